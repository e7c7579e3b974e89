import { endBefore, expandEntries, occurrenceDays, startFrom } from "@/lib/calendar/recurrence";
import { dayFromIso, hhmm, isoFromDay, weekdayOf } from "@/lib/engine";
import type { Day, SportSession, Weekday } from "@/lib/engine/types";
import type { CampBook, SportEntry } from "@/lib/schemas/camp-book";
import type { ChangeScope, SportValues } from "@/lib/schemas/change";
import type { BookEdit } from "./edit";

/** One dated sport session and the entry that makes it. */
export interface Occurrence {
  readonly entry: SportEntry;
  readonly session: SportSession;
}

/** Finds the entry behind a dated session; null where the book has none. */
export function findOccurrence(book: CampBook, sportId: string, from: Day, to: Day): Occurrence | null {
  for (const entry of book.sport) {
    if (entry.rrule === null ? entry.id !== sportId : !sportId.startsWith(`${entry.series}@`)) continue;
    const session = expandEntries([entry], from, to).find((candidate) => candidate.id === sportId);
    if (session) return { entry, session };
  }
  return null;
}

const startText = (day: Day, start: string): string => `${isoFromDay(day)}T${start}`;
const WEEKDAY_NAMES: Record<Weekday, string> = {
  1: "MO",
  2: "TU",
  3: "WE",
  4: "TH",
  5: "FR",
  6: "SA",
  7: "SU",
};

const byDay = (rrule: string): string[] | null => /(?:^|;)BYDAY=([^;]*)/.exec(rrule)?.[1]?.split(",") ?? null;
const withByDay = (rrule: string, days: readonly string[]): string =>
  rrule.replace(/(^|;)BYDAY=[^;]*/, `$1BYDAY=${days.join(",")}`);

/** What an edit gives an entry besides its place in time. */
function withFacts(entry: SportEntry, values: Partial<SportValues>): SportEntry {
  return {
    ...entry,
    kind: values.kind ?? entry.kind,
    title: values.title ?? entry.title,
    minutes: values.minutes ?? entry.minutes,
    effort: values.effort ?? entry.effort,
    place: values.place ?? entry.place,
  };
}

/** An id that the book does not hold yet; the same for the same book, so that preview and server agree. */
function freshId(book: CampBook, wanted: string): string {
  const taken = new Set(book.sport.map((entry) => entry.id));
  for (let n = 0; ; n++) {
    const candidate = n === 0 ? wanted : `${wanted}.${n}`;
    if (!taken.has(candidate)) return candidate;
  }
}

/** Exceptions of a series from a day on: edited by themselves earlier, they leave with the series. */
const exceptionsFrom = (book: CampBook, series: string, from: Day): SportEntry[] =>
  book.sport.filter(
    (entry) =>
      entry.rrule === null &&
      entry.id.startsWith(`${series}@`) &&
      dayFromIso(entry.start.slice(0, 10)) >= from,
  );

/** First day of the series that an edit of the given scope touches. `firstOpen`: the first occurrence that is not past. */
const scopeStart = (scope: ChangeScope, session: SportSession, firstOpen: SportSession): Day =>
  scope === "all" ? firstOpen.day : session.day;

function detach({ entry, session }: Occurrence, values: Partial<SportValues>): BookEdit {
  const start = startText(session.day, hhmm(session.start));
  const alone: SportEntry = {
    ...withFacts(entry, values),
    id: session.id,
    series: session.id,
    idShift: 0,
    rrule: null,
    exdate: [],
    start: startText(
      values.date ? dayFromIso(values.date) : session.day,
      values.start ?? hhmm(session.start),
    ),
  };
  return { putSport: [{ ...entry, exdate: [...entry.exdate, start] }, alone] };
}

/** Moves a single entry or gives it a recurrence. */
function editSingle({ entry, session }: Occurrence, values: Partial<SportValues>): BookEdit {
  const start = startText(
    values.date ? dayFromIso(values.date) : session.day,
    values.start ?? hhmm(session.start),
  );
  return { putSport: [{ ...withFacts(entry, values), start, rrule: values.rrule ?? null }] };
}

/**
 * Edits a recurring session from a day on. The series is cut there; where only one of several weekdays moves to another
 * day, that weekday becomes a series of its own, so that the others stay where they are.
 */
function editFollowing(
  book: CampBook,
  { entry, session }: Occurrence,
  from: Day,
  values: Partial<SportValues>,
): BookEdit {
  const whole = from <= firstDay(entry);
  const before = whole ? [] : [endBefore(entry, isoFromDay(from))];
  const rest = whole
    ? entry
    : startFrom(entry, isoFromDay(from), freshId(book, `${entry.series}~${isoFromDay(from)}`));
  const facts = withFacts(rest, values);
  const shift = values.date ? dayFromIso(values.date) - session.day : 0;
  const time = values.start ?? hhmm(session.start);
  const newDay = WEEKDAY_NAMES[weekdayOf((session.day + shift) as Day)];

  if (values.rrule !== undefined || rest.rrule === null) {
    const start = startText((session.day + shift) as Day, time);
    return { putSport: [...before, { ...facts, start, rrule: values.rrule ?? null, exdate: [] }] };
  }
  const days = byDay(rest.rrule);
  if (shift === 0 || days === null || days.length === 1) {
    const moved: SportEntry = {
      ...facts,
      idShift: rest.idShift + shift,
      start: startText((firstDay(rest) + shift) as Day, time),
      rrule: shiftUntil(days === null || shift === 0 ? rest.rrule : withByDay(rest.rrule, [newDay]), shift),
      exdate: shiftExdates(rest.exdate, shift, time),
    };
    return { putSport: [...before, moved] };
  }
  const ends = untilForCount(rest, rest.rrule);
  const oldDay = WEEKDAY_NAMES[weekdayOf(session.day)];
  const others = withByDay(
    ends,
    days.filter((day) => day !== oldDay),
  );
  const moved: SportEntry = {
    ...facts,
    id: freshId(book, `${entry.series}~${isoFromDay(from)}m`),
    idShift: rest.idShift + shift,
    start: startText((firstOnWeekday(from, session.day) + shift) as Day, time),
    rrule: shiftUntil(withByDay(ends, [newDay]), shift),
    exdate: shiftExdates(
      rest.exdate.filter((date) => onWeekday(date, session.day)),
      shift,
      time,
    ),
  };
  return { putSport: [...before, { ...rest, rrule: others }, moved] };
}

/** A count means all weekdays together: before they part, it becomes the day of the last one. */
function untilForCount(entry: SportEntry, rrule: string): string {
  if (!/(^|;)COUNT=/.test(rrule)) return rrule;
  const first = firstDay(entry);
  const days = occurrenceDays(entry, first, (first + 3 * 366) as Day);
  const last = isoFromDay(days.at(-1) ?? first).replaceAll("-", "");
  return rrule.replace(/(^|;)COUNT=\d+/, `$1UNTIL=${last}T235900Z`);
}

/** The rule with its end moved along: a series that moves by a day ends a day later, at the end of that day. */
const shiftUntil = (rrule: string, shift: number): string =>
  rrule.replace(/UNTIL=(\d{4})(\d{2})(\d{2})(T\d{6}Z?)?/, (_, year: string, month: string, date: string) => {
    const until = (dayFromIso(`${year}-${month}-${date}`) + shift) as Day;
    return `UNTIL=${isoFromDay(until).replaceAll("-", "")}T235900Z`;
  });

const firstDay = (entry: SportEntry): Day => dayFromIso(entry.start.slice(0, 10));
const onWeekday = (date: string, like: Day): boolean =>
  weekdayOf(dayFromIso(date.slice(0, 10))) === weekdayOf(like);
const firstOnWeekday = (from: Day, like: Day): Day => (from + ((((like - from) % 7) + 7) % 7)) as Day;
const shiftExdates = (dates: readonly string[], shift: number, time: string): string[] =>
  dates.map((date) => startText((dayFromIso(date.slice(0, 10)) + shift) as Day, time));

/** The edit for new values of a dated sport session. */
export function editSport(
  book: CampBook,
  occurrence: Occurrence,
  scope: ChangeScope,
  values: Partial<SportValues>,
  firstOpen: SportSession,
): BookEdit {
  if (occurrence.entry.rrule === null) return editSingle(occurrence, values);
  if (scope === "this") return detach(occurrence, values);
  return editFollowing(book, occurrence, scopeStart(scope, occurrence.session, firstOpen), values);
}

/** The edit that takes a dated sport session out. */
export function dropSport(
  book: CampBook,
  { entry, session }: Occurrence,
  scope: ChangeScope,
  firstOpen: SportSession,
): BookEdit {
  if (entry.rrule === null) return { dropSport: [entry.id] };
  if (scope === "this") {
    return {
      putSport: [{ ...entry, exdate: [...entry.exdate, startText(session.day, hhmm(session.start))] }],
    };
  }
  const from = scopeStart(scope, session, firstOpen);
  const exceptions = exceptionsFrom(book, entry.series, from).map((exception) => exception.id);
  if (from <= firstDay(entry)) return { dropSport: [entry.id, ...exceptions] };
  return { putSport: [endBefore(entry, isoFromDay(from))], dropSport: exceptions };
}
