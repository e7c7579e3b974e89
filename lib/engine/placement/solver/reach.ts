import type { PlacementProblem } from "../../types";
import type { Ban } from "./bans";
import { Extremes } from "./extremes";
import type { Group, Timeline } from "./timeline";

const [NEVER, ALWAYS] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];

/** Position of the first member that fails `holds`, for a test that holds up to some position and not after it. */
function countWhile(members: readonly number[], holds: (index: number) => boolean): number {
  let [low, high] = [0, members.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (holds(members[middle] ?? 0)) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** How one `apart` rule ties candidates of different days together. */
export class Reach {
  readonly #groups: readonly (readonly Group[])[];
  readonly #starts: Float64Array;
  readonly #ends: Float64Array;
  readonly #concerns: readonly boolean[];
  // From a day on.
  readonly #firstStart: Extremes;
  readonly #firstEnd: Extremes;
  // Over the days before one, turned round: the least of the negative is the largest.
  readonly #lastStart: Extremes;
  readonly #lastEnd: Extremes;

  /** Keeps `minutes` between lifts: all of them, or heavy ones. */
  constructor(
    problem: PlacementProblem,
    timeline: Timeline,
    private readonly minutes: number,
    readonly heavyOnly: boolean,
  ) {
    this.#concerns = problem.items.map(({ heavy }) => heavy || !heavyOnly);
    this.#groups = timeline.groups.map((day) => day.filter(({ item }) => this.#concerns[item]));
    this.#starts = timeline.starts;
    this.#ends = timeline.ends;
    const backwards = [...this.#groups].reverse();
    this.#firstStart = new Extremes(this.#groups, ({ firstStart }) => firstStart);
    this.#firstEnd = new Extremes(this.#groups, ({ firstEnd }) => firstEnd);
    this.#lastStart = new Extremes(backwards, ({ lastStart }) => -lastStart);
    this.#lastEnd = new Extremes(backwards, ({ lastEnd }) => -lastEnd);
  }

  /** Earliest start from `day` on, of the candidates that the rule is about. */
  earliest(day: number): number {
    return this.#firstStart.from(day);
  }

  /** Latest end of other items before `day`. */
  #endBefore(item: number, day: number): number {
    return -this.#lastEnd.without(item, this.#groups.length - day);
  }

  /** False where no other item comes near enough, on another day, to any candidate of the group. */
  touches({ item, firstStart, lastEnd }: Group, day: number): boolean {
    if (!this.#concerns[item]) return false;
    const ahead = this.#firstStart.without(item, day + 1);
    return lastEnd + this.minutes > ahead || this.#endBefore(item, day) + this.minutes > firstStart;
  }

  /** The same for one candidate of the group. */
  touchesAt(index: number, item: number, day: number): boolean {
    if (!this.#concerns[item]) return false;
    const [start, end] = [this.#starts[index] ?? 0, this.#ends[index] ?? 0];
    const ahead = this.#firstStart.without(item, day + 1);
    return end + this.minutes > ahead || this.#endBefore(item, day) + this.minutes > start;
  }

  /** What a candidate forbids on later days, in the weakest form that forbids the same; null for nothing. */
  ban(index: number, item: number, day: number): Ban | null {
    if (!this.#concerns[item]) return null;
    const until = (this.#ends[index] ?? 0) + this.minutes;
    const from = (this.#starts[index] ?? 0) - this.minutes;
    let last = ALWAYS;
    for (let later = day + 1; this.#firstStart.without(item, later) < until; later++) {
      for (const group of this.#groups[later] ?? []) {
        if (group.item !== item) last = Math.max(last, this.#lastForbidden(group, until, from));
      }
    }
    if (last === ALWAYS) return null;
    const spares = this.#firstEnd.without(item, day + 1) <= from;
    return { heavyOnly: this.heavyOnly, until: last + 1, from: spares ? from : ALWAYS };
  }

  /**
   * How much earlier days can forbid a candidate: the least `until` of theirs above its start, infinity for none. Of two
   * candidates of an item on a day, the one with the larger value is forbidden by no more than the other.
   */
  exposure(index: number, item: number, day: number): number {
    if (!this.#concerns[item]) return NEVER;
    const [start, end] = [this.#starts[index] ?? 0, this.#ends[index] ?? 0];
    // Something of an earlier day lies after it: days do not order instants here, so nothing can be compared.
    if (-this.#lastStart.without(item, this.#groups.length - day) - this.minutes >= end) return Number.NaN;
    let least = NEVER;
    for (let earlier = day; this.#endBefore(item, earlier) + this.minutes > start; earlier--) {
      for (const group of this.#groups[earlier - 1] ?? []) {
        if (group.item !== item) least = Math.min(least, this.#leastRelease(group, start));
      }
    }
    return least;
  }

  /** Latest start before `until` in a group, of a member that ends after `from`. */
  #lastForbidden({ members, endsSorted }: Group, until: number, from: number): number {
    for (let n = countWhile(members, (index) => (this.#starts[index] ?? 0) < until) - 1; n >= 0; n--) {
      const index = members[n] ?? 0;
      if ((this.#ends[index] ?? 0) > from) return this.#starts[index] ?? 0;
      if (endsSorted) break;
    }
    return ALWAYS;
  }

  /** Least end of a group, with the rule's minutes, above an instant. */
  #leastRelease({ members, endsSorted }: Group, above: number): number {
    const releases = (index: number | undefined): number =>
      index === undefined ? NEVER : (this.#ends[index] ?? 0) + this.minutes;
    if (endsSorted) return releases(members[countWhile(members, (index) => releases(index) <= above)]);
    return members.reduce((least, index) => {
      const release = releases(index);
      return release > above && release < least ? release : least;
    }, NEVER);
  }
}

/** The problem's rules between lifts: of several about the same lifts the widest. */
export function reachesOf(problem: PlacementProblem, timeline: Timeline): readonly Reach[] {
  return (["all", "heavy"] as const).flatMap((among) => {
    const minutes = problem.apart.filter((rule) => rule.among === among).map((rule) => rule.minutes);
    return minutes.length === 0
      ? []
      : [new Reach(problem, timeline, Math.max(...minutes), among === "heavy")];
  });
}
