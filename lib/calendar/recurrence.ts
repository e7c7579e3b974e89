import { RRule } from "rrule";
import { dayFromIso, hhmm, isoFromDay, minuteFromHhmm } from "@/lib/engine/geometry";
import type { Day, Minute, SportSession } from "@/lib/engine/types";
import type { SportEntry } from "@/lib/schemas/camp-book";

/** Most occurrences of one timetable over a camp. */
export const MOST_OCCURRENCES = 2000;

const DAY_MS = 86_400_000;
/** Candidates looked at before a rule that never yields is given up. */
const MOST_STEPS = 20_000;
const FREQUENCIES = new Set([RRule.DAILY, RRule.WEEKLY, RRule.MONTHLY, RRule.YEARLY]);

/** A recurrence that cannot be expanded. `entryIndex` counts in the list that was given. */
export class RecurrenceError extends Error {
  constructor(
    message: string,
    readonly pointerField: "rrule" | "exdate" | "start",
    readonly entryIndex = 0,
  ) {
    super(message);
    this.name = "RecurrenceError";
  }
}

// rrule works on UTC fields: wall-clock times go in as if they were UTC and come out the same way.
const asUtc = (local: string): Date => new Date(`${local}:00Z`);
const localOf = (date: Date): string => date.toISOString().slice(0, 16);
const dateOfDay = (day: Day, minute = 0): Date => new Date(day * DAY_MS + minute * 60_000);

function ruleOf(entry: SportEntry, rrule: string): RRule {
  let rule: RRule;
  try {
    // UNTIL is read as wall-clock time of the entry, whatever its suffix.
    rule = new RRule({ ...RRule.parseString(rrule), dtstart: asUtc(entry.start) });
  } catch {
    throw new RecurrenceError("This is not an RRULE of RFC 5545.", "rrule");
  }
  if (!FREQUENCIES.has(rule.options.freq))
    throw new RecurrenceError("Recurrences are daily, weekly, monthly or yearly.", "rrule");
  if (
    [rule.options.byhour, rule.options.byminute, rule.options.bysecond].some(
      (list) => Array.isArray(list) && list.length > 1,
    )
  ) {
    throw new RecurrenceError("A recurrence keeps one time of day.", "rrule");
  }
  return rule;
}

/** Local starts of a recurring entry from one day to another, both inclusive. */
function startsOf(entry: SportEntry, rrule: string, from: Day, to: Day): string[] {
  const rule = ruleOf(entry, rrule);
  const out = new Set(entry.exdate);
  const starts: string[] = [];
  let steps = 0;
  rule.between(dateOfDay(from), dateOfDay(to, 1439), true, (date) => {
    const local = localOf(date);
    if (!out.has(local)) starts.push(local);
    return ++steps <= MOST_STEPS && starts.length <= MOST_OCCURRENCES;
  });
  if (starts.length > MOST_OCCURRENCES)
    throw new RecurrenceError(`More than ${MOST_OCCURRENCES} occurrences.`, "rrule");
  return starts;
}

function sessionAt(entry: SportEntry, local: string): SportSession {
  const day = dayFromIso(local.slice(0, 10));
  return {
    id: entry.rrule === null ? entry.id : `${entry.series}@${isoFromDay((day - entry.idShift) as Day)}`,
    kind: entry.kind,
    title: entry.title,
    day,
    start: minuteFromHhmm(local.slice(11)),
    minutes: entry.minutes,
    effort: entry.effort,
  };
}

const byTime = (a: SportSession, b: SportSession): number =>
  a.day - b.day || a.start - b.start || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);

/**
 * Dated sessions of a timetable from one day to another, both inclusive, sorted by day, start and id. Wall-clock times stay
 * the same across daylight-saving changes. Throws `RecurrenceError`.
 */
export function expandEntries(entries: readonly SportEntry[], from: Day, to: Day): SportSession[] {
  const sessions: SportSession[] = [];
  entries.forEach((entry, entryIndex) => {
    try {
      if (entry.rrule !== null) {
        for (const local of startsOf(entry, entry.rrule, from, to)) sessions.push(sessionAt(entry, local));
        return;
      }
      const day = dayFromIso(entry.start.slice(0, 10));
      if (day >= from && day <= to) sessions.push(sessionAt(entry, entry.start));
    } catch (error) {
      if (error instanceof RecurrenceError)
        throw new RecurrenceError(error.message, error.pointerField, entryIndex);
      throw error;
    }
  });
  if (sessions.length > MOST_OCCURRENCES)
    throw new RecurrenceError(`More than ${MOST_OCCURRENCES} sessions in one camp.`, "rrule");
  return sessions.sort(byTime);
}

const partsOf = (rrule: string): string[] => rrule.split(";").filter((part) => part !== "");
const without = (rrule: string, names: readonly string[]): string[] =>
  partsOf(rrule).filter((part) => !names.includes((part.split("=")[0] ?? "").toUpperCase()));

/** The series cut before a date: its last occurrence is on an earlier day. `date` is `YYYY-MM-DD`. */
export function endBefore(entry: SportEntry, date: string): SportEntry {
  if (entry.rrule === null) return entry;
  const last = isoFromDay((dayFromIso(date) - 1) as Day).replaceAll("-", "");
  return {
    ...entry,
    rrule: [...without(entry.rrule, ["UNTIL", "COUNT"]), `UNTIL=${last}T235900Z`].join(";"),
    exdate: entry.exdate.filter((local) => local.slice(0, 10) < date),
  };
}

/** The rest of a series from a date on, under a new id; a COUNT becomes what remains of it. */
export function startFrom(entry: SportEntry, firstDate: string, newId: string): SportEntry {
  if (entry.rrule === null) return entry;
  const rule = ruleOf(entry, entry.rrule);
  const next = rule.after(dateOfDay(dayFromIso(firstDate)), true);
  if (!next) throw new RecurrenceError("The series has ended by that day.", "rrule");
  const { count } = rule.options;
  let rrule = entry.rrule;
  if (count !== null && count !== undefined) {
    const gone = rule.all((date) => date < next).filter((date) => date < next).length;
    rrule = [...without(entry.rrule, ["COUNT"]), `COUNT=${count - gone}`].join(";");
  }
  return {
    ...entry,
    id: newId,
    start: localOf(next),
    rrule,
    exdate: entry.exdate.filter((local) => local.slice(0, 10) >= firstDate),
  };
}

/** Wall-clock start of a dated session, as entries write it. */
export const localStart = (day: Day, start: Minute): string => `${isoFromDay(day)}T${hhmm(start)}`;
