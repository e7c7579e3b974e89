import { z } from "zod";
import type { TestVerdict } from "./test-trial";
import type { BoutResult } from "./result";
import { boutResultSchema } from "./result";

/** PUT /api/camps/:id/result; null takes it back. */
export const resultFormSchema = z.object({ result: boutResultSchema.omit({ recordedOn: true }).nullable() });
export type ResultForm = z.infer<typeof resultFormSchema>;

/** Sessions of one kind of work: as planned at the end, and what was answered for those that are past. */
export interface Attendance {
  readonly key: string;
  readonly title: string;
  readonly planned: number;
  readonly done: number;
  readonly missed: number;
  /** Past, and nothing was logged. */
  readonly unanswered: number;
}

/** A camp week. Loads in AU; null where nothing was logged. */
export interface ReportWeek {
  readonly weeksOut: number;
  readonly from: string;
  readonly phase: string;
  readonly setsPlanned: number;
  readonly setsDone: number | null;
  readonly loadPlanned: number;
  readonly loadDone: number | null;
}

export interface ReportTest {
  readonly key: string;
  readonly title: string;
  readonly verdict: TestVerdict;
  readonly errorText: string;
}

export interface ReportWeight {
  readonly limitKg: number | null;
  readonly points: readonly { readonly date: string; readonly kg: number }[];
}

export interface ReportChange {
  readonly number: number;
  readonly at: string;
  readonly by: string;
  readonly summary: string;
}

/** GET /api/camps/:id/report. Parts that the reader may not see are null. */
export interface ReportView {
  readonly campId: string;
  readonly athlete: { readonly id: string; readonly name: string };
  readonly bout: {
    readonly date: string;
    readonly place: string;
    readonly opponent: string;
    readonly ruleset: string;
  };
  readonly zone: string;
  readonly weeks: number;
  readonly off: boolean;
  /** The bout is over, or was called off. */
  readonly over: boolean;
  readonly result: BoutResult | null;
  /** Days without contact that were ordered; null where none were. */
  readonly standDown: {
    readonly from: string;
    readonly to: string;
    readonly eligible: string;
    readonly days: number;
  } | null;
  readonly unit: "kg" | "lb";
  readonly attendance: readonly Attendance[] | null;
  readonly hardRounds: number | null;
  readonly byWeek: readonly ReportWeek[] | null;
  readonly tests: readonly ReportTest[] | null;
  /** Off for a minor. */
  readonly weight: ReportWeight | { readonly off: string } | null;
  readonly changes: readonly ReportChange[] | null;
  readonly may: { readonly record: boolean };
}
