import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { plan, type Base, type PlanInput, type Plan } from "@/lib/engine";
import { layOut } from "@/lib/engine/menu";
import { frameOf } from "@/lib/engine/phases";
import { placeLifts, type Placement, type PlacementRequest } from "@/lib/engine/placement";
import { arbPlanInput, deepFreeze } from "../factories/plan-input";

function requestOf(input: PlanInput, base?: Base): PlacementRequest {
  const { slots, fixed } = layOut(frameOf(input), base);
  return { input, slots, fixed };
}

const baseOf = (made: Plan): Base => ({ boutDay: made.bout.day, lifts: made.lifts });

/** All that a placement says, as text: equal to the byte or not. */
const written = ({ placed, unplaced, violations, cost }: Placement): string =>
  JSON.stringify({ placed, unplaced, violations, cost });

describe("for every camp", () => {
  it("the order in which sport, free hours, holds and standing lifts are listed does not matter (200 camps)", () => {
    const arbOrders = arbPlanInput({ maxWeeks: 8 }).chain((input) =>
      fc.record({
        input: fc.constant(input),
        sport: fc.shuffledSubarray([...input.sport], { minLength: input.sport.length }),
        freeHours: fc.shuffledSubarray([...input.athlete.freeHours], {
          minLength: input.athlete.freeHours.length,
        }),
        holds: fc.shuffledSubarray([...input.holds], { minLength: input.holds.length }),
      }),
    );
    fc.assert(
      fc.property(arbOrders, ({ input, sport, freeHours, holds }) => {
        const request = deepFreeze(requestOf(input));
        const shuffled: PlacementRequest = {
          input: { ...input, sport, holds, athlete: { ...input.athlete, freeHours } },
          slots: request.slots,
          fixed: [...request.fixed].reverse(),
        };
        expect(written(placeLifts(shuffled))).toBe(written(placeLifts(request)));
      }),
      { numRuns: 200, seed: 401 },
    );
  });

  it("placing what is placed changes nothing, also after a change moved some of it (200 camps)", () => {
    let moved = 0;
    fc.assert(
      fc.property(
        arbPlanInput({ maxWeeks: 8, pins: false }),
        arbPlanInput({ maxWeeks: 8 }),
        (input, other) => {
          const first = plan(input);
          const shift = input.bout.day - other.bout.day;
          const changed: PlanInput = {
            ...input,
            sport: other.sport.map((session) => ({
              ...session,
              day: (session.day + shift) as typeof session.day,
            })),
          };
          const second = plan(changed, baseOf(first));
          const places = (made: Plan) => made.lifts.map(({ id, day, start }) => ({ id, day, start }));
          if (JSON.stringify(places(second)) !== JSON.stringify(places(first))) moved += 1;
          const again = placeLifts(requestOf(changed, baseOf(second)));
          const before = new Map(second.lifts.map((lift) => [lift.id, lift]));
          for (const { slot, day, start } of again.placed) expect({ day, start }).toEqual(slot.base);
          expect(again.unplaced.map(({ slot }) => slot.id).filter((id) => before.has(id))).toEqual([]);
        },
      ),
      { numRuns: 200, seed: 402 },
    );
    expect(moved).toBeGreaterThan(40);
  });

  it("every lift wanted is placed or comes back with the rules that shut it (300 camps)", () => {
    fc.assert(
      fc.property(arbPlanInput({ maxWeeks: 8 }), (input) => {
        const request = requestOf(input);
        const { placed, unplaced } = placeLifts(request);
        const ids = [...placed, ...unplaced].map(({ slot }) => slot.id);
        expect(ids.sort()).toEqual(request.slots.map(({ id }) => id).sort());
        for (const { rules } of unplaced) {
          expect(rules.length).toBeGreaterThan(0);
          for (const { text } of rules) expect(text).toMatch(/^[A-Z0-9].*\.$/);
        }
        for (const { reasons } of placed) {
          expect(reasons.length).toBeGreaterThan(0);
          for (const { text } of reasons) expect(text).toMatch(/^[A-Z0-9].*\.$/);
        }
      }),
      { numRuns: 300, seed: 403 },
    );
  });
});
