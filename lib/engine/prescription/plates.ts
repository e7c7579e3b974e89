import type { Kg } from "../types";
import type { Range } from "./exercise";
import type { Plates } from "./types";

/** Kilograms of a pound, exact (international yard and pound agreement, 1959). */
export const KG_PER_LB = 0.45359237;

/** Smallest change of load, kilograms. */
export const stepKg = ({ unit, step }: Plates): number => (unit === "lb" ? step * KG_PER_LB : step);

/**
 * A load that the plates allow, nearest the middle of a percent range of `best` kilograms and never above its high end: where no
 * step falls inside the range, the one below it. Null where that is nothing at all.
 */
export function loadOnPlates(best: number, percent: Range, plates: Plates): Kg | null {
  const step = stepKg(plates);
  // The small term undoes what binary fractions take from an exact step.
  const most = Math.floor((best * percent.high) / 100 / step + 1e-9);
  const steps = Math.min(most, Math.round((best * (percent.low + percent.high)) / 200 / step));
  return steps > 0 ? ((steps * step) as Kg) : null;
}
