import { expandEntries } from "@/lib/calendar/recurrence";
import { dayFromIso, instantAt, isoFromDay, minuteFromHhmm, hhmm } from "@/lib/engine";
import type { Day, Instant, Lift, OffsetStep, SportSession } from "@/lib/engine/types";
import type { FieldError } from "@/lib/errors";
import type { CampBook, SportEntry } from "@/lib/schemas/camp-book";
import type { Change, SportValues } from "@/lib/schemas/change";
import type { BookEdit } from "./edit";
import { campSpan } from "./camp-span";
import { dropSport, editSport, findOccurrence } from "./sport-edits";

export type EditResult = { readonly edit: BookEdit } | { readonly problems: readonly FieldError[] };

/** Where the camp stands: what a change is held against. */
export interface CampState {
  readonly book: CampBook;
  readonly lifts: readonly Lift[];
  readonly zone: readonly OffsetStep[];
  readonly now: Instant;
}

const refuse = (pointer: string, message: string): EditResult => ({ problems: [{ pointer, message }] });
const END_OF_DAY = "23:59";
const PAST = "That is already past, and what is past stays.";

const isPast = (state: CampState, day: Day, start: string): boolean =>
  instantAt(state.zone, day, minuteFromHhmm(start)) <= state.now;

const sessionIsPast = (state: CampState, session: Pick<SportSession, "day" | "start">): boolean =>
  instantAt(state.zone, session.day, session.start) <= state.now;

/** A new place in time must lie inside the camp and ahead of now. */
function placeProblem(state: CampState, date: string, start: string): EditResult | null {
  const { from, to } = campSpan(state.book);
  const day = dayFromIso(date);
  if (day < from || day > to) return refuse("/change/date", "That day is outside the camp.");
  if (isPast(state, day, start)) return refuse("/change/date", PAST);
  return null;
}

const entryOf = (id: string, values: SportValues): SportEntry => ({
  id,
  series: id,
  idShift: 0,
  kind: values.kind,
  title: values.title,
  start: `${values.date}T${values.start}`,
  minutes: values.minutes,
  effort: values.effort,
  place: values.place,
  rrule: values.rrule,
  exdate: [],
});

function editLift(state: CampState, change: Extract<Change, { liftId: string }>): EditResult {
  const lift = state.lifts.find((candidate) => candidate.id === change.liftId);
  if (lift && isPast(state, lift.day, hhmm(lift.start))) return refuse("/change/liftId", PAST);
  if (change.kind === "lift.release") return { edit: { dropPins: [change.liftId] } };
  if (change.kind === "lift.factor") {
    return { edit: { factors: { [change.liftId]: change.factor === 1 ? null : change.factor } } };
  }
  const { liftId, item, week, date, start } = change;
  return placeProblem(state, date, start) ?? { edit: { putPins: [{ liftId, item, week, date, start }] } };
}

/** More than this many at once is no plan any more; the schema of the book holds no more either. */
const MOST_RESPONSES = 100;

function editResponse(state: CampState, change: Extract<Change, { kind: `response.${string}` }>): EditResult {
  const { from, to } = campSpan(state.book);
  const known = state.book.responses.find((response) => response.id === change.id);
  if (change.kind === "response.drop") {
    if (!known) return refuse("/change/id", "That suggestion is not in force any more.");
    if (isPast(state, dayFromIso(known.to), END_OF_DAY)) return refuse("/change/id", PAST);
    return { edit: { dropResponses: [change.id] } };
  }
  if (dayFromIso(change.from) < from || dayFromIso(change.to) > to) {
    return refuse("/change/from", "Those days are outside the camp.");
  }
  if (isPast(state, dayFromIso(change.to), END_OF_DAY)) return refuse("/change/to", PAST);
  if (!known && state.book.responses.length >= MOST_RESPONSES) {
    return refuse("/change", "Too many suggestions are in force: take one out first.");
  }
  const { id, from: first, to: last, factor, because } = change;
  return { edit: { putResponses: [{ id, from: first, to: last, factor, because }] } };
}

function editDatedSport(state: CampState, change: Extract<Change, { sportId: string }>): EditResult {
  const { from, to } = campSpan(state.book);
  const occurrence = findOccurrence(state.book, change.sportId, from, to);
  if (!occurrence) return refuse("/change/sportId", "That session is not in the camp any more.");
  if (sessionIsPast(state, occurrence.session)) return refuse("/change/sportId", PAST);
  const open = seriesFrom(state, occurrence.entry, from, to);
  const firstOpen = open ?? occurrence.session;
  if (change.kind === "sport.drop")
    return { edit: dropSport(state.book, occurrence, change.scope, firstOpen) };
  const date = change.values.date ?? isoFromDay(occurrence.session.day);
  const start = change.values.start ?? hhmm(occurrence.session.start);
  return (
    placeProblem(state, date, start) ?? {
      edit: editSport(state.book, occurrence, change.scope, change.values, firstOpen),
    }
  );
}

/** The first occurrence of an entry that is not past. */
function seriesFrom(state: CampState, entry: SportEntry, from: Day, to: Day): SportSession | undefined {
  return expandEntries([entry], from, to).find((session) => !sessionIsPast(state, session));
}

/** Makes a person's decision concrete, or says why it cannot be done. `put-back` needs the saved history: the server's own. */
export function editFor(state: CampState, change: Exclude<Change, { kind: "put-back" }>): EditResult {
  switch (change.kind) {
    case "lift.move":
    case "lift.release":
    case "lift.factor":
      return editLift(state, change);
    case "response.add":
    case "response.drop":
      return editResponse(state, change);
    case "sport.add":
      return (
        placeProblem(state, change.values.date, change.values.start) ?? {
          edit: { putSport: [entryOf(change.entryId, change.values)] },
        }
      );
    case "sport.edit":
    case "sport.drop":
      return editDatedSport(state, change);
    case "bout.change":
      return { edit: { bout: change.bout, weeks: change.weeks, weighIn: change.weighIn } };
    case "bout.off":
      return { edit: { status: "off" } };
  }
}
