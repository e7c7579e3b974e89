import type { Day } from "../types";
import { COMMON_PRACTICE, type ResponseInput, type Suggestion, type WeekAnswer } from "./types";

/** Rounding of minutes is no excess. AU. */
const SLACK = 0.5;

/**
 * The share of the lifting still ahead that brings the week back to its cap, in steps of 0.05 and never below a half; null where
 * no lifting is left to lower.
 */
function shareFor(input: ResponseInput, { to }: WeekAnswer, excess: number): number | null {
  const load = input.liftsAhead
    .filter(({ day }) => day >= input.today && day <= to)
    .map((lift) => lift.load)
    .sort((a, b) => a - b)
    .reduce((sum, one) => sum + one, 0);
  if (load <= 0) return null;
  return Math.max(0.5, Math.floor((1 - excess / load) * 20 + 1e-9) / 20);
}

/** The week under way, done and still planned, is beyond its cap; or the one before it ended beyond. */
export function weekLoadSuggestions(input: ResponseInput): readonly Suggestion[] {
  const { today, camp, rules, weeks } = input;
  return weeks
    .filter(({ from, to }) => from <= today && to > today - rules["response.recent"])
    .sort((a, b) => a.from - b.from)
    .flatMap((week): Suggestion[] => {
      const { from, to, cap, done } = week;
      const over = to < today;
      const total = over ? done : done + week.ahead;
      if (cap === null || total <= cap + SLACK) return [];
      const share = over ? null : shareFor(input, week, total - cap);
      return [
        {
          key: `week-load:${from}`,
          kind: "week-load",
          title: over ? "Last week ended beyond its cap" : "This week's load is beyond the cap",
          numbers: [
            { label: over ? "Done" : "Done and still planned", value: total, unit: "AU" },
            { label: "Cap", value: cap, unit: "AU" },
            { label: "Beyond it by", value: (total / cap - 1) * 100, unit: "%" },
          ],
          text: over
            ? "The week is over and nothing is taken back. Look at what made it so before the next one."
            : "More was done than planned, or sport alone is more than the weeks before prepared for. Lifting can give way; sport is the coaches' own decision.",
          source: `Load: Foster 1998, Med Sci Sports Exerc 30:1164-1168; average: Williams et al. 2017, Br J Sports Med 51(3):209-210; the cap is ${COMMON_PRACTICE}`,
          change:
            share === null
              ? null
              : {
                  kind: "response",
                  from: Math.max(today, camp.from) as Day,
                  to: Math.min(to, camp.to) as Day,
                  factor: share,
                },
        },
      ];
    });
}
