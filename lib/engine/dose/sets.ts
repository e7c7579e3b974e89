import type { HouseRules } from "../types";

/** Half up: 12.5 is 13. The small term undoes what binary fractions take from an exact half. */
export function roundHalfUp(value: number): number {
  return Math.floor(value + 0.5 + 1e-9);
}

/** Minutes of a lift: warm-up and sets, rounded up to five. Grows with the sets, never falls. */
export function sessionMinutes(sets: number, rules: HouseRules): number {
  return Math.ceil((rules["minutes.base"] + rules["minutes.per-set"] * sets) / 5 - 1e-9) * 5;
}
