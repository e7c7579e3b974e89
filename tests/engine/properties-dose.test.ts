import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { instantAt, plan, weeksOutOf, type Lift, type PlanInput, type SportSession } from "@/lib/engine";
import { arbAddition, sessionAt } from "../factories/additions";
import { arbPlanInput } from "../factories/plan-input";

/** Every lift pinned where it stands. */
const pinned = (input: PlanInput, lifts: readonly Lift[]): PlanInput => ({
  ...input,
  pins: lifts.map(({ id, item, week, day, start }) => ({ id, slot: { item, week }, day, start })),
});

// Thousands of camps on a shared machine: generous, and never what decides.
const TIME = { timeout: 180_000 };

describe("dose", TIME, () => {
  it("with lifts pinned, a hard sparring day more raises no sets of its week and lowers those within a day of it (400 inputs)", () => {
    let within = 0;
    fc.assert(
      fc.property(
        arbPlanInput({ pins: false, defaultRules: true, ahead: true, maxWeeks: 12 }),
        arbAddition,
        (free, { share, start }) => {
          const input = pinned(free, plan(free).lifts);
          const added = sessionAt(input, share, start);
          const before = plan(input).lifts;
          const after = new Map(
            plan({ ...input, sport: [...input.sport, added] }).lifts.map((lift) => [lift.id, lift.sets]),
          );
          /** Hours between a lift and a session, 0 where they overlap. */
          const hours = (lift: Lift, session: SportSession): number => {
            const [a, b] = [
              instantAt(input.zone, lift.day, lift.start),
              instantAt(input.zone, session.day, session.start),
            ];
            return Math.max(0, b - a - lift.minutes, a - b - session.minutes) / 60;
          };
          for (const lift of before) {
            const sets = after.get(lift.id) ?? Number.NaN;
            const week = weeksOutOf(input.bout.day, lift.day) - weeksOutOf(input.bout.day, added.day);
            if (week === 0) expect(sets).toBeLessThanOrEqual(lift.sets);
            const already = input.sport.some(
              (other) => other.kind === "hard-sparring" && hours(lift, other) <= 24,
            );
            // The week after may carry more, since the week with the extra day raised what its cap is measured by.
            if (week < 0 || hours(lift, added) > 24 || already || lift.sets <= lift.floorSets) continue;
            within += 1;
            expect(sets).toBeLessThan(lift.sets);
          }
        },
      ),
      { numRuns: 400, seed: 121 },
    );
    expect(within).toBeGreaterThan(100);
  });

  it("a deeper cut never raises the sets of any session (200 inputs)", () => {
    const cut = fc.integer({ min: 41, max: 60 }).map((value) => value / 100);
    fc.assert(
      fc.property(arbPlanInput(), cut, cut, (input, one, other) => {
        const at = (share: number) => plan({ ...input, rules: { ...input.rules, "taper.cut": share } }).lifts;
        const deeper = new Map(at(Math.max(one, other)).map((lift) => [lift.id, lift.sets]));
        for (const lift of at(Math.min(one, other))) {
          expect(deeper.get(lift.id) ?? Number.NaN).toBeLessThanOrEqual(lift.sets);
        }
      }),
      { numRuns: 200, seed: 122 },
    );
  });

  it("no week exceeds its cap, except by what sport and the floors leave no choice about (120 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput({ pins: false }), (input) => {
        const made = plan(input);
        for (const week of made.weeks) {
          if (week.loadCap === null || week.sportLoad + week.liftingLoad <= week.loadCap + 1e-6) continue;
          const lifts = made.lifts.filter((lift) => lift.week === week.weeksOut);
          for (const lift of lifts) {
            const {
              wave = 1,
              taper = 1,
              response = 1,
              coach = 1,
              before = 1,
              after = 1,
            } = Object.fromEntries(lift.factors.map(({ name, value }) => [name, value]));
            const least =
              lift.baseSets *
              wave *
              response *
              coach *
              Math.min(taper * before * after, input.rules["cap.floor"]);
            expect(lift.sets).toBeLessThanOrEqual(Math.max(lift.floorSets, Math.floor(least + 0.501)));
          }
        }
      }),
      { numRuns: 120, seed: 123 },
    );
  });
});
