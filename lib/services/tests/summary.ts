import {
  POWER_METHODS,
  REACTIVE_METHODS,
  TEST_KINDS,
  TEST_SIDES,
  asymmetry,
  beyondOwnSpread,
  changeVerdict,
  heightOfFlight,
  reactiveStrength,
  regressionPower,
  verdictSentence,
  type TestKind,
  type TestSide,
} from "@/lib/engine/measures";
import { measureText } from "@/lib/format/measure";
import type {
  SideDifference,
  TestDay,
  TestSeries,
  TestVerdict,
  TestsView,
  TrialView,
} from "@/lib/schemas/test-trial";
import { errorOf, worthwhileOf } from "./error";
import { keyText, measureOf, measuredOf, seriesKeyOf, type SeriesKey } from "./measure";

/** A trial as the summary needs it. `kind` is checked against the engine's list: what it does not know is left out. */
export interface SummaryTrial {
  readonly id: string;
  readonly kind: string;
  readonly side: TestSide;
  readonly day: string;
  readonly value: number;
  readonly second: number | null;
  readonly massKg: number | null;
  readonly note: string;
}

/** A result of someone in the team, of their newest day. */
export type PeopleTrial = Pick<SummaryTrial, "kind" | "side" | "value" | "second"> & {
  readonly athleteId: string;
};

const isKind = (kind: string): kind is TestKind => (TEST_KINDS as readonly string[]).includes(kind);

const mean = (values: readonly number[]): number =>
  values.reduce((sum, value) => sum + value, 0) / values.length;

function grouped<T, K>(all: readonly T[], keyOf: (one: T) => string, made: (one: T) => K) {
  const groups = new Map<string, { readonly key: K; readonly members: T[] }>();
  for (const one of all) {
    const text = keyOf(one);
    const group = groups.get(text) ?? { key: made(one), members: [] };
    group.members.push(one);
    groups.set(text, group);
  }
  return [...groups.values()];
}

/** Jump height, cm, where the trial is a jump with body mass alone. */
function heightCmOf(kind: TestKind, value: number): number | null {
  if (kind === "jump-height") return value;
  return kind === "flight-time" || kind === "reactive-jump" ? heightOfFlight(value / 1000) * 100 : null;
}

const viewOf = (kind: TestKind, { id, value, second, massKg, note }: SummaryTrial): TrialView => ({
  id,
  value,
  second,
  massKg,
  note,
  measure: measureOf(kind, value, second),
});

function dayOf(key: SeriesKey, day: string, rows: readonly SummaryTrial[], weight: number | null): TestDay {
  const trials = rows.map((row) => viewOf(key.kind, row));
  const top = trials.reduce((best, one) => (one.measure > best.measure ? one : best));
  const heightCm = heightCmOf(key.kind, top.value);
  const massKg = top.massKg ?? trials.find((one) => one.massKg !== null)?.massKg ?? weight;
  // The regressions are of jumps off both legs, without a drop before them.
  const regresses =
    key.side === "both" && key.kind !== "reactive-jump" && heightCm !== null && massKg !== null;
  return {
    day,
    trials,
    best: top.measure,
    mean: mean(trials.map((one) => one.measure)),
    heightCm,
    massKg,
    powers: regresses
      ? POWER_METHODS.flatMap((method) => {
          const watts = regressionPower(method, heightCm, massKg);
          return watts === null ? [] : [{ method, watts }];
        })
      : [],
    reactive:
      key.kind === "reactive-jump"
        ? REACTIVE_METHODS.flatMap(
            (method) => reactiveStrength(method, top.value / 1000, (top.second ?? 0) / 1000) ?? [],
          )
        : [],
  };
}

/**
 * First day to last, by the means of the days: a best of several rises with the number of trials. Held against the error of one
 * trial, which is the strict way: a mean of several is off by less.
 */
function verdictOf(
  days: readonly TestDay[],
  unit: string,
  typicalError: number | null,
  worthwhile: number | null,
): TestVerdict | null {
  const [first, last] = [days[0], days.at(-1)];
  if (!first || !last || first === last) return null;
  const verdict = changeVerdict(first.mean, last.mean, typicalError, worthwhile);
  const sign = verdict.change > 0 ? "+" : "";
  const noise = verdict.leastReal === null ? "" : `; noise up to ${measureText(verdict.leastReal, unit)}`;
  return {
    first: first.day,
    last: last.day,
    change: verdict.change,
    leastReal: verdict.leastReal,
    beyondNoise: verdict.beyondNoise,
    sentence: `${measureText(first.mean, unit)} to ${measureText(last.mean, unit)} (${sign}${measureText(verdict.change, unit)}${noise}). ${verdictSentence(verdict)}`,
  };
}

function seriesOf(
  key: SeriesKey,
  rows: readonly SummaryTrial[],
  people: readonly PeopleTrial[],
  weights: ReadonlyMap<string, number>,
): TestSeries {
  const { title, unit } = measuredOf(key.kind);
  const days = grouped(
    rows,
    (row) => row.day,
    (row) => row.day,
  ).map(({ key: day, members }) => dayOf(key, day, members, weights.get(day) ?? null));
  const error = errorOf(
    key.kind,
    days.map((day) => day.trials.map((trial) => trial.measure)),
  );
  const comparable = people.filter(
    (one) =>
      one.kind === key.kind &&
      one.side === key.side &&
      seriesKeyOf(key.kind, one.side, one.second).at === key.at,
  );
  const spread = grouped(
    comparable,
    (one) => one.athleteId,
    () => null,
  ).map(({ members }) => mean(members.map((one) => measureOf(key.kind, one.value, one.second))));
  const worthwhile = worthwhileOf(key.kind, spread, error.typicalError);
  return {
    key: keyText(key),
    ...key,
    measure: title,
    unit,
    days,
    error,
    worthwhile: worthwhile.value,
    worthwhileText: worthwhile.text,
    verdict: verdictOf(days, unit, error.typicalError, worthwhile.value),
  };
}

/** Spread of one side's own trials, percent; null where its error is not known. */
const ownCv = ({ error, days }: TestSeries): number | null =>
  error.from === "own" && error.typicalError !== null
    ? (error.typicalError / mean(days.map((day) => day.mean))) * 100
    : null;

/** Days on which both sides were tested, by the formula for one side at a time. */
function differencesOf(left: TestSeries, right: TestSeries): SideDifference[] {
  const [cvLeft, cvRight] = [ownCv(left), ownCv(right)];
  const cv = cvLeft === null || cvRight === null ? null : Math.max(cvLeft, cvRight);
  return left.days.flatMap((day) => {
    const other = right.days.find((one) => one.day === day.day);
    const difference = other ? asymmetry("unilateral", day.mean, other.mean) : null;
    if (!other || !difference) return [];
    return {
      key: `${left.key} ${day.day}`,
      kind: left.kind,
      at: left.at,
      day: day.day,
      left: day.mean,
      right: other.mean,
      unit: left.unit,
      difference,
      beyondOwnSpread: cv === null ? null : beyondOwnSpread(difference, cv),
    };
  });
}

/**
 * Everything that can be said of an athlete's trials (oldest first). `people` are newest results of the team, for the smallest
 * worthwhile change; `weights` are body masses, kg, by day, for trials without one.
 */
export function summarise(
  trials: readonly SummaryTrial[],
  people: readonly PeopleTrial[],
  weights: ReadonlyMap<string, number>,
): TestsView {
  const known = trials.flatMap((row) =>
    isKind(row.kind) ? [{ row, key: seriesKeyOf(row.kind, row.side, row.second) }] : [],
  );
  const series = grouped(
    known,
    ({ key }) => keyText(key),
    ({ key }) => key,
  )
    .map(({ key, members }) =>
      seriesOf(
        key,
        members.map(({ row }) => row),
        people,
        weights,
      ),
    )
    .sort(
      (a, b) =>
        TEST_KINDS.indexOf(a.kind) - TEST_KINDS.indexOf(b.kind) ||
        (a.at ?? 0) - (b.at ?? 0) ||
        TEST_SIDES.indexOf(a.side) - TEST_SIDES.indexOf(b.side),
    );
  const differences = series.flatMap((left) => {
    if (left.side !== "left") return [];
    const right = series.find((one) => one.side === "right" && one.kind === left.kind && one.at === left.at);
    return right ? differencesOf(left, right) : [];
  });
  return { series, differences };
}
