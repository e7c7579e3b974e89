import type { CampDay } from "../placement/camp-day";
import type { Lifting, Surroundings } from "../placement/surroundings";
import type { Minute } from "../types";
import type { HouseRules, RuleKey } from "./house-rules";

export const PLACEMENT_RULE_IDS = [
  "clash",
  "free-hours",
  "heavy-before-hard",
  "lift-after-hard",
  "heavy-apart",
  "one-lift",
  "last-heavy",
  "last-lift",
  "rest-day",
  "sport-gap",
  "heavy-before-hard-48",
  "full-dose",
  "fresh-first",
  "spread",
  "hard-days-hard",
  "stay-put",
] as const;
export type PlacementRuleId = (typeof PLACEMENT_RULE_IDS)[number];

interface Rule {
  readonly id: PlacementRuleId;
  readonly title: string;
  /** House rules that hold its values; unit, range, reason and source are there. */
  readonly keys: readonly RuleKey[];
}

/** Starts on a day that a must rule shuts to a lift: `from` inclusive, `to` not. */
export interface Shut {
  readonly rule: PlacementRuleId;
  readonly from: number;
  readonly to: number;
  /** True where the two are minutes since local midnight; else they are instants. */
  readonly onClock: boolean;
  /** What the lift would break it with: sport and lift ids. */
  readonly ids: readonly string[];
  /** The break in a sentence, for a lift that stands at `startsAt`. Made only where it is shown. */
  readonly text: (startsAt: number, start: Minute) => string;
}

/** Forbids. One evaluation serves candidates, what shut them, and the breaks of lifts that stand. */
export interface MustRule extends Rule {
  readonly kind: "must";
  /** What sport, the calendar and the lifts that stand shut on a day. */
  readonly shuts: (around: Surroundings, lift: Lifting, day: CampDay) => readonly Shut[];
  /** What it keeps from happening, without a full stop, for the starts that it shut. */
  readonly keepsFrom: (rules: HouseRules, lift: Lifting) => string;
}

/** What a should rule takes for starts on a day, in whole points. */
export interface Pricing {
  readonly points: (startsAt: number, start: Minute) => number;
  readonly text: (startsAt: number, start: Minute) => string;
}

/** Costs. */
export interface ShouldRule extends Rule {
  readonly kind: "should";
  /** What a lift pays by its own place; null where no start of the day pays. */
  readonly pricing: (around: Surroundings, lift: Lifting, day: CampDay) => Pricing | null;
}

export type PlacementRule = MustRule | ShouldRule;
