import type { CampWeek } from "../phases";
import type { Factor, HouseRules } from "../types";

const LIGHTER = "Lighter week";
const STEP_WORDS = ["First", "Second", "Third"] as const;

/** The week's place in its block: from a little under the planned dose to a little over, then a lighter week. */
export function waveFactor(week: CampWeek, rules: HouseRules): Factor {
  if (week.deload) return { name: "wave", value: rules["wave.deload"], text: LIGHTER };
  if (week.step === 0) return { name: "wave", value: 1, text: "No wave in the taper" };
  const text = `${STEP_WORDS[week.step - 1] ?? `${week.step}th`} week of the block`;
  const key = week.step === 1 ? "wave.first" : week.step === 2 ? "wave.second" : "wave.third";
  return { name: "wave", value: rules[key], text };
}

/** Whether a lift of these factors stands in a deload week. The house rule's value may be 1, so its words tell. */
export const isLighterWeek = (factors: readonly Factor[]): boolean =>
  factors.some(({ name, text }) => name === "wave" && text === LIGHTER);
