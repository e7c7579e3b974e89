import type { Day } from "../types";

/** Days from `day` to the bout: 0 on the bout day, negative after it. */
export function daysOutOf(boutDay: Day, day: Day): number {
  return boutDay - day;
}

/** Camp week of `day`: 0 is fight week, whose last day is the bout. Negative after the bout. */
export function weeksOutOf(boutDay: Day, day: Day): number {
  return Math.floor((boutDay - day) / 7);
}

/** First and last day, both inclusive, of the camp week `weeksOut` weeks out. */
export function weekSpan(boutDay: Day, weeksOut: number): { readonly from: Day; readonly to: Day } {
  const to = boutDay - 7 * weeksOut;
  return { from: (to - 6) as Day, to: to as Day };
}

/** First day of a camp of `weeks` weeks. */
export function campStart(boutDay: Day, weeks: number): Day {
  return (boutDay - 7 * weeks + 1) as Day;
}
