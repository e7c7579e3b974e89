import type { CalendarEntry } from "./entry";

/**
 * The chips of the calendar by id. Outside React's state, because the calendar's cells are drawn by FullCalendar: each chip
 * subscribes to its own entry, so that a move redraws the few that changed.
 */
export interface EntryStore {
  readonly read: (id: string) => CalendarEntry | undefined;
  readonly all: () => readonly CalendarEntry[];
  readonly write: (entries: readonly CalendarEntry[]) => void;
  readonly subscribe: (listener: () => void) => () => void;
}

const signature = (entry: CalendarEntry): string =>
  JSON.stringify([
    entry.day,
    entry.start,
    entry.title,
    entry.look.chip,
    entry.movable,
    entry.state,
    entry.label,
  ]);

export function createEntryStore(initial: readonly CalendarEntry[]): EntryStore {
  let list = initial;
  let byId = new Map(initial.map((entry) => [entry.id, entry]));
  const listeners = new Set<() => void>();
  return {
    read: (id) => byId.get(id),
    all: () => list,
    write(entries) {
      const before = byId;
      // An entry that is as it was stays the same object: its chip is not drawn again.
      list = entries.map((entry) => {
        const old = before.get(entry.id);
        return old && signature(old) === signature(entry) ? old : entry;
      });
      byId = new Map(list.map((entry) => [entry.id, entry]));
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
