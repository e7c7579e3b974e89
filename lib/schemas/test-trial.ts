import { z } from "zod";
import {
  TEST_KINDS,
  TEST_SIDES,
  TEST_SPECS,
  testProblems,
  type Asymmetry,
  type PowerMethod,
  type ReactiveStrength,
  type TestKind,
} from "@/lib/engine/measures";
import { civilDate } from "./civil";

/** Kinds that are kept as trials. Rep records belong to an exercise and are kept as bests. */
export const TRIAL_KINDS: readonly TestKind[] = TEST_KINDS.filter((kind) => !TEST_SPECS[kind].ofExercise);

const MASS = "20 to 300 kg.";

export const trialFormSchema = z
  .object({
    kind: z.enum(TEST_KINDS, "Choose a test.").refine((kind) => TRIAL_KINDS.includes(kind), {
      message: "A rep record belongs to an exercise: add it under Bests.",
    }),
    side: z.enum(TEST_SIDES, "Both, left or right."),
    day: civilDate,
    /** In the unit of the kind. */
    value: z.number("Give a number."),
    /** Contact time in ms, load or ball in kg; null where the kind has one number only. */
    second: z.number("Give a number.").nullable(),
    /** Body mass on the day, kg: power is worked out with it. */
    massKg: z.number(MASS).min(20, MASS).max(300, MASS).nullable(),
    note: z.string().trim().max(200, "At most 200 characters."),
  })
  .superRefine((trial, issue) => {
    if (!TEST_SPECS[trial.kind].sides.includes(trial.side))
      issue.addIssue({ code: "custom", path: ["side"], message: "This test has no such side." });
    for (const { field, message } of testProblems(trial.kind, trial))
      issue.addIssue({ code: "custom", path: [field], message });
  });
/** POST /api/athletes/:id/tests */
export type TrialForm = z.infer<typeof trialFormSchema>;

/** Most rows of one upload. */
export const MOST_ROWS = 2000;

/** POST /api/athletes/:id/tests/upload: rows of a file, mapped already; all are kept or none. */
export const trialUploadSchema = z.object({
  /** Of this file: sent twice, it is kept once. */
  uploadId: z.uuid(),
  rows: z
    .array(trialFormSchema)
    .min(1, "The file has no rows.")
    .max(MOST_ROWS, `At most ${MOST_ROWS} rows at once.`),
});
export type TrialUpload = z.infer<typeof trialUploadSchema>;

export interface TrialView {
  readonly id: string;
  readonly value: number;
  readonly second: number | null;
  readonly massKg: number | null;
  readonly note: string;
  /** What is compared, in the unit of the series. */
  readonly measure: number;
}

/** One day of a test. */
export interface TestDay {
  readonly day: string;
  readonly trials: readonly TrialView[];
  readonly best: number;
  readonly mean: number;
  /** Jump height, cm, of the best trial; null where the test is no jump of one's own weight. */
  readonly heightCm: number | null;
  /** Body mass, kg: of the trial, else the weight of that day. */
  readonly massKg: number | null;
  /** Power, W, of the best trial by each regression; two of them are never compared. */
  readonly powers: readonly { readonly method: PowerMethod; readonly watts: number }[];
  /** Reactive strength of the best trial by each method. */
  readonly reactive: readonly ReactiveStrength[];
}

/** What a single measurement may be off by. */
export interface TestError {
  /** In the unit of the series; null where nobody knows it. */
  readonly typicalError: number | null;
  readonly from: "own" | "published" | "unknown";
  readonly text: string;
}

export interface TestVerdict {
  readonly first: string;
  readonly last: string;
  readonly change: number;
  readonly leastReal: number | null;
  readonly beyondNoise: boolean | null;
  /** "38.1 to 41.0 cm (+2.9 cm): higher, beyond the noise of this test." */
  readonly sentence: string;
}

/** One test of one side, at one load or ball where results compare at the same alone; days oldest first. */
export interface TestSeries {
  readonly key: string;
  readonly kind: TestKind;
  readonly side: (typeof TEST_SIDES)[number];
  /** Load or ball, kg; null where results compare whatever the second reading is. */
  readonly at: number | null;
  /** What is compared, with its method where there are several. */
  readonly measure: string;
  readonly unit: string;
  readonly days: readonly TestDay[];
  readonly error: TestError;
  /** Smallest worthwhile change, in the unit of the series; null where the team is too small to say. */
  readonly worthwhile: number | null;
  readonly worthwhileText: string;
  /** First day to last, means of the day; null for a single day. */
  readonly verdict: TestVerdict | null;
}

/** Left against right on one day, means of the day. */
export interface SideDifference {
  readonly key: string;
  readonly kind: TestKind;
  readonly at: number | null;
  readonly day: string;
  readonly left: number;
  readonly right: number;
  readonly unit: string;
  readonly difference: Asymmetry;
  /** Larger than the spread of the athlete's own trials; null where that is not known. */
  readonly beyondOwnSpread: boolean | null;
}

/** GET /api/athletes/:id/tests */
export interface TestsView {
  readonly series: readonly TestSeries[];
  readonly differences: readonly SideDifference[];
}
