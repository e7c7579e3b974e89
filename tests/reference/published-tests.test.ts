import { describe, expect, it } from "vitest";
import {
  asymmetry,
  changeVerdict,
  flightOfHeight,
  heightOfFlight,
  leastRealChange,
  reactiveStrength,
  regressionPower,
  reliability,
  sampleSd,
  smallestWorthwhile,
  takeOffSpeed,
  verdictSentence,
  type PowerMethod,
  type TrialPair,
} from "@/lib/engine/measures";

describe("jump power by the published regressions (values worked out from the stated formulas)", () => {
  const cases: readonly (readonly [string, PowerMethod, number, number, number])[] = [
    ["Sayers et al. 1999, squat jump", "sayers-squat-jump", 40, 80, 3997],
    ["Sayers et al. 1999, squat jump", "sayers-squat-jump", 60, 75, 4984.5],
    ["Sayers et al. 1999, squat jump", "sayers-squat-jump", 55, 80, 4907.5],
    ["Sayers et al. 1999, countermovement (from memory)", "sayers-countermovement", 40, 80, 3981],
    ["Sayers et al. 1999, countermovement (from memory)", "sayers-countermovement", 60, 75, 4774.5],
    ["Sayers et al. 1999, countermovement (from memory)", "sayers-countermovement", 55, 80, 4759.5],
    ["Harman et al. 1991, peak", "harman-peak", 40, 80, 3534],
    ["Harman et al. 1991, peak", "harman-peak", 60, 75, 4592],
    ["Harman et al. 1991, peak", "harman-peak", 55, 80, 4462.5],
    ["Harman et al. 1991, average", "harman-average", 40, 80, 1295],
    ["Harman et al. 1991, average", "harman-average", 60, 75, 1604],
  ];
  it.each(cases)("%s: %s of %d cm at %d kg is %d W", (_, method, height, mass, watts) => {
    expect(regressionPower(method, height, mass)).toBeCloseTo(watts, 6);
  });

  it("the regressions agree with the group means of Canavan & Vescovi 2004 (Med Sci Sports Exerc 36(9):1589-1593), Harman's with minus 1822 alone", () => {
    // Reported there: 65.9 kg; means 2425.4 W measured, 2920.8 Sayers squat jump, 2925.1 countermovement, 2585.0 Harman.
    const mass = 65.9;
    const height = (2920.8 + 2055 - 45.3 * mass) / 60.7;
    expect(height).toBeCloseTo(32.79, 2);
    const near = (method: PowerMethod, reported: number, percent: number) =>
      expect(Math.abs((regressionPower(method, height, mass) ?? 0) / reported - 1) * 100).toBeLessThan(
        percent,
      );
    near("harman-peak", 2585, 0.25);
    near("sayers-countermovement", 2925.1, 0.35);
    near("canavan-vescovi", 2425.4, 0.2);
    expect((regressionPower("harman-peak", height, mass) ?? 0) + 2 * 1822).toBeCloseTo(6224.3, 0);
  });

  it("a jump too low for the regression has no power, not a negative one", () => {
    expect(regressionPower("sayers-squat-jump", 5, 30)).toBeNull();
  });
});

describe("flight time (h = g t2 / 8 with g = 9.81 m/s2)", () => {
  it.each([
    [0.5, 0.30656],
    [0.55, 0.37094],
    [0.6, 0.44145],
  ])("%d s is %d m, and back", (seconds, height) => {
    expect(heightOfFlight(seconds)).toBeCloseTo(height, 5);
    expect(flightOfHeight(heightOfFlight(seconds))).toBeCloseTo(seconds, 12);
  });

  it("0.40 m is a flight of 0.57114 s; 0.30 m is left at 2.42611 m/s", () => {
    expect(flightOfHeight(0.4)).toBeCloseTo(0.57114, 5);
    expect(takeOffSpeed(0.3)).toBeCloseTo(2.42611, 5);
  });

  it("reactive strength names its method: one jump, two numbers (Flanagan & Comyns 2008, from memory)", () => {
    const flight = flightOfHeight(0.35);
    expect(flight).toBeCloseTo(0.53425, 5);
    expect(reactiveStrength("height-over-contact", flight, 0.2)).toMatchObject({
      method: "height-over-contact",
      value: expect.closeTo(1.75, 6),
    });
    expect(reactiveStrength("flight-over-contact", flight, 0.2)).toMatchObject({
      method: "flight-over-contact",
      value: expect.closeTo(2.671, 3),
    });
    expect(reactiveStrength("height-over-contact", 0.5, 0)).toBeNull();
  });
});

describe("asymmetry (Bishop et al. 2016, Strength Cond J 38(6):27-32; 2018, 40(4):1-6; formulas from memory)", () => {
  it("right 24, left 21: 12.5 % one side at a time, 6.667 % both at once, the left being lower", () => {
    expect(asymmetry("unilateral", 21, 24)).toMatchObject({ size: 12.5, signed: -12.5, lower: "left" });
    expect(asymmetry("bilateral", 21, 24)?.size).toBeCloseTo(6.667, 3);
    expect(asymmetry("bilateral", 21, 24)?.signed).toBeCloseTo(-6.667, 3);
  });
});

describe("reliability (Hopkins 2000, Sports Med 30:1-15, its worked example)", () => {
  const first = [62, 78, 81, 55, 66];
  const second = [67, 76, 87, 55, 63];
  const pairs = first.map((value, index): TrialPair => [value, second[index] ?? Number.NaN]);
  const made = reliability(pairs);

  it("differences, their mean and SD", () => {
    expect(made?.differences).toEqual([5, -2, 6, 0, -3]);
    expect(made?.meanDifference).toBeCloseTo(1.2, 12);
    expect(made?.sdDifference).toBeCloseTo(4.08656, 5);
  });

  it("typical error 2.9, CV 4.188 %, least real change 8.010", () => {
    expect(made?.typicalError).toBeCloseTo(2.88964, 5);
    expect(made?.cvPercent).toBeCloseTo(4.188, 3);
    expect(made?.mdc95).toBeCloseTo(8.01, 2);
    expect(leastRealChange(2.88964)).toBeCloseTo(made?.mdc95 ?? Number.NaN, 3);
  });

  it("smallest worthwhile change 2.107 with the noise taken out of an SD of 10.9225", () => {
    expect(sampleSd(first)).toBeCloseTo(10.9225, 4);
    expect(smallestWorthwhile(first, made?.typicalError ?? Number.NaN)).toBeCloseTo(2.107, 3);
    expect(0.2 * (sampleSd(first) ?? Number.NaN)).toBeCloseTo(2.1845, 4);
  });

  it("a change between the typical error and the least real one is called noise, a larger one is not", () => {
    const error = made?.typicalError ?? Number.NaN;
    const small = changeVerdict(66, 71, error, 2.107);
    expect(small).toMatchObject({ change: 5, beyondNoise: false, worthHaving: true });
    expect(verdictSentence(small)).toBe(
      "Higher, not beyond the noise of this test; if it is real, worth having.",
    );
    const large = changeVerdict(66, 75, error, 2.107);
    expect(large).toMatchObject({ change: 9, beyondNoise: true, worthHaving: true });
    expect(verdictSentence(large)).toBe("Higher, beyond the noise of this test; worth having.");
  });
});
