import type { Day, Item, Minute, PlanInput, Reason, SportKind, Violation } from "../types";

export interface LiftEffect {
  readonly id: string;
  readonly item: Item;
  readonly kind: "moved" | "dose" | "added" | "dropped" | "unplaced";
  readonly from: { readonly day: Day; readonly start: Minute } | null;
  readonly to: { readonly day: Day; readonly start: Minute } | null;
  readonly setsBefore: number | null;
  readonly setsAfter: number | null;
  /** The rule or factor that caused it, in the coach's words. */
  readonly because: readonly Reason[];
}

export interface SportEffect {
  readonly id: string;
  readonly title: string;
  readonly sport: SportKind;
  readonly kind: "moved" | "added" | "dropped" | "edited";
  readonly from: { readonly day: Day; readonly start: Minute; readonly minutes: number } | null;
  readonly to: { readonly day: Day; readonly start: Minute; readonly minutes: number } | null;
}

export interface WeekEffect {
  readonly weeksOut: number;
  readonly setsBefore: number;
  readonly setsAfter: number;
  readonly because: readonly Reason[];
}

export interface KnockOn {
  readonly lifts: readonly LiftEffect[];
  readonly sport: readonly SportEffect[];
  readonly weeks: readonly WeekEffect[];
  /** Violations that were not there before. */
  readonly violations: readonly Violation[];
  readonly bout: { readonly from: PlanInput["bout"]; readonly to: PlanInput["bout"] } | null;
}
