import fc from "fast-check";
import type { Candidate, Day, Instant, Minute, PlacementItem, PlacementProblem } from "@/lib/engine";

/** How large and how awkward generated placement problems may be. */
export interface ProblemShape {
  readonly weeks: number;
  readonly daysPerWeek: number;
  readonly itemsPerWeek: number;
  readonly startsPerDay: number;
  /** Costs are drawn from 0 to this: 0 makes everything a tie. */
  readonly mostCost: number;
}

const HOUR = 60;
/** Any day will do: the solver knows no calendar. */
const FIRST_DAY = 20_000;

interface Draft {
  readonly day: number;
  readonly start: number;
  readonly item: number;
  readonly cost: number;
  readonly minutes: number;
}

/**
 * Problems that no camp would ever pose: any number of heavy items in a week, arbitrary costs and lengths, rules between
 * lifts that reach over days, days on which a journey puts the hours out of order, weeks without a free day.
 */
export const arbProblem = (shape: ProblemShape): fc.Arbitrary<PlacementProblem> =>
  fc
    .record({
      items: fc.array(
        fc.array(
          fc.record({ heavy: fc.boolean(), unplaced: fc.integer({ min: 0, max: 3 * shape.mostCost }) }),
          {
            maxLength: shape.itemsPerWeek,
          },
        ),
        { minLength: 1, maxLength: shape.weeks },
      ),
      starts: fc.uniqueArray(fc.integer({ min: 0, max: 47 }), {
        minLength: 1,
        maxLength: shape.startsPerDay,
      }),
      density: fc.integer({ min: 20, max: 100 }),
      sameLength: fc.boolean(),
      apart: fc.record({
        all: fc.option(fc.constantFrom(0, 45, 240, 24 * HOUR), { freq: 6 }),
        heavy: fc.option(fc.constantFrom(24 * HOUR, 48 * HOUR, 96 * HOUR), { freq: 6 }),
        twice: fc.boolean(),
      }),
      spread: fc.array(fc.integer({ min: 0, max: shape.mostCost }), { maxLength: 3 }),
      noRest: fc.integer({ min: 0, max: 4 * shape.mostCost }),
      busy: fc.integer({ min: 0, max: 100 }),
      // Hours by which the clock is put forward over night before this day, as on a journey east.
      journey: fc.option(
        fc.record({
          day: fc.integer({ min: 1, max: shape.weeks * shape.daysPerWeek }),
          hours: fc.integer({ min: 1, max: 23 }),
        }),
        { freq: 3 },
      ),
      salt: fc.integer({ min: 0, max: 2 ** 30 }),
    })
    .map(({ items, starts, density, sameLength, apart, spread, noRest, busy, journey, salt }) => {
      // One number settles the many small choices, which keeps shrinking fast.
      let state = salt;
      const draw = (below: number): number => {
        state = (Math.imul(state, 1_103_515_245) + 12_345) & 0x7fffffff;
        return Math.floor((state / 0x80000000) * below);
      };
      const all: PlacementItem[] = items.flatMap((week, at) =>
        week.map(({ heavy, unplaced }, n): PlacementItem => ({
          key: `${at}-${n}`,
          week: items.length - at,
          heavy,
          unplaced,
        })),
      );
      const drafts: Draft[] = [];
      const freeDays = new Map<number, Day[]>();
      items.forEach((_, at) => {
        for (let n = 0; n < shape.daysPerWeek; n++) {
          const day = at * shape.daysPerWeek + n;
          if (draw(100) >= busy)
            freeDays.set(items.length - at, [
              ...(freeDays.get(items.length - at) ?? []),
              (FIRST_DAY + day) as Day,
            ]);
          for (const half of starts) {
            all.forEach((item, index) => {
              if (item.week !== items.length - at || draw(100) >= density) return;
              drafts.push({
                day,
                start: half * 30,
                item: index,
                cost: draw(shape.mostCost + 1),
                minutes: sameLength ? 60 : 30 + 15 * draw(6),
              });
            });
          }
        }
      });
      const offset = (day: number): number => (journey && day >= journey.day ? journey.hours * HOUR : 0);
      const candidates = drafts
        .map(({ day, start, item, cost, minutes }): Candidate => {
          const startsAt = (FIRST_DAY + day) * 1440 + start - offset(day);
          return {
            item,
            day: (FIRST_DAY + day) as Day,
            start: start as Minute,
            startsAt: startsAt as Instant,
            endsAt: (startsAt + minutes) as Instant,
            cost,
          };
        })
        .sort((a, b) => a.day - b.day || a.start - b.start || a.item - b.item);
      const rules: PlacementProblem["apart"][number][] = [];
      if (apart.all !== null) rules.push({ among: "all", minutes: apart.all });
      if (apart.heavy !== null) rules.push({ among: "heavy", minutes: apart.heavy });
      if (apart.twice) rules.push({ among: "heavy", minutes: 12 * HOUR }, { among: "all", minutes: 30 });
      return {
        items: all,
        candidates,
        apart: rules,
        spread,
        weekly: [...freeDays].map(([week, days]) => ({ week, freeDays: days, noRestCost: noRest })),
      };
    });

/** Minutes from the end of the earlier to the start of the later; negative where they overlap. */
export const gapBetween = (a: Candidate, b: Candidate): number =>
  Math.max(b.startsAt - a.endsAt, a.startsAt - b.endsAt);

/** Two candidates of different items that may not both be chosen: same day, or nearer than an `apart` asks. */
export function exclude(problem: PlacementProblem, a: Candidate, b: Candidate): boolean {
  if (a.day === b.day) return true;
  const bothHeavy = (problem.items[a.item]?.heavy && problem.items[b.item]?.heavy) ?? false;
  return problem.apart.some(
    ({ among, minutes }) => (among === "all" || bothHeavy) && gapBetween(a, b) < minutes,
  );
}

/** Cost of a choice by the words of `PlacementProblem`, or null where it is not allowed. */
export function costOf(problem: PlacementProblem, chosen: readonly (number | null)[]): number | null {
  const picked = chosen.flatMap((index) => {
    const candidate = index === null ? undefined : problem.candidates[index];
    return candidate ? [candidate] : [];
  });
  let cost = 0;
  chosen.forEach((index, item) => {
    if (index === null) cost += problem.items[item]?.unplaced ?? 0;
  });
  for (const [n, a] of picked.entries()) {
    cost += a.cost;
    for (const b of picked.slice(n + 1)) {
      if (exclude(problem, a, b)) return null;
      cost += problem.spread[Math.abs(a.day - b.day) - 1] ?? 0;
    }
  }
  for (const { freeDays, noRestCost } of problem.weekly) {
    if (freeDays.every((day) => picked.some((candidate) => candidate.day === day))) cost += noRestCost;
  }
  return cost;
}
