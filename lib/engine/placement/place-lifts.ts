import { ITEM_TITLES } from "../menu";
import type { Day, Reason, Violation } from "../types";
import { allBreaks, reasonOf } from "./must-rules";
import { liftSpanAt, placementProblem } from "./problem";
import type { PlacedSlot, Placement, PlacementRequest, UnplacedSlot } from "./request";
import { shouldCosts } from "./should-costs";
import { solvePlacement } from "./solver";
import { lastBefore, nextFrom, surroundingsOf, type LiftSpan, type Surroundings } from "./surroundings";

const hours = (minutes: number): string => `${Math.round(minutes / 60)} h`;

/** What a coach asks of a place first: how far hard sparring is, then what the place costs. */
function reasonsFor(around: Surroundings, lift: LiftSpan, fresh: boolean): Reason[] {
  const reasons: Reason[] = [];
  const { rules } = around.input;
  const next = nextFrom(around.hard, lift.endsAt);
  if (next && lift.heavyLower) {
    reasons.push({
      rule: "heavy-before-hard",
      text: `Ends ${hours(next.startsAt - lift.endsAt)} before ${next.title}; house rule asks ${rules["heavy-before-hard.hours"]} h.`,
    });
  }
  const last = lastBefore(around.hard, lift.startsAt);
  if (last && lift.startsAt - last.endsAt < 72 * 60) {
    const asked = lift.heavyLower
      ? Math.max(rules["heavy-after-hard.hours"], rules["lift-after-hard.hours"])
      : rules["lift-after-hard.hours"];
    reasons.push({
      rule: "lift-after-hard",
      text: `Starts ${hours(lift.startsAt - last.endsAt)} after ${last.title}; house rule asks ${asked} h.`,
    });
  }
  for (const { rule, text } of shouldCosts(around, lift, fresh)) reasons.push({ rule, text: text() });
  if (reasons.length === 0) reasons.push({ rule: "spread", text: "The day that costs the week least." });
  return reasons;
}

function violationsOf(request: PlacementRequest, around: Surroundings): Violation[] {
  const violations: Violation[] = [];
  const seen = new Set<string>();
  for (const lift of around.fixed) {
    const fixed = request.fixed.find(({ id }) => id === lift.id);
    // What is past cannot be helped any more: only pins that still lie ahead are reported.
    if (!fixed || fixed.past) continue;
    for (const broken of allBreaks(around, lift)) {
      const ids = broken.with === null ? [lift.id] : [lift.id, broken.with];
      const key = `${broken.rule}|${[...ids].sort().join("|")}`;
      if (seen.has(key)) continue;
      seen.add(key);
      violations.push({ rule: broken.rule, ids, day: lift.day, text: broken.text() });
    }
  }
  return violations.sort((a, b) => a.day - b.day || (a.rule < b.rule ? -1 : 1));
}

/** Places every slot that can be placed, at the least cost; says why the others cannot, and what standing lifts break. */
export function placeLifts(request: PlacementRequest): Placement {
  const { problem, around, shut } = placementProblem(request);
  const solution = solvePlacement(problem);
  const placed: PlacedSlot[] = [];
  const unplaced: UnplacedSlot[] = [];
  request.slots.forEach((slot, index) => {
    const candidate = problem.candidates[solution.chosen[index] ?? -1];
    if (!candidate) {
      const rules = shut.get(slot.id)?.() ?? [];
      const left = problem.candidates.some(({ item }) => item === index);
      unplaced.push({
        slot,
        rules: left
          ? [
              { rule: "one-lift", text: "The days it could take are needed by lifts that come first." },
              ...rules,
            ]
          : rules,
      });
      return;
    }
    const lift = liftSpanAt(around, slot, candidate.day, candidate.start);
    placed.push({
      slot,
      day: candidate.day,
      start: candidate.start,
      reasons: reasonsFor(around, lift, slot.fresh),
    });
  });
  return { placed, unplaced, violations: violationsOf(request, around), cost: solution.cost };
}

/** What shuts, or makes dear, a place that a lift had before: for the words of a knock-on. */
export function whyNotAt(
  request: PlacementRequest,
  slotId: string,
  day: Day,
  start: LiftSpan["startMinute"],
): readonly Reason[] {
  const slot = request.slots.find(({ id }) => id === slotId);
  if (!slot) return [];
  const around = surroundingsOf(request.input, request.fixed, (item) => ITEM_TITLES[item]);
  const lift = liftSpanAt(around, slot, day, start as Parameters<typeof liftSpanAt>[3]);
  const broken = allBreaks(around, lift);
  if (broken.length > 0) return broken.map(reasonOf);
  return shouldCosts(around, lift, slot.fresh).map(({ rule, text }) => ({ rule, text: text() }));
}
