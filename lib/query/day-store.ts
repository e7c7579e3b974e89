import type { TodayView } from "@/lib/schemas/today";
import { ProblemError, sendJson } from "./send";

/**
 * The athlete's day as this page has it, and the one question that renews it. The phone keeps the view and what waits for the net by
 * itself (`lib/offline`): a general cache beside that would be a second one, and more script than the page has to spare.
 */
export interface DayStore {
  readonly read: () => TodayView;
  /** Why the last question failed; null where it did not. */
  readonly readProblem: () => ProblemError | null;
  readonly subscribe: (listener: () => void) => () => void;
  /** Gives back what stands then. */
  readonly set: (change: (shown: TodayView) => TodayView) => TodayView;
  /** An answer that is under way is not taken any more: it began before something that was just sent. */
  readonly cancel: () => void;
  /** Asks the server; the newer of its answer and what stands is shown. Never throws. */
  readonly refresh: () => Promise<void>;
}

export function createDayStore(initial: TodayView): DayStore {
  let view = initial;
  let problem: ProblemError | null = null;
  let asked = 0;
  const listeners = new Set<() => void>();
  const tell = (): void => listeners.forEach((listener) => listener());
  return {
    read: () => view,
    readProblem: () => problem,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    set: (change) => {
      view = change(view);
      tell();
      return view;
    },
    cancel: () => void asked++,
    refresh: async () => {
      const mine = ++asked;
      try {
        const given = await sendJson<TodayView>("/api/today");
        if (mine !== asked) return;
        problem = null;
        // The same instant is the same answer, to which this page has added what it sent since.
        if (given.madeAt > view.madeAt) view = given;
      } catch (error) {
        if (mine !== asked) return;
        if (!(error instanceof ProblemError)) throw error;
        problem = error;
      }
      tell();
    },
  };
}
