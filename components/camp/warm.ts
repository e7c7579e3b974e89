import type { Instant } from "@/lib/engine/types";
import type { Planner } from "./load-planner";
import type { Picture } from "./picture";

/** Runs of the planner before the first drag: as many as browsers take to compile all of it, a tenth of a second in idle moments. */
export const WARM_RUNS = 40;

/** Runs the planner while the page is idle, so that the browser has compiled it when the first session is carried. */
export function warm({ previewChange }: Planner, standing: Picture, now: Instant): () => void {
  const lift = standing.plan.lifts.findLast((candidate) => !candidate.past);
  if (!lift || typeof requestIdleCallback === "undefined") return () => undefined;
  let left = WARM_RUNS;
  const run = (): void => {
    previewChange(standing, { kind: "lift.factor", liftId: lift.id, factor: 1 }, now);
    if (--left > 0) handle = requestIdleCallback(run);
  };
  let handle = requestIdleCallback(run);
  return () => cancelIdleCallback(handle);
}
