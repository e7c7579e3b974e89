import type { Day, Minute, Weekday } from "../types";

/** Minutes of a civil day. */
export const DAY_MINUTES = 1440;

/**
 * Civil day of a proleptic Gregorian date, days since 1970-01-01. Months 1 to 12. No range check.
 * Source: Howard Hinnant, chrono-compatible low-level date algorithms, `days_from_civil`.
 */
export function dayFromYmd(year: number, month: number, dayOfMonth: number): Day {
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + dayOfMonth - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return (era * 146_097 + dayOfEra - 719_468) as Day;
}

/** Civil day of `YYYY-MM-DD`. The text must be a date; a check belongs to the caller. */
export const dayFromIso = (iso: string): Day =>
  dayFromYmd(Number(iso.slice(0, 4)), Number(iso.slice(5, 7)), Number(iso.slice(8, 10)));

const pad = (value: number, width = 2): string => String(value).padStart(width, "0");

/** `YYYY-MM-DD` of a civil day. Source: as above, `civil_from_days`. */
export function isoFromDay(day: Day): string {
  const z = day + 719_468;
  const era = Math.floor(z / 146_097);
  const dayOfEra = z - era * 146_097;
  const yearOfEra = Math.floor(
    (dayOfEra - Math.floor(dayOfEra / 1460) + Math.floor(dayOfEra / 36_524) - Math.floor(dayOfEra / 146_096)) / 365,
  );
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const monthFromMarch = Math.floor((5 * dayOfYear + 2) / 153);
  const dayOfMonth = dayOfYear - Math.floor((153 * monthFromMarch + 2) / 5) + 1;
  const month = monthFromMarch < 10 ? monthFromMarch + 3 : monthFromMarch - 9;
  const year = yearOfEra + era * 400 + (month <= 2 ? 1 : 0);
  return `${pad(year, 4)}-${pad(month)}-${pad(dayOfMonth)}`;
}

/** ISO weekday, 1 is Monday; 1970-01-01 was a Thursday. */
export const weekdayOf = (day: Day): Weekday => (((((day + 3) % 7) + 7) % 7) + 1) as Weekday;

/** Minutes since midnight of `HH:MM`, 24:00 included. */
export const minuteFromHhmm = (text: string): Minute => (Number(text.slice(0, 2)) * 60 + Number(text.slice(3, 5))) as Minute;

/** `HH:MM` of minutes since midnight; past midnight it wraps to the next day's clock, but 1440 is "24:00". */
export function hhmm(minute: Minute): string {
  const shown = minute > DAY_MINUTES ? minute % DAY_MINUTES : minute;
  return `${pad(Math.floor(shown / 60))}:${pad(shown % 60)}`;
}
