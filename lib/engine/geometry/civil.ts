import type { Day, Minute, Weekday } from "../types";

/** Minutes of a civil day. */
export const DAY_MINUTES = 1440;

/** Days from 0000-03-01 to 1970-01-01 in the proleptic Gregorian calendar. */
const EPOCH_SHIFT = 719_468;
const DAYS_PER_ERA = 146_097;
const ISO = /^(\d{4})-(\d{2})-(\d{2})$/;
const HHMM = /^(\d{2}):(\d{2})$/;

const pad = (value: number, length: number): string => String(value).padStart(length, "0");

/**
 * Days since 1970-01-01 of a civil year, month (1 to 12) and day of the month.
 * Source: H. Hinnant, "chrono-Compatible Low-Level Date Algorithms", days_from_civil.
 */
function daysFromCivil(year: number, month: number, dayOfMonth: number): number {
  const y = month <= 2 ? year - 1 : year;
  const era = Math.floor(y / 400);
  const yearOfEra = y - era * 400;
  const dayOfYear = Math.floor((153 * (month + (month > 2 ? -3 : 9)) + 2) / 5) + dayOfMonth - 1;
  const dayOfEra = yearOfEra * 365 + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100) + dayOfYear;
  return era * DAYS_PER_ERA + dayOfEra - EPOCH_SHIFT;
}

/** ISO date (YYYY-MM-DD) of a civil day. Source: Hinnant, civil_from_days. */
export function isoFromDay(day: Day): string {
  const shifted = day + EPOCH_SHIFT;
  const era = Math.floor(shifted / DAYS_PER_ERA);
  const dayOfEra = shifted - era * DAYS_PER_ERA;
  const yearOfEra = Math.floor(
    (dayOfEra -
      Math.floor(dayOfEra / 1460) +
      Math.floor(dayOfEra / 36_524) -
      Math.floor(dayOfEra / 146_096)) /
      365,
  );
  const dayOfYear = dayOfEra - (365 * yearOfEra + Math.floor(yearOfEra / 4) - Math.floor(yearOfEra / 100));
  const shiftedMonth = Math.floor((5 * dayOfYear + 2) / 153);
  const dayOfMonth = dayOfYear - Math.floor((153 * shiftedMonth + 2) / 5) + 1;
  const month = shiftedMonth + (shiftedMonth < 10 ? 3 : -9);
  const year = yearOfEra + era * 400 + (month <= 2 ? 1 : 0);
  return `${pad(year, 4)}-${pad(month, 2)}-${pad(dayOfMonth, 2)}`;
}

/** Civil day of an ISO date (YYYY-MM-DD). Throws `RangeError` for anything that is not a date of the calendar. */
export function dayFromIso(iso: string): Day {
  const parts = ISO.exec(iso);
  const day = parts ? (daysFromCivil(Number(parts[1]), Number(parts[2]), Number(parts[3])) as Day) : null;
  // Reading it back catches 2026-02-29 and month 13 without a table of month lengths.
  if (day === null || isoFromDay(day) !== iso) throw new RangeError(`Not a date: ${iso}`);
  return day;
}

/** ISO weekday of a civil day; 1970-01-01 was a Thursday. */
export function weekdayOf(day: Day): Weekday {
  return (((((day + 3) % 7) + 7) % 7) + 1) as Weekday;
}

/** Minutes since midnight of "HH:MM", 00:00 to 24:00. Throws `RangeError` for anything else. */
export function minuteFromHhmm(text: string): Minute {
  const parts = HHMM.exec(text);
  const minute = parts && Number(parts[2]) < 60 ? Number(parts[1]) * 60 + Number(parts[2]) : -1;
  if (minute < 0 || minute > DAY_MINUTES) throw new RangeError(`Not a time of day: ${text}`);
  return minute as Minute;
}

/** "HH:MM" of minutes since midnight; an end past midnight reads as the time of the next day, 1440 as "24:00". */
export function hhmm(minute: Minute): string {
  const ofDay = minute === DAY_MINUTES ? minute : minute % DAY_MINUTES;
  return `${pad(Math.floor(ofDay / 60), 2)}:${pad(ofDay % 60, 2)}`;
}
