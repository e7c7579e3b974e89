import type { Day, Item, Minute, PlanInput } from "../types";

/** A lifting session that wants a place. */
export interface Slot {
  /** `Lift.id` that the session will have. */
  readonly id: string;
  readonly item: Item;
  /** Weeks out of its camp week; it may only stand on that week's days. */
  readonly week: number;
  /** Minutes reserved: an upper bound of what the dose will ask for, so that placing does not depend on dosing. */
  readonly minutes: number;
  readonly heavyLower: boolean;
  readonly explosive: boolean;
  /** Wants the freshest day: strength A and power A. */
  readonly fresh: boolean;
  readonly primer: boolean;
  /** Importance within its week, 0 first. */
  readonly order: number;
  /** Where the plan that stood before had it. */
  readonly base: { readonly day: Day; readonly start: Minute } | null;
}

/** A lifting session that does not move: pinned by a coach, or already past. */
export interface FixedLift {
  readonly id: string;
  readonly item: Item;
  readonly week: number;
  readonly day: Day;
  readonly start: Minute;
  readonly minutes: number;
  readonly heavyLower: boolean;
  readonly primer: boolean;
  readonly pinned: boolean;
  readonly past: boolean;
}

export interface PlacementRequest {
  readonly input: PlanInput;
  readonly slots: readonly Slot[];
  readonly fixed: readonly FixedLift[];
}
