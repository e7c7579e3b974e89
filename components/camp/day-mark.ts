import type { Day } from "@/lib/engine/types";

/** The day that is pointed at, in the ropes or in the calendar. Kept outside React's state: it changes with the pointer. */
export interface DayMark {
  readonly read: () => Day | null;
  readonly set: (day: Day | null) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

export function createDayMark(): DayMark {
  let marked: Day | null = null;
  const listeners = new Set<() => void>();
  return {
    read: () => marked,
    set(day) {
      if (day === marked) return;
      marked = day;
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
