import { DAY_MINUTES, instantAt, offsetAt } from "../geometry";
import { ITEM_TITLES } from "../menu/items";
import type { Day, Instant, Minute, PlanInput, SportKind } from "../types";
import type { FixedLift, PlacementRequest, Slot } from "./request";
import { residualLoad, type ResidualLoad } from "./residual";
import { shutDaysOf, type ShutDay } from "./shut-days";
import { Spans, type Span } from "./spans";

export interface SportSpan extends Span {
  readonly kind: SportKind;
  /** AU: as done where that is known, else effort x minutes. */
  readonly load: number;
}

/** All that a rule asks about a lift, wherever it stands. */
export interface Lifting {
  readonly id: string;
  readonly title: string;
  readonly minutes: number;
  readonly heavyLower: boolean;
  readonly primer: boolean;
  readonly fresh: boolean;
  readonly base: Slot["base"];
}

/** A lift that stands: pinned, or past. */
export interface StandingLift extends Span, Lifting {
  readonly start: Minute;
  readonly pinned: boolean;
  readonly past: boolean;
}

/** What lies around the lifts: prepared once a plan, asked for every candidate. */
export interface Surroundings {
  readonly input: PlanInput;
  /** Sport that takes time. Rest is no session, and travel shuts its day. */
  readonly sport: Spans<SportSpan>;
  readonly hard: Spans<SportSpan>;
  readonly fixed: Spans<StandingLift>;
  readonly fixedHeavy: Spans<StandingLift>;
  readonly shutDays: ReadonlyMap<Day, ShutDay>;
  readonly residual: ResidualLoad;
}

export const liftingOf = (slot: Slot): Lifting => ({
  id: slot.id,
  title: ITEM_TITLES[slot.item],
  minutes: slot.minutes,
  heavyLower: slot.heavyLower,
  primer: slot.primer,
  fresh: slot.fresh,
  base: slot.base,
});

/** The one offset of a whole civil day and of a session that runs on from it; null on a day with a step. */
function offsetOn({ zone }: PlanInput, day: Day): number | null {
  if (zone.length > 1) {
    const from = day * DAY_MINUTES;
    for (const step of zone) if (step.from > from && step.from < from + DAY_MINUTES) return null;
  }
  return offsetAt(zone, day * DAY_MINUTES);
}

/** Instants of a day's wall-clock readings, for many readings of the same day. */
export function clockOf(input: PlanInput, day: Day): (minute: number) => Instant {
  const offset = offsetOn(input, day);
  if (offset === null) return (minute) => instantAt(input.zone, day, minute as Minute);
  const midnight = day * DAY_MINUTES - offset;
  return (minute) => (midnight + minute) as Instant;
}

/** Earliest and latest instant that a reading of the day can mean. */
export function boundsOf(input: PlanInput, day: Day): readonly [number, number] {
  const offset = offsetOn(input, day);
  const from = day * DAY_MINUTES;
  if (offset !== null) return [from - offset, from + DAY_MINUTES - offset];
  const offsets = input.zone.map((step) => step.offset);
  return [from - Math.max(...offsets), from + DAY_MINUTES - Math.min(...offsets)];
}

function spanOf(
  input: PlanInput,
  day: Day,
  start: Minute,
  minutes: number,
): Pick<Span, "startsAt" | "endsAt"> {
  const startsAt = instantAt(input.zone, day, start);
  return { startsAt, endsAt: (startsAt + minutes) as Instant };
}

function standing(input: PlanInput, lift: FixedLift): StandingLift {
  const { id, item, day, start, minutes, heavyLower, primer, pinned, past } = lift;
  return {
    ...{ id, title: ITEM_TITLES[item], day, start, minutes, heavyLower, primer, pinned, past },
    ...spanOf(input, day, start, minutes),
    fresh: false,
    base: null,
  };
}

export function surroundingsOf({ input, fixed }: PlacementRequest): Surroundings {
  const sport = input.sport
    .filter(({ kind }) => kind !== "rest" && kind !== "travel")
    .map((session): SportSpan => ({
      id: session.id,
      title: session.title,
      day: session.day,
      ...spanOf(input, session.day, session.start, session.minutes),
      kind: session.kind,
      load: session.doneLoad ?? session.effort * session.minutes,
    }));
  const lifts = fixed.map((lift) => standing(input, lift));
  const spans = new Spans(sport);
  return {
    input,
    sport: spans,
    hard: new Spans(sport.filter(({ kind }) => kind === "hard-sparring")),
    fixed: new Spans(lifts),
    fixedHeavy: new Spans(lifts.filter(({ heavyLower }) => heavyLower)),
    shutDays: shutDaysOf(input),
    residual: residualLoad(spans.list, input.rules["fresh-first.hours"] * 60),
  };
}
