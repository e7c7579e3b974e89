import type { Day, Item, Minute, PlanInput, Reason, Violation } from "../types";

/** One item of one camp week that wants a place. */
export interface Slot {
  /** Identity of the lift that it becomes. */
  readonly id: string;
  readonly item: Item;
  /** Weeks out. */
  readonly week: number;
  /** Reserved minutes: the longest the session can take before sparring and cap lower its sets. */
  readonly minutes: number;
  readonly heavyLower: boolean;
  readonly explosive: boolean;
  /** Wants the freshest day: strength A and power A. */
  readonly fresh: boolean;
  readonly primer: boolean;
  /** Importance in its week, 0 first. */
  readonly order: number;
  /** Where the published plan had it; null when it is new. */
  readonly base: { readonly day: Day; readonly start: Minute } | null;
}

/** A lift that the solver may not move: pinned, or already past. */
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

export interface PlacedSlot {
  readonly slot: Slot;
  readonly day: Day;
  readonly start: Minute;
  readonly reasons: readonly Reason[];
}

export interface UnplacedSlot {
  readonly slot: Slot;
  /** Rules that shut its candidates, most frequent first. */
  readonly rules: readonly Reason[];
}

export interface Placement {
  readonly placed: readonly PlacedSlot[];
  readonly unplaced: readonly UnplacedSlot[];
  readonly violations: readonly Violation[];
  readonly cost: number;
  /** What keeps a slot, by its id, from a place: rules it would break, the lift that has the day, or what it would pay. */
  readonly whyNot: (id: string, day: Day, start: Minute) => readonly Reason[];
}
