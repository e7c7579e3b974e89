import type { Intensity } from "../types";
import type { Aim, Exercise, Range } from "./exercise";
import { liftCountAt, MOST_RESERVE, percentAtReps, repsAtPercent, type LiftCount } from "./loading-tables";
import { loadOnPlates } from "./plates";
import type { Best, LineLoad, Plates } from "./types";

/** Reserve of volume work where the session's intensity says none: common practice, no published source. */
const VOLUME_RESERVE: Range = { low: 2, high: 3 };

/** Reserve of fast work whose load no best gives: far from failure, and no more than can be judged. */
const FAST_RESERVE: Range = { low: MOST_RESERVE, high: MOST_RESERVE };

/** Heavy sets stop this many short of failure: common practice, no published source. */
const HEAVY_LEAVES = 1;

/** Fast repetitions of one exercise before a bout, at most: common practice; the effect in Harrison et al. 2019. */
const PRIMER_REPS = 12;

/** A ballistic exercise without a zone of its own: Cormie, McGuigan & Newton 2011, Sports Med 41(2):125-146 (from memory). */
const BALLISTIC_ZONE: Range = { low: 0, high: 50 };

/** Percent of best that heavy work of a session stands for: the middle of the engine's range; null for a reserve. */
export const middleOf = (intensity: Intensity): number | null =>
  intensity.of === "best" ? (intensity.low + intensity.high) / 2 : null;

/** The lift-count row that governs heavy work of a session; null where the table has none. */
export function heavyRow(intensity: Intensity): LiftCount | null {
  const middle = middleOf(intensity);
  return middle === null ? null : liftCountAt(middle);
}

/** Repetitions a set that both the table and the exercise allow; the table alone where they do not meet. */
function repsChoices(row: LiftCount, reps: Range): Range {
  const low = Math.max(row.repsPerSet.low, reps.low);
  const high = Math.min(row.repsPerSet.high, reps.high);
  return low <= high ? { low, high } : row.repsPerSet;
}

/** Fewest and most sets with which heavy work stays inside the lift-count table. */
export const heavySets = ({ total, repsPerSet }: LiftCount): Range => ({
  low: Math.ceil(total.low / repsPerSet.high),
  high: Math.floor(total.high / repsPerSet.low),
});

/**
 * Repetitions a set of heavy work: those that bring the total nearest the table's optimum and inside its range. At most `most`, and
 * within the exercise's own range, where the table can be met that way.
 */
export function heavyReps(row: LiftCount, sets: number, own: Range, most = Infinity): number {
  const inside = (reps: number) => sets * reps >= row.total.low && sets * reps <= row.total.high;
  const nearest = ({ low, high }: Range): number | null => {
    let best: number | null = null;
    for (let reps = low; reps <= high; reps += 1) {
      const better =
        best === null || Math.abs(sets * reps - row.optimal) < Math.abs(sets * best - row.optimal);
      if (inside(reps) && better) best = reps;
    }
    return best;
  };
  const choices = repsChoices(row, own);
  const short = { low: choices.low, high: Math.min(choices.high, most) };
  return nearest(short) ?? nearest(choices) ?? nearest(row.repsPerSet) ?? row.repsPerSet.high;
}

/** Repetitions of a line, or seconds of a hold. */
export function repsOf(
  exercise: Exercise,
  aim: Aim,
  sets: number,
  intensity: Intensity,
  primer: boolean,
): Range {
  const own = exercise.doses[aim]?.reps ?? { low: 1, high: 1 };
  if (primer && aim === "fast") {
    const most = Math.max(1, Math.floor(PRIMER_REPS / Math.max(1, sets)));
    return { low: Math.min(own.low, most), high: Math.min(own.high, most) };
  }
  if (aim !== "heavy") return own;
  const row = heavyRow(intensity);
  if (!row) return own;
  const reps = heavyReps(row, sets, own, repsAtPercent(intensity.high) - HEAVY_LEAVES);
  return { low: reps, high: reps };
}

const capped = (reserve: number): number => Math.min(MOST_RESERVE, Math.max(0, reserve));

/** Reserve that a percent range leaves for so many repetitions, by the wall chart: never none, at most what can be judged. */
export function reserveAt(percent: Range, reps: Range): Range {
  const left = (at: number, count: number) => capped(Math.max(HEAVY_LEAVES, repsAtPercent(at) - count));
  return { low: left(percent.high, reps.high), high: left(percent.low, reps.low) };
}

/** Percent at which the repetitions leave the reserve, by the wall chart and under the session's own high end. */
function percentFor(reps: Range, reserve: Range, intensity: Intensity): Range | null {
  const high = percentAtReps(reps.low + reserve.low);
  const low = percentAtReps(reps.high + reserve.high);
  if (low === null || high === null) return null;
  const most = intensity.of === "best" && intensity.high >= 55 ? intensity.high : 100;
  // Rounded down: never heavier than the chart.
  const half = (value: number) => Math.floor(Math.min(value, most) * 2) / 2;
  return { low: half(low), high: half(high) };
}

export interface LoadParts {
  readonly exercise: Exercise;
  readonly aim: Aim;
  readonly reps: Range;
  readonly intensity: Intensity;
  /** Newest best of the exercise, where one is known. */
  readonly best: Best | null;
  readonly plates: Plates;
}

const withoutBest = (reserve: Range): LineLoad => ({ of: "reserve", reserve, kg: null });

function ofBest(percent: Range, { exercise, best, plates }: LoadParts): LineLoad | null {
  const bar = exercise.equipment.some((thing) => thing === "barbell" || thing === "trap-bar");
  const kg = best && loadOnPlates(best.kg, percent, plates, { bar });
  return best && kg !== null ? { of: "best", percent, kg, best } : null;
}

/** Reserve of the aim, and the percent it stands for; percent null where the chart ends. */
function aimed(parts: LoadParts): { readonly percent: Range | null; readonly reserve: Range } {
  const { aim, reps, intensity } = parts;
  if (aim === "heavy" && intensity.of === "best" && intensity.low >= 55) {
    const percent = { low: intensity.low, high: intensity.high };
    return { percent, reserve: reserveAt(percent, reps) };
  }
  const reserve =
    aim === "fast"
      ? FAST_RESERVE
      : intensity.of === "reserve"
        ? { low: capped(intensity.low), high: capped(intensity.high) }
        : VOLUME_RESERVE;
  return { percent: aim === "fast" || aim === "hold" ? null : percentFor(reps, reserve, intensity), reserve };
}

/**
 * The load of a line. Heavy work takes the engine's percent; volume the percent at which its repetitions leave their reserve; ballistic
 * work the zone of most power (Soriano et al. 2015, Sports Med 45(8):1191-1205), with body mass alone where that zone begins at
 * nothing and no best is known. Kilograms only with a best, on the athlete's plates, never above the percent's high end.
 */
export function loadOf(parts: LoadParts): LineLoad {
  const { exercise, aim } = parts;
  switch (exercise.load) {
    case "body":
    case "throw":
    case "none":
      return { of: exercise.load, kg: null };
    case "reserve":
      return withoutBest(aimed(parts).reserve);
    case "best": {
      if (aim === "fast") {
        const zone = exercise.powerZone ?? BALLISTIC_ZONE;
        return ofBest(zone, parts) ?? (zone.low === 0 ? { of: "body", kg: null } : withoutBest(FAST_RESERVE));
      }
      const { percent, reserve } = aimed(parts);
      return (percent && ofBest(percent, parts)) ?? withoutBest(reserve);
    }
  }
}

/** The newest best of a lift on or before a day; on one day a measured one, then the higher. Null where none is known. */
export function bestOn(bests: readonly Best[], exercise: Exercise, day: number): Best | null {
  if (exercise.load !== "best") return null;
  const lift = exercise.bestOf ?? exercise.id;
  let newest: Best | null = null;
  for (const best of bests) {
    if (best.exercise !== lift || best.day > day) continue;
    const measured = (one: Best) => (one.from === "measured" ? 1 : 0);
    const ahead = newest
      ? best.day - newest.day || measured(best) - measured(newest) || best.kg - newest.kg
      : 1;
    if (ahead > 0) newest = best;
  }
  return newest;
}
