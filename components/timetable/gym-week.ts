import type { Weekday } from "@/lib/engine/types";
import type { TimetableEntry } from "@/lib/schemas/timetable";
import { weeklyOf } from "./weekly";

const timeOf = (entry: TimetableEntry): string => entry.start.slice(11);
const byTime = (a: TimetableEntry, b: TimetableEntry): number =>
  timeOf(a).localeCompare(timeOf(b)) || a.title.localeCompare(b.title);

/** The gym's week as it stands on `today` (YYYY-MM-DD): what comes each weekday, and what else there is, past left out. */
export function gymWeek(entries: readonly TimetableEntry[], today: string) {
  const weekly = entries.flatMap((entry) => {
    const rule = weeklyOf(entry);
    return rule && (rule.until === null || rule.until >= today) ? [{ entry, rule }] : [];
  });
  const days = ([1, 2, 3, 4, 5, 6, 7] as const).map((weekday: Weekday) => ({
    weekday,
    entries: weekly
      .filter(({ rule }) => rule.weekdays.includes(weekday))
      .map(({ entry }) => entry)
      .sort(byTime),
  }));
  const others = entries.filter(
    (entry) => weeklyOf(entry) === null && (entry.rrule !== null || entry.start.slice(0, 10) >= today),
  );
  const over = entries.length - weekly.length - others.length;
  return { days, others, over };
}
