/**
 * Exponentially weighted averages, seeded with the first value: E1 = L1, Et = Lt x lambda + (1 - lambda) x E(t-1), with
 * lambda = 2 / (span + 1). Williams et al. 2017, Br J Sports Med 51(3):209-210; the seed is common practice.
 */
export function ewma(values: readonly number[], span: number): readonly number[] {
  const lambda = 2 / (span + 1);
  const averages: number[] = [];
  for (const value of values) {
    const previous = averages.at(-1);
    averages.push(previous === undefined ? value : value * lambda + (1 - lambda) * previous);
  }
  return averages;
}
