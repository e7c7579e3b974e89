import type { StandingCamp } from "@/lib/book";
import type { Instant } from "@/lib/engine/types";
import type { PreviewResult } from "@/lib/book/preview-result";
import type { LiveChange } from "./desk-state";

/** What the page needs of book and engine: the server runs the same when a change is saved. */
export interface Planner {
  readonly previewChange: (standing: StandingCamp, change: LiveChange, now: Instant) => PreviewResult;
}

let arriving: Promise<Planner> | null = null;

/** Fetches book and engine, once; after a failure the next call tries again. */
export function loadPlanner(): Promise<Planner> {
  arriving ??= import("@/lib/book/preview").then(
    ({ previewChange }) => ({
      previewChange: (standing, change, now) => {
        const start = performance.now();
        const result = previewChange(standing, change, now);
        // In the browser's performance timeline, where one can see how long a preview takes.
        performance.measure("bellward.preview", { start, end: performance.now() });
        return result;
      },
    }),
    (error: unknown) => {
      arriving = null;
      throw error;
    },
  );
  return arriving;
}
