/** First and second trial of one person. */
export type TrialPair = readonly [number, number];

/** How well a test repeats. Hopkins 2000, Sports Med 30:1-15. */
export interface Reliability {
  readonly pairs: number;
  /** Second minus first, in order. */
  readonly differences: readonly number[];
  readonly meanDifference: number;
  /** Sample SD (n - 1) of the differences. */
  readonly sdDifference: number;
  /** sdDifference / sqrt(2), in the test's own unit. */
  readonly typicalError: number;
  /** Typical error in percent of the mean of all trials; null where that mean is not above 0. */
  readonly cvPercent: number | null;
  /** Least change that is beyond noise at 95 %: 1.96 x sqrt(2) x typical error. */
  readonly mdc95: number;
}

const mean = (values: readonly number[]): number =>
  values.reduce((sum, value) => sum + value, 0) / values.length;

/** Sample SD (n - 1); null for fewer than two values. */
export function sampleSd(values: readonly number[]): number | null {
  if (values.length < 2) return null;
  const middle = mean(values);
  const squares = values.reduce((sum, value) => sum + (value - middle) ** 2, 0);
  return Math.sqrt(squares / (values.length - 1));
}

/** Least change beyond noise at 95 %, two measurements each with the typical error. Hopkins 2000, Sports Med 30:1-15. */
export const leastRealChange = (typicalError: number): number => 1.96 * Math.SQRT2 * typicalError;

/**
 * Typical error and what follows from it, of two trials by several people. Null for fewer than two pairs.
 * Hopkins 2000, Sports Med 30:1-15; around 50 people and 3 trials make it precise.
 */
export function reliability(pairs: readonly TrialPair[]): Reliability | null {
  const differences = pairs.map(([first, second]) => second - first);
  const sdDifference = sampleSd(differences);
  if (sdDifference === null) return null;
  const typicalError = sdDifference / Math.SQRT2;
  const level = mean(pairs.flat());
  return {
    pairs: pairs.length,
    differences,
    meanDifference: mean(differences),
    sdDifference,
    typicalError,
    cvPercent: level > 0 ? (typicalError / level) * 100 : null,
    mdc95: leastRealChange(typicalError),
  };
}

/** Fewest degrees of freedom for an error of one's own: common practice, no published source. */
export const OWN_ERROR_LEAST = 5;

/**
 * An athlete's own typical error from repeated trials, one list a test day: the SD within days, pooled over them. Null
 * below `OWN_ERROR_LEAST` degrees of freedom (trials less one, summed over the days). It holds what differs within a day;
 * from day to day the noise is larger, so this is the least it can be.
 */
export function ownTypicalError(
  days: readonly (readonly number[])[],
): { readonly typicalError: number; readonly degrees: number } | null {
  let [squares, degrees] = [0, 0];
  for (const trials of days) {
    const sd = sampleSd(trials);
    if (sd === null) continue;
    squares += sd ** 2 * (trials.length - 1);
    degrees += trials.length - 1;
  }
  return degrees < OWN_ERROR_LEAST ? null : { typicalError: Math.sqrt(squares / degrees), degrees };
}

/**
 * Smallest worthwhile change: 0.2 x the SD between people with the noise of the test taken out first,
 * SD^2 = observed SD^2 - typical error^2. Null for fewer than two people, or where noise is all there is.
 * Hopkins 2000, Sports Med 30:1-15.
 */
export function smallestWorthwhile(people: readonly number[], typicalError: number): number | null {
  const observed = sampleSd(people);
  if (observed === null) return null;
  const real = observed ** 2 - typicalError ** 2;
  return real > 0 ? 0.2 * Math.sqrt(real) : null;
}
