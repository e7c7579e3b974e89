import { describe, expect, it } from "vitest";
import { meanOfDecay, taperFactor, tauFor } from "@/lib/engine/dose/taper";
import { HOUSE_RULES } from "@/lib/engine/rules/house-rules";

const percent = (share: number): number => Number((100 * share).toFixed(2));

describe("exponential taper (Banister, Carter & Zarkadas 1999, Eur J Appl Physiol 79:182-191)", () => {
  // Values computed from the published formula L(t) = L0 exp(-t / tau), in % of the load before the taper.
  it.each([
    { t: 1, tau4: 77.88, tau5: 81.87, tau8: 88.25 },
    { t: 2, tau4: 60.65, tau5: 67.03, tau8: 77.88 },
    { t: 4, tau4: 36.79, tau5: 44.93, tau8: 60.65 },
    { t: 7, tau4: 17.38, tau5: 24.66, tau8: 41.69 },
    { t: 10, tau4: 8.21, tau5: 13.53, tau8: 28.65 },
    { t: 14, tau4: 3.02, tau5: 6.08, tau8: 17.38 },
  ])("day $t of the decay", ({ t, tau4, tau5, tau8 }) => {
    expect([4, 5, 8].map((tau) => percent(taperFactor(t, tau)))).toEqual([tau4, tau5, tau8]);
  });

  it("means of 14 days: 24.39, 30.30 and 44.32 %", () => {
    expect([4, 5, 8].map((tau) => percent(meanOfDecay(tau, 14)))).toEqual([24.39, 30.3, 44.32]);
  });

  it("of the constants 4 and 8 days, only the slow one stays within the published 41 to 60 % over 14 days", () => {
    expect(1 - meanOfDecay(8, 14)).toBeLessThanOrEqual(0.6);
    expect(1 - meanOfDecay(4, 14)).toBeGreaterThan(0.6);
  });

  it("leaves everything before the taper as it is", () => {
    expect(taperFactor(0, 5)).toBe(1);
    expect(taperFactor(-20, 5)).toBe(1);
  });
});

describe("cut of volume (Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365: 41 to 60 %)", () => {
  it.each([
    { cut: 0.41, days8: 7.905, days10: 9.618, days14: 13.045 },
    { cut: 0.5, days8: 5.855, days10: 7.111, days14: 9.623 },
    { cut: 0.6, days8: 4.257, days10: 5.155, days14: 6.95 },
  ])("time constants for a mean cut of $cut", ({ cut, days8, days10, days14 }) => {
    expect(tauFor(cut, 8)).toBeCloseTo(days8, 3);
    expect(tauFor(cut, 10)).toBeCloseTo(days10, 3);
    expect(tauFor(cut, 14)).toBeCloseTo(days14, 3);
  });

  it("the constant found cuts the mean by exactly what was asked, for every taper a team may choose", () => {
    for (let days = 7; days <= 21; days++) {
      for (const cut of [0.41, 0.45, 0.5, 0.55, 0.6]) {
        const tau = tauFor(cut, days);
        const mean =
          Array.from({ length: days }, (_, index) => taperFactor(index + 1, tau)).reduce((a, b) => a + b) /
          days;
        expect(1 - mean).toBeCloseTo(cut, 9);
      }
    }
  });

  it("a team cannot choose a cut outside the published range", () => {
    expect([HOUSE_RULES["taper.cut"].min, HOUSE_RULES["taper.cut"].max]).toEqual([0.41, 0.6]);
  });

  it("16 sets fall to 13.0, 10.6, 7.7, 5.7 and 3.7 on days 2, 4, 7, 10 and 14", () => {
    const tau = tauFor(0.5, 14);
    expect([2, 4, 7, 10, 14].map((t) => Number((16 * taperFactor(t, tau)).toFixed(1)))).toEqual([
      13, 10.6, 7.7, 5.7, 3.7,
    ]);
  });

  it("two weeks, the duration with the largest published effect, is the default of a full camp", () => {
    expect(HOUSE_RULES["taper.days.long"].value).toBe(14);
  });
});
