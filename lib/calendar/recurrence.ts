import { dayFromIso, isoFromDay, minuteFromHhmm } from "@/lib/engine";
import type { Day, SportSession } from "@/lib/engine/types";
import type { SportEntry } from "@/lib/schemas/camp-book";
import { allowance, occurrences, type Allowance, type Rule } from "./occurrences";
import { MOST_OCCURRENCES, TOO_MANY, readRule, ruleText, untilMs, type RuleParts } from "./rrule-text";

/** The part of an entry that says when it takes place. */
type Timed = Pick<SportEntry, "start" | "rrule" | "exdate">;

/** A recurrence that cannot be expanded: which entry, which of its fields, and why in a coach's words. */
export class RecurrenceError extends Error {
  constructor(
    readonly entryIndex: number,
    readonly pointerField: "rrule" | "exdate" | "start",
    message: string,
  ) {
    super(message);
    this.name = "RecurrenceError";
  }
}

const LOCAL = /^(\d{4}-\d{2}-\d{2})T(\d{2}:\d{2})$/;
/** A rule without an occurrence for so long has none: 29 February is at most 8 years away. */
const SEARCH_DAYS = 9 * 366;

function dayOf(local: string, field: "start" | "exdate", index: number): Day {
  const parts = LOCAL.exec(local);
  try {
    if (parts?.[1] && parts[2]) {
      minuteFromHhmm(parts[2]);
      return dayFromIso(parts[1]);
    }
  } catch {
    // Falls through to the refusal below.
  }
  throw new RecurrenceError(index, field, "Give a local date and time as YYYY-MM-DDTHH:MM.");
}

function ruleOf(entry: Timed, rrule: string, index: number): Rule {
  const parts = readRule(rrule, entry.start);
  if ("problem" in parts) throw new RecurrenceError(index, "rrule", parts.problem);
  const until = parts.get("UNTIL");
  return {
    parts,
    start: entry.start,
    startDay: dayOf(entry.start, "start", index),
    until: until === undefined ? null : untilMs(until),
  };
}

/** Days on which the rule falls, exceptions not yet taken out. */
function ruleDays(rule: Rule, from: Day, to: Day, index: number, left: Allowance): Day[] {
  const days = occurrences(rule, from, to, left);
  if (days.length === 0 && rule.until === null) {
    // Outside the window is no mistake; nowhere at all is one.
    const ever = occurrences(rule, rule.startDay, (rule.startDay + SEARCH_DAYS) as Day, left, 1);
    if (ever.length === 0 && left.periods > 0)
      throw new RecurrenceError(index, "rrule", "This recurrence never falls on any day.");
  }
  if (left.periods <= 0)
    throw new RecurrenceError(
      index,
      "start",
      "This recurrence starts too long before the camp to be worked out.",
    );
  return days;
}

function daysOf(entry: Timed, from: Day, to: Day, index: number, left: Allowance): Day[] {
  const first = dayOf(entry.start, "start", index);
  const without = new Set(entry.exdate.map((date) => (dayOf(date, "exdate", index), date)));
  const all =
    entry.rrule === null
      ? [first].filter((day) => day >= from && day <= to)
      : ruleDays(ruleOf(entry, entry.rrule, index), from, to, index, left);
  const time = entry.start.slice(10);
  return all.filter((day) => !without.has(`${isoFromDay(day)}${time}`));
}

/**
 * Days from `from` to `to`, both inclusive, on which an entry takes place, in order. Wall-clock days: no time zone is
 * asked. Throws `RecurrenceError` (index 0) for a recurrence that cannot be expanded.
 */
export const occurrenceDays = (entry: Timed, from: Day, to: Day): Day[] =>
  daysOf(entry, from, to, 0, allowance());

// Entries are values that nobody changes, so that one worked out for a window stays worked out: a preview expands the
// whole book again and again while a session is dragged.
const expanded = new WeakMap<
  SportEntry,
  { readonly window: string; readonly sessions: readonly SportSession[] }
>();

function sessionsOf(
  entry: SportEntry,
  from: Day,
  to: Day,
  index: number,
  left: Allowance,
): readonly SportSession[] {
  const window = `${from} ${to}`;
  const known = expanded.get(entry);
  if (known?.window === window) return known.sessions;
  const { kind, title, minutes, effort } = entry;
  const sessions = daysOf(entry, from, to, index, left).map((day): SportSession => ({
    id: entry.rrule === null ? entry.id : `${entry.series}@${isoFromDay((day - entry.idShift) as Day)}`,
    kind,
    title,
    day,
    start: minuteFromHhmm(entry.start.slice(11)),
    minutes,
    effort,
  }));
  expanded.set(entry, { window, sessions });
  return sessions;
}

const inOrder = (a: SportSession, b: SportSession): number =>
  a.day - b.day || a.start - b.start || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);

/**
 * All sessions of a timetable from `from` to `to`, both inclusive, sorted by day, start and id. Recurrences are expanded on
 * the wall clock, so that 18:00 stays 18:00 across a daylight-saving change. A recurrence without an end is bounded by the
 * window. Throws `RecurrenceError` for one that is invalid, finer than daily, never falls on a day, or brings the whole
 * above 2,000 sessions.
 */
export function expandEntries(entries: readonly SportEntry[], from: Day, to: Day): SportSession[] {
  const left = allowance();
  const sessions: SportSession[] = [];
  entries.forEach((entry, index) => {
    sessions.push(...sessionsOf(entry, from, to, index, left));
    if (sessions.length > MOST_OCCURRENCES) throw new RecurrenceError(index, "rrule", TOO_MANY);
  });
  return sessions.sort(inOrder);
}

const partsOf = (entry: Timed, rrule: string): { rule: Rule; parts: Map<string, string> } => {
  const rule = ruleOf(entry, rrule, 0);
  return { rule, parts: new Map(rule.parts) };
};

/** Occurrences, exceptions included, from the start of the series up to the day before `day`. */
const countBefore = (rule: Rule, day: Day): number =>
  occurrences(rule, rule.startDay, (day - 1) as Day, allowance()).length;

const withRule = (entry: SportEntry, parts: RuleParts, exdate: string[]): SportEntry => ({
  ...entry,
  rrule: ruleText(parts),
  exdate,
});

/**
 * The series up to the day before `date` (YYYY-MM-DD). A COUNT that ends it earlier stays; any later end becomes an UNTIL.
 * A single entry is given back as it is.
 */
export function endBefore(entry: SportEntry, date: string): SportEntry {
  if (entry.rrule === null) return entry;
  const day = dayFromIso(date);
  const { rule, parts } = partsOf(entry, entry.rrule);
  const count = Number(parts.get("COUNT") ?? Infinity);
  const cut = `${isoFromDay((day - 1) as Day).replaceAll("-", "")}T235959`;
  if (countBefore(rule, day) < count && (rule.until === null || rule.until > untilMs(cut))) {
    parts.delete("COUNT");
    parts.set("UNTIL", cut);
  }
  return withRule(
    entry,
    parts,
    entry.exdate.filter((exception) => exception < date),
  );
}

/**
 * The rest of a series from `firstDate` (YYYY-MM-DD) on, as an entry of its own with `newId`: it starts at the first
 * occurrence that remains, and a COUNT becomes what remains of it. Throws `RecurrenceError` where nothing remains.
 */
export function startFrom(entry: SportEntry, firstDate: string, newId: string): SportEntry {
  if (entry.rrule === null) return { ...entry, id: newId };
  const day = dayFromIso(firstDate);
  const { rule, parts } = partsOf(entry, entry.rrule);
  const [first] = occurrences(rule, day, (day + SEARCH_DAYS) as Day, allowance(), 1);
  if (first === undefined)
    throw new RecurrenceError(0, "start", "Nothing of this recurrence remains from that day on.");
  const count = parts.get("COUNT");
  if (count !== undefined) parts.set("COUNT", String(Number(count) - countBefore(rule, day)));
  const start = `${isoFromDay(first)}${entry.start.slice(10)}`;
  return {
    ...withRule(
      entry,
      parts,
      entry.exdate.filter((exception) => exception >= firstDate),
    ),
    id: newId,
    start,
  };
}
