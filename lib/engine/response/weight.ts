import { WEIGHT_CAUTION, weightRemark, type WeightRemark, type WeightRemarkKind } from "../weight";
import type { Day } from "../types";
import type { ResponseInput, Suggestion } from "./types";

const TITLES: Readonly<Record<Exclude<WeightRemarkKind, "on-line">, string>> = {
  behind: "Weight behind the line",
  "too-fast": "Weight coming down too fast",
  "above-ceiling": "Weight above the ceiling",
};

/** A week has one say on the line and the rate, and each ceiling has its own: weighing daily does not ask daily. */
function keyOf(remark: WeightRemark, day: Day, weighIn: Day): string {
  const hours = remark.numbers.find((number) => number.unit === "h")?.value;
  return `weight:${remark.kind}:${hours === undefined ? Math.floor((weighIn - day) / 7) : `${hours}h`}`;
}

/**
 * Weight behind, too fast or above a ceiling. A talk, never a change, and no way to lose it. Whoever may not read weights
 * must not be shown these.
 */
export function weightSuggestions({ weight, today, rules }: ResponseInput): readonly Suggestion[] {
  const weighIn = weight?.weighIn ?? null;
  if (weight === null || weighIn === null) return [];
  const state = weightRemark({ ...weight, today, rules });
  if (state.off !== null) return [];
  return state.remarks.flatMap((remark): Suggestion[] =>
    remark.kind === "on-line"
      ? []
      : [
          {
            key: keyOf(remark, state.latest.day, weighIn),
            kind: "weight",
            title: TITLES[remark.kind],
            numbers: remark.numbers,
            text: `${remark.text} ${WEIGHT_CAUTION}`,
            source: remark.source,
            change: null,
          },
        ],
  );
}
