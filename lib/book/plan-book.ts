import { expandEntries } from "@/lib/calendar/recurrence";
import { dayFromIso, instantAt, isoFromDay, minuteFromHhmm, plan, withOverrides } from "@/lib/engine";
import type {
  Base,
  Day,
  Instant,
  Pin,
  Plan,
  PlanInput,
  SportKind,
  SportSession,
  Weekday,
} from "@/lib/engine/types";
import type { BookPin, CampBook } from "@/lib/schemas/camp-book";
import { campSpan } from "./camp-span";
import { zoneOf } from "./camp-zone";

/** A camp book with what the engine made of it. */
export interface PlannedCamp {
  readonly input: PlanInput;
  readonly plan: Plan;
}

const CONTACT: ReadonlySet<SportKind> = new Set(["hard-sparring", "technical-sparring"]);

/**
 * Sport sessions of the camp's days, in order. A hold stops contact from being planned: sparring on held days is left out
 * until the medic lifts the hold. Throws `RecurrenceError` for a recurrence that cannot be expanded.
 */
export function sportOf(book: CampBook): SportSession[] {
  const { from, to } = campSpan(book);
  const held = (date: string): boolean =>
    book.holds.some((hold) => hold.from <= date && (hold.to === null || date <= hold.to));
  return expandEntries(book.sport, from, to).filter(
    (session) => !CONTACT.has(session.kind) || !held(isoFromDay(session.day)),
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
    holds: book.holds.map((hold) => ({
      from: dayFromIso(hold.from),
      to: hold.to === null ? null : dayFromIso(hold.to),
    })),
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
