import fc from "fast-check";
import { EXERCISES } from "@/db/seed/exercises";
import {
  EQUIPMENT,
  LIMITATIONS,
  plan,
  prescribe,
  REP_MAX_FORMULAS,
  STRIKING_BASES,
  type BaseMix,
  type Best,
  type Exercise,
  type Kg,
  type Lift,
  type Line,
  type PlanInput,
  type PrescriptionInput,
  type StrikingBase,
} from "@/lib/engine";
import { arbPlanInput, day, planInput } from "./plan-input";

/** A mix of one base. */
export const only = (base: StrikingBase): BaseMix => [{ base, share: 1 }];

export const exerciseOf = (id: string, exercises: readonly Exercise[] = EXERCISES): Exercise => {
  const found = exercises.find((exercise) => exercise.id === id);
  if (!found) throw new Error(`No exercise ${id}`);
  return found;
};

/** A best of an invented athlete, known long before the camp. */
export const best = (exercise: string, kg: number, over: Partial<Best> = {}): Best => ({
  exercise,
  day: day("2026-01-01"),
  kg: kg as Kg,
  from: "measured",
  ...over,
});

/** A well-equipped whipping kicker without limitations, on the lifts of a camp of 8 weeks with four lifts a week. */
export const prescriptionInput = (
  over: Partial<PrescriptionInput> = {},
  camp: Partial<PlanInput> = {},
): PrescriptionInput => {
  const made = planInput(camp);
  return {
    lifts: over.lifts ?? plan({ ...made, athlete: { ...made.athlete, liftsPerWeek: 4 } }).lifts,
    exercises: EXERCISES,
    mix: only("whipping-round-kicks"),
    equipment: EQUIPMENT,
    limitations: [],
    bests: [],
    plates: { unit: "kg", step: 2.5 },
    swaps: [],
    edits: {},
    ...over,
  };
};

/** Every line of a plan with its lift. */
export const linesOf = (
  input: PrescriptionInput,
): readonly { readonly lift: Lift; readonly line: Line; readonly exercise: Exercise }[] => {
  const sessions = prescribe(input);
  return input.lifts.flatMap((lift, index) =>
    (sessions[index]?.lines ?? []).map((line) => ({
      lift,
      line,
      exercise: exerciseOf(line.exercise, input.exercises),
    })),
  );
};

const arbMix: fc.Arbitrary<BaseMix> = fc.oneof(
  fc.constantFrom(...STRIKING_BASES).map(only),
  fc
    .tuple(
      fc.shuffledSubarray([...STRIKING_BASES], { minLength: 2, maxLength: 2 }),
      fc.integer({ min: 1, max: 9 }),
    )
    .map(([bases, tenths]) =>
      bases.map((base, index) => ({ base, share: (index === 0 ? tenths : 10 - tenths) / 10 })),
    ),
);

const LOADED = EXERCISES.filter(({ load }) => load === "best").map(({ id, bestOf }) => bestOf ?? id);

const arbBest: fc.Arbitrary<Best> = fc.record({
  exercise: fc.constantFrom(...LOADED),
  // Most are known before any camp of the generator, some fall into one.
  day: fc
    .oneof(
      { weight: 3, arbitrary: fc.integer({ min: day("2025-01-01"), max: day("2025-06-30") }) },
      { weight: 1, arbitrary: fc.integer({ min: day("2025-07-01"), max: day("2031-12-31") }) },
    )
    .map((value) => value as Best["day"]),
  kg: fc.integer({ min: 30, max: 600 }).map((half) => (half / 2) as Kg),
  from: fc.constantFrom("measured" as const, ...REP_MAX_FORMULAS),
});

/** Athletes of every kind on real plans: equipment, limitations, mixes, bests and plates, without swaps and edits. */
export const arbAthlete: fc.Arbitrary<PrescriptionInput> = fc
  .record({
    camp: arbPlanInput({ maxWeeks: 12 }),
    mix: arbMix,
    equipment: fc.oneof(
      { weight: 2, arbitrary: fc.constant([...EQUIPMENT]) },
      { weight: 3, arbitrary: fc.subarray([...EQUIPMENT]) },
      { weight: 1, arbitrary: fc.constant([]) },
    ),
    limitations: fc.oneof(fc.constant([]), fc.subarray([...LIMITATIONS], { maxLength: 4 })),
    bests: fc.array(arbBest, { maxLength: 20 }),
    plates: fc.oneof(
      fc.constantFrom(0.5, 1, 1.25, 2.5, 5, 10).map((step) => ({ unit: "kg" as const, step })),
      fc.constantFrom(1, 2.5, 5, 10).map((step) => ({ unit: "lb" as const, step })),
    ),
  })
  .map(({ camp, ...athlete }) => ({
    ...athlete,
    lifts: plan(camp).lifts,
    exercises: EXERCISES,
    swaps: [],
    edits: {},
  }));
