import type { Day, Minute, Reason } from "../types";
import { neededByOthers, reasonsFor, whyNot } from "./explain";
import { placementProblem } from "./problem";
import type { PlacedSlot, Placement, PlacementRequest, UnplacedSlot } from "./request";
import { solvePlacement } from "./solver";
import { violationsOf } from "./violations";

/** Places every slot that can be placed, at the least cost; says why the others cannot, and what lifts that stand break. */
export function placeLifts(request: PlacementRequest): Placement {
  const { problem, around, shut } = placementProblem(request);
  const solution = solvePlacement(problem);
  const chosen = solution.chosen.map((index) =>
    index === null ? null : (problem.candidates[index] ?? null),
  );
  const taken = chosen.filter((candidate) => candidate !== null);
  const placed: PlacedSlot[] = [];
  const unplaced: UnplacedSlot[] = [];
  request.slots.forEach((slot, item) => {
    const candidate = chosen[item];
    if (candidate) {
      const { day, start } = candidate;
      placed.push({ slot, day, start, reasons: reasonsFor(around, slot, candidate) });
      return;
    }
    const needed = neededByOthers(problem, item, taken);
    unplaced.push({ slot, rules: [...(needed ? [needed] : []), ...(shut.get(slot.id) ?? [])] });
  });
  return {
    placed,
    unplaced,
    violations: violationsOf(around),
    cost: solution.cost,
    whyNot: (id: string, day: Day, start: Minute): readonly Reason[] => {
      const slot = request.slots.find((one) => one.id === id);
      return slot ? whyNot(around, slot, day, start, placed) : [];
    },
  };
}
