import { describe, expect, it } from "vitest";
import { estimateBest, REP_MAX_FORMULAS, type RepMaxFormula } from "@/lib/engine";

const kgOf = (formula: RepMaxFormula, kg: number, reps: number): number => {
  const estimate = estimateBest(formula, kg, reps);
  if ("problem" in estimate) throw new Error(estimate.problem);
  return estimate.kg;
};

describe("estimated bests (equations as compared by LeSuer et al. 1997, J Strength Cond Res 11:211-213, from memory)", () => {
  // 100 kg to failure; values computed from the published equations.
  const TABLE: readonly (readonly [number, ...number[]])[] = [
    //  reps  Epley  Brzycki   Lander  O'Conner   Wathan Lombardi   Mayhew
    [3, 110, 105.882, 107.197, 107.5, 108.98, 111.612, 113.99],
    [5, 116.667, 112.5, 113.709, 112.5, 116.583, 117.462, 119.011],
    [8, 126.667, 124.138, 125.109, 120, 127.671, 123.114, 126.286],
    [10, 133.333, 133.333, 134.07, 125, 134.747, 125.893, 130.934],
  ];

  it.each(TABLE)("%i repetitions of 100 kg", (reps, ...kilograms) => {
    const formulas = ["epley", "brzycki", "lander", "oconner", "wathan", "lombardi", "mayhew"] as const;
    expect(formulas).toHaveLength(REP_MAX_FORMULAS.length);
    expect(formulas.map((formula) => Number(kgOf(formula, 100, reps).toFixed(3)))).toEqual(kilograms);
  });

  it.each(REP_MAX_FORMULAS)(
    "%s: one repetition is the best itself, not what the equation makes of it",
    (formula) => {
      expect(kgOf(formula, 142.5, 1)).toBe(142.5);
    },
  );

  it("Epley and Brzycki meet at ten repetitions, Brzycki and O'Conner at five", () => {
    expect(kgOf("epley", 90, 10)).toBeCloseTo(kgOf("brzycki", 90, 10), 10);
    expect(kgOf("brzycki", 90, 5)).toBeCloseTo(kgOf("oconner", 90, 5), 10);
  });

  it("the rounded form of Brzycki, w / (1.0278 - 0.0278 r), is within 0.04 kg of the exact one (Brzycki 1993, JOPERD 64:88)", () => {
    for (const reps of [2, 3, 5, 8, 10]) {
      expect(Math.abs(kgOf("brzycki", 100, reps) - 100 / (1.0278 - 0.0278 * reps))).toBeLessThan(0.04);
    }
  });

  it.each(REP_MAX_FORMULAS)("%s grows with repetitions and with load", (formula) => {
    for (let reps = 2; reps <= 10; reps += 1) {
      expect(kgOf(formula, 80, reps)).toBeGreaterThan(kgOf(formula, 80, reps - 1));
      expect(kgOf(formula, 82.5, reps)).toBeGreaterThan(kgOf(formula, 80, reps));
    }
  });

  it.each(REP_MAX_FORMULAS)(
    "%s refuses more than ten repetitions (Reynolds et al. 2006, J Strength Cond Res 20(3):584-592)",
    (formula) => {
      for (const reps of [11, 12, 20, 37])
        expect(estimateBest(formula, 100, reps)).toEqual({ problem: "reps" });
    },
  );

  it("refuses what is no count of repetitions and what is no load", () => {
    for (const reps of [0, -1, 2.5, Number.NaN]) {
      expect(estimateBest("epley", 100, reps)).toEqual({ problem: "reps" });
    }
    for (const kg of [0, -20, Number.NaN, Infinity]) {
      expect(estimateBest("epley", kg, 5)).toEqual({ problem: "load" });
    }
  });
});
