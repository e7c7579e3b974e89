import type { Kg } from "../types";
import type { RepMaxFormula } from "./types";

/** Above this many repetitions the equations part ways (Reynolds et al. 2006, J Strength Cond Res 20(3):584-592: at most 10). */
export const MOST_REPS_FOR_ESTIMATE = 10;

/** Best from a load `w` lifted `r` times to failure, r from 2 to 10. Compared by LeSuer et al. 1997 (from memory). */
const EQUATIONS: Readonly<Record<RepMaxFormula, (w: number, r: number) => number>> = {
  // Slope 1/30; 0.333 is a known misprint.
  epley: (w, r) => w * (1 + r / 30),
  // Brzycki 1993, JOPERD 64:88.
  brzycki: (w, r) => (36 * w) / (37 - r),
  // The form 1.0644 - 0.0644 r is a known misprint.
  lander: (w, r) => (100 * w) / (101.3 - 2.67123 * r),
  oconner: (w, r) => w * (1 + 0.025 * r),
  wathan: (w, r) => (100 * w) / (48.8 + 53.8 * Math.exp(-0.075 * r)),
  lombardi: (w, r) => w * r ** 0.1,
  mayhew: (w, r) => (100 * w) / (52.2 + 41.9 * Math.exp(-0.055 * r)),
};

/** Why no best is estimated: `reps` outside 1 to 10 or not whole, `load` not above 0. */
export interface RepMaxProblem {
  readonly problem: "reps" | "load";
}

/**
 * Best (one-repetition maximum), kilograms, unrounded, from `kg` lifted `reps` times to failure. One repetition is the best
 * itself. Refused as a value: repetitions that are not whole or not 1 to 10, a load that is not above 0.
 * Equations as listed by LeSuer et al. 1997, J Strength Cond Res 11:211-213 (from memory).
 */
export function estimateBest(
  formula: RepMaxFormula,
  kg: number,
  reps: number,
): { readonly kg: Kg } | RepMaxProblem {
  if (!Number.isInteger(reps) || reps < 1 || reps > MOST_REPS_FOR_ESTIMATE) return { problem: "reps" };
  if (!Number.isFinite(kg) || kg <= 0) return { problem: "load" };
  return { kg: (reps === 1 ? kg : EQUATIONS[formula](kg, reps)) as Kg };
}
