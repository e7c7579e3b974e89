import { instantAt, weekSpan, weekdayOf } from "../geometry";
import { ITEM_TITLES } from "../menu";
import type { Candidate, Day, Instant, Minute, PlacementProblem, Reason } from "../types";
import { dayBreak, timeBreak } from "./must-rules";
import type { PlacementRequest, Slot } from "./request";
import { shouldPoints, stayPutPrice } from "./should-costs";
import { surroundingsOf, type LiftSpan, type Surroundings } from "./surroundings";

/**
 * Price of leaving a lift out: above all should costs that placing it could bring (a week's are some hundreds of points), and
 * more for the more important, so that the least important is left out first.
 */
const UNPLACED = 20_000;
const IMPORTANCE_STEP = 1_000;
const MOST_ORDER = 8;

export interface BuiltProblem {
  readonly problem: PlacementProblem;
  readonly around: Surroundings;
  /** By slot id: the rules that shut its candidates, most frequent first. */
  readonly shut: ReadonlyMap<string, () => readonly Reason[]>;
}

/** A slot at a place. Members are named one by one: spreading an object here costs more than all rules together. */
export function liftSpanAt(around: Surroundings, slot: Slot, day: Day, start: Minute): LiftSpan {
  const startsAt = instantAt(around.input.zone, day, start);
  return {
    id: slot.id,
    title: ITEM_TITLES[slot.item],
    day,
    startsAt,
    endsAt: (startsAt + slot.minutes) as Instant,
    startMinute: start,
    item: slot.item,
    heavyLower: slot.heavyLower,
    primer: slot.primer,
  };
}

/** Starts to try on a day: the grid of each window of free hours, and the published start where it fits. */
function startsOn(around: Surroundings, slot: Slot, day: Day): Minute[] {
  const step = around.input.rules["start-step.minutes"];
  const weekday = weekdayOf(day);
  const starts = new Set<number>();
  for (const free of around.input.athlete.freeHours) {
    if (free.weekday !== weekday) continue;
    for (let start: number = free.from; start + slot.minutes <= free.to; start += step) starts.add(start);
    const base = slot.base;
    if (base?.day === day && base.start >= free.from && base.start + slot.minutes <= free.to)
      starts.add(base.start);
  }
  return [...starts].sort((a, b) => a - b) as Minute[];
}

/** Which rules shut a slot's candidates, how often; the first of each is told. */
class ShutCount {
  private readonly counts = new Map<string, { readonly text: () => string; count: number }>();

  add(rule: string, text: () => string, count = 1): void {
    const known = this.counts.get(rule);
    if (known) known.count += count;
    else this.counts.set(rule, { text, count });
  }

  list(): Reason[] {
    return [...this.counts]
      .sort(([a, x], [b, y]) => y.count - x.count || (a < b ? -1 : 1))
      .map(([rule, { text }]) => ({ rule, text: text() }));
  }
}

/** A shut day counts as all its starts, about. */
const STARTS_A_DAY = 24;

const pastText = (): string => "Its days are already past.";

function candidatesOf(around: Surroundings, slot: Slot, index: number, shut: ShutCount): Candidate[] {
  const found: Candidate[] = [];
  const { from, to } = weekSpan(around.input.bout.day, slot.week);
  const moving = basePrice(around, slot);
  for (let day = from; day <= to; day = (day + 1) as Day) {
    const closed = dayBreak(around, liftSpanAt(around, slot, day, 0 as Minute));
    if (closed) {
      shut.add(closed.rule, closed.text, STARTS_A_DAY);
      continue;
    }
    const starts = startsOn(around, slot, day);
    if (starts.length === 0)
      shut.add("free-hours", () => `No free hours long enough for ${slot.minutes} min.`);
    for (const start of starts) {
      const lift = liftSpanAt(around, slot, day, start);
      if (lift.startsAt <= around.input.now) {
        shut.add("past", pastText);
        continue;
      }
      const broken = timeBreak(around, lift);
      if (broken) {
        shut.add(broken.rule, broken.text);
        continue;
      }
      const { startsAt, endsAt } = lift;
      const stays = slot.base?.day === day && slot.base.start === start;
      const cost = shouldPoints(around, lift, slot.fresh) + (stays ? 0 : moving);
      found.push({ item: index, day, start, startsAt, endsAt, cost });
    }
  }
  return found;
}

/** What leaving the published place costs, by moving or by going unplaced alike; 0 for a new lift. */
const basePrice = (around: Surroundings, slot: Slot): number =>
  slot.base ? stayPutPrice(around, liftSpanAt(around, slot, slot.base.day, slot.base.start).startsAt) : 0;

/** Days of a week that sport and standing lifts leave free; none where the week is partly past and had one already. */
function freeDaysOf(around: Surroundings, week: number): Day[] {
  const { from, to } = weekSpan(around.input.bout.day, week);
  const days: Day[] = [];
  for (let day = from; day <= to; day = (day + 1) as Day) {
    if (day === around.input.bout.day) continue;
    if (!around.sportByDay.has(day) && !around.fixedByDay.has(day)) days.push(day);
  }
  return days;
}

/** The placement of a request as a value that any solver can take. */
export function placementProblem(request: PlacementRequest): BuiltProblem {
  const around = surroundingsOf(request.input, request.fixed, (item) => ITEM_TITLES[item]);
  const { rules } = request.input;
  const shut = new Map<string, () => readonly Reason[]>();
  const candidates = request.slots.flatMap((slot, index) => {
    const count = new ShutCount();
    const found = candidatesOf(around, slot, index, count);
    shut.set(slot.id, () => count.list());
    return found;
  });
  candidates.sort((a, b) => a.day - b.day || a.start - b.start || a.item - b.item);
  const weeks = [...new Set(request.slots.map(({ week }) => week))];
  const problem: PlacementProblem = {
    items: request.slots.map((slot) => ({
      key: slot.id,
      week: slot.week,
      heavy: slot.heavyLower,
      unplaced: UNPLACED + IMPORTANCE_STEP * Math.max(0, MOST_ORDER - slot.order) + basePrice(around, slot),
    })),
    candidates,
    apart: [
      { among: "all", minutes: rules["clash.gap"] },
      { among: "heavy", minutes: rules["heavy-apart.hours"] * 60 },
    ],
    spread: [rules["spread.next-day"], rules["spread.second-day"]],
    weekly: weeks
      .map((week) => ({ week, freeDays: freeDaysOf(around, week), noRestCost: rules["rest-day.price"] }))
      .filter(({ freeDays }) => freeDays.length > 0),
  };
  return { problem, around, shut };
}
