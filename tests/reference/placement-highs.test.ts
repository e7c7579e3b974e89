import fc from "fast-check";
import loadHighs from "highs";
import { describe, expect, it } from "vitest";
import {
  inputProblems,
  plan,
  type Base,
  type PlacementProblem,
  type PlacementSolution,
  type PlanInput,
} from "@/lib/engine";
import { layOut } from "@/lib/engine/menu";
import { frameOf } from "@/lib/engine/phases";
import { placementProblem, solvePlacement } from "@/lib/engine/placement";
import { arbProblem, costOf } from "../factories/placement";
import { choiceOf, milpOf } from "../factories/placement-milp";
import { arbPlanInput } from "../factories/plan-input";

// HiGHS: a general solver of mixed-integer programs, open source, https://highs.dev (npm `highs`, WebAssembly).
const highs = await loadHighs();

/** Least cost by HiGHS, counted from its choice, so that its tolerances do not blur the sum. */
function costByHighs(problem: PlacementProblem): number | null {
  if (problem.items.length === 0) return solvePlacement(problem).cost;
  // Costs are whole, so a gap under 1 is none.
  const solution = highs.solve(milpOf(problem), { mip_rel_gap: 0, mip_abs_gap: 0.5 });
  if (solution.Status !== "Optimal") throw new Error(`HiGHS: ${solution.Status}`);
  const columns = solution.Columns;
  const column = (name: string): number => {
    const found = columns[name];
    return found && "Primal" in found ? Number(found.Primal) : 0;
  };
  return costOf(problem, choiceOf(problem, column));
}

function problemOf(input: PlanInput, base?: Base): PlacementProblem {
  const { slots, fixed } = layOut(frameOf(input), base);
  return placementProblem({ input, slots, fixed }).problem;
}

/** Cost of taking items in order, each at its cheapest place that is left: what a placement without look-ahead comes to. */
function greedyCost(problem: PlacementProblem): number {
  const chosen: (number | null)[] = problem.items.map(() => null);
  problem.items.forEach((_, item) => {
    let best: number | null = null;
    problem.candidates.forEach((candidate, index) => {
      if (candidate.item !== item || candidate.cost >= (problem.candidates[best ?? -1]?.cost ?? Infinity))
        return;
      if (costOf(problem, chosen.with(item, index)) !== null) best = index;
    });
    chosen[item] = best;
  });
  return costOf(problem, chosen) ?? Infinity;
}

/** Counts what the generated problems were like, so that a generator gone tame is noticed. */
class Seen {
  problems = 0;
  unplaced = 0;
  /** Problems in which taking one lift after the other does not find the optimum. */
  hard = 0;

  add(problem: PlacementProblem, { cost, chosen }: PlacementSolution): void {
    this.problems += 1;
    if (chosen.includes(null)) this.unplaced += 1;
    if (greedyCost(problem) > cost) this.hard += 1;
  }
}

function compare(problem: PlacementProblem, seen: Seen): void {
  const solved = solvePlacement(problem);
  expect(costOf(problem, solved.chosen)).toBe(solved.cost);
  expect(solved.cost).toBe(costByHighs(problem));
  seen.add(problem, solved);
}

describe("the optimum of generated camps is the one that HiGHS finds", () => {
  it.each([
    { weeks: [1, 1], runs: 150, seed: 501 },
    { weeks: [2, 2], runs: 120, seed: 502 },
    { weeks: [3, 4], runs: 90, seed: 503 },
    { weeks: [5, 8], runs: 50, seed: 504 },
  ] as const)(
    "laid from scratch, $weeks weeks ($runs camps)",
    ({ weeks: [minWeeks, maxWeeks], runs, seed }) => {
      const seen = new Seen();
      fc.assert(
        fc.property(arbPlanInput({ minWeeks, maxWeeks }), (input) => compare(problemOf(input), seen)),
        { numRuns: runs, seed },
      );
      expect(seen.problems).toBe(runs);
      expect(seen.unplaced).toBeGreaterThan(runs / 10);
      expect(seen.hard).toBeGreaterThan(runs / 20);
    },
    60_000,
  );

  it("measured against the plan that stood, after the timetable and the bout have changed (60 camps)", () => {
    const seen = new Seen();
    fc.assert(
      fc.property(
        arbPlanInput({ maxWeeks: 4 }),
        arbPlanInput({ maxWeeks: 4 }),
        fc.integer({ min: 0, max: 9 }),
        (input, other, later) => {
          const { lifts } = plan(input);
          const changed: PlanInput = {
            ...input,
            sport: other.sport.map((session) => ({
              ...session,
              day: (session.day + input.bout.day - other.bout.day) as typeof session.day,
            })),
            bout: { ...input.bout, day: (input.bout.day + later) as typeof input.bout.day },
            weighIn: null,
          };
          expect(inputProblems(changed)).toEqual([]);
          compare(problemOf(changed, { boutDay: input.bout.day, lifts }), seen);
        },
      ),
      { numRuns: 60, seed: 505 },
    );
    expect(seen.hard).toBeGreaterThan(3);
  }, 60_000);
});

describe("the optimum of problems that no camp poses is the one that HiGHS finds", () => {
  it.each([
    {
      name: "two weeks, many heavy lifts",
      shape: { weeks: 2, daysPerWeek: 7, itemsPerWeek: 4, startsPerDay: 4, mostCost: 50 },
      runs: 120,
      seed: 511,
    },
    {
      name: "five weeks, five lifts",
      shape: { weeks: 5, daysPerWeek: 5, itemsPerWeek: 5, startsPerDay: 2, mostCost: 300 },
      runs: 40,
      seed: 512,
    },
    {
      name: "few different costs",
      shape: { weeks: 3, daysPerWeek: 4, itemsPerWeek: 4, startsPerDay: 4, mostCost: 3 },
      runs: 60,
      seed: 513,
    },
  ])(
    "$name ($runs problems)",
    ({ shape, runs, seed }) => {
      const seen = new Seen();
      fc.assert(
        fc.property(arbProblem(shape), (problem) => compare(problem, seen)),
        { numRuns: runs, seed },
      );
      expect(seen.hard).toBeGreaterThan(runs / 20);
    },
    60_000,
  );
});
