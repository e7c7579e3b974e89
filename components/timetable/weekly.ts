import { readRule, ruleText, type RuleParts } from "@/lib/calendar/rrule-text";
import { dayFromIso, weekdayOf } from "@/lib/engine";
import type { Weekday } from "@/lib/engine/types";
import type { TimetableForm } from "@/lib/schemas/timetable";

const CODES = ["MO", "TU", "WE", "TH", "FR", "SA", "SU"] as const;
const WEEKDAYS: readonly Weekday[] = [1, 2, 3, 4, 5, 6, 7];

/** A session that comes every week on some days, perhaps up to a last one. */
export interface Weekly {
  readonly weekdays: readonly Weekday[];
  /** YYYY-MM-DD; null without end. */
  readonly until: string | null;
}

const partsOf = (entry: Pick<TimetableForm, "rrule" | "start">): RuleParts | null => {
  const parts = entry.rrule === null ? null : readRule(entry.rrule, entry.start);
  return parts && !("problem" in parts) ? parts : null;
};

const ownDay = (start: string): Weekday => weekdayOf(dayFromIso(start.slice(0, 10)));

/** The weekly recurrence of an entry, or null where it is a single session or recurs in another way. */
export function weeklyOf(entry: Pick<TimetableForm, "rrule" | "start">): Weekly | null {
  const parts = partsOf(entry);
  if (!parts || parts.get("FREQ") !== "WEEKLY") return null;
  const plain = [...parts].every(
    ([name, value]) =>
      ["FREQ", "BYDAY", "UNTIL", "WKST"].includes(name) || (name === "INTERVAL" && value === "1"),
  );
  if (!plain) return null;
  const codes = parts.get("BYDAY")?.split(",");
  const until = parts.get("UNTIL");
  return {
    weekdays: codes ? WEEKDAYS.filter((day) => codes.includes(CODES[day - 1] ?? "")) : [ownDay(entry.start)],
    until: until ? `${until.slice(0, 4)}-${until.slice(4, 6)}-${until.slice(6, 8)}` : null,
  };
}

/** The rule of a weekly session; the day it starts on always counts. */
export function weeklyRule({ weekdays, until }: Weekly, start: string): string {
  const days = WEEKDAYS.filter((day) => day === ownDay(start) || weekdays.includes(day));
  const parts = new Map([
    ["FREQ", "WEEKLY"],
    ["BYDAY", days.map((day) => CODES[day - 1]).join(",")],
  ]);
  if (until) parts.set("UNTIL", `${until.replaceAll("-", "")}T235959`);
  return ruleText(parts);
}
