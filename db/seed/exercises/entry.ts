import type { AimDose, Exercise } from "@/lib/engine/prescription/exercise";

type Needed = "id" | "name" | "qualities" | "doses" | "cues";
type Entry = Pick<Exercise, Needed> & Partial<Omit<Exercise, Needed | "easier" | "harder">>;

/** An exercise of the library; what is left out is the common case. */
export const entry = (fields: Entry): Exercise => ({
  main: false,
  load: "body",
  sides: "both",
  intent: "controlled",
  rest: 90,
  equipment: [],
  ruledOutBy: [],
  order: "any",
  easier: null,
  harder: null,
  ...fields,
});

/** Forms of one exercise from easy to hard: each names its neighbours, so the two never contradict each other. */
export const ladder = (...steps: readonly Exercise[]): readonly Exercise[] =>
  steps.map((step, index) => ({
    ...step,
    easier: steps[index - 1]?.id ?? null,
    harder: steps[index + 1]?.id ?? null,
  }));

/** Sets from and to, of repetitions (or seconds) from and to. */
export const of = (
  [setsLow, setsHigh]: readonly [number, number],
  [repsLow, repsHigh]: readonly [number, number],
): AimDose => ({ sets: { low: setsLow, high: setsHigh }, reps: { low: repsLow, high: repsHigh } });
