import { weekSpan, weekdayOf } from "../geometry";
import { ITEM_TITLES } from "../menu";
import type { Candidate, Day, Minute, PlacementProblem, Reason } from "../types";
import { dayBreak, timeBreak, type Break } from "./must-rules";
import type { PlacementRequest, Slot } from "./request";
import { shouldCosts, stayPutPrice } from "./should-costs";
import { spanAt, surroundingsOf, type LiftSpan, type Surroundings } from "./surroundings";

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
  readonly shut: ReadonlyMap<string, readonly Reason[]>;
}

/** A slot at a place. */
export function liftSpanAt(around: Surroundings, slot: Slot, day: Day, start: Minute): LiftSpan {
  return {
    ...spanAt(around.input, day, start, slot.minutes),
    id: slot.id,
    item: slot.item,
    title: ITEM_TITLES[slot.item],
    day,
    startMinute: start,
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

class ShutCount {
  private readonly counts = new Map<string, { reason: Reason; count: number }>();
  add({ rule, text }: Pick<Break, "text"> & { rule: string }, count = 1): void {
    const known = this.counts.get(rule);
    if (known) known.count += count;
    else this.counts.set(rule, { reason: { rule, text }, count });
  }
  list(): Reason[] {
    return [...this.counts.values()]
      .sort((a, b) => b.count - a.count || (a.reason.rule < b.reason.rule ? -1 : 1))
      .map(({ reason }) => reason);
  }
}

function candidatesOf(around: Surroundings, slot: Slot, index: number, shut: ShutCount): Candidate[] {
  const found: Candidate[] = [];
  const { from, to } = weekSpan(around.input.bout.day, slot.week);
  const basePrice = slot.base
    ? stayPutPrice(around, liftSpanAt(around, slot, slot.base.day, slot.base.start).startsAt)
    : 0;
  for (let day = from; day <= to; day = (day + 1) as Day) {
    const probe = liftSpanAt(around, slot, day, 0 as Minute);
    const broken = dayBreak(around, probe);
    if (broken) {
      shut.add(broken, 24);
      continue;
    }
    const starts = startsOn(around, slot, day);
    if (starts.length === 0)
      shut.add({ rule: "free-hours", text: `No free hours long enough for ${slot.minutes} min.` });
    for (const start of starts) {
      const lift = liftSpanAt(around, slot, day, start);
      if (lift.startsAt <= around.input.now) {
        shut.add({ rule: "past", text: "Its days are already past." });
        continue;
      }
      const broken = timeBreak(around, lift);
      if (broken) {
        shut.add(broken);
        continue;
      }
      const stays = slot.base?.day === day && slot.base.start === start;
      const own = shouldCosts(around, lift, slot.fresh).reduce((sum, { points }) => sum + points, 0);
      found.push({
        item: index,
        day,
        start,
        startsAt: lift.startsAt,
        endsAt: lift.endsAt,
        cost: own + (stays ? 0 : basePrice),
      });
    }
  }
  return found;
}

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
  const shut = new Map<string, readonly Reason[]>();
  const candidates = request.slots.flatMap((slot, index) => {
    const count = new ShutCount();
    const found = candidatesOf(around, slot, index, count);
    shut.set(slot.id, count.list());
    return found;
  });
  candidates.sort((a, b) => a.day - b.day || a.start - b.start || a.item - b.item);
  const weeks = [...new Set(request.slots.map(({ week }) => week))];
  const problem: PlacementProblem = {
    items: request.slots.map((slot) => ({
      key: slot.id,
      week: slot.week,
      heavy: slot.heavyLower,
      unplaced:
        UNPLACED +
        IMPORTANCE_STEP * Math.max(0, MOST_ORDER - slot.order) +
        (slot.base
          ? stayPutPrice(around, liftSpanAt(around, slot, slot.base.day, slot.base.start).startsAt)
          : 0),
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
