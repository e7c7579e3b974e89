import { performance } from "node:perf_hooks";

export interface Figures {
  readonly median: number;
  readonly p95: number;
  readonly runs: number;
}

/** Quantile by the nearest-rank method, `q` in 0 to 1. */
export function quantile(values: readonly number[], q: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.max(0, Math.ceil(q * sorted.length) - 1))] ?? Number.NaN;
}

export const figures = (times: readonly number[]): Figures => ({
  median: quantile(times, 0.5),
  p95: quantile(times, 0.95),
  runs: times.length,
});

/** Milliseconds of each of `runs` calls after `warmUp` calls that do not count. */
export function timed(runs: number, warmUp: number, work: (run: number) => void): number[] {
  for (let run = 0; run < warmUp; run++) work(run);
  return Array.from({ length: runs }, (_, run) => {
    const start = performance.now();
    work(run);
    return performance.now() - start;
  });
}

/** The same for work that waits. */
export async function timedAsync(
  runs: number,
  warmUp: number,
  work: (run: number) => Promise<void>,
): Promise<number[]> {
  for (let run = 0; run < warmUp; run++) await work(run);
  const times: number[] = [];
  for (let run = 0; run < runs; run++) {
    const start = performance.now();
    await work(run);
    times.push(performance.now() - start);
  }
  return times;
}

/** Two decimals, for reading. */
export const round = (value: number): number => Math.round(value * 100) / 100;
