import { describe, expect, it } from "vitest";
import { EXERCISES } from "@/db/seed/exercises";
import {
  GOALS,
  insideLiftCount,
  LIFT_COUNTS,
  liftCountAt,
  percentAtReps,
  POWER_ZONES,
  repsAtPercent,
  reserveOfEffort,
} from "@/lib/engine";

describe("percent of best and most repetitions (NSCA wall chart; 15 repetitions from memory)", () => {
  it.each([
    [1, 100],
    [2, 95],
    [3, 93],
    [4, 90],
    [5, 87],
    [6, 85],
    [7, 83],
    [8, 80],
    [9, 77],
    [10, 75],
    [12, 70],
    [15, 65],
  ])("%i repetitions at most at %i percent", (reps, percent) => {
    expect(percentAtReps(reps)).toBe(percent);
    expect(repsAtPercent(percent)).toBe(reps);
  });

  it("reads between two rows on a straight line, and cautiously back", () => {
    expect(percentAtReps(11)).toBe(72.5);
    expect(repsAtPercent(82.5)).toBe(7);
    expect(repsAtPercent(87.5)).toBe(4);
    expect(repsAtPercent(40)).toBe(15);
  });

  it("says nothing where the chart does", () => {
    expect(percentAtReps(0)).toBeNull();
    expect(percentAtReps(16)).toBeNull();
  });

  // A derivation from the two tables, not a published chart.
  it.each([
    { reps: 5, effort: 8, percent: 83 },
    { reps: 3, effort: 9, percent: 90 },
    { reps: 8, effort: 8, percent: 75 },
    { reps: 5, effort: 7, percent: 80 },
  ])("$reps repetitions at an effort of $effort are $percent %", ({ reps, effort, percent }) => {
    expect(percentAtReps(reps + (reserveOfEffort(effort)?.low ?? Number.NaN))).toBe(percent);
  });
});

describe("repetitions in reserve (Zourdos 2016, J Strength Cond Res 30:267-275; Helms 2016, Strength Cond J 38(4):42-49; from memory)", () => {
  it.each([
    [10, 0, 0],
    [9.5, 0, 0],
    [9, 1, 1],
    [8.5, 1, 2],
    [8, 2, 2],
    [7.5, 2, 3],
    [7, 3, 3],
    [6, 4, 6],
    [5, 4, 6],
  ])("an effort of %d leaves %i to %i", (effort, low, high) => {
    expect(reserveOfEffort(effort)).toEqual({ low, high });
  });

  it("below 5 and above 10 there is nothing to count", () => {
    for (const effort of [0, 2, 4.5, 10.5]) expect(reserveOfEffort(effort)).toBeNull();
  });
});

describe("lift-count table (Prilepin, from weightlifting logs)", () => {
  it.each([
    { percent: 60, reps: [3, 6], optimal: 24, total: [18, 30] },
    { percent: 70, reps: [3, 6], optimal: 18, total: [12, 24] },
    { percent: 79.5, reps: [3, 6], optimal: 18, total: [12, 24] },
    { percent: 80, reps: [2, 4], optimal: 15, total: [10, 20] },
    { percent: 89.5, reps: [2, 4], optimal: 15, total: [10, 20] },
    { percent: 90, reps: [1, 2], optimal: 7, total: [4, 10] },
  ])("at $percent %", ({ percent, reps, optimal, total }) => {
    const row = liftCountAt(percent);
    expect([row?.repsPerSet.low, row?.repsPerSet.high]).toEqual(reps);
    expect(row?.optimal).toBe(optimal);
    expect([row?.total.low, row?.total.high]).toEqual(total);
  });

  it("has no row under 55 %, and none overlap", () => {
    expect(liftCountAt(54.5)).toBeNull();
    LIFT_COUNTS.slice(1).forEach((row, index) => expect(row.from).toBe(LIFT_COUNTS[index]?.below));
  });

  it("5 × 3 at 80 % is inside and the optimum", () => {
    expect(insideLiftCount(80, 5, 3)).toBe(true);
    expect(liftCountAt(80)?.optimal).toBe(15);
  });
  it("6 × 4 at 85 % is too much", () => expect(insideLiftCount(85, 6, 4)).toBe(false));
  it("4 × 2 at 92 % is inside", () => expect(insideLiftCount(92, 4, 2)).toBe(true));
  it("5 × 5 at 75 % is just too much", () => expect(insideLiftCount(75, 5, 5)).toBe(false));
});

describe("loads for power (Soriano et al. 2015, Sports Med 45(8):1191-1205)", () => {
  it("zones: squat 30 to 70 %, jump squat at most 30 %, power clean from 70 %", () => {
    expect(POWER_ZONES.squat).toEqual({ low: 30, high: 70 });
    expect(POWER_ZONES["jump-squat"]).toEqual({ low: 0, high: 30 });
    expect(POWER_ZONES["power-clean"].low).toBe(70);
  });

  // Cormie et al. 2007, Med Sci Sports Exerc 39(2):340-349: jump squat 0 %, squat 56 %, power clean 80 %.
  it("hold the best single loads of Cormie et al. 2007", () => {
    for (const [lift, percent] of [
      ["jump-squat", 0],
      ["squat", 56],
      ["power-clean", 80],
    ] as const) {
      expect(POWER_ZONES[lift].low).toBeLessThanOrEqual(percent);
      expect(POWER_ZONES[lift].high).toBeGreaterThanOrEqual(percent);
    }
  });

  const zoned = EXERCISES.filter(({ powerZone }) => powerZone);
  const named = (pattern: RegExp, not = /^$/) => zoned.filter(({ id }) => pattern.test(id) && !not.test(id));

  it("every squat of the library that is moved fast stays in the squat's zone", () => {
    const squats = named(/squat/, /jump/);
    expect(squats.length).toBeGreaterThan(0);
    for (const { powerZone } of squats) {
      expect(powerZone?.low).toBeGreaterThanOrEqual(POWER_ZONES.squat.low);
      expect(powerZone?.high).toBeLessThanOrEqual(POWER_ZONES.squat.high);
    }
  });

  it("every jump squat of the library stays at or under 30 %", () => {
    const jumps = named(/jump.*squat|squat.*jump/);
    expect(jumps.length).toBeGreaterThan(0);
    for (const { powerZone } of jumps) expect(powerZone?.high).toBeLessThanOrEqual(30);
  });

  it("every power clean of the library is at or above 70 %", () => {
    const cleans = named(/clean/);
    expect(cleans.length).toBeGreaterThan(0);
    for (const { powerZone } of cleans) expect(powerZone?.low).toBeGreaterThanOrEqual(70);
  });
});

describe("goal table (NSCA Essentials, from memory)", () => {
  it("strength is 85 % or more, at most 6 repetitions, 2 to 6 sets, 2 to 5 minutes of rest", () => {
    expect(GOALS.strength).toMatchObject({
      percent: { low: 85 },
      reps: { high: 6 },
      sets: { low: 2, high: 6 },
      rest: { low: 120, high: 300 },
    });
  });

  it("power is 80 to 90 % for one effort and 75 to 85 % for several", () => {
    expect(GOALS["power-single"]).toMatchObject({
      percent: { low: 80, high: 90 },
      reps: { low: 1, high: 2 },
    });
    expect(GOALS["power-multiple"]).toMatchObject({
      percent: { low: 75, high: 85 },
      reps: { low: 3, high: 5 },
    });
  });

  it("size is 67 to 85 % of 6 to 12 repetitions; endurance at most 67 % of 12 or more", () => {
    expect(GOALS.size).toMatchObject({ percent: { low: 67, high: 85 }, reps: { low: 6, high: 12 } });
    expect(GOALS.endurance).toMatchObject({ percent: { high: 67 }, reps: { low: 12 } });
  });
});
