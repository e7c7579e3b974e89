import type { Day, PlacementProblem } from "../../types";

/** Candidates of one item on one day, by start. */
export interface Group {
  readonly item: number;
  /** Indexes into `candidates`, sorted by `startsAt`. */
  readonly members: readonly number[];
  /** Ends grow with starts, as they do when all members are equally long: a search may then halve. */
  readonly endsSorted: boolean;
  readonly firstStart: number;
  readonly lastStart: number;
  readonly firstEnd: number;
  readonly lastEnd: number;
}

/** The days of a problem, 0 from the first on which anything can be chosen or has to be free. */
export interface Timeline {
  readonly first: Day;
  readonly days: number;
  readonly groups: readonly (readonly Group[])[];
  /** Instants by candidate. */
  readonly starts: Float64Array;
  readonly ends: Float64Array;
  /** Least of `starts`. */
  readonly origin: number;
}

function groupOf(item: number, members: number[], starts: Float64Array, ends: Float64Array): Group {
  const isSorted = (values: Float64Array): boolean => {
    for (let n = 1; n < members.length; n++) {
      if ((values[members[n - 1] ?? 0] ?? 0) > (values[members[n] ?? 0] ?? 0)) return false;
    }
    return true;
  };
  // On a day of travel east the order on the clock is not the order of instants.
  if (!isSorted(starts)) members.sort((a, b) => (starts[a] ?? 0) - (starts[b] ?? 0) || a - b);
  const [first, last] = [members[0] ?? 0, members[members.length - 1] ?? 0];
  let [firstEnd, lastEnd] = [ends[first] ?? 0, ends[last] ?? 0];
  const endsSorted = isSorted(ends);
  if (!endsSorted) {
    for (const index of members) {
      firstEnd = Math.min(firstEnd, ends[index] ?? 0);
      lastEnd = Math.max(lastEnd, ends[index] ?? 0);
    }
  }
  return {
    item,
    members,
    endsSorted,
    firstStart: starts[first] ?? 0,
    lastStart: starts[last] ?? 0,
    firstEnd,
    lastEnd,
  };
}

/** Candidates by day and item. */
export function timelineOf({ candidates, weekly }: PlacementProblem): Timeline {
  let [first, last, origin] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
  const see = (day: Day): void => {
    if (day < first) first = day;
    if (day > last) last = day;
  };
  const starts = new Float64Array(candidates.length);
  const ends = new Float64Array(candidates.length);
  candidates.forEach(({ day, startsAt, endsAt }, index) => {
    see(day);
    starts[index] = startsAt;
    ends[index] = endsAt;
    if (startsAt < origin) origin = startsAt;
  });
  for (const { freeDays } of weekly) for (const day of freeDays) see(day);

  const days = Math.max(0, last - first + 1);
  // A day has a handful of items: looking through them is quicker than a map.
  const byDay: { readonly item: number; readonly members: number[] }[][] = Array.from(
    { length: days },
    () => [],
  );
  candidates.forEach(({ day, item }, index) => {
    const groups = byDay[day - first] ?? [];
    let known = groups[0];
    for (let n = 1; known && known.item !== item; n++) known = groups[n];
    if (known) known.members.push(index);
    else groups.push({ item, members: [index] });
  });
  const groups = byDay.map((day) => day.map(({ item, members }) => groupOf(item, members, starts, ends)));
  return { first: first as Day, days, groups, starts, ends, origin };
}
