export const ASYMMETRY_FORMULAS = ["unilateral", "bilateral"] as const;
export type AsymmetryFormula = (typeof ASYMMETRY_FORMULAS)[number];

/** A difference between the sides, with the formula that made it. */
export interface Asymmetry {
  readonly formula: AsymmetryFormula;
  readonly title: string;
  /** Percent, 0 to 100: how large. */
  readonly size: number;
  /** Percent with direction: below 0 where the left is the lower one. */
  readonly signed: number;
  readonly lower: "left" | "right" | null;
  readonly source: string;
}

export const ASYMMETRY_CAUTION =
  "Nine formulas are in use and give different numbers. No published threshold foretells an injury; a difference is real only where it is larger than the spread of the athlete's own trials on one side.";

const SOURCE =
  "Bishop et al. 2016, Strength Cond J 38(6):27-32; 2018, Strength Cond J 40(4):1-6 (formulas from memory)";

const TITLES: Readonly<Record<AsymmetryFormula, string>> = {
  unilateral: "Percent difference, tested one side at a time: (higher - lower) / higher",
  bilateral: "Bilateral asymmetry index, tested with both at once: (higher - lower) / (higher + lower)",
};

/**
 * Difference between left and right by the named formula: `unilateral` for tests of one side at a time, `bilateral` for
 * both at once (stronger side as D, weaker as ND). Null where both are 0 or one is below 0.
 */
export function asymmetry(formula: AsymmetryFormula, left: number, right: number): Asymmetry | null {
  const [low, high] = left < right ? [left, right] : [right, left];
  if (!(low >= 0) || !(high > 0)) return null;
  const size = ((high - low) / (formula === "unilateral" ? high : high + low)) * 100;
  return {
    formula,
    title: TITLES[formula],
    size,
    signed: left < right ? -size : size,
    lower: left === right ? null : left < right ? "left" : "right",
    source: SOURCE,
  };
}

/** True where the difference is larger than the spread of one side's own trials (CV, percent): Exell, after Bishop 2018. */
export const beyondOwnSpread = (difference: Asymmetry, cvPercent: number): boolean =>
  difference.size > cvPercent;
