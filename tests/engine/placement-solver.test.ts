import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Day, Instant, Minute, PlacementProblem } from "@/lib/engine";
import { solvePlacement } from "@/lib/engine/placement/solver";
import { arbProblem, costOf } from "../factories/placement";
import { deepFreeze } from "../factories/plan-input";

type Choice = readonly (number | null)[];

/** Every choice of a candidate or none for each item. */
function* allChoices({ items, candidates }: PlacementProblem, item = 0): Generator<(number | null)[]> {
  if (item === items.length) {
    yield [];
    return;
  }
  const own = candidates.flatMap((candidate, index) => (candidate.item === item ? [index] : []));
  for (const rest of allChoices({ items, candidates } as PlacementProblem, item + 1)) {
    for (const index of [null, ...own]) yield [index, ...rest];
  }
}

/** Cost, sum of starts, then by day the item chosen on it: less is better, position by position. */
function rankOf(problem: PlacementProblem, chosen: Choice, cost: number): number[] {
  const picked = chosen.flatMap((index) => (index === null ? [] : (problem.candidates[index] ?? [])));
  const days = [...new Set(problem.candidates.map(({ day }) => day))].sort((a, b) => a - b);
  const origin = Math.min(...problem.candidates.map(({ startsAt }) => startsAt));
  return [
    cost,
    picked.reduce((sum, { startsAt }) => sum + startsAt - origin, 0),
    ...days.map((day) => picked.find((candidate) => candidate.day === day)?.item ?? Number.MAX_SAFE_INTEGER),
  ];
}

function compare(a: readonly number[], b: readonly number[]): number {
  const at = a.findIndex((value, index) => value !== b[index]);
  return at < 0 ? 0 : (a[at] ?? 0) - (b[at] ?? 0);
}

/** The best choice, found by trying all. */
function bruteForce(problem: PlacementProblem): { cost: number; rank: number[] } {
  let best: { cost: number; rank: number[] } | null = null;
  for (const chosen of allChoices(problem)) {
    const cost = costOf(problem, chosen);
    if (cost === null || (best && cost > best.cost)) continue;
    const rank = rankOf(problem, chosen, cost);
    if (!best || compare(rank, best.rank) < 0) best = { cost, rank };
  }
  return best ?? { cost: 0, rank: [] };
}

const choicesOf = ({ items, candidates }: PlacementProblem): number =>
  items.reduce((product, _, item) => product * (1 + candidates.filter((one) => one.item === item).length), 1);

describe("solvePlacement against trying every choice", () => {
  it.each([
    { name: "costs apart", mostCost: 30, seed: 301 },
    { name: "few different costs", mostCost: 2, seed: 302 },
    { name: "everything a tie", mostCost: 0, seed: 303 },
  ])(
    "$name: the same cost, and of equal ones the one that the order of ties names (1000 problems)",
    ({ mostCost, seed }) => {
      let tied = 0;
      fc.assert(
        fc.property(
          arbProblem({ weeks: 2, daysPerWeek: 3, itemsPerWeek: 3, startsPerDay: 3, mostCost }).filter(
            (problem) => choicesOf(problem) <= 4_000,
          ),
          (problem) => {
            const best = bruteForce(problem);
            const solved = solvePlacement(deepFreeze(problem));
            expect(costOf(problem, solved.chosen)).toBe(solved.cost);
            expect(solved.cost).toBe(best.cost);
            expect(rankOf(problem, solved.chosen, solved.cost)).toEqual(best.rank);
            tied += problem.apart.length;
          },
        ),
        { numRuns: 1000, seed },
      );
      expect(tied).toBeGreaterThan(500);
    },
  );
});

describe("solvePlacement", () => {
  const at = (day: number, start: number, item: number, cost = 0, minutes = 60) => ({
    ...{ item, day: day as Day, start: start as Minute, cost },
    startsAt: (day * 1440 + start) as Instant,
    endsAt: (day * 1440 + start + minutes) as Instant,
  });
  const item = (key: string, heavy = false, unplaced = 1000) => ({ key, week: 1, heavy, unplaced });
  const problem = (over: Partial<PlacementProblem>): PlacementProblem => ({
    items: [],
    candidates: [],
    apart: [],
    spread: [],
    weekly: [],
    ...over,
  });

  it("an empty problem costs nothing", () => {
    expect(solvePlacement(problem({}))).toEqual({ cost: 0, chosen: [] });
  });

  it("items that no day can take cost their price", () => {
    const items = [item("a"), item("b", true, 700)];
    expect(solvePlacement(problem({ items }))).toEqual({ cost: 1700, chosen: [null, null] });
  });

  it("a week without a free day is paid for only when lifts take all days that were free", () => {
    const two = problem({
      items: [item("a"), item("b")],
      candidates: [at(1, 600, 0), at(1, 600, 1), at(2, 600, 0), at(2, 600, 1)],
      weekly: [{ week: 1, freeDays: [1, 2] as Day[], noRestCost: 50 }],
    });
    expect(solvePlacement(two).cost).toBe(50);
    const three = { ...two, weekly: [{ week: 1, freeDays: [1, 2, 3] as Day[], noRestCost: 50 }] };
    expect(solvePlacement(three).cost).toBe(0);
  });

  it.each([
    { name: "2879 min apart where 2880 are asked", start: 659, cost: 1000 },
    { name: "2880 min apart where 2880 are asked", start: 660, cost: 0 },
  ])("two heavy lifts $name", ({ start, cost }) => {
    const heavy = problem({
      items: [item("a", true), item("b", true)],
      candidates: [at(1, 600, 0), at(3, start, 1)],
      apart: [{ among: "heavy", minutes: 2880 }],
    });
    expect(solvePlacement(heavy).cost).toBe(cost);
  });

  it("the rule between two lifts holds over midnight, and two weeks are one run of days", () => {
    const night = problem({
      items: [{ ...item("a"), week: 2 }, item("b")],
      candidates: [at(1, 1380, 0), at(2, 44, 1), at(2, 45, 1, 5)],
      apart: [{ among: "all", minutes: 45 }],
    });
    expect(solvePlacement(night)).toEqual({ cost: 5, chosen: [0, 2] });
  });

  it("a free day is kept, and a pair of days apart paid for, across the border of two weeks", () => {
    const border = problem({
      items: [{ ...item("a"), week: 2 }, item("b")],
      candidates: [at(1, 600, 0), at(2, 600, 0, 3), at(3, 600, 1), at(5, 600, 1, 4)],
      spread: [14, 2],
    });
    expect(solvePlacement(border)).toEqual({ cost: 2, chosen: [0, 2] });
  });

  it("ties go to the earlier day, then to the earlier start, then to the item that comes first", () => {
    const tie = problem({
      items: [item("first"), item("second")],
      candidates: [at(1, 600, 0), at(1, 600, 1), at(1, 660, 0), at(2, 600, 0), at(2, 600, 1), at(3, 600, 1)],
    });
    expect(solvePlacement(tie).chosen).toEqual([0, 4]);
  });
});
