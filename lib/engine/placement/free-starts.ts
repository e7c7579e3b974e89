import type { FreeHours, PlanInput, Weekday } from "../types";

export interface StartRange {
  readonly from: number;
  /** Inclusive. */
  readonly to: number;
}

/** Starts, minutes since midnight, from which a session of `minutes` stays inside one window of free hours; merged, by time. */
export function fittingStarts(
  freeHours: readonly FreeHours[],
  weekday: Weekday,
  minutes: number,
): readonly StartRange[] {
  const ranges: StartRange[] = freeHours
    .filter((free) => free.weekday === weekday && free.to - free.from >= minutes)
    .map(({ from, to }) => ({ from, to: to - minutes }))
    .sort((a, b) => a.from - b.from);
  const merged: StartRange[] = [];
  for (const range of ranges) {
    const last = merged.at(-1);
    if (!last || range.from > last.to + 1) merged.push(range);
    else merged[merged.length - 1] = { from: last.from, to: Math.max(last.to, range.to) };
  }
  return merged;
}

export type StartsByWeekday = ReadonlyMap<Weekday, readonly number[]>;

/** Starts to try, minutes since midnight: every step from the beginning of each window of free hours, by time. */
export function startsByWeekday({ athlete, rules }: Pick<PlanInput, "athlete" | "rules">): StartsByWeekday {
  const starts = new Map<Weekday, Set<number>>();
  for (const { weekday, from, to } of athlete.freeHours) {
    const known = starts.get(weekday) ?? new Set<number>();
    starts.set(weekday, known);
    for (let start: number = from; start < to; start += rules["start-step.minutes"]) known.add(start);
  }
  return new Map([...starts].map(([weekday, times]) => [weekday, [...times].sort((a, b) => a - b)]));
}
