import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  instantAt,
  knockOn,
  plan,
  type Base,
  type Day,
  type Instant,
  type Lift,
  type Plan,
} from "@/lib/engine";
import { arbAddition, sessionAt } from "../factories/additions";
import { arbPlanInput } from "../factories/plan-input";

const baseOf = (made: Plan): Base => ({ boutDay: made.bout.day, lifts: made.lifts });
const EMPTY = { lifts: [], sport: [], weeks: [], violations: [], bout: null };

// Thousands of camps on a shared machine: generous, and never what decides.
const TIME = { timeout: 180_000 };

describe("a change", TIME, () => {
  it("that is none has no knock-on, also once the plan that stands was itself planned on another (200 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput({ maxWeeks: 10 }), arbAddition, (input, { share, start }) => {
        const first = plan(input);
        expect(
          knockOn(
            { plan: first, sport: input.sport },
            { plan: plan(input, baseOf(first)), sport: input.sport },
          ),
        ).toEqual(EMPTY);
        const changed = { ...input, sport: [...input.sport, sessionAt(input, share, start)] };
        const second = plan(changed, baseOf(first));
        const third = plan(changed, baseOf(second));
        expect(
          knockOn({ plan: second, sport: changed.sport }, { plan: third, sport: changed.sport }),
        ).toEqual(EMPTY);
      }),
      { numRuns: 200, seed: 111 },
    );
  });

  it("put back restores the lifts that stood before it, to the byte (200 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput({ maxWeeks: 10 }), arbAddition, (input, { share, start }) => {
        const stood = plan(input, baseOf(plan(input)));
        const changed = { ...input, sport: [...input.sport, sessionAt(input, share, start)] };
        const standing = plan(changed, baseOf(stood));
        // As the camp book does it: what the change touched goes back to where it stood.
        const before = new Map(stood.lifts.map((lift) => [lift.id, lift]));
        const kept = standing.lifts.flatMap((lift) => before.get(lift.id) ?? []);
        const gone = stood.lifts.filter((lift) => !standing.lifts.some(({ id }) => id === lift.id));
        const restored = plan(input, { boutDay: input.bout.day, lifts: [...kept, ...gone] });
        expect(JSON.stringify(restored.lifts)).toBe(JSON.stringify(stood.lifts));
        expect(knockOn({ plan: stood, sport: input.sport }, { plan: restored, sport: input.sport })).toEqual(
          EMPTY,
        );
      }),
      { numRuns: 200, seed: 112 },
    );
  });

  it("never moves, drops or re-doses what is past, whatever changes: sport, bout, length or lifts a week (200 inputs)", () => {
    fc.assert(
      fc.property(
        arbPlanInput({ minWeeks: 2, maxWeeks: 10 }),
        arbAddition,
        fc.integer({ min: -10, max: 21 }),
        fc.integer({ min: 1, max: 12 }),
        (input, { share, start }, shift, weeks) => {
          const first = plan({ ...input, now: ((input.bout.day - 7 * input.weeks - 30) * 1440) as Instant });
          const bout = { day: (input.bout.day + shift) as Day, start: input.bout.start };
          const later = {
            ...input,
            weeks,
            bout: instantAt(input.zone, bout.day, bout.start) > input.now ? bout : input.bout,
            weighIn: null,
            sport: [...input.sport, sessionAt(input, share, start)],
          };
          const second = plan(later, baseOf(first));
          const past = first.lifts.filter((lift) => instantAt(input.zone, lift.day, lift.start) <= input.now);
          for (const { week: _week, past: _past, ...rest } of past) {
            expect(second.lifts.find((lift) => lift.id === rest.id)).toMatchObject({ ...rest, past: true });
          }
          expect(second.lifts.filter((lift) => lift.past)).toHaveLength(past.length);
        },
      ),
      { numRuns: 200, seed: 113 },
    );
  });

  it("time that passes moves nothing (120 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput({ maxWeeks: 8 }), (input) => {
        const early = { ...input, now: ((input.bout.day - 7 * input.weeks - 30) * 1440) as Instant };
        const first = plan(early);
        const later = plan(input, baseOf(first));
        const places = (lifts: readonly Lift[]) =>
          lifts.map(({ id, day, start, sets }) => ({ id, day, start, sets }));
        expect(places(later.lifts)).toEqual(places(first.lifts));
      }),
      { numRuns: 120, seed: 114 },
    );
  });
});
