import { RRule, Weekday as RuleDay } from "rrule";
import { dayFromIso, isoFromDay, weekdayOf } from "@/lib/engine/geometry";
import type { Day, Weekday } from "@/lib/engine/types";

/** A weekly recurrence as the form has it. */
export interface Weekly {
  readonly weekdays: readonly number[];
  /** Last day, `YYYY-MM-DD`; null for as long as the camp lasts. */
  readonly until: string | null;
}

/** RRULE value of a weekly recurrence. UNTIL is a wall-clock reading, as everywhere in a camp book. */
export function weeklyRule({ weekdays, until }: Weekly, start: string, boutDate: string): string {
  const days = new Set([...weekdays, weekdayOf(dayFromIso(start))]);
  // Nothing is trained on the bout day, so a series without an end of its own stops the day before.
  const last = until ?? isoFromDay((dayFromIso(boutDate) - 1) as Day);
  return RRule.optionsToString({
    freq: RRule.WEEKLY,
    // rrule counts weekdays from Monday 0, ISO from Monday 1.
    byweekday: [...days].sort((a, b) => a - b).map((day) => new RuleDay(day - 1)),
    until: new Date(`${last}T23:59:00Z`),
  }).replace("RRULE:", "");
}

/** Date of the last occurrence that a rule allows, or null for one without an end. */
function lastDate(rrule: string, start: string): string | null {
  const parts = RRule.parseString(rrule);
  if (parts.until) return parts.until.toISOString().slice(0, 10);
  if (!parts.count) return null;
  const last = new RRule({ ...parts, dtstart: new Date(`${start}T00:00:00Z`) }).all().at(-1);
  return last ? last.toISOString().slice(0, 10) : null;
}

/** The form's values of a rule, or null where the rule is more than the form can say. */
export function readWeekly(rrule: string, start: string, boutDate: string): Weekly | null {
  const { freq, byweekday, until: _until, count: _count, ...rest } = RRule.parseString(rrule);
  const plain = Object.entries(rest).every(
    ([name, value]) => name === "wkst" || (name === "interval" && value === 1),
  );
  if (freq !== RRule.WEEKLY || !plain) return null;
  const days = [byweekday ?? []]
    .flat()
    .map((day) => (day instanceof RuleDay ? day.weekday + 1 : Number(day) + 1));
  const last = lastDate(rrule, start);
  const own: Weekday = weekdayOf(dayFromIso(start));
  return {
    weekdays: days.length > 0 ? days : [own],
    until: last !== null && last >= isoFromDay((dayFromIso(boutDate) - 1) as Day) ? null : last,
  };
}

/** "every week on Tuesday until December 29, 2026". */
export const ruleText = (rrule: string): string => RRule.fromString(rrule).toText();
