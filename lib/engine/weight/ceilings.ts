import type { Day, HouseRules, Kg } from "../types";

export const CEILING_HOURS = [72, 48, 24] as const;
export type CeilingHours = (typeof CEILING_HOURS)[number];

export const CEILING_SOURCE = "Ricci et al. 2025, J Int Soc Sports Nutr 22(1):2467909";

/** How the published percent is read; the paper does not say, so it is said wherever the number stands. */
export const CEILING_BASIS = "Percent of the mass on that day: limit / (1 - share).";

/** The most an athlete may weigh so many hours before the weigh-in. */
export interface Ceiling {
  readonly hours: CeilingHours;
  /** Civil day on which it begins to hold. */
  readonly day: Day;
  /** Share of current mass that may still be to go. */
  readonly share: number;
  readonly kg: Kg;
}

/**
 * Ceilings at 72, 48 and 24 h before the weigh-in: limit / (1 - share), 6.7, 5.7 and 4.4 % by default, earliest first.
 * Ricci et al. 2025, J Int Soc Sports Nutr 22(1):2467909. Not a way to lose it: no protocol comes with it.
 */
export function ceilings(limitKg: Kg, weighIn: Day, rules: HouseRules): readonly Ceiling[] {
  const share: Readonly<Record<CeilingHours, number>> = {
    72: rules["weight.ceiling-72"] / 100,
    48: rules["weight.ceiling-48"] / 100,
    24: rules["weight.ceiling-24"] / 100,
  };
  return CEILING_HOURS.map((hours) => ({
    hours,
    day: (weighIn - hours / 24) as Day,
    share: share[hours],
    kg: (limitKg / (1 - share[hours])) as Kg,
  }));
}

/** The ceiling that holds on a day: the newest one that has begun. Null before the first and after the weigh-in. */
export function ceilingOn(all: readonly Ceiling[], weighIn: Day, day: Day): Ceiling | null {
  return day > weighIn ? null : (all.findLast((ceiling) => ceiling.day <= day) ?? null);
}
