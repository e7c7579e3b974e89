import { z } from "zod";
import { MOST_REPS_FOR_ESTIMATE } from "@/lib/engine/prescription/rep-max";
import {
  REP_MAX_FORMULAS,
  type EmptySlot,
  type Line,
  type LiftEdit,
  type LineLoad,
  type RepMaxFormula,
} from "@/lib/engine/prescription/types";
import { ITEMS, type Lift, type PhaseSpan, type Violation } from "@/lib/engine/types";
import type { Action } from "@/lib/policy";
import { civilDate } from "./civil";
import type { LastTime, LogView } from "./today";

/** What people decide about prescriptions, and what pages show of them. Kilograms on the wire. */

const exerciseId = z.string().min(1, "Choose an exercise.").max(80);
const count = (high: number) => z.int(`1 to ${high}.`).min(1, `1 to ${high}.`).max(high, `1 to ${high}.`);
const kg = z.number("0 to 500 kg.").min(0, "0 to 500 kg.").max(500, "0 to 500 kg.");
const note = z.string().trim().max(300, "At most 300 characters.");

const lineEditSchema = z.strictObject({
  exercise: exerciseId.optional(),
  sets: count(10).optional(),
  /** Repetitions, seconds of a hold. */
  reps: z
    .strictObject({ low: count(100), high: count(100) })
    .refine(({ low, high }) => low <= high, { path: ["high"], message: "Not fewer than the low end." })
    .optional(),
  kg: kg.optional(),
  note: note.optional(),
});

/** PUT /api/camps/:id/sessions/:sid/edit: the whole of what a coach writes over one lifting session. */
export const saveEditSchema = z.strictObject({
  /** `changedAt` of the edit that was edited; null where there was none. An older one gives 409. */
  base: z.iso.datetime().nullable(),
  edit: z.strictObject({
    /** By slot of the prescription. */
    lines: z.record(z.string().min(1).max(40), lineEditSchema),
    note: note.optional(),
  }),
});
export type SaveEdit = z.infer<typeof saveEditSchema>;

/** POST /api/camps/:id/swaps: `to` instead of `from` in all sessions of an item in this camp. */
export const swapFormSchema = z.strictObject({ item: z.enum(ITEMS), from: exerciseId, to: exerciseId });
export type SwapForm = z.infer<typeof swapFormSchema>;

/** DELETE /api/camps/:id/swaps: `from` is done again. */
export const dropSwapSchema = z.strictObject({ item: z.enum(ITEMS), from: exerciseId });
export type DropSwap = z.infer<typeof dropSwapSchema>;

const REPS_WORDS = `1 to ${MOST_REPS_FOR_ESTIMATE}: above that the formulas part ways.`;

/** POST /api/athletes/:id/bests: what was lifted; one repetition is the best itself. */
export const bestFormSchema = z
  .strictObject({
    exerciseId,
    day: civilDate,
    /** What was lifted. */
    kg: z.number("Above 0, up to 500 kg.").gt(0, "Above 0.").max(500, "Up to 500 kg."),
    reps: z.int(REPS_WORDS).min(1, REPS_WORDS).max(MOST_REPS_FOR_ESTIMATE, REPS_WORDS),
    formula: z.enum(REP_MAX_FORMULAS, "Choose a formula.").nullable(),
  })
  .refine(({ reps, formula }) => reps === 1 || formula !== null, {
    path: ["formula"],
    message: "More than one repetition: choose a formula.",
  });
export type BestForm = z.infer<typeof bestFormSchema>;

export interface BestView {
  readonly id: string;
  readonly exerciseId: string;
  readonly name: string;
  readonly date: string;
  readonly liftedKg: number;
  readonly reps: number;
  /** Null where it was measured. */
  readonly formula: RepMaxFormula | null;
  /** The best itself. */
  readonly kg: number;
}

/** What a reader sees of a load: who may not see bests gets the percent alone. */
export type ShownLoad = LineLoad | { readonly of: "percent"; readonly percent: Line["reps"] };

interface Named {
  readonly id: string;
  readonly name: string;
}

/** GET /api/athletes/:id/bests */
export interface BestsView {
  readonly unit: "kg" | "lb";
  /** Newest first. */
  readonly bests: readonly BestView[];
  /** Lifts of which a best can be kept, by name. */
  readonly lifts: readonly Named[];
  readonly mayWrite: boolean;
}

/** What the plan says of a line that a coach wrote over. */
export interface PlannedLine {
  readonly exercise: string;
  readonly name: string;
  readonly aim: Line["aim"];
  readonly sides: Line["sides"];
  readonly sets: number;
  readonly reps: Line["reps"];
  readonly load: ShownLoad;
}

export interface LineView extends Omit<Line, "load"> {
  readonly load: ShownLoad;
  /** Exercise whose turn it is, where a swap of this camp stands in for it. */
  readonly swappedFrom: Named | null;
  /** What a swap may put in its place: shares a quality and may be done, best first; at most 8 ids. */
  readonly swaps: readonly string[];
  /** Null where nobody wrote over the line. */
  readonly planned: PlannedLine | null;
}

/** What a coach wrote over a lift, as it stands. */
export interface EditView {
  readonly changedAt: string;
  /** Null where they left the team. */
  readonly by: string | null;
  readonly edit: LiftEdit;
}

export interface LiftView {
  readonly lift: Lift;
  readonly violations: readonly Violation[];
  readonly warmUp: readonly LineView[];
  readonly lines: readonly LineView[];
  readonly empty: readonly EmptySlot[];
  readonly note: string | null;
  readonly edit: EditView | null;
  /** Why nothing of it can be changed any more, in words; null where it can. */
  readonly closed: string | null;
  /** Every exercise that the page may name, by id. */
  readonly names: Readonly<Record<string, string>>;
  /** What a coach may choose from, by name; empty for others. */
  readonly choices: readonly Named[];
  /** Bests that the loads come from, by exercise and day. */
  readonly bests: readonly BestView[];
}

export interface SessionLink {
  readonly id: string;
  readonly title: string;
  readonly date: string;
  readonly start: string;
}

/** GET /api/camps/:id/sessions/:sid. For a guest `lift`, `effort` and `log` are null. */
export interface SessionPageView {
  readonly campId: string;
  readonly athlete: Named;
  readonly daysOut: number;
  readonly session: {
    readonly id: string;
    readonly source: "lift" | "sport" | "bout" | "weigh-in";
    readonly kind: string;
    readonly title: string;
    readonly place: string;
    readonly date: string;
    readonly start: string;
    readonly minutes: number;
    /** Expected, CR-10. */
    readonly effort: number | null;
    /** Taken out of the plan, in sight because it was logged. */
    readonly dropped: boolean;
  };
  readonly past: boolean;
  /** The unit that this reader sees. */
  readonly unit: "kg" | "lb";
  readonly may: readonly Action[];
  readonly lift: LiftView | null;
  /** By exercise. */
  readonly lastTime: Readonly<Record<string, LastTime>>;
  readonly log: LogView | null;
  readonly previous: SessionLink | null;
  readonly next: SessionLink | null;
}

export interface SheetSession extends SessionLink {
  readonly source: SessionPageView["session"]["source"];
  readonly kind: string;
  readonly minutes: number;
  readonly place: string;
  /** Null for sport, and for readers without the detail of lifting. */
  readonly lift: {
    readonly sets: number;
    readonly warmUp: readonly string[];
    readonly lines: readonly LineView[];
    readonly empty: readonly EmptySlot[];
    readonly note: string | null;
  } | null;
}

/** One camp week as it is printed. */
export interface SheetView {
  readonly campId: string;
  readonly athlete: Named;
  readonly unit: "kg" | "lb";
  readonly bout: {
    readonly date: string;
    readonly time: string;
    readonly place: string;
    readonly opponent: string;
  };
  readonly off: boolean;
  readonly week: {
    readonly weeksOut: number;
    readonly phase: PhaseSpan["phase"];
    readonly deload: boolean;
    readonly from: string;
    readonly to: string;
    /** On its first day. */
    readonly daysOut: number;
  };
  /** Weeks of the camp, first week first. */
  readonly weeks: readonly number[];
  readonly days: readonly { readonly date: string; readonly sessions: readonly SheetSession[] }[];
}
