/** The tests that the product records: a closed list. */
export const TEST_KINDS = [
  "jump-height",
  "flight-time",
  "reactive-jump",
  "loaded-jump",
  "medicine-ball-throw",
  "rep-record",
] as const;
export type TestKind = (typeof TEST_KINDS)[number];

export const TEST_SIDES = ["both", "left", "right"] as const;
export type TestSide = (typeof TEST_SIDES)[number];

/** One number of a test. Both ends of the range belong to it. */
export interface TestField {
  readonly title: string;
  readonly unit: "cm" | "ms" | "m" | "kg" | "reps";
  readonly min: number;
  readonly max: number;
  /** Only whole numbers. */
  readonly whole: boolean;
}

export interface TestSpec {
  readonly title: string;
  /** The number that is compared from test to test. */
  readonly value: TestField;
  /** A second reading that belongs to the result: contact time, load, ball, repetitions. */
  readonly second: TestField | null;
  /** True where results compare only at the same second reading: the same load, the same ball. */
  readonly comparesAtSame: boolean;
  /** True where the result belongs to an exercise of the library. */
  readonly ofExercise: boolean;
  readonly higherIsBetter: boolean;
  readonly sides: readonly TestSide[];
  /** Published typical error in the value's unit; null where none was read. */
  readonly typicalError: { readonly value: number; readonly source: string } | null;
}

/** Shown where a test has no published typical error. */
export const NO_PUBLISHED_ERROR = "No published error read; the athlete's own repeated trials give it.";

const field = (
  title: string,
  unit: TestField["unit"],
  min: number,
  max: number,
  whole = false,
): TestField => ({ title, unit, min, max, whole });

const spec = (title: string, value: TestField, over: Partial<TestSpec> = {}): TestSpec => ({
  title,
  value,
  second: null,
  comparesAtSame: false,
  ofExercise: false,
  higherIsBetter: true,
  sides: TEST_SIDES,
  typicalError: null,
  ...over,
});

/** The ranges catch slips of the hand (metres for centimetres, seconds for milliseconds): common practice, no published source. */
export const TEST_SPECS: Readonly<Record<TestKind, TestSpec>> = {
  "jump-height": spec("Jump height", field("Height", "cm", 3, 120)),
  "flight-time": spec("Jump, flight time", field("Flight time", "ms", 150, 1000)),
  "reactive-jump": spec("Reactive jump", field("Flight time", "ms", 150, 1000), {
    second: field("Contact time", "ms", 80, 800),
  }),
  "loaded-jump": spec("Loaded jump", field("Height", "cm", 1, 100), {
    second: field("Load", "kg", 0.5, 250),
    comparesAtSame: true,
  }),
  "medicine-ball-throw": spec("Medicine-ball throw", field("Distance", "m", 0.5, 30), {
    second: field("Ball", "kg", 0.5, 15),
    comparesAtSame: true,
  }),
  "rep-record": spec("Rep record", field("Load", "kg", 0.5, 500), {
    second: field("Repetitions", "reps", 1, 50, true),
    comparesAtSame: true,
    ofExercise: true,
  }),
};

/** The numbers of one result as given, not yet checked. */
export interface TestNumbers {
  readonly value: number;
  readonly second: number | null;
}

export interface TestProblem {
  readonly field: "value" | "second";
  readonly message: string;
}

const rangeText = ({ title, unit, min, max, whole }: TestField): string =>
  `${title}: ${whole ? "a whole number from " : ""}${min} to ${max} ${unit}.`;

const fits = ({ min, max, whole }: TestField, value: number): boolean =>
  Number.isFinite(value) && value >= min && value <= max && (!whole || Number.isInteger(value));

/** What keeps a result from being kept, field by field; empty where it fits. */
export function testProblems(kind: TestKind, numbers: TestNumbers): readonly TestProblem[] {
  const { value, second } = TEST_SPECS[kind];
  const problems: TestProblem[] = [];
  if (!fits(value, numbers.value)) problems.push({ field: "value", message: rangeText(value) });
  if (second === null && numbers.second !== null) {
    problems.push({ field: "second", message: "This test has one number only." });
  }
  if (second !== null && (numbers.second === null || !fits(second, numbers.second))) {
    problems.push({ field: "second", message: rangeText(second) });
  }
  return problems;
}
