import type { PlanInput, Weekday } from "../types";

export interface StartRange {
  readonly from: number;
  /** Inclusive. */
  readonly to: number;
}

const NONE: readonly number[] = [];

/** Starts that the free hours allow, minutes since midnight, by weekday. */
export class FreeStarts {
  readonly #grids = new Map<Weekday, readonly number[]>();
  readonly #fitting = new Map<number, readonly StartRange[]>();
  readonly #freeHours: PlanInput["athlete"]["freeHours"];

  constructor({ athlete, rules }: Pick<PlanInput, "athlete" | "rules">) {
    this.#freeHours = athlete.freeHours;
    const starts = new Map<Weekday, Set<number>>();
    for (const { weekday, from, to } of athlete.freeHours) {
      const known = starts.get(weekday) ?? new Set<number>();
      starts.set(weekday, known);
      for (let start: number = from; start < to; start += rules["start-step.minutes"]) known.add(start);
    }
    for (const [weekday, times] of starts)
      this.#grids.set(
        weekday,
        [...times].sort((a, b) => a - b),
      );
  }

  /** Starts to try: every step from the beginning of each window, by time. */
  grid(weekday: Weekday): readonly number[] {
    return this.#grids.get(weekday) ?? NONE;
  }

  /** Starts from which a session of `minutes` stays inside one window; merged, by time. */
  fitting(weekday: Weekday, minutes: number): readonly StartRange[] {
    const key = minutes * 8 + weekday;
    const known = this.#fitting.get(key);
    if (known) return known;
    const ranges: StartRange[] = [];
    const windows = this.#freeHours.filter(
      (free) => free.weekday === weekday && free.to - free.from >= minutes,
    );
    for (const { from, to } of windows.sort((a, b) => a.from - b.from)) {
      const last = ranges.at(-1);
      if (!last || from > last.to + 1) ranges.push({ from, to: to - minutes });
      else ranges[ranges.length - 1] = { from: last.from, to: Math.max(last.to, to - minutes) };
    }
    this.#fitting.set(key, ranges);
    return ranges;
  }
}
