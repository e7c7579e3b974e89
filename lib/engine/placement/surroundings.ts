import { instantAt } from "../geometry";
import type { Day, Instant, Item, Minute, PlanInput, SportKind } from "../types";
import { residualLoad, type ResidualLoad } from "./residual";
import type { FixedLift } from "./request";

/** Anything that takes time, as instants. */
export interface Span {
  readonly id: string;
  readonly title: string;
  readonly day: Day;
  readonly startsAt: Instant;
  readonly endsAt: Instant;
}

export interface SportSpan extends Span {
  readonly kind: SportKind;
  readonly load: number;
}

/** A lift somewhere: a candidate, or one that stands. */
export interface LiftSpan extends Span {
  /** Wall-clock start, minutes since midnight. */
  readonly startMinute: number;
  readonly item: Item;
  readonly heavyLower: boolean;
  readonly primer: boolean;
}

/** What lies around the lifts: prepared once a plan. */
export interface Surroundings {
  readonly input: PlanInput;
  /** Sport that takes time, by start. Rest is not a session; travel shuts its day. */
  readonly sport: readonly SportSpan[];
  readonly sportByDay: ReadonlyMap<Day, readonly SportSpan[]>;
  readonly hard: readonly SportSpan[];
  /** Days on which nothing is lifted, and why. */
  readonly shutDays: ReadonlyMap<Day, string>;
  readonly fixed: readonly LiftSpan[];
  readonly fixedHeavy: readonly LiftSpan[];
  readonly fixedByDay: ReadonlyMap<Day, readonly LiftSpan[]>;
  readonly residual: ResidualLoad;
}

function spanAt(
  input: PlanInput,
  day: Day,
  start: Minute,
  minutes: number,
): { startsAt: Instant; endsAt: Instant } {
  const startsAt = instantAt(input.zone, day, start);
  return { startsAt, endsAt: (startsAt + minutes) as Instant };
}

function groupByDay<T extends { readonly day: Day }>(list: readonly T[]): Map<Day, T[]> {
  const days = new Map<Day, T[]>();
  for (const value of list) {
    const known = days.get(value.day);
    if (known) known.push(value);
    else days.set(value.day, [value]);
  }
  return days;
}

function shutDaysOf({ bout, weighIn, sport, holds, weeks }: PlanInput): Map<Day, string> {
  const days = new Map<Day, string>();
  const shut = (day: Day, why: string): void => {
    if (!days.has(day)) days.set(day, why);
  };
  shut(bout.day, "the bout day");
  if (weighIn) shut(weighIn.day, "the weigh-in day");
  const first = (bout.day - weeks * 7 + 1) as Day;
  for (const hold of holds) {
    const last = Math.min(hold.to ?? bout.day, bout.day);
    for (let day = Math.max(hold.from, first); day <= last; day++) shut(day as Day, "a day on hold");
  }
  for (const { kind, day } of sport) {
    if (kind === "rest") shut(day, "a rest day");
    if (kind === "travel") shut(day, "a travel day");
  }
  return days;
}

export function surroundingsOf(
  input: PlanInput,
  fixed: readonly FixedLift[],
  titleOf: (item: Item) => string,
): Surroundings {
  const sport = input.sport
    .filter(({ kind }) => kind !== "rest" && kind !== "travel")
    .map((session): SportSpan => ({
      ...spanAt(input, session.day, session.start, session.minutes),
      id: session.id,
      title: session.title,
      day: session.day,
      kind: session.kind,
      load: session.doneLoad ?? session.effort * session.minutes,
    }))
    .sort((a, b) => a.startsAt - b.startsAt || (a.id < b.id ? -1 : 1));
  const lifts = fixed
    .map((lift): LiftSpan => ({
      ...spanAt(input, lift.day, lift.start, lift.minutes),
      ...lift,
      startMinute: lift.start,
      title: titleOf(lift.item),
    }))
    .sort((a, b) => a.startsAt - b.startsAt || (a.id < b.id ? -1 : 1));
  return {
    input,
    sport,
    sportByDay: groupByDay(sport),
    hard: sport.filter(({ kind }) => kind === "hard-sparring"),
    shutDays: shutDaysOf(input),
    fixed: lifts,
    fixedHeavy: lifts.filter(({ heavyLower }) => heavyLower),
    fixedByDay: groupByDay(lifts),
    residual: residualLoad(sport, input.rules["fresh-first.hours"] * 60),
  };
}

/** First of a sorted list that starts at or after an instant. */
export function nextFrom<T extends Span>(list: readonly T[], instant: number): T | null {
  let [low, high] = [0, list.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle]?.startsAt ?? 0) < instant) low = middle + 1;
    else high = middle;
  }
  return list[low] ?? null;
}

/** Latest end at or before an instant, among sessions that start before it. */
export function lastBefore<T extends Span>(list: readonly T[], instant: number): T | null {
  let [low, high] = [0, list.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((list[middle]?.startsAt ?? 0) < instant) low = middle + 1;
    else high = middle;
  }
  return list[low - 1] ?? null;
}
