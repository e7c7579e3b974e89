import loadHighs from "highs";
import { EXERCISES } from "@/db/seed/exercises";
import { EQUIPMENT, plan, prescribe, type Best, type Kg, type Lift } from "@/lib/engine";
import { frameOf } from "@/lib/engine/phases";
import { layOut } from "@/lib/engine/menu";
import { placementProblem, solvePlacement } from "@/lib/engine/placement";
import { milpOf } from "../factories/placement-milp";
import { benchCamp } from "./engine-cases";
import { figures, round, timed } from "./measure";

const WEEKS = [4, 8, 12, 16, 20] as const;
const SESSIONS = 8;

/** Share of the variance of `y` that a straight line through the points explains. */
function straightness(x: readonly number[], y: readonly number[]): number {
  const mean = (list: readonly number[]) => list.reduce((sum, value) => sum + value, 0) / list.length;
  const [mx, my] = [mean(x), mean(y)];
  const sxy = x.reduce((sum, value, index) => sum + (value - mx) * ((y[index] ?? 0) - my), 0);
  const sxx = x.reduce((sum, value) => sum + (value - mx) ** 2, 0);
  const syy = y.reduce((sum, value) => sum + (value - my) ** 2, 0);
  return sxy ** 2 / (sxx * syy);
}

/** All equipment, two bases and a best of every loaded lift: nothing is left out that takes time. */
function filled(lifts: readonly Lift[]) {
  const first = lifts[0];
  const bests = first
    ? EXERCISES.filter(({ load, main }) => load === "best" && main).map(({ id }): Best => ({
        exercise: id,
        day: first.day,
        kg: 120 as Kg,
        from: "epley",
      }))
    : [];
  return prescribe({
    lifts,
    exercises: EXERCISES,
    mix: [
      { base: "whipping-round-kicks", share: 0.6 },
      { base: "boxing", share: 0.4 },
    ],
    equipment: EQUIPMENT,
    limitations: [],
    bests,
    plates: { unit: "kg", step: 2.5 },
    swaps: [],
    edits: {},
  });
}

const ROUNDS = 30;

/** Times of plans by length of the camp, in turns: whatever else the machine does meanwhile falls on all lengths alike. */
function plansByLength() {
  const camps = WEEKS.map((weeks) => ({ weeks, input: benchCamp(weeks, SESSIONS), times: [] as number[] }));
  for (let round = 0; round < ROUNDS; round++)
    for (const { input, times } of camps) times.push(...timed(5, round === 0 ? 40 : 0, () => plan(input)));
  return camps.map(({ weeks, times }) => ({ weeks, ...figures(times) }));
}

/** Plans from scratch: time by length of the camp, and the placement beside HiGHS on the same value. */
export async function benchEngine() {
  const input = benchCamp(12, SESSIONS);
  const layout = layOut(frameOf(input), undefined);
  const { problem } = placementProblem({ input, slots: layout.slots, fixed: layout.fixed });
  const highs = await loadHighs();
  // The whole value, as our solver gets it.
  const milp = milpOf(problem, { whole: true });
  const theirs = figures(timed(7, 1, () => void highs.solve(milp)));
  const ours = figures(timed(200, 50, () => void solvePlacement(problem)));
  const prescribed = figures(timed(100, 40, () => void filled(plan(input).lifts)));
  const medians = plansByLength();
  const cost = Math.round(highs.solve(milp).ObjectiveValue);
  return {
    "plan from scratch, ms": Object.fromEntries(
      medians.map(({ weeks, median, p95 }) => [`${weeks} weeks`, { median: round(median), p95: round(p95) }]),
    ),
    "straight line through 4 to 20 weeks, r²": round(
      straightness(
        [...WEEKS],
        medians.map(({ median }) => median),
      ),
    ),
    "plan with prescription of 12 weeks, ms": {
      median: round(prescribed.median),
      p95: round(prescribed.p95),
      "8 or less": prescribed.median <= 8,
    },
    "placement of 12 weeks, ms": round(ours.median),
    "the same by HiGHS, ms": round(theirs.median),
    "times faster than HiGHS": Math.round(theirs.median / ours.median),
    "same optimum": cost === solvePlacement(problem).cost,
  };
}
