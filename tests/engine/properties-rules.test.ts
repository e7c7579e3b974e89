import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { inputProblems, instantAt, plan, weeksOutOf, type Base, type Plan } from "@/lib/engine";
import { arbPlanInput, deepFreeze } from "../factories/plan-input";
import { brokenMustRules, closedDays } from "./must-rules";

const baseOf = (made: Plan): Base => ({ boutDay: made.bout.day, lifts: made.lifts });

// Thousands of camps on a shared machine: generous, and never what decides.
const TIME = { timeout: 180_000 };

describe("for every valid input", TIME, () => {
  it("nothing unpinned breaks a must rule, and every rule that a pin breaks is reported (400 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput(), (input) => {
        const made = plan(input);
        const free = made.lifts.filter((lift) => !lift.pinned);
        expect(brokenMustRules(input, made.lifts, free)).toEqual([]);
        const reported = new Set(
          made.violations.flatMap(({ rule, ids }) => ids.map((id) => `${rule} ${id}`)),
        );
        const pins = made.lifts.filter((lift) => lift.pinned && !lift.past);
        for (const { rule, id } of brokenMustRules(input, made.lifts, pins))
          expect(reported).toContain(`${rule} ${id}`);
      }),
      { numRuns: 400, seed: 101 },
    );
  });

  it("nothing is planned on held, rest, travel, weigh-in and bout days, nor in the past, nor outside the camp (250 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput({ pins: false }), (input) => {
        const made = plan(input);
        for (const lift of made.lifts) {
          expect(closedDays(input, lift.day)).toBeNull();
          expect(instantAt(input.zone, lift.day, lift.start)).toBeGreaterThan(input.now);
          expect(weeksOutOf(input.bout.day, lift.day)).toBe(lift.week);
          expect(lift.week).toBeLessThan(input.weeks);
        }
        const slots = [...made.lifts, ...made.unplaced].map(({ item, week }) => `${item} ${week}`);
        expect(new Set(slots).size).toBe(slots.length);
        expect(new Set([...made.lifts, ...made.unplaced].map(({ id }) => id)).size).toBe(slots.length);
        for (const { rules } of made.unplaced) expect(rules.length).toBeGreaterThan(0);
      }),
      { numRuns: 250, seed: 102 },
    );
  });

  it("planning never changes its input, and the same input gives the same plan to the byte (120 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput(), (input) => {
        expect(inputProblems(input)).toEqual([]);
        const copy = structuredClone(input);
        const made = plan(deepFreeze(input));
        expect(JSON.stringify(plan(copy))).toBe(JSON.stringify(made));
        const base = deepFreeze(baseOf(made));
        const changed = { ...input, weeks: Math.max(1, input.weeks - 1) };
        expect(JSON.stringify(plan(copy, base))).toBe(JSON.stringify(plan(input, structuredClone(base))));
        plan(deepFreeze(changed), base);
      }),
      { numRuns: 120, seed: 103 },
    );
  });

  it("sets come from the factors, and a lift keeps its reserved start (120 inputs)", () => {
    fc.assert(
      fc.property(arbPlanInput(), (input) => {
        for (const lift of plan(input).lifts) {
          const product = lift.factors.reduce((sets, factor) => sets * factor.value, lift.baseSets);
          expect(lift.sets).toBe(Math.max(lift.floorSets, Math.floor(product + 0.5 + 1e-9)));
        }
      }),
      { numRuns: 120, seed: 104 },
    );
  });
});
