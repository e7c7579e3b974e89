import type { CalendarApi, EventApi, EventInput } from "@fullcalendar/core";
import { hhmm, isoFromDay } from "@/lib/engine/geometry";
import type { CalendarEntry } from "./entry";

const startText = (entry: CalendarEntry): string => {
  const date = isoFromDay(entry.day);
  return entry.wholeDay ? date : `${date}T${hhmm(entry.start)}:00`;
};

/** What FullCalendar needs to know of an entry; all looks come from the entry store. */
export const eventInput = (entry: CalendarEntry): EventInput => ({
  id: entry.id,
  start: startText(entry),
  allDay: entry.wholeDay,
  editable: entry.movable,
});

/** True where the session now stands on another day. */
function update(event: EventApi, entry: CalendarEntry): boolean {
  const start = startText(entry);
  const elsewhere = event.startStr.slice(0, 10) !== start.slice(0, 10);
  if (event.startStr.slice(0, start.length) !== start || event.allDay !== entry.wholeDay) {
    // No end: moving the start alone would stretch the session over the days between.
    event.setDates(start, null, { allDay: entry.wholeDay });
  }
  if (event.startEditable !== entry.movable) event.setProp("editable", entry.movable);
  return elsewhere;
}

/**
 * Makes the calendar hold exactly these entries. Events are changed in place, never replaced as a list: replacing them
 * under a running drag would leave copies behind, and every chip would lose its focus. `dragged` is in the reader's hand and
 * left to FullCalendar until it is dropped. Returns the ids of those that now stand on another day.
 */
export function reconcile(
  calendar: CalendarApi,
  entries: readonly CalendarEntry[],
  dragged: string | null,
): ReadonlySet<string> {
  const moved = new Set<string>();
  const wanted = new Map(entries.map((entry) => [entry.id, entry]));
  calendar.batchRendering(() => {
    for (const event of calendar.getEvents()) {
      const entry = wanted.get(event.id);
      wanted.delete(event.id);
      if (event.id === dragged) continue;
      if (!entry) event.remove();
      else if (update(event, entry)) moved.add(entry.id);
    }
    for (const entry of wanted.values()) calendar.addEvent(eventInput(entry));
  });
  return moved;
}
