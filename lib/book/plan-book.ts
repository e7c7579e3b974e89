import { expandEntries } from "@/lib/calendar/recurrence";
import { dayFromIso, hhmm, instantAt, isoFromDay, minuteFromHhmm, plan, withOverrides } from "@/lib/engine";
import type {
  Base,
  Day,
  Hold,
  Instant,
  Pin,
  Plan,
  PlanInput,
  SportKind,
  SportSession,
  Weekday,
} from "@/lib/engine/types";
import type { BookPin, CampBook, CampHold } from "@/lib/schemas/camp-book";
import { campSpan } from "./camp-span";
import { zoneOf } from "./camp-zone";

/** A camp book with what the engine made of it. */
export interface PlannedCamp {
  readonly input: PlanInput;
  readonly plan: Plan;
}

const CONTACT: ReadonlySet<SportKind> = new Set(["hard-sparring", "technical-sparring"]);

/** True where a hold stands, or stood, over the start of a session. */
function takesOut(hold: CampHold, { day, start }: Pick<SportSession, "day" | "start">): boolean {
  const date = isoFromDay(day);
  const at = `${date}T${hhmm(start)}`;
  return (
    hold.from <= date &&
    (hold.to === null || date <= hold.to) &&
    (hold.setAt === undefined || hold.setAt < at) &&
    (hold.liftedAt === undefined || at <= hold.liftedAt)
  );
}

/** Days on which the engine may plan no lifting; null for a hold that was lifted before its first day was over. */
function engineHold({ from, to, liftedAt }: CampHold): Hold | null {
  const first = dayFromIso(from);
  const lifted = liftedAt === undefined ? null : ((dayFromIso(liftedAt.slice(0, 10)) - 1) as Day);
  const planned = to === null ? null : dayFromIso(to);
  const last = lifted === null ? planned : planned === null ? lifted : (Math.min(lifted, planned) as Day);
  return last !== null && last < first ? null : { from: first, to: last };
}

/**
 * Sport sessions of the camp's days, in order. A hold stops contact from being planned: sparring on held days is left out
 * until the medic lifts the hold. What began before it was set had been; what it took out does not come back into the past. Throws `RecurrenceError` for a recurrence that cannot be expanded.
 */
export function sportOf(book: CampBook): SportSession[] {
  const { from, to } = campSpan(book);
  return expandEntries(book.sport, from, to).filter(
    (session) => !CONTACT.has(session.kind) || !book.holds.some((hold) => takesOut(hold, session)),
  );
}

const pinOf = (pin: BookPin): Pin => ({
  id: pin.liftId,
  slot: { item: pin.item, week: pin.week },
  day: dayFromIso(pin.date),
  start: minuteFromHhmm(pin.start),
});

/** The engine's input for a book, as of `now`. */
export function planInputOf(book: CampBook, now: Instant): PlanInput {
  const sport = sportOf(book);
  return {
    now,
    zone: zoneOf(book, sport),
    bout: { day: dayFromIso(book.bout.date), start: minuteFromHhmm(book.bout.time) },
    weeks: book.weeks,
    weighIn: book.weighIn && { day: dayFromIso(book.weighIn.date), start: minuteFromHhmm(book.weighIn.time) },
    athlete: {
      trainingAge: book.athlete.trainingAge,
      liftsPerWeek: book.athlete.liftsPerWeek,
      strikingBase: book.athlete.strikingBase,
      freeHours: book.athlete.freeHours.map((hours) => ({
        weekday: hours.weekday as Weekday,
        from: minuteFromHhmm(hours.from),
        to: minuteFromHhmm(hours.to),
      })),
    },
    sport,
    pins: book.pins.map(pinOf),
    holds: book.holds.flatMap((hold) => engineHold(hold) ?? []),
    rules: withOverrides(book.rules),
    coachFactors: book.coachFactors,
    responses: book.responses.map(({ from, to, factor }) => ({
      from: dayFromIso(from),
      to: dayFromIso(to),
      factor,
    })),
  };
}

/** A camp whose bout is off keeps what is past and plans nothing more. */
function calledOff(input: PlanInput, base: Base | undefined): PlannedCamp {
  const past = (session: SportSession) => instantAt(input.zone, session.day, session.start) <= input.now;
  const stopped: PlanInput = {
    ...input,
    sport: input.sport.filter(past),
    pins: [],
    holds: [...input.holds, { from: (Math.floor(input.now / 1440) - 1) as Day, to: null }],
  };
  const result = plan(stopped, base);
  return { input: stopped, plan: { ...result, unplaced: [], violations: [] } };
}

/**
 * Plans a book. `base` is the plan that stood before: published sessions move only for a reason.
 * Throws `PlanInputError` for a book that cannot be planned and `RecurrenceError` for a recurrence that cannot be expanded.
 */
export function planBook(book: CampBook, now: Instant, base?: Base): PlannedCamp {
  const input = planInputOf(book, now);
  if (book.status === "off") return calledOff(input, base);
  return { input, plan: plan(input, base) };
}

/** The part of a plan that the next one is measured against. */
export const baseOf = (before: Plan): Base => ({ boutDay: before.bout.day, lifts: before.lifts });
