import type { Day, HouseRules, Kg } from "../types";

export const WEIGHT_CAUTION =
  "Rapid weight loss can injure or kill. Work with a licensed physician and a registered dietitian, and follow your commission's rules.";

/**
 * Weeks to come from `now` to `target` kg when each week takes `rate` (a share, above 0 and below 1) of what is left:
 * ln(target / now) / ln(1 - rate). 0 where the target is already met.
 */
export function weeksNeeded(now: number, target: number, rate: number): number {
  return now <= target ? 0 : Math.log(target / now) / Math.log(1 - rate);
}

/** Share of body mass lost in a week, from one weight to another so many days later; below 0 for a gain. */
export const weeklyRate = (from: number, to: number, days: number): number => 1 - (to / from) ** (7 / days);

export type DescentPace = "none" | "recommended" | "faster-than-recommended" | "beyond-fastest";

/** The line from a start weight to the limit at the weigh-in. Never rises and never falls faster than the fastest rate. */
export interface DescentLine {
  readonly from: Day;
  /** Day of the weigh-in. */
  readonly to: Day;
  readonly startKg: Kg;
  readonly limitKg: Kg;
  /** Share a week that the line falls by; 0 where the limit is already met. */
  readonly rate: number;
  /** Share a week that the limit asks for. */
  readonly neededRate: number;
  /** Weeks that the recommended rate takes. */
  readonly weeksNeeded: number;
  readonly pace: DescentPace;
  /** Kilograms above the limit that the fastest rate leaves at the weigh-in; 0 where the line meets it. */
  readonly shortKg: number;
}

function paceOf(neededRate: number, rules: HouseRules): DescentPace {
  // Rates are compared in percent with a hair of slack: an 8-week line at exactly 0.7 % is at 0.7 %.
  const percent = neededRate * 100 - 1e-9;
  if (percent <= 0) return "none";
  if (percent > rules["weight.fastest"]) return "beyond-fastest";
  return percent <= rules["weight.rate"] ? "recommended" : "faster-than-recommended";
}

/**
 * The line from a start to the limit at the weigh-in. It takes the whole time there is, so it is slower than the recommended
 * 0.7 % a week (Garthe et al. 2011) where time allows; where the limit asks for more than the fastest rate (1.5 %, NCAA and
 * NFHS) the line keeps that rate and misses the limit by `shortKg`. An athlete at or under the limit gets the limit as a level
 * line. Null where no day is left before the weigh-in.
 */
export function descentLine(
  start: { readonly day: Day; readonly kg: Kg },
  limitKg: Kg,
  weighIn: Day,
  rules: HouseRules,
): DescentLine | null {
  const days = weighIn - start.day;
  if (days < 1) return null;
  const neededRate = start.kg > limitKg ? weeklyRate(start.kg, limitKg, days) : 0;
  const rate = Math.min(neededRate, rules["weight.fastest"] / 100);
  const pace = paceOf(neededRate, rules);
  const line = { from: start.day, to: weighIn, startKg: start.kg, limitKg, rate, neededRate, pace };
  return {
    ...line,
    weeksNeeded: weeksNeeded(start.kg, limitKg, rules["weight.rate"] / 100),
    shortKg: pace === "beyond-fastest" ? lineKg(line, weighIn) - limitKg : 0,
  };
}

/** Weight, kg, that the line gives for a day; before its first day the start, after its last the end. */
export function lineKg(
  line: Pick<DescentLine, "from" | "to" | "startKg" | "limitKg" | "rate">,
  day: Day,
): Kg {
  const days = Math.max(0, Math.min(day, line.to) - line.from);
  return Math.max(line.limitKg, line.startKg * (1 - line.rate) ** (days / 7)) as Kg;
}

/** One point a day, first to last. */
export const linePoints = (line: DescentLine): readonly { readonly day: Day; readonly kg: Kg }[] =>
  Array.from({ length: line.to - line.from + 1 }, (_, index) => {
    const day = (line.from + index) as Day;
    return { day, kg: lineKg(line, day) };
  });
