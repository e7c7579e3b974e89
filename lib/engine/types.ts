/**
 * Glossary of the engine, and the shapes that go in and come out.
 *
 * - civil day      integer days since 1970-01-01 in the athlete's own calendar; no time zone inside.
 * - civil minute   `day * 1440 + minutes since local midnight`: a wall-clock reading.
 * - instant        minutes since 1970-01-01T00:00Z; `civil minute - offset` (see `OffsetStep`).
 * - days out       `bout day - day`; 0 on the bout day.
 * - weeks out      `floor(days out / 7)`; 0 is fight week, whose last day is the bout.
 * - effort         session effort on the CR-10 scale, 0 to 10 (Foster 2001).
 * - load           effort x minutes, arbitrary units, AU (Foster 1998).
 * - sets           working sets of a session, warm-up not counted.
 * - item           what a lifting session is for ("strength-a"); a camp week holds each item at most once.
 * - slot           one item of one camp week; placed at a day and start, or left unplaced.
 * - pin            a coach's decision on where a slot stands; the engine obeys and reports what it breaks.
 * - base           the plan that stood before; a session that is already published is moved only for a reason.
 *
 * The engine has no clock, no randomness, no I/O and no `Date`: everything it needs is an argument.
 */

declare const brand: unique symbol;
type Branded<T, B extends string> = T & { readonly [brand]: B };

/** Days since 1970-01-01, civil. */
export type Day = Branded<number, "Day">;
/** Minutes since local midnight, 0 to 1439; an end may be up to 2880. */
export type Minute = Branded<number, "Minute">;
/** Minutes since 1970-01-01T00:00Z. */
export type Instant = Branded<number, "Instant">;
/** Arbitrary units of training load: CR-10 effort x minutes. */
export type Au = Branded<number, "Au">;
export type Kg = Branded<number, "Kg">;

/** ISO weekday: 1 is Monday, 7 is Sunday. */
export type Weekday = 1 | 2 | 3 | 4 | 5 | 6 | 7;

/**
 * UTC offset that holds from a wall-clock reading on, in minutes east of UTC. Steps are sorted by `from`; the first
 * holds for everything before it too. A daylight-saving change is a step whose `from` is the later of the two wall
 * readings of the transition, so that a time in the gap moves forward and one in the overlap takes the first.
 */
export interface OffsetStep {
  /** Civil minute. */
  readonly from: number;
  /** Minutes east of UTC. */
  readonly offset: number;
}

export const PHASES = ["foundation", "strength", "power", "taper"] as const;
export type Phase = (typeof PHASES)[number];

export const ITEMS = [
  "strength-a",
  "strength-b",
  "trunk-and-kick",
  "power-touch",
  "power-a",
  "strength-keep",
  "power-b",
  "power-short",
  "primer",
] as const;
export type Item = (typeof ITEMS)[number];

export const SPORT_KINDS = [
  "hard-sparring",
  "technical-sparring",
  "skill",
  "conditioning",
  "travel",
  "rest",
  "other",
] as const;
export type SportKind = (typeof SPORT_KINDS)[number];

export const TRAINING_AGES = ["novice", "intermediate", "advanced"] as const;
export type TrainingAge = (typeof TRAINING_AGES)[number];

export const STRIKING_BASES = [
  "whipping-round-kicks",
  "in-and-out-kicks",
  "dynamic-high-kicks",
  "boxing",
  "grappling",
] as const;
export type StrikingBase = (typeof STRIKING_BASES)[number];

/** Values of all house rules by key; see `rules/house-rules.ts` for units, ranges, reasons and sources. */
export type { HouseRules, RuleKey } from "./rules/house-rules";
import type { HouseRules } from "./rules/house-rules";

/** Hours of a weekday in which the athlete can lift. `from < to`, minutes since local midnight, `to` up to 1440. */
export interface FreeHours {
  readonly weekday: Weekday;
  readonly from: Minute;
  readonly to: Minute;
}

/** One dated sport session; recurrences are expanded outside the engine. */
export interface SportSession {
  /** Stable across plans. */
  readonly id: string;
  readonly kind: SportKind;
  readonly title: string;
  readonly day: Day;
  readonly start: Minute;
  /** 1 to 1440. `rest` and `travel` claim the whole day whatever their minutes. */
  readonly minutes: number;
  /** Expected CR-10 effort, 0 to 10. */
  readonly effort: number;
  /** Set when the session was done and answered for: the load that counts instead of effort x minutes. */
  readonly doneLoad?: Au;
}

/** A slot by name: the item and the camp week it belongs to. */
export interface SlotKey {
  readonly item: Item;
  /** Weeks out of the camp week that the slot belongs to. */
  readonly week: number;
}

/** A coach's decision on one lifting session, kept by the session's identity. */
export interface Pin {
  /** `Lift.id`. */
  readonly id: string;
  /** The slot, so that a pin also works on a plan made from scratch. */
  readonly slot: SlotKey;
  readonly day: Day;
  readonly start: Minute;
}

/** A medical hold: nothing is planned from `from` to `to`, both inclusive; `to` null is open-ended. */
export interface Hold {
  readonly from: Day;
  readonly to: Day | null;
}

/** An accepted suggestion: sets of the lifts of these days are lowered. */
export interface AcceptedResponse {
  readonly from: Day;
  /** Inclusive. */
  readonly to: Day;
  /** 0.5 to 1. */
  readonly factor: number;
}

export interface PlanInput {
  /** What starts at or before this instant is past: it is never planned and never moves. */
  readonly now: Instant;
  readonly zone: readonly OffsetStep[];
  readonly bout: { readonly day: Day; readonly start: Minute };
  /** Camp length in weeks, 1 to 20. */
  readonly weeks: number;
  readonly weighIn: { readonly day: Day; readonly start: Minute } | null;
  readonly athlete: {
    readonly trainingAge: TrainingAge;
    /** 1 to 4. */
    readonly liftsPerWeek: number;
    readonly strikingBase: StrikingBase;
    readonly freeHours: readonly FreeHours[];
  };
  readonly sport: readonly SportSession[];
  readonly pins: readonly Pin[];
  readonly holds: readonly Hold[];
  readonly rules: HouseRules;
  /** Coach's own factor on sets by lift id, 0.5 to 1.5. */
  readonly coachFactors: Readonly<Record<string, number>>;
  /** Accepted suggestions; where several cover a day their factors multiply, never below 0.5. */
  readonly responses: readonly AcceptedResponse[];
}

export const FACTOR_NAMES = ["wave", "taper", "before", "after", "cap", "response", "coach"] as const;
export type FactorName = (typeof FACTOR_NAMES)[number];

/** One step of the dose, in the order it is multiplied. `text` says it in the coach's words. */
export interface Factor {
  readonly name: FactorName;
  readonly value: number;
  readonly text: string;
}

/** Why a session stands where it stands, or why a candidate was shut. `rule` is a placement rule id. */
export interface Reason {
  readonly rule: string;
  readonly text: string;
}

/** Low and high end of the prescribed intensity. */
export interface Intensity {
  readonly low: number;
  readonly high: number;
  /** `best`: percent of the best lift (1RM). `reserve`: repetitions left in reserve. */
  readonly of: "best" | "reserve";
}

/** A planned lifting session. */
export interface Lift {
  /** Stable across plans, also when the bout moves. */
  readonly id: string;
  readonly item: Item;
  /** Weeks out of the slot's camp week. */
  readonly week: number;
  readonly phase: Phase;
  readonly day: Day;
  readonly start: Minute;
  /** 12 + 3.2 x sets, rounded up to 5. */
  readonly minutes: number;
  readonly sets: number;
  /** Sets before any factor. */
  readonly baseSets: number;
  /** Fewest sets the item is worth doing for. */
  readonly floorSets: number;
  readonly intensity: Intensity;
  /** Expected CR-10 effort. */
  readonly effort: number;
  readonly heavyLower: boolean;
  readonly explosive: boolean;
  readonly pinned: boolean;
  /** Already past at `now`: kept as it was. */
  readonly past: boolean;
  readonly factors: readonly Factor[];
  readonly reasons: readonly Reason[];
}

export interface Unplaced extends SlotKey {
  /** `Lift.id` that the session has, or would have had. */
  readonly id: string;
  /** The rules that shut its candidates, most frequent first. */
  readonly rules: readonly Reason[];
}

/** A must rule broken by a pin, a fixed session or the sport itself. Reported, never repaired silently. */
export interface Violation {
  readonly rule: string;
  /** Lift and sport ids involved. */
  readonly ids: readonly string[];
  readonly day: Day;
  readonly text: string;
}

export interface PhaseSpan {
  readonly phase: Phase;
  readonly from: Day;
  /** Inclusive. */
  readonly to: Day;
}

export interface WeekSummary {
  readonly weeksOut: number;
  readonly from: Day;
  readonly to: Day;
  readonly phase: Phase;
  readonly deload: boolean;
  readonly sets: number;
  readonly sportLoad: Au;
  readonly liftingLoad: Au;
  /** Mean / sample SD (n - 1) of the seven daily loads; null where the SD is 0 (Foster 1998). */
  readonly monotony: number | null;
  /** Week load x monotony; null where monotony is. */
  readonly strain: number | null;
  /** Load the week may reach under the weekly cap; null where no cap applies. */
  readonly loadCap: Au | null;
}

export interface DayLoad {
  readonly day: Day;
  readonly sport: Au;
  readonly lifting: Au;
  readonly hard: boolean;
  readonly sets: number;
}

/** Impulse-response illustration, one value a camp day; never a forecast. */
export interface Form {
  readonly from: Day;
  /** Model performance on the morning of each day, arbitrary units, relative to the first. */
  readonly values: readonly number[];
  /** Days before the bout at which training stops helping (Fitz-Clarke 1991). */
  readonly stopsHelping: number;
  /** Days before the bout at which training helps most (Fitz-Clarke 1991). */
  readonly helpsMost: number;
}

export interface Plan {
  readonly bout: PlanInput["bout"];
  readonly weeks: readonly WeekSummary[];
  readonly phases: readonly PhaseSpan[];
  readonly lifts: readonly Lift[];
  readonly unplaced: readonly Unplaced[];
  readonly violations: readonly Violation[];
  readonly days: readonly DayLoad[];
  readonly form: Form;
  /** Total of should costs and unplaced prices: the value the solver minimised. */
  readonly cost: number;
  /** Against the base: why its lifts moved or went, and why new ones came. Empty for a plan made from scratch. */
  readonly causes: readonly Cause[];
}

/** Kept beside the lifts, not in them: a lift reads the same whatever the plan was measured against. */
export interface Cause {
  /** `Lift.id`. */
  readonly id: string;
  readonly because: readonly Reason[];
}

/** The part of an earlier plan that a new one is measured against. */
export interface Base {
  readonly boutDay: Day;
  readonly lifts: readonly Lift[];
}

/** Input that cannot be planned: `pointer` is a JSON pointer into the plan request. */
export interface InputProblem {
  readonly code:
    | "bout-past"
    | "weeks-range"
    | "lifts-range"
    | "free-hours"
    | "rule-range"
    | "sport-range"
    | "weigh-in-order"
    | "number";
  readonly pointer: string;
  readonly message: string;
}

/* Placement: a value of its own, so that any solver can be held against ours. */

/** What a candidate occupies: instants are exact across daylight-saving changes and travel. */
export interface Candidate {
  /** Index into `PlacementProblem.items`. */
  readonly item: number;
  readonly day: Day;
  readonly start: Minute;
  readonly startsAt: Instant;
  readonly endsAt: Instant;
  /** Sum of should costs that depend on this candidate alone. Integer, 0 or more. */
  readonly cost: number;
}

export interface PlacementItem {
  readonly key: string;
  readonly week: number;
  readonly heavy: boolean;
  /** Price of leaving it out. Integer. */
  readonly unplaced: number;
}

/**
 * Minimise: sum of chosen candidates' costs + prices of unplaced items + spread costs + rest-day costs,
 * where each item gets one candidate or none, no two chosen candidates share a day, and no two break an `apart`.
 */
export interface PlacementProblem {
  readonly items: readonly PlacementItem[];
  /** Sorted by day, then start, then item. */
  readonly candidates: readonly Candidate[];
  /** Least minutes from the end of one to the start of the next, for all lifts or for heavy ones. Forbidden below. */
  readonly apart: readonly { readonly among: "all" | "heavy"; readonly minutes: number }[];
  /** `spread[g - 1]`: cost of each pair of chosen candidates whose days are g apart. Length at most 3. Integers. */
  readonly spread: readonly number[];
  /** Per camp week: days that fixed training leaves free, and the cost if lifting takes all of them. */
  readonly weekly: readonly {
    readonly week: number;
    readonly freeDays: readonly Day[];
    readonly noRestCost: number;
  }[];
}

export interface PlacementSolution {
  readonly cost: number;
  /** Per item: index into `candidates`, or null. */
  readonly chosen: readonly (number | null)[];
}

export type { KnockOn, LiftEffect, SportEffect, WeekEffect } from "./changes/types";
