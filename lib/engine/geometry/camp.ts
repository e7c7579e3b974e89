import type { Day } from "../types";

/** Days from `day` to the bout; negative after it. */
export const daysOutOf = (boutDay: Day, day: Day): number => boutDay - day;

/** Camp week of a day: 0 is fight week, whose last day is the bout. */
export const weeksOutOf = (boutDay: Day, day: Day): number => Math.floor((boutDay - day) / 7);

/** First and last day of a camp week. */
export const weekSpan = (boutDay: Day, weeksOut: number): { readonly from: Day; readonly to: Day } => ({
  from: (boutDay - 7 * weeksOut - 6) as Day,
  to: (boutDay - 7 * weeksOut) as Day,
});
