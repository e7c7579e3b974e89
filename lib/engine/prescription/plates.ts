import type { Kg } from "../types";
import type { Range } from "./exercise";
import type { Plates } from "./types";

/** Kilograms of a pound, exact (international yard and pound agreement, 1959). */
export const KG_PER_LB = 0.45359237;

/** Smallest change of load, kilograms. */
export const stepKg = ({ unit, step }: Plates): number => (unit === "lb" ? step * KG_PER_LB : step);

/** An empty bar, kilograms: 20 kg, or 45 lb where plates are in pounds. Common practice, no published source. */
const barKg = ({ unit }: Plates): number => (unit === "lb" ? 45 * KG_PER_LB : 20);

/**
 * A load that the plates allow, nearest the middle of a percent range of `best` kilograms and never above its high end: where no
 * step falls inside the range, the one below it. With `bar` never less than an empty bar. Null where that is nothing at all, or
 * where the bar alone is too heavy.
 */
export function loadOnPlates(best: number, percent: Range, plates: Plates, { bar = false } = {}): Kg | null {
  const step = stepKg(plates);
  // The small term undoes what binary fractions take from an exact step.
  const most = Math.floor((best * percent.high) / 100 / step + 1e-9);
  const least = bar ? Math.ceil(barKg(plates) / step - 1e-9) : 1;
  const wanted = Math.round((best * (percent.low + percent.high)) / 200 / step);
  const steps = Math.min(most, Math.max(least, wanted));
  return steps >= least ? ((steps * step) as Kg) : null;
}
