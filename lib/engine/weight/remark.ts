import type { Day, HouseRules, Kg } from "../types";
import { CEILING_BASIS, CEILING_SOURCE, ceilingOn, ceilings } from "./ceilings";
import { lineKg, weeklyRate, type DescentLine } from "./descent";

export interface Weighing {
  readonly day: Day;
  readonly kg: Kg;
}

export interface WeightFacts {
  /** Under 18: nothing is said about weight. */
  readonly minor: boolean;
  readonly limitKg: Kg | null;
  /** Day of the weigh-in. */
  readonly weighIn: Day | null;
  readonly line: DescentLine | null;
  /** In any order, at most one a day; those after `today` are left out. */
  readonly weights: readonly Weighing[];
  readonly today: Day;
  readonly rules: HouseRules;
}

export type WeightRemarkKind = "on-line" | "behind" | "too-fast" | "above-ceiling";

/** One thing to say about a weight, with its numbers. Kilograms stand in `numbers`, so that a page can show pounds. */
export interface WeightRemark {
  readonly kind: WeightRemarkKind;
  readonly text: string;
  readonly numbers: readonly {
    readonly label: string;
    readonly value: number;
    readonly unit: "kg" | "%" | "days" | "h";
  }[];
  readonly source: string;
}

export type WeightState =
  | { readonly off: "minor" | "no-limit" | "weighed-in" | "no-weight" }
  /** At least one remark; `on-line` stands alone. */
  | { readonly off: null; readonly latest: Weighing; readonly remarks: readonly WeightRemark[] };

export const MINOR_WORDS =
  "The way down in weight is switched off under 18: growing bodies are not brought to a limit.";

const COMMON = "common practice, no published source";
const RATE_SOURCE = "NCAA and NFHS weight management rules (at most 1.5 % a week)";
/** An older weight says nothing of the rate of now. Days. */
const OLDEST_REFERENCE = 28;

/** Without a line (no day was left for one) the limit stands in its place. */
const shouldBe = (line: DescentLine | null, limitKg: Kg, day: Day): Kg =>
  line ? lineKg(line, day) : limitKg;

function behind({ line, rules }: WeightFacts, limitKg: Kg, { day, kg }: Weighing): WeightRemark | null {
  const should = shouldBe(line, limitKg, day);
  if (kg <= should * (1 + rules["weight.behind"] / 100)) return null;
  return {
    kind: "behind",
    text: `Above the line by ${((kg / should - 1) * 100).toFixed(1)} %.`,
    numbers: [
      { label: "Weight", value: kg, unit: "kg" },
      { label: "Line", value: should, unit: "kg" },
      { label: "Above the line by", value: kg - should, unit: "kg" },
    ],
    source: COMMON,
  };
}

function tooFast(facts: WeightFacts, latest: Weighing, firstCeiling: Day): WeightRemark | null {
  // In the last three days the published ceilings judge, which allow for water; the weekly rate is about tissue.
  if (latest.day >= firstCeiling) return null;
  const { rules, weights } = facts;
  const reference = weights
    .filter(({ day }) => day <= latest.day - rules["weight.window"] && day >= latest.day - OLDEST_REFERENCE)
    .reduce<Weighing | null>((newest, one) => (newest && newest.day >= one.day ? newest : one), null);
  if (!reference) return null;
  const days = latest.day - reference.day;
  const percent = weeklyRate(reference.kg, latest.kg, days) * 100;
  if (percent <= rules["weight.fastest"] + 1e-9) return null;
  return {
    kind: "too-fast",
    text: `Coming down ${percent.toFixed(1)} % a week over ${days} days, faster than ${rules["weight.fastest"]} %.`,
    numbers: [
      { label: "Rate a week", value: percent, unit: "%" },
      { label: "Fastest", value: rules["weight.fastest"], unit: "%" },
      { label: "Over", value: days, unit: "days" },
      { label: "Lost", value: reference.kg - latest.kg, unit: "kg" },
    ],
    source: RATE_SOURCE,
  };
}

function aboveCeiling(facts: WeightFacts, limitKg: Kg, weighIn: Day, latest: Weighing): WeightRemark | null {
  const ceiling = ceilingOn(ceilings(limitKg, weighIn, facts.rules), weighIn, latest.day);
  if (!ceiling || latest.kg <= ceiling.kg) return null;
  return {
    kind: "above-ceiling",
    text: `Above the ceiling at ${ceiling.hours} h before the weigh-in. ${CEILING_BASIS}`,
    numbers: [
      { label: "Weight", value: latest.kg, unit: "kg" },
      { label: "Ceiling", value: ceiling.kg, unit: "kg" },
      { label: "Still to go at most", value: ceiling.share * 100, unit: "%" },
      { label: "Before the weigh-in", value: ceiling.hours, unit: "h" },
    ],
    source: CEILING_SOURCE,
  };
}

/**
 * What is to say of the latest weight: above a ceiling, too fast, behind the line, or on it; several may hold at once, the
 * gravest first. Off for minors, without a limit or a weigh-in, after it, and without a weight of the last 28 days. Names what is beyond
 * the published; gives no way to lose it.
 */
export function weightRemark(facts: WeightFacts): WeightState {
  if (facts.minor) return { off: "minor" };
  const { limitKg, weighIn, line, today } = facts;
  if (limitKg === null || weighIn === null) return { off: "no-limit" };
  if (today > weighIn) return { off: "weighed-in" };
  const latest = facts.weights
    .filter(({ day }) => day <= today && day >= today - OLDEST_REFERENCE)
    .reduce<Weighing | null>((newest, one) => (newest && newest.day >= one.day ? newest : one), null);
  if (!latest) return { off: "no-weight" };
  const remarks = [
    aboveCeiling(facts, limitKg, weighIn, latest),
    tooFast(facts, latest, (weighIn - 3) as Day),
    behind(facts, limitKg, latest),
  ].filter((remark) => remark !== null);
  if (remarks.length > 0) return { off: null, latest, remarks };
  return {
    off: null,
    latest,
    remarks: [
      {
        kind: "on-line",
        text: latest.kg <= limitKg ? "At or under the limit." : "On the line.",
        numbers: [
          { label: "Weight", value: latest.kg, unit: "kg" },
          { label: "Line", value: shouldBe(line, limitKg, latest.day), unit: "kg" },
        ],
        source: COMMON,
      },
    ],
  };
}
