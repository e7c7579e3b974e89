import type { PlacementProblem } from "../../types";
import { isWeaker, NO_BANS, type Ban } from "./bans";
import type { Reach } from "./reach";
import type { Group, Timeline } from "./timeline";

/** A candidate that is worth trying. */
export interface Option {
  readonly index: number;
  readonly item: number;
  readonly heavy: boolean;
  readonly cost: number;
  /** Start in minutes from the first candidate's: the first tie-break is their sum. */
  readonly starts: number;
  readonly startsAt: number;
  readonly endsAt: number;
  /** What it forbids on later days. */
  readonly bans: readonly Ban[];
}

interface Tied extends Option {
  readonly exposure: readonly number[];
}

interface Score {
  readonly cost: number;
  readonly starts: number;
}

const byScore = (a: Score, b: Score): number => a.cost - b.cost || a.starts - b.starts;

/** `other` can stand in for `option` in any choice, and comes before it. */
const isBeaten = (option: Tied, other: Tied): boolean =>
  isWeaker(other.bans, option.bans) &&
  other.exposure.every((until, rule) => until >= (option.exposure[rule] ?? Number.NaN));

/**
 * Per day, the candidates worth trying. Of an item's candidates on a day only one can be chosen, and the spread and the free
 * days do not ask at what hour: so one is left out where another costs no more, comes first, forbids no more and is
 * forbidden by no more. Mostly one of an item and day is left.
 */
export function optionsByDay(
  problem: PlacementProblem,
  timeline: Timeline,
  reaches: readonly Reach[],
): readonly (readonly Option[])[] {
  const { starts, ends, origin } = timeline;

  const optionAt = (index: number, item: number, bans: readonly Ban[]): Option => ({
    index,
    item,
    heavy: problem.items[item]?.heavy ?? false,
    cost: problem.candidates[index]?.cost ?? 0,
    starts: (starts[index] ?? 0) - origin,
    startsAt: starts[index] ?? 0,
    endsAt: ends[index] ?? 0,
    bans,
  });

  /** The best of those that no rule ties to another day, and those that one does. */
  const sift = (group: Group, day: number): { loose: Option | null; tied: readonly number[] } => {
    const { item, members } = group;
    const touching = reaches.filter((reach) => reach.touches(group, day));
    let best = -1;
    let bestCost = Number.POSITIVE_INFINITY;
    let bestStart = Number.POSITIVE_INFINITY;
    const tied: number[] = [];
    for (const index of members) {
      let isTied = false;
      for (const reach of touching) isTied ||= reach.touchesAt(index, item, day);
      if (isTied) {
        tied.push(index);
        continue;
      }
      const cost = problem.candidates[index]?.cost ?? 0;
      const start = starts[index] ?? 0;
      if (cost > bestCost || (cost === bestCost && start >= bestStart)) continue;
      best = index;
      bestCost = cost;
      bestStart = start;
    }
    return { loose: best < 0 ? null : optionAt(best, item, NO_BANS), tied };
  };

  const worthTrying = (group: Group, day: number): readonly Option[] => {
    const { loose, tied } = sift(group, day);
    if (tied.length === 0) return loose ? [loose] : [];
    const left = tied
      .map((index) => optionAt(index, group.item, NO_BANS))
      .filter((option) => loose === null || byScore(option, loose) < 0)
      .sort((a, b) => byScore(a, b) || a.index - b.index);
    const kept: Tied[] = [];
    for (const option of left) {
      const { index, item } = option;
      const full: Tied = {
        ...option,
        bans: reaches.flatMap((reach) => reach.ban(index, item, day) ?? []),
        exposure: reaches.map((reach) => reach.exposure(index, item, day)),
      };
      if (!kept.some((other) => isBeaten(full, other))) kept.push(full);
    }
    return loose ? [...kept, loose] : kept;
  };

  return timeline.groups.map((groups, day) => groups.flatMap((group) => worthTrying(group, day)));
}
