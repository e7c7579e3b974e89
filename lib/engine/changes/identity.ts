import { weekSpan } from "../geometry";
import type { Base, Day, Item, Lift, PlanInput, SlotKey } from "../types";
import { weekOfBaseLift } from "./base";

/** Days from a day to a week's span (0 inside it), then to the week's middle. */
function distance(day: Day, boutDay: Day, week: number): readonly [number, number] {
  const { from, to } = weekSpan(boutDay, week);
  return [Math.max(0, from - day, day - to), Math.abs(day - (from + 3))];
}

/** The bout stands: the same item of the same week is the same session. */
function sameWeek(
  wanted: readonly SlotKey[],
  open: readonly Lift[],
  base: Base,
  input: PlanInput,
): Map<SlotKey, Lift> {
  const matched = new Map<SlotKey, Lift>();
  const taken = new Set<string>();
  for (const slot of wanted) {
    const lift = open.find(
      (candidate) =>
        candidate.item === slot.item &&
        !taken.has(candidate.id) &&
        weekOfBaseLift(candidate, base, input) === slot.week,
    );
    if (!lift) continue;
    matched.set(slot, lift);
    taken.add(lift.id);
  }
  return matched;
}

/** Days from a slot's week beyond which a lift is another lift: dropped and added says it better than a leap of weeks. */
const FARTHEST = 7;

/** The bout has moved: the nearest session of the same item, nearest pair first, the earlier day on a tie. */
function nearest(wanted: readonly SlotKey[], open: readonly Lift[], input: PlanInput): Map<SlotKey, Lift> {
  const pairs = wanted.flatMap((slot) =>
    open
      .filter((lift) => lift.item === slot.item)
      .map((lift) => ({ slot, lift, far: distance(lift.day, input.bout.day, slot.week) }))
      .filter(({ far }) => far[0] <= FARTHEST),
  );
  pairs.sort(
    (a, b) =>
      a.far[0] - b.far[0] || a.far[1] - b.far[1] || a.lift.day - b.lift.day || b.slot.week - a.slot.week,
  );
  const matched = new Map<SlotKey, Lift>();
  const taken = new Set<string>();
  for (const { slot, lift } of pairs) {
    if (matched.has(slot) || taken.has(lift.id)) continue;
    matched.set(slot, lift);
    taken.add(lift.id);
  }
  return matched;
}

/**
 * Which lift of the base each wanted slot goes on as, so that a move is a move and not a delete and an add. `open` are the
 * lifts of the base that are not past and not claimed by a pin, earliest first.
 */
export function matchSlots(
  wanted: readonly SlotKey[],
  open: readonly Lift[],
  base: Base,
  input: PlanInput,
): ReadonlyMap<SlotKey, Lift> {
  return base.boutDay === input.bout.day ? sameWeek(wanted, open, base, input) : nearest(wanted, open, input);
}

const numberOf = (id: string, item: Item): number | null => {
  if (!id.startsWith(`${item}.`)) return null;
  const value = Number(id.slice(item.length + 1));
  return Number.isInteger(value) ? value : null;
};

/** Hands out lift ids that no lift of the base and no pin has: `item.number`, the number the slot's weeks out if free. */
export class LiftIds {
  readonly #used = new Map<Item, Set<number>>();

  constructor(taken: Iterable<{ readonly id: string; readonly item: Item }>) {
    for (const { id, item } of taken) this.#claim(item, numberOf(id, item));
  }

  next({ item, week }: SlotKey): string {
    const used = this.#used.get(item) ?? new Set();
    const value = used.has(week) ? Math.max(...used) + 1 : week;
    this.#claim(item, value);
    return `${item}.${value}`;
  }

  #claim(item: Item, value: number | null): void {
    const used = this.#used.get(item) ?? new Set<number>();
    this.#used.set(item, used);
    if (value !== null) used.add(value);
  }
}
