import type { Range } from "./exercise";

/**
 * Percent of best at which a number of repetitions is the most that goes: NSCA wall chart. 15 repetitions at 65 % from
 * memory. (The textbook's own table gives 67 % at 12 repetitions.) Individuals differ widely: 6 to 26 repetitions at 70 %
 * of the squat (cited in Zourdos 2021, J Strength Cond Res 35:S158).
 */
export const REPS_AT_PERCENT: readonly (readonly [reps: number, percent: number])[] = [
  [1, 100],
  [2, 95],
  [3, 93],
  [4, 90],
  [5, 87],
  [6, 85],
  [7, 83],
  [8, 80],
  [9, 77],
  [10, 75],
  [12, 70],
  [15, 65],
];

/** Percent of best for so many repetitions at most, 1 to 15; between rows of the chart a straight line. Null outside. */
export function percentAtReps(reps: number): number | null {
  let before: readonly [number, number] | null = null;
  for (const row of REPS_AT_PERCENT) {
    const [at, percent] = row;
    if (at === reps) return percent;
    if (at > reps) {
      if (!before) return null;
      const [low, high] = before;
      return high + ((percent - high) * (reps - low)) / (at - low);
    }
    before = row;
  }
  return null;
}

/** Most repetitions of the chart that go at a percent of best: the cautious reading between two rows. 1 to 15. */
export function repsAtPercent(percent: number): number {
  let most = 1;
  for (const [reps, at] of REPS_AT_PERCENT) if (at >= percent) most = reps;
  return most;
}

/**
 * Repetitions in reserve by effort of a set, 0 to 10. Zourdos 2016, J Strength Cond Res 30:267-275; Helms 2016, Strength Cond J
 * 38(4):42-49 (table from memory). Null under 5: too light to tell repetitions.
 */
export function reserveOfEffort(effort: number): Range | null {
  if (effort > 10 || effort < 5) return null;
  if (effort < 7) return { low: 4, high: 6 };
  return { low: Math.floor(10 - effort), high: effort > 9 ? 0 : Math.ceil(10 - effort) };
}

/** Beyond this many the guess is off by more than two: Hackett et al. 2017, J Strength Cond Res 31(8):2162-2168. */
export const MOST_RESERVE = 4;

/** One row of the lift-count table. */
export interface LiftCount {
  /** Percent of best from which the row holds, and below which it ends. */
  readonly from: number;
  readonly below: number;
  readonly repsPerSet: Range;
  readonly optimal: number;
  readonly total: Range;
}

/**
 * Repetitions a set and in all, by percent of best: Prilepin's table, from weightlifting logs, as most copies print it. Copies
 * differ at the edges; 70 to 79 and 80 to 89 are the wide readings.
 */
export const LIFT_COUNTS: readonly LiftCount[] = [
  { from: 55, below: 70, repsPerSet: { low: 3, high: 6 }, optimal: 24, total: { low: 18, high: 30 } },
  { from: 70, below: 80, repsPerSet: { low: 3, high: 6 }, optimal: 18, total: { low: 12, high: 24 } },
  { from: 80, below: 90, repsPerSet: { low: 2, high: 4 }, optimal: 15, total: { low: 10, high: 20 } },
  { from: 90, below: Infinity, repsPerSet: { low: 1, high: 2 }, optimal: 7, total: { low: 4, high: 10 } },
];

/** The row for a percent of best; null under 55 %. */
export const liftCountAt = (percent: number): LiftCount | null =>
  LIFT_COUNTS.find((row) => percent >= row.from && percent < row.below) ?? null;

/** True where so many sets of so many repetitions at this percent of best stay inside the table. */
export function insideLiftCount(percent: number, sets: number, reps: number): boolean {
  const row = liftCountAt(percent);
  if (!row) return false;
  const total = sets * reps;
  return (
    reps >= row.repsPerSet.low &&
    reps <= row.repsPerSet.high &&
    total >= row.total.low &&
    total <= row.total.high
  );
}

/**
 * Percent of best that gives most power. Soriano et al. 2015, Sports Med 45(8):1191-1205: squat above 30 and below 70, jump
 * squat at most 30, power clean and hang power clean 70 or more. The upper end of the cleans, 90, from Cormie, McGuigan &
 * Newton 2011, Sports Med 41(2):125-146 (from memory).
 */
export const POWER_ZONES = {
  squat: { low: 30, high: 70 },
  "jump-squat": { low: 0, high: 30 },
  "power-clean": { low: 70, high: 90 },
} as const satisfies Record<string, Range>;

/** One row of the goal table. */
export interface Goal {
  /** Percent of best. */
  readonly percent: Range;
  readonly reps: Range;
  readonly sets: Range;
  /** Seconds. */
  readonly rest: Range;
}

/** Loads, repetitions, sets and rest by goal: NSCA Essentials (from memory). Open ends are closed at 100 % and 20 repetitions. */
export const GOALS = {
  strength: {
    percent: { low: 85, high: 100 },
    reps: { low: 1, high: 6 },
    sets: { low: 2, high: 6 },
    rest: { low: 120, high: 300 },
  },
  "power-single": {
    percent: { low: 80, high: 90 },
    reps: { low: 1, high: 2 },
    sets: { low: 3, high: 5 },
    rest: { low: 120, high: 300 },
  },
  "power-multiple": {
    percent: { low: 75, high: 85 },
    reps: { low: 3, high: 5 },
    sets: { low: 3, high: 5 },
    rest: { low: 120, high: 300 },
  },
  size: {
    percent: { low: 67, high: 85 },
    reps: { low: 6, high: 12 },
    sets: { low: 3, high: 6 },
    rest: { low: 30, high: 90 },
  },
  endurance: {
    percent: { low: 0, high: 67 },
    reps: { low: 12, high: 20 },
    sets: { low: 2, high: 3 },
    rest: { low: 0, high: 30 },
  },
} as const satisfies Record<string, Goal>;
