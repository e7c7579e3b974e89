import { campStart } from "../geometry";
import type { Day, HouseRules, Phase, PhaseSpan, TrainingAge } from "../types";

/** What decides the phases of a camp. */
export interface CampShape {
  readonly boutDay: Day;
  /** 1 to 20. */
  readonly weeks: number;
  readonly trainingAge: TrainingAge;
  readonly rules: HouseRules;
}

/** Days of the taper, the bout day included; never more than the camp has. */
export function taperDays({ weeks, rules }: Pick<CampShape, "weeks" | "rules">): number {
  const key = weeks >= 6 ? "taper.days.long" : weeks >= 4 ? "taper.days.medium" : "taper.days.short";
  return Math.min(rules[key], 7 * weeks);
}

function foundationWeeks({ weeks, rules }: CampShape): number {
  if (weeks >= 12) return rules["foundation.weeks.long"];
  return weeks >= 10 ? rules["foundation.weeks.medium"] : 0;
}

/**
 * Phases counted back from the bout, in days, first to last; together the whole camp. A phase without a day is left out,
 * so that short camps drop from the front. Shares and lengths: `house-rules.ts`.
 */
export function phaseSpans(shape: CampShape): readonly PhaseSpan[] {
  const { boutDay, weeks, trainingAge, rules } = shape;
  const taper = taperDays(shape);
  const building = 7 * weeks - taper;
  const leastPower = building >= 7 ? 1 : 0;
  // Foundation never takes the one week of power that a camp which builds at all must have.
  const foundation = Math.min(7 * foundationWeeks(shape), building - 7 * leastPower);
  const share = rules[`power.share.${trainingAge}`];
  const wanted = Math.floor((share * (building - foundation)) / 7 + 0.5);
  const powerWeeks = Math.min(rules["power.weeks.max"], Math.max(leastPower, wanted));
  const power = Math.min(7 * powerWeeks, building - foundation);
  const lengths: readonly (readonly [Phase, number])[] = [
    ["foundation", Math.max(0, foundation)],
    ["strength", building - Math.max(0, foundation) - power],
    ["power", power],
    ["taper", taper],
  ];
  let from = campStart(boutDay, weeks) as number;
  const spans: PhaseSpan[] = [];
  for (const [phase, days] of lengths) {
    if (days <= 0) continue;
    spans.push({ phase, from: from as Day, to: (from + days - 1) as Day });
    from += days;
  }
  return spans;
}
