import { weekSpan } from "../geometry";
import { stayPutPrice } from "../rules/should-rules";
import type { Day, PlacementProblem, Reason } from "../types";
import { candidatesOf, wantedOf } from "./candidates";
import type { PlacementRequest, Slot } from "./request";
import { surroundingsOf, type Surroundings } from "./surroundings";

/**
 * Price of leaving a lift out, by its importance in the week: the first of a week at `STEP` x `STEPS`, the next a step less.
 *
 * A step is above all that should rules can take from a week: four lifts at `MOST_OWN_COST` (4 000) each, their six pairs
 * at no more than the largest spread prices (200 each), the free day (500) and four moves at the largest price (1 000)
 * come to 21 700. So no lift is left out to save points, and never the more important for the less. Two lifts at the
 * fourth's price are above one at the first's: as many as possible are placed first.
 * Four lifts unplaced come to 780 000, which is below the price of moving a lift inside the locked hours.
 */
const STEP = 30_000;
const STEPS = 8;

/** A request as a value for the solver, with what was worked out on the way to it. */
export interface BuiltProblem {
  readonly problem: PlacementProblem;
  readonly around: Surroundings;
  /** By slot id: the rules that shut its candidates, most frequent first. */
  readonly shut: ReadonlyMap<string, readonly Reason[]>;
}

const unplacedPrice = (around: Surroundings, { order, base }: Slot): number =>
  // Leaving it out takes it from its published place as much as moving it does.
  STEP * Math.max(1, STEPS - order) + stayPutPrice(around, base);

/** Days of a camp week without sport and without lifts that stand. The bout's own day is no rest, rest and travel days are. */
function freeDaysOf({ input, sport, fixed }: Surroundings, week: number): readonly Day[] {
  const { from, to } = weekSpan(input.bout.day, week);
  return Array.from({ length: to - from + 1 }, (_, index) => (from + index) as Day).filter(
    (day) => day !== input.bout.day && sport.on(day).length === 0 && fixed.on(day).length === 0,
  );
}

/** The placement of a request as a value that any solver can take. Items are the slots, in their order. */
export function placementProblem(request: PlacementRequest): BuiltProblem {
  const around = surroundingsOf(request);
  const { rules } = request.input;
  const wanted = wantedOf(request.slots);
  const candidates = candidatesOf(around, wanted);
  const weeks = [...new Set(request.slots.map(({ week }) => week))];
  const problem: PlacementProblem = {
    items: request.slots.map((slot) => ({
      key: slot.id,
      week: slot.week,
      heavy: slot.heavyLower,
      unplaced: unplacedPrice(around, slot),
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
  const shut = new Map<string, readonly Reason[]>();
  for (const { slot, lift, shut: count } of wanted) shut.set(slot.id, count.reasons(lift, rules));
  return { problem, around, shut };
}
