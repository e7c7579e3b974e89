import type { Day, Item, Kg, Lift, Reason } from "../types";
import type { Aim, BaseMix, Equipment, Exercise, Intent, Limitation, Range } from "./exercise";

/** Equations that estimate a best from a load lifted for some repetitions; see `rep-max.ts`. */
export const REP_MAX_FORMULAS = [
  "epley",
  "brzycki",
  "lander",
  "oconner",
  "wathan",
  "lombardi",
  "mayhew",
] as const;
export type RepMaxFormula = (typeof REP_MAX_FORMULAS)[number];

/** A best (one-repetition maximum) of one lift as known on a day. */
export interface Best {
  readonly exercise: string;
  readonly day: Day;
  /** The best itself, measured or estimated. */
  readonly kg: Kg;
  /** Named beside the figure wherever it is shown. */
  readonly from: "measured" | RepMaxFormula;
}

/** What the smallest change of load is: `step` in `unit`, both sides of a bar together. */
export interface Plates {
  readonly unit: "kg" | "lb";
  /** 0.5 to 10. */
  readonly step: number;
}

/** Coach or athlete chose another exercise of the same quality: kept for every session of this item in the camp. */
export interface Swap {
  readonly item: Item;
  readonly from: string;
  readonly to: string;
}

/** What a coach wrote over one line of one session. What is left out stays as computed. */
export interface LineEdit {
  readonly exercise?: string;
  /** 1 to 10. */
  readonly sets?: number;
  readonly reps?: Range;
  readonly kg?: number;
  readonly note?: string;
}

/** Edits of one lifting session by slot id; they survive re-planning because they hang on the lift's identity. */
export interface LiftEdit {
  readonly lines: Readonly<Record<string, LineEdit>>;
  readonly note?: string;
}

export interface PrescriptionInput {
  /** The plan's lifts, past ones included: main lifts and rotation follow their order. */
  readonly lifts: readonly Lift[];
  readonly exercises: readonly Exercise[];
  readonly mix: BaseMix;
  readonly equipment: readonly Equipment[];
  readonly limitations: readonly Limitation[];
  /** Any order; of one lift the newest on or before the session's day counts. */
  readonly bests: readonly Best[];
  readonly plates: Plates;
  readonly swaps: readonly Swap[];
  readonly edits: Readonly<Record<string, LiftEdit>>;
}

/** The load of a line: percent of best with kilograms where the best is known, else repetitions in reserve, else words. */
export type LineLoad =
  | {
      readonly of: "best";
      /** Percent, in steps of a half: the engine's own intensity is finer than whole numbers. */
      readonly percent: Range;
      /** Rounded to the athlete's plates. */
      readonly kg: Kg;
      readonly best: Best;
    }
  | { readonly of: "reserve"; readonly reserve: Range; readonly kg: Kg | null }
  | { readonly of: "body" | "throw" | "none"; readonly kg: Kg | null };

/** One exercise of a session. */
export interface Line {
  /** Stable within an item: the place in the session ("main-lower", "trunk-1"). */
  readonly slot: string;
  /** What the slot is for, in words. */
  readonly purpose: string;
  readonly exercise: string;
  readonly name: string;
  readonly aim: Aim;
  readonly sets: number;
  /** Repetitions, seconds for the aim `hold`; a side where `sides` is `each`. */
  readonly reps: Range;
  readonly sides: Exercise["sides"];
  readonly intent: Intent;
  /** Tempo or intent in words: "Down in three, up as fast as it goes". */
  readonly tempo: string;
  readonly load: LineLoad;
  /** Seconds. */
  readonly rest: number;
  readonly cues: readonly string[];
  /** Why this exercise, and why so much of it. */
  readonly reasons: readonly Reason[];
  /** Fields that a coach wrote over. */
  readonly edited: readonly (keyof LineEdit)[];
  readonly note: string | null;
  /** Legal exercises for this slot, best first, the chosen one left out; at most 8 ids. */
  readonly alternatives: readonly string[];
}

/** A slot for which no exercise is legal: said, never left out silently. */
export interface EmptySlot {
  readonly slot: string;
  readonly purpose: string;
  readonly why: string;
}

export interface PrescribedLift {
  /** `Lift.id`. */
  readonly id: string;
  /** Mobility before the first set; its sets are not working sets. */
  readonly warmUp: readonly Line[];
  /** In the order in which they are done; their sets add up to `Lift.sets` unless a coach edited sets. */
  readonly lines: readonly Line[];
  readonly empty: readonly EmptySlot[];
  readonly note: string | null;
}
