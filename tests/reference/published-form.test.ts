import { describe, expect, it } from "vitest";
import {
  daysTrainingHelpsMost,
  daysTrainingStopsHelping,
  impulseResponse,
  influence,
  steadyState,
  type FormModel,
} from "@/lib/engine/load/form";
import { DEFAULT_RULES } from "@/lib/engine/rules/house-rules";

const model = (tau1: number, tau2: number, k1: number, k2: number): FormModel => ({ tau1, tau2, k1, k2 });
/** Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (constants from memory). */
const MORTON = model(45, 15, 1, 2);

describe("impulse-response model (Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177)", () => {
  // Values computed from the published recursion with same-day load left out, p0 = 500, loads 100, 0, 50.
  it.each([
    { morning: 0, g: 0, h: 0, p: 500 },
    { morning: 1, g: 97.8023, h: 93.5507, p: 410.7009 },
    { morning: 2, g: 95.6529, h: 87.5173, p: 420.6182 },
    { morning: 3, g: 142.4518, h: 128.6484, p: 385.155 },
  ])("morning $morning of the trace", ({ morning, g, h, p }) => {
    const at = impulseResponse([100, 0, 50], MORTON, 500)[morning];
    expect(at?.fitness).toBeCloseTo(g, 4);
    expect(at?.fatigue).toBeCloseTo(h, 4);
    expect(at?.performance).toBeCloseTo(p, 4);
  });

  it.each([
    { tau: 45, settles: 4450.185 },
    { tau: 15, settles: 1450.556 },
    { tau: 42, settles: 4150.198 },
    { tau: 7, settles: 651.19 },
  ])("100 AU a day settles at $settles for a time constant of $tau days", ({ tau, settles }) => {
    expect(steadyState(100, tau)).toBeCloseTo(settles, 3);
    const long = impulseResponse(Array<number>(2000).fill(100), model(tau, 1, 1, 1)).at(-1);
    expect(long?.fitness).toBeCloseTo(settles, 3);
  });

  it("the recursion equals the published sum over past days", () => {
    const loads = [300, 0, 120, 450, 0, 0, 80];
    const sum = (tau: number) =>
      loads.reduce((total, load, day) => total + load * Math.exp(-(loads.length - day) / tau), 0);
    expect(impulseResponse(loads, MORTON).at(-1)?.performance).toBeCloseTo(sum(45) - 2 * sum(15), 9);
  });

  it("the constants of the house rules are the published ones", () => {
    expect([
      DEFAULT_RULES["form.tau1"],
      DEFAULT_RULES["form.tau2"],
      DEFAULT_RULES["form.k1"],
      DEFAULT_RULES["form.k2"],
    ]).toEqual([45, 15, 1, 2]);
  });
});

describe("influence curve (Fitz-Clarke, Morton & Banister 1991, J Appl Physiol 71:1151-1158)", () => {
  // Values computed from the closed forms t_n and t_g.
  it.each([
    { tau1: 45, tau2: 15, k1: 1, k2: 2, stops: 15.596, most: 40.315 },
    { tau1: 42, tau2: 7, k1: 1, k2: 2, stops: 5.822, most: 20.873 },
    { tau1: 50, tau2: 11, k1: 1, k2: 1.8, stops: 8.289, most: 29.642 },
    { tau1: 60, tau2: 15, k1: 1, k2: 2, stops: 13.863, most: 41.589 },
    { tau1: 38, tau2: 19, k1: 1, k2: 1.5, stops: 15.408, most: 41.747 },
  ])(
    "constants $tau1 and $tau2: stops helping at $stops, helps most at $most days out",
    ({ tau1, tau2, k1, k2, stops, most }) => {
      const constants = model(tau1, tau2, k1, k2);
      expect(daysTrainingStopsHelping(constants)).toBeCloseTo(stops, 3);
      expect(daysTrainingHelpsMost(constants)).toBeCloseTo(most, 3);
      expect(influence(daysTrainingStopsHelping(constants), constants)).toBeCloseTo(0, 12);
      const peak = influence(daysTrainingHelpsMost(constants), constants);
      expect(influence(most - 1, constants)).toBeLessThan(peak);
      expect(influence(most + 1, constants)).toBeLessThan(peak);
    },
  );

  it("constants 45, 15, 1, 2: -1 on the day, -0.39824 at 7 days, 0.272166 at the best day", () => {
    expect(influence(0, MORTON)).toBe(-1);
    expect(influence(7, MORTON)).toBeCloseTo(-0.39824, 5);
    expect(influence(daysTrainingHelpsMost(MORTON), MORTON)).toBeCloseTo(0.272166, 6);
  });

  it("the two lines are always tau1 tau2 / (tau1 - tau2) x ln(tau1 / tau2) apart", () => {
    for (const [k1, k2] of [
      [1, 2],
      [1, 1.5],
      [2, 3],
    ] as const) {
      const constants = model(45, 15, k1, k2);
      expect(daysTrainingHelpsMost(constants) - daysTrainingStopsHelping(constants)).toBeCloseTo(
        22.5 * Math.log(3),
        9,
      );
    }
  });
});
