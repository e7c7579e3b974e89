import { dayFromIso } from "@/lib/engine";

/** RFC 5545 3.3.10, as far as a timetable has use for it: a recurrence falls at most once a day. */

export const FREQUENCIES = ["DAILY", "WEEKLY", "MONTHLY", "YEARLY"] as const;
export type Frequency = (typeof FREQUENCIES)[number];

/** A rule taken apart; names and values in capitals, in the order they were given. */
export type RuleParts = ReadonlyMap<string, string>;

/** More occurrences than this are refused. */
export const MOST_OCCURRENCES = 2000;

const FINER = ["HOURLY", "MINUTELY", "SECONDLY"];
const WEEKDAY = /^([+-]?[1-9]\d?)?(MO|TU|WE|TH|FR|SA|SU)$/;
const INTEGER = /^[+-]?\d{1,4}$/;

const listOf = (value: string): string[] => value.split(",");

const numbers =
  (low: number, high: number, signed = false) =>
  (value: string): boolean =>
    listOf(value).every((text) => {
      const number = Number(text);
      const size = signed ? Math.abs(number) : number;
      return INTEGER.test(text) && size >= low && size <= high;
    });

const single = (low: number, high: number) => (value: string) =>
  /^\d+$/.test(value) && Number(value) >= low && Number(value) <= high;

/** Last wall-clock moment of an UNTIL as if it were UTC, in milliseconds; a date alone includes its whole day. NaN if it is neither. */
export function untilMs(value: string): number {
  const parts = /^(\d{4})(\d{2})(\d{2})(?:T(\d{2})(\d{2})(\d{2})Z?)?$/.exec(value);
  if (!parts) return NaN;
  const [, year, month, day, hour = "23", minute = "59", second = "59"] = parts;
  try {
    dayFromIso(`${year}-${month}-${day}`);
  } catch {
    return NaN;
  }
  return Date.parse(`${year}-${month}-${day}T${hour}:${minute}:${second}Z`);
}

const VALUES: Readonly<Record<string, (value: string) => boolean>> = {
  FREQ: (value) => FREQUENCIES.some((known) => known === value),
  INTERVAL: single(1, 1000),
  COUNT: single(1, MOST_OCCURRENCES),
  UNTIL: (value) => !Number.isNaN(untilMs(value)),
  WKST: (value) => /^(MO|TU|WE|TH|FR|SA|SU)$/.test(value),
  BYDAY: (value) => listOf(value).every((day) => WEEKDAY.test(day)),
  BYMONTHDAY: numbers(1, 31, true),
  BYYEARDAY: numbers(1, 366, true),
  BYWEEKNO: numbers(1, 53, true),
  BYMONTH: numbers(1, 12),
  BYSETPOS: numbers(1, 366, true),
  BYHOUR: single(0, 23),
  BYMINUTE: single(0, 59),
  BYSECOND: single(0, 0),
};

/** Parts that RFC 5545 allows with some frequencies only. */
const WITH: Readonly<Record<string, readonly Frequency[]>> = {
  BYMONTHDAY: ["DAILY", "MONTHLY", "YEARLY"],
  BYYEARDAY: ["YEARLY"],
  BYWEEKNO: ["YEARLY"],
};

/** The rule in parts, or what is wrong with it in words. `start` is the local start, `YYYY-MM-DDTHH:MM`. */
export function readRule(text: string, start: string): RuleParts | { readonly problem: string } {
  const parts = new Map<string, string>();
  for (const part of text.toUpperCase().split(";")) {
    const [name = "", value = "", more] = part.split("=");
    const problem =
      more === undefined && !parts.has(name)
        ? problemOf(name, value)
        : `"${part}" does not belong in a recurrence.`;
    if (problem) return { problem };
    parts.set(name, value);
  }
  const problem = problemTogether(parts, start);
  return problem ? { problem } : parts;
}

function problemOf(name: string, value: string): string | null {
  if (name === "FREQ" && FINER.includes(value))
    return "A session can recur daily at most: FREQ must be DAILY, WEEKLY, MONTHLY or YEARLY.";
  if (name === "COUNT" && /^\d+$/.test(value) && Number(value) > MOST_OCCURRENCES) return TOO_MANY;
  if (["BYHOUR", "BYMINUTE", "BYSECOND"].includes(name) && value.includes(","))
    return "A session can recur daily at most: make one session for each time of day.";
  const allowed = Object.hasOwn(VALUES, name) ? VALUES[name] : undefined;
  if (!allowed) return `"${name}" is no part of a recurrence.`;
  return allowed(value) ? null : `${name} cannot be "${value}".`;
}

export const TOO_MANY = `A recurrence may have at most ${MOST_OCCURRENCES.toLocaleString("en")} occurrences.`;

function problemTogether(parts: RuleParts, start: string): string | null {
  const freq = frequencyOf(parts);
  if (!freq) return "A recurrence needs a FREQ.";
  if (parts.has("COUNT") && parts.has("UNTIL")) return "Give COUNT or UNTIL, not both.";
  for (const [name, allowed] of Object.entries(WITH)) {
    if (parts.has(name) && !allowed.includes(freq)) return `${name} cannot be used with FREQ=${freq}.`;
  }
  const numbered = listOf(parts.get("BYDAY") ?? "").some((day) => /\d/.test(day));
  if (numbered && (freq === "DAILY" || freq === "WEEKLY" || parts.has("BYWEEKNO"))) {
    return "BYDAY takes numbers only in a month or a year.";
  }
  if (
    parts.has("BYSETPOS") &&
    ![...parts.keys()].some((name) => name.startsWith("BY") && name !== "BYSETPOS")
  ) {
    return "BYSETPOS needs another BY part to choose from.";
  }
  const times = [
    ["BYHOUR", start.slice(11, 13)],
    ["BYMINUTE", start.slice(14, 16)],
  ] as const;
  if (times.some(([name, own]) => parts.has(name) && Number(parts.get(name)) !== Number(own))) {
    return "The time of day is the session's start: leave BYHOUR and BYMINUTE out.";
  }
  return null;
}

export const frequencyOf = (parts: RuleParts): Frequency | undefined =>
  FREQUENCIES.find((known) => known === parts.get("FREQ"));

export const ruleText = (parts: RuleParts): string =>
  [...parts].map(([name, value]) => `${name}=${value}`).join(";");
