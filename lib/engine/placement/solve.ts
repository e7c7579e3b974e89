import type { Candidate, Day, PlacementProblem, PlacementSolution } from "../types";

/**
 * Exact optimum of a placement by dynamic programming over days.
 *
 * State after a day: which items of the running week are still open, on which of the last days a lift stood (for the
 * spread costs), whether the week has had a free day, and the time before which the next lift, or the next heavy lift, may
 * not start. That time is kept only while a later candidate can be touched by it, so that states meet again.
 * Ties: the smaller sum of starts, so earlier days and starts win; then the order of the items.
 */

/** Weight of a point of cost over the tie-break: a sum of at most 80 starts of at most 20 weeks of minutes is below 2^25. */
const POINT = 2 ** 25;

interface Option {
  readonly candidate: number;
  readonly bit: number;
  readonly score: number;
  readonly heavy: boolean;
  readonly startsAt: number;
  /** Instant before which no lift, or no heavy lift, may start after this one; 0 where no later candidate is touched. */
  readonly lastUntil: number;
  readonly heavyUntil: number;
}

interface DayStep {
  readonly options: readonly Option[];
  readonly opens: number;
  readonly closes: readonly { readonly bit: number; readonly score: number }[];
  /** Fixed training leaves the day free. */
  readonly free: boolean;
  /** Score to pay after this day where the week had no free day. */
  readonly noRest: number;
  readonly weekBegins: boolean;
  /** Earliest start of any option from this day on: times before it are forgotten. */
  readonly floor: number;
}

interface State {
  open: number;
  /** Bit g - 1: a lift stood g days ago. */
  readonly recent: number;
  readonly rested: boolean;
  readonly lastUntil: number;
  readonly heavyUntil: number;
  score: number;
  readonly parent: State | null;
  /** Candidate chosen on the day that led here, or -1. */
  readonly chosen: number;
}

const least = (problem: PlacementProblem, among: "all" | "heavy"): number =>
  problem.apart.reduce((most, rule) => (rule.among === among ? Math.max(most, rule.minutes) : most), 0);

/** Of one day: the earliest start, over all candidates and over heavy ones. */
interface DayStarts {
  all: number;
  heavy: number;
}

function earliestStarts(problem: PlacementProblem): Map<Day, DayStarts> {
  const days = new Map<Day, DayStarts>();
  for (const { day, item, startsAt } of problem.candidates) {
    let starts = days.get(day);
    if (!starts) days.set(day, (starts = { all: Number.POSITIVE_INFINITY, heavy: Number.POSITIVE_INFINITY }));
    if (startsAt < starts.all) starts.all = startsAt;
    if (problem.items[item]?.heavy && startsAt < starts.heavy) starts.heavy = startsAt;
  }
  return days;
}

/** Shortest day there is for a traveller, minutes: nine hours, eastwards across fifteen zones. */
const SHORTEST_DAY = 540;

/** `until` where a candidate on a later day starts before it, else 0: nothing then needs to remember it. */
function keptUntil(
  starts: ReadonlyMap<Day, DayStarts>,
  { day, startsAt }: Candidate,
  until: number,
  among: keyof DayStarts,
): number {
  const reach = Math.ceil((until - startsAt) / SHORTEST_DAY) + 1;
  for (let ahead = 1; ahead <= reach; ahead++) {
    const first = starts.get((day + ahead) as Day);
    if (first && first[among] < until) return until;
  }
  return 0;
}

/** Per day, the candidates worth trying: all that a time between lifts can touch, of the others only the best of each item. */
function optionsByDay(problem: PlacementProblem, bits: readonly number[]): Map<Day, Option[]> {
  const starts = earliestStarts(problem);
  const [all, heavy] = [least(problem, "all"), least(problem, "heavy")];
  const origin = problem.candidates.reduce(
    (first, { startsAt }) => Math.min(first, startsAt),
    Number.POSITIVE_INFINITY,
  );
  const days = new Map<Day, Option[]>();
  // Candidates come by day, so everything that may shut one has been seen before it.
  let latestRelease = 0;
  let latestHeavyRelease = 0;
  let today: Day | null = null;
  let [releasesToday, heavyReleasesToday] = [0, 0];
  let best = new Map<number, Option>();
  problem.candidates.forEach((candidate, index) => {
    if (candidate.day !== today) {
      today = candidate.day;
      latestRelease = Math.max(latestRelease, releasesToday);
      latestHeavyRelease = Math.max(latestHeavyRelease, heavyReleasesToday);
      best = new Map();
    }
    const isHeavy = problem.items[candidate.item]?.heavy ?? false;
    const lastUntil = keptUntil(starts, candidate, candidate.endsAt + all, "all");
    const heavyUntil = isHeavy ? keptUntil(starts, candidate, candidate.endsAt + heavy, "heavy") : 0;
    releasesToday = Math.max(releasesToday, lastUntil);
    heavyReleasesToday = Math.max(heavyReleasesToday, heavyUntil);
    const option: Option = {
      candidate: index,
      bit: bits[candidate.item] ?? 0,
      score: candidate.cost * POINT + (candidate.startsAt - origin),
      heavy: isHeavy,
      startsAt: candidate.startsAt,
      lastUntil,
      heavyUntil,
    };
    let options = days.get(candidate.day);
    if (!options) days.set(candidate.day, (options = []));
    const touched =
      lastUntil > 0 ||
      heavyUntil > 0 ||
      candidate.startsAt < latestRelease ||
      (isHeavy && candidate.startsAt < latestHeavyRelease);
    if (touched) {
      options.push(option);
      return;
    }
    const known = best.get(candidate.item);
    if (known && known.score <= option.score) return;
    if (known) options.splice(options.indexOf(known), 1);
    best.set(candidate.item, option);
    options.push(option);
  });
  for (const options of days.values()) {
    options.sort((a, b) => a.bit - b.bit || a.score - b.score || a.candidate - b.candidate);
  }
  return days;
}

/** Bits of items: unique among the items of a week. */
function bitsOf(problem: PlacementProblem): number[] {
  const used = new Map<number, number>();
  return problem.items.map(({ week }) => {
    const n = used.get(week) ?? 0;
    used.set(week, n + 1);
    return 2 ** n;
  });
}

/** The days from the first to the last that matters, with what opens and closes on each. */
function stepsOf(problem: PlacementProblem): { steps: DayStep[]; lost: number } {
  const bits = bitsOf(problem);
  const options = optionsByDay(problem, bits);
  const span = new Map<number, { from: Day; to: Day }>();
  const widen = (week: number, day: Day): void => {
    const known = span.get(week);
    span.set(
      week,
      known
        ? { from: Math.min(known.from, day) as Day, to: Math.max(known.to, day) as Day }
        : { from: day, to: day },
    );
  };
  for (const { item, day } of problem.candidates) widen(problem.items[item]?.week ?? 0, day);
  for (const { week, freeDays } of problem.weekly) for (const day of freeDays) widen(week, day);
  let lost = 0;
  const opens = new Map<Day, number>();
  const closes = new Map<Day, { bit: number; score: number }[]>();
  problem.items.forEach((item, index) => {
    const days = span.get(item.week);
    const bit = bits[index] ?? 0;
    if (!days) {
      lost += item.unplaced * POINT;
      return;
    }
    opens.set(days.from, (opens.get(days.from) ?? 0) | bit);
    closes.set(days.to, [...(closes.get(days.to) ?? []), { bit, score: item.unplaced * POINT }]);
  });
  const begins = new Set([...span.values()].map(({ from }) => from));
  const free = new Set(problem.weekly.flatMap(({ freeDays }) => freeDays));
  const noRest = new Map<Day, number>();
  for (const { week, freeDays, noRestCost } of problem.weekly) {
    const last = span.get(week)?.to;
    if (last !== undefined && freeDays.length > 0) noRest.set(last, noRestCost * POINT);
  }
  const all = [...span.values()];
  const first = Math.min(...all.map(({ from }) => from));
  const last = Math.max(...all.map(({ to }) => to));
  const steps: DayStep[] = [];
  for (let day = first as Day; day <= last; day = (day + 1) as Day) {
    steps.push({
      options: options.get(day) ?? [],
      opens: opens.get(day) ?? 0,
      closes: closes.get(day) ?? [],
      free: free.has(day),
      noRest: noRest.get(day) ?? 0,
      weekBegins: begins.has(day),
      floor: 0,
    });
  }
  let floor = Number.POSITIVE_INFINITY;
  const floored = steps.map((step) => step);
  for (let index = steps.length - 1; index >= 0; index--) {
    const step = steps[index];
    if (!step) continue;
    floor = step.options.reduce((earliest, { startsAt }) => Math.min(earliest, startsAt), floor);
    floored[index] = { ...step, floor };
  }
  return { steps: floored, lost };
}

/** Without times that nothing from `floor` on can be touched by. */
const forget = (state: State, floor: number): State =>
  (state.lastUntil > 0 && state.lastUntil <= floor) || (state.heavyUntil > 0 && state.heavyUntil <= floor)
    ? {
        ...state,
        lastUntil: state.lastUntil <= floor ? 0 : state.lastUntil,
        heavyUntil: state.heavyUntil <= floor ? 0 : state.heavyUntil,
      }
    : state;

/**
 * Key of a state, exact in a double: times are counted from `origin`, and 20 weeks of minutes take 18 bits each; open items
 * take 8, days 3, rest 1.
 */
const keyOf = (state: State, origin: number): number => {
  const last = state.lastUntil === 0 ? 0 : state.lastUntil - origin + 1;
  const heavy = state.heavyUntil === 0 ? 0 : state.heavyUntil - origin + 1;
  return (
    ((last * 2 ** 18 + heavy) * 2 ** 8 + state.open) * 2 ** 4 + state.recent * 2 + (state.rested ? 1 : 0)
  );
};

/** Optimum and choice. Takes only the value; deterministic; never throws for a well-formed problem. */
export function solvePlacement(problem: PlacementProblem): PlacementSolution {
  const { steps, lost } = stepsOf(problem);
  const origin = problem.candidates.reduce(
    (first, { startsAt }) => Math.min(first, startsAt),
    Number.POSITIVE_INFINITY,
  );
  const window = (1 << problem.spread.length) - 1;
  const spreadScore = Array.from({ length: window + 1 }, (_, recent) =>
    problem.spread.reduce((sum, cost, gap) => (recent & (1 << gap) ? sum + cost * POINT : sum), 0),
  );
  let layer: State[] = [
    { open: 0, recent: 0, rested: false, lastUntil: 0, heavyUntil: 0, score: lost, parent: null, chosen: -1 },
  ];
  for (const step of steps) {
    const next = new Map<number, State>();
    const settle = (state: State): void => {
      let { score, open } = state;
      for (const { bit, score: price } of step.closes)
        if (open & bit) {
          score += price;
          open &= ~bit;
        }
      if (step.noRest > 0 && !state.rested) score += step.noRest;
      state.score = score;
      state.open = open;
      const key = keyOf(state, origin);
      const known = next.get(key);
      if (!known || score < known.score) next.set(key, state);
    };
    for (const before of layer) {
      const state = forget(before, step.floor);
      const open = state.open | step.opens;
      const rested = step.weekBegins ? false : state.rested;
      const shifted = (state.recent << 1) & window;
      settle({
        open,
        recent: shifted,
        rested: rested || step.free,
        lastUntil: state.lastUntil,
        heavyUntil: state.heavyUntil,
        score: state.score,
        parent: state,
        chosen: -1,
      });
      for (const option of step.options) {
        if (!(open & option.bit) || option.startsAt < state.lastUntil) continue;
        if (option.heavy && option.startsAt < state.heavyUntil) continue;
        settle({
          open: open & ~option.bit,
          rested,
          recent: shifted | (window & 1),
          lastUntil: option.lastUntil,
          heavyUntil: option.heavy ? option.heavyUntil : state.heavyUntil,
          score: state.score + option.score + (spreadScore[state.recent] ?? 0),
          parent: state,
          chosen: option.candidate,
        });
      }
    }
    layer = [...next.values()];
  }
  return readBack(problem, layer);
}

function readBack(problem: PlacementProblem, layer: readonly State[]): PlacementSolution {
  const chosen: (number | null)[] = problem.items.map(() => null);
  let best: State | null = null;
  for (const state of layer) if (!best || state.score < best.score) best = state;
  const cost = Math.floor((best?.score ?? 0) / POINT);
  for (let state = best; state; state = state.parent) {
    const candidate = problem.candidates[state.chosen];
    if (candidate) chosen[candidate.item] = state.chosen;
  }
  return { cost, chosen };
}
