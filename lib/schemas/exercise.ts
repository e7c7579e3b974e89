import { z } from "zod";
import {
  AIMS,
  EQUIPMENT,
  INTENTS,
  LIMITATIONS,
  LOAD_MODELS,
  QUALITIES,
  type Aim,
  type AimDose,
  type Exercise,
} from "@/lib/engine/prescription/exercise";

/** Seconds of a hold may be more than anyone repeats. */
const MOST_REPS: Record<Aim, number> = { heavy: 12, volume: 60, fast: 20, hold: 300 };
const MOST_SETS = 10;
const FEWEST_CUES = 2;
export const MOST_CUES = 4;
export const CUE_LENGTH = 90;

const range = (low: number, high: number, what: string) => {
  const end = z.int(`Whole numbers, ${low} to ${high}${what}.`);
  const message = `${low} to ${high}${what}.`;
  const within = end.min(low, message).max(high, message);
  return z
    .object({ low: within, high: within })
    .refine((ends) => ends.low <= ends.high, { path: ["high"], message: "Not below the first." });
};

const dose = (aim: Aim) =>
  z
    .object({
      sets: range(1, MOST_SETS, " sets"),
      reps: range(1, MOST_REPS[aim], aim === "hold" ? " seconds" : " repetitions"),
    })
    .nullable();

const listOf = <const T extends readonly string[]>(of: T) =>
  z
    .array(z.enum(of))
    .max(of.length)
    .refine((list) => new Set(list).size === list.length, "Each only once.");

const otherId = z.string().min(1).max(100).nullable();

const fields = z.object({
  name: z.string().trim().min(1, "Give the exercise a name.").max(80, "At most 80 characters."),
  /** The main one first. */
  qualities: listOf(QUALITIES).min(1, "Say what it trains."),
  main: z.boolean(),
  load: z.enum(LOAD_MODELS),
  /** Null: its own best. */
  bestOf: otherId,
  powerZone: range(0, 100, " % of best").nullable(),
  sides: z.enum(["both", "each"]),
  intent: z.enum(INTENTS),
  /** Null: not used for it. */
  doses: z.object({ heavy: dose("heavy"), volume: dose("volume"), fast: dose("fast"), hold: dose("hold") }),
  rest: z.int("Whole seconds.").min(0, "0 to 600 seconds.").max(600, "0 to 600 seconds."),
  equipment: listOf(EQUIPMENT),
  ruledOutBy: listOf(LIMITATIONS),
  order: z.enum(["any", "last"]),
  stretch: z.enum(["active", "passive", "against-antagonist"]).nullable(),
  easier: otherId,
  harder: otherId,
  /** Empty ones are left out. */
  cues: z
    .array(z.string().trim().max(CUE_LENGTH, `At most ${CUE_LENGTH} characters.`))
    .max(MOST_CUES, `At most ${MOST_CUES} cues.`),
});

/** Everything a team can say about an exercise; its id is made from the name and stays. */
export type ExerciseForm = z.infer<typeof fields>;

const given = (cues: readonly string[]): string[] => cues.filter((cue) => cue !== "");

function checkWhole(form: ExerciseForm, ctx: z.core.$RefinementCtx): void {
  const wrong = (path: keyof ExerciseForm, message: string): void =>
    ctx.addIssue({ code: "custom", path: [path], message, input: form[path] });
  if (AIMS.every((aim) => form.doses[aim] === null)) wrong("doses", "Say what it is for: one at least.");
  if (form.main && form.doses.heavy === null)
    wrong("main", "A main lift is done heavy: give its heavy sets.");
  if (given(form.cues).length < FEWEST_CUES) wrong("cues", "Two cues at least.");
  if (form.easier !== null && form.easier === form.harder)
    wrong("harder", "One exercise cannot be both the easier and the harder form.");
  if (form.powerZone !== null && form.load !== "best")
    wrong("powerZone", "A power zone needs a load in percent of a best.");
}

export const exerciseFormSchema = fields.superRefine(checkWhole);

const changedAt = z.iso.datetime().nullable();

/** What was edited is named by the time of its last change (null: the library's form): an older one is refused. */
export const exerciseEditSchema = fields.extend({ changedAt }).superRefine(checkWhole);
export type ExerciseEdit = z.infer<typeof exerciseEditSchema>;

export const exerciseShelveSchema = z.object({ shelved: z.boolean(), changedAt });
export type ExerciseShelve = z.infer<typeof exerciseShelveSchema>;

export const exerciseRestoreSchema = z.object({ changedAt });
export type ExerciseRestore = z.infer<typeof exerciseRestoreSchema>;

export function formOfExercise(exercise: Exercise): ExerciseForm {
  const { id: _id, bestOf = null, powerZone = null, stretch = null, doses, ...rest } = exercise;
  return {
    ...rest,
    ...{ bestOf, powerZone, stretch },
    qualities: [...rest.qualities],
    equipment: [...rest.equipment],
    ruledOutBy: [...rest.ruledOutBy],
    cues: [...rest.cues],
    doses: {
      heavy: doses.heavy ?? null,
      volume: doses.volume ?? null,
      fast: doses.fast ?? null,
      hold: doses.hold ?? null,
    },
  };
}

/** What a form says, without what its other answers make meaningless. */
export function exerciseOfForm(id: string, form: ExerciseForm): Exercise {
  const { bestOf, powerZone, stretch, qualities, doses, cues, ...rest } = form;
  const [first, ...others] = qualities;
  if (first === undefined) throw new RangeError("An exercise without a quality.");
  const used = AIMS.flatMap((aim): [Aim, AimDose][] => {
    const of = doses[aim];
    return of ? [[aim, of]] : [];
  });
  const best = rest.load === "best";
  const { name, main, load, sides, intent, rest: pause, equipment, ruledOutBy, order, easier, harder } = rest;
  return {
    ...{ id, name, qualities: [first, ...others], main, load },
    ...(best && bestOf !== null && bestOf !== id && { bestOf }),
    ...(best && powerZone !== null && { powerZone }),
    ...{ sides, intent, doses: Object.fromEntries(used), rest: pause, equipment, ruledOutBy, order },
    ...(stretch !== null && qualities.includes("mobility") && { stretch }),
    ...{ easier, harder, cues: given(cues) },
  };
}

/** `changed`: of the library, in a form of the team's own. */
export type ExerciseOrigin = "library" | "team" | "changed";

export interface ExerciseSummary {
  readonly exercise: Exercise;
  readonly origin: ExerciseOrigin;
  readonly shelved: boolean;
  /** ISO instant; null where the team has no row of its own. */
  readonly changedAt: string | null;
  /** Current camps in which it was chosen or logged, and sets logged in the last 8 weeks. */
  readonly use: { readonly camps: number; readonly sets: number };
}

interface ExerciseState {
  readonly exercise: Exercise;
  readonly shelved: boolean;
}

/** One edit: null before where it was new, null after where the team went back to the library's form. */
export interface ExerciseHistoryEntry {
  readonly id: string;
  readonly at: string;
  readonly by: string | null;
  readonly before: ExerciseState | null;
  readonly after: ExerciseState | null;
}

export interface ExerciseView extends ExerciseSummary {
  /** Newest first. */
  readonly history: readonly ExerciseHistoryEntry[];
}
