import { ewma } from "../load/weighted";
import type { HouseRules } from "../types";

/**
 * Load, AU, that a week may reach: the exponentially weighted average of the weeks before it and a ramp on top; null where
 * no week came before. Average: Williams et al. 2017, Br J Sports Med 51(3):209-210. Ramp: common practice, no published
 * source.
 */
export function loadCap(weekLoadsBefore: readonly number[], rules: HouseRules): number | null {
  const average = ewma(weekLoadsBefore, rules["cap.weeks"]).at(-1);
  return average === undefined ? null : (1 + rules["cap.ramp"]) * average;
}

/** Halvings of [floor, 1]: far below a thousandth of a set. */
const HALVINGS = 24;

/**
 * The largest share of full lifting in [floor, 1] whose load stays at or under `room`; `loadAt` never falls as the share grows.
 *
 * The share is a bound on taper x before x after, not one more factor: what a session already gives up counts towards the
 * cap. So more sport never raises a set of its week, and a deeper taper never raises one anywhere.
 */
export function capShare(room: number, floor: number, loadAt: (share: number) => number): number {
  if (loadAt(1) <= room) return 1;
  let [low, high] = [floor, 1];
  for (let round = 0; round < HALVINGS; round++) {
    const middle = (low + high) / 2;
    if (loadAt(middle) <= room) low = middle;
    else high = middle;
  }
  return low;
}
