import { instantAt } from "../geometry";
import { ITEM_TITLES } from "../menu/items";
import type { Day, Instant, Minute, PlanInput, SportKind } from "../types";
import { CampDay } from "./camp-day";
import { FreeStarts } from "./free-starts";
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
  readonly free: FreeStarts;
  readonly dayOf: (day: Day) => CampDay;
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
  const days = new Map<Day, CampDay>();
  return {
    input,
    sport: spans,
    hard: new Spans(sport.filter(({ kind }) => kind === "hard-sparring")),
    fixed: new Spans(lifts),
    fixedHeavy: new Spans(lifts.filter(({ heavyLower }) => heavyLower)),
    shutDays: shutDaysOf(input),
    free: new FreeStarts(input),
    dayOf: (day) => {
      const known = days.get(day) ?? new CampDay(input, day);
      days.set(day, known);
      return known;
    },
    residual: residualLoad(spans.list, input.rules["fresh-first.hours"] * 60),
  };
}
