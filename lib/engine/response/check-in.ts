import { sampleSd } from "../measures";
import type { Day, HouseRules } from "../types";
import { loweredFor } from "./lowered";
import { COMMON_PRACTICE, type CheckIn, type ResponseInput, type Suggestion } from "./types";

/** Sum of the four answers: 4 (all very good) to 28 (all very poor). */
export const checkInSum = ({ sleep, fatigue, soreness, stress }: CheckIn): number =>
  sleep + fatigue + soreness + stress;

/** A check-in against the athlete's own of the weeks before it. */
export interface AgainstNormal {
  readonly day: Day;
  readonly sum: number;
  readonly mean: number;
  /** Sample SD (n - 1). */
  readonly sd: number;
  /** Check-ins that the normal is taken from. */
  readonly days: number;
  readonly beyond: boolean;
}

/**
 * Holds one check-in against the same athlete's of the days before it (28 by default, the day itself left out). Null where
 * fewer than ten days answered: own normal is not known yet. Common practice, no published source.
 */
export function againstNormal(
  checkIn: CheckIn,
  all: readonly CheckIn[],
  rules: HouseRules,
): AgainstNormal | null {
  const since = checkIn.day - rules["response.checkin-days"];
  // Sorted: a sum of binary fractions depends on the order, and what is suggested must not.
  const before = all
    .filter(({ day }) => day >= since && day < checkIn.day)
    .map(checkInSum)
    .sort((a, b) => a - b);
  const sd = sampleSd(before);
  if (sd === null || before.length < rules["response.checkin-least"]) return null;
  const mean = before.reduce((total, sum) => total + sum, 0) / before.length;
  const sum = checkInSum(checkIn);
  // A hair of slack for the mean of whole numbers.
  const beyond =
    sum > mean + rules["response.checkin-sd"] * sd + 1e-9 &&
    sum >= mean + rules["response.checkin-points"] - 1e-9;
  return { day: checkIn.day, sum, mean, sd, days: before.length, beyond };
}

/** The newest check-in, if it is of today or yesterday. */
const newest = ({ checkIns, today }: ResponseInput): CheckIn | undefined =>
  checkIns
    .filter(({ day }) => day <= today && day >= today - 1)
    .reduce<CheckIn | undefined>((found, one) => (found && found.day >= one.day ? found : one), undefined);

/** A check-in beyond the athlete's own normal. */
export function checkInSuggestions(input: ResponseInput): readonly Suggestion[] {
  const { rules } = input;
  const checkIn = newest(input);
  const held = checkIn && againstNormal(checkIn, input.checkIns, rules);
  if (!held?.beyond) return [];
  return [
    {
      key: `check-in:${held.day}`,
      kind: "check-in",
      title: "Check-in beyond own normal",
      numbers: [
        { label: "Check-in, of 4 to 28", value: held.sum, unit: "points" },
        { label: "Own mean", value: held.mean, unit: "points" },
        { label: "Own spread, SD", value: held.sd, unit: "points" },
        { label: "From check-ins on", value: held.days, unit: "days" },
      ],
      text: "Sleep, fatigue, soreness and stress together are worse than this athlete's usual. Ask first; fewer sets for a few days are on offer.",
      source: COMMON_PRACTICE,
      change: loweredFor(input, rules["response.checkin-span"], rules["response.checkin-factor"]),
    },
  ];
}
