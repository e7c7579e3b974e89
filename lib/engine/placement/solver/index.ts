import type { PlacementProblem, PlacementSolution } from "../../types";
import { agendaOf } from "./agenda";
import { optionsByDay } from "./options";
import { reachesOf } from "./reach";
import { search } from "./search";
import { timelineOf } from "./timeline";

/**
 * The exact optimum of a placement, and of equally good choices always the same one: see `search` for the order of ties.
 * Takes only the value; nothing else is known of lifts or rules here. Up to 24 items and weeks may be open on one day.
 */
export function solvePlacement(problem: PlacementProblem): PlacementSolution {
  const timeline = timelineOf(problem);
  const reaches = reachesOf(problem, timeline);
  const agenda = agendaOf(problem, timeline, optionsByDay(problem, timeline, reaches));
  // Not Int32Array.from: the iteration behind it takes longer than the rest of this function.
  const itemOf = new Int32Array(problem.candidates.length);
  problem.candidates.forEach(({ item }, index) => (itemOf[index] = item));
  const best = search(agenda, reaches, problem.spread, itemOf);
  const chosen: (number | null)[] = problem.items.map(() => null);
  for (const index of best.chosen) chosen[itemOf[index] ?? -1] = index;
  return { cost: best.cost, chosen };
}
