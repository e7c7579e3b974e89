import type { RuleKey } from "./house-rules";

export interface PlacementRule {
  readonly id: string;
  readonly title: string;
  readonly kind: "must" | "should";
  /** House rules that hold its values; their reason and source are there. */
  readonly keys: readonly RuleKey[];
}

/** The rules of placement by name. Must rules forbid, should rules cost. */
export const PLACEMENT_RULES = [
  { id: "clash", title: "Sessions never overlap, with time between", kind: "must", keys: ["clash.gap"] },
  {
    id: "free-hours",
    title: "Inside the athlete's free hours, not on rest, travel, weigh-in, bout or held days",
    kind: "must",
    keys: [],
  },
  {
    id: "heavy-before-hard",
    title: "Heavy legs end well before hard sparring",
    kind: "must",
    keys: ["heavy-before-hard.hours"],
  },
  {
    id: "lift-after-hard",
    title: "A lift waits after hard sparring",
    kind: "must",
    keys: ["lift-after-hard.hours", "heavy-after-hard.hours"],
  },
  { id: "heavy-apart", title: "Heavy legs lie apart", kind: "must", keys: ["heavy-apart.hours"] },
  {
    id: "one-lift",
    title: "One lift a day, and not a third session",
    kind: "must",
    keys: ["sessions-a-day"],
  },
  { id: "last-heavy", title: "No heavy legs in the last days", kind: "must", keys: ["last-heavy.days"] },
  {
    id: "last-lift",
    title: "Only the primer, then nothing, before the bout",
    kind: "must",
    keys: ["only-primer.days", "last-lift.days"],
  },
  { id: "rest-day", title: "A free day a week", kind: "should", keys: ["rest-day.price"] },
  {
    id: "sport-gap",
    title: "Hours between a lift and other training of the day",
    kind: "should",
    keys: ["sport-gap.hours", "sport-gap.price"],
  },
  {
    id: "heavy-before-hard-48",
    title: "Heavy legs two days before hard sparring",
    kind: "should",
    keys: ["heavy-before-hard-48.hours", "heavy-before-hard-48.price"],
  },
  {
    id: "fresh-first",
    title: "The main lift on the freshest day",
    kind: "should",
    keys: ["fresh-first.price", "fresh-first.hours"],
  },
  {
    id: "spread",
    title: "Lifts spread over the week",
    kind: "should",
    keys: ["spread.next-day", "spread.second-day"],
  },
  {
    id: "hard-days-hard",
    title: "Lift on hard days",
    kind: "should",
    keys: ["hard-days-hard.on", "hard-days-hard.price"],
  },
  {
    id: "stay-put",
    title: "Published sessions stay",
    kind: "should",
    keys: ["stay-put.far", "stay-put.near", "stay-put.locked.hours"],
  },
] as const satisfies readonly PlacementRule[];

export type PlacementRuleId = (typeof PLACEMENT_RULES)[number]["id"];
