import type { Au, Day, HouseRules, Minute } from "../types";
import type { WeightFacts } from "../weight";

/** One day's four answers, each 1 (very good) to 7 (very poor). */
export interface CheckIn {
  readonly day: Day;
  readonly sleep: number;
  readonly fatigue: number;
  readonly soreness: number;
  readonly stress: number;
}

/** What an athlete answered for one session. */
export interface LoggedSession {
  /** Lift or sport id. */
  readonly id: string;
  readonly of: "lift" | "sport";
  readonly title: string;
  readonly day: Day;
  readonly start: Minute;
  /** CR-10, as planned; null where nothing was expected. */
  readonly expectedEffort: number | null;
  /** CR-10, as felt; null where it was not given. */
  readonly effort: number | null;
  readonly missed: boolean;
  /** 0 to 10; null where none was flagged. */
  readonly pain: number | null;
}

/** One camp week, with what was done in it and what is still planned. */
export interface WeekAnswer {
  readonly from: Day;
  /** Inclusive. */
  readonly to: Day;
  /** Load that the week may reach; null where no cap applies. */
  readonly cap: Au | null;
  readonly done: Au;
  /** Planned and not past. */
  readonly ahead: Au;
}

export interface LiftAhead {
  readonly id: string;
  readonly title: string;
  readonly day: Day;
  readonly load: Au;
  /** The coach's own factor as it stands, 0.5 to 1.5. */
  readonly coachFactor: number;
}

/** What suggestions are made from; lists in any order. What lies after `today` in check-ins and logs is left out. */
export interface ResponseInput {
  readonly today: Day;
  /** First and last day of the camp: no change reaches beyond them. */
  readonly camp: { readonly from: Day; readonly to: Day };
  readonly checkIns: readonly CheckIn[];
  readonly logs: readonly LoggedSession[];
  /** Null where weight is not followed. */
  readonly weight: Omit<WeightFacts, "today" | "rules"> | null;
  readonly weeks: readonly WeekAnswer[];
  readonly liftsAhead: readonly LiftAhead[];
  readonly rules: HouseRules;
}

/** In the order in which they are shown. */
export const SUGGESTION_KINDS = ["pain", "weight", "check-in", "effort", "week-load", "missed"] as const;
export type SuggestionKind = (typeof SUGGESTION_KINDS)[number];

/** What accepting would do to the plan. */
export type SuggestedChange =
  /** Fewer sets of all lifting from one day to another, both inclusive; 0.5 to 1. */
  | { readonly kind: "response"; readonly from: Day; readonly to: Day; readonly factor: number }
  /** The coach's own factor of one lift, 0.5 to 1.5. */
  | { readonly kind: "factor"; readonly liftId: string; readonly factor: number };

export interface SuggestionNumber {
  readonly label: string;
  readonly value: number;
  readonly unit: "points" | "of 10" | "kg" | "%" | "days" | "h" | "AU" | "sessions" | "×";
}

/** Something to look at, with its numbers. Never applied by itself. */
export interface Suggestion {
  /** The same for the same occasion, also tomorrow: what was decided on it stays decided. */
  readonly key: string;
  readonly kind: SuggestionKind;
  readonly title: string;
  readonly numbers: readonly SuggestionNumber[];
  readonly text: string;
  readonly source: string;
  /** Null: a talk, not a change. */
  readonly change: SuggestedChange | null;
}

export const COMMON_PRACTICE = "common practice, no published source";
