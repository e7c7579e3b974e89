import { describe, expect, it } from "vitest";
import { loadCap } from "@/lib/engine/dose/cap";
import { sessionLoad, sportLoad } from "@/lib/engine/load/session-load";
import { weekLoad } from "@/lib/engine/load/week-load";
import { ewma } from "@/lib/engine/load/weighted";
import { DEFAULT_RULES } from "@/lib/engine/rules/house-rules";
import type { Au } from "@/lib/engine/types";

describe("session load (Foster 1998, Med Sci Sports Exerc 30:1164-1168; Foster et al. 2001, J Strength Cond Res 15(1):109-115)", () => {
  it.each([
    { effort: 7, minutes: 60, load: 420 },
    { effort: 8, minutes: 60, load: 480 },
    { effort: 7, minutes: 25, load: 175 },
  ])("effort $effort for $minutes min is $load AU", ({ effort, minutes, load }) => {
    expect(sessionLoad(effort, minutes)).toBe(load);
  });

  it("a load that was answered for counts instead of the expected one", () => {
    expect(sportLoad({ effort: 8, minutes: 60, doneLoad: 300 as Au })).toBe(300);
    expect(sportLoad({ effort: 8, minutes: 60, doneLoad: 0 as Au })).toBe(0);
    expect(sportLoad({ effort: 8, minutes: 60 })).toBe(480);
  });
});

describe("monotony and strain (Foster 1998, Med Sci Sports Exerc 30:1164-1168; sample SD by our choice)", () => {
  // Values computed from the published definitions.
  it.each([
    { week: "mixed", daily: [360, 480, 0, 540, 420, 720, 0], total: 2520, monotony: 1.3306, strain: 3353.1 },
    {
      week: "six days alike",
      daily: [400, 400, 400, 400, 400, 400, 0],
      total: 2400,
      monotony: 2.2678,
      strain: 5442.7,
    },
    {
      week: "hard and easy days",
      daily: [600, 200, 600, 200, 600, 200, 0],
      total: 2400,
      monotony: 1.3675,
      strain: 3282.1,
    },
  ])("$week", ({ daily, total, monotony, strain }) => {
    const week = weekLoad(daily);
    expect(week.total).toBe(total);
    expect(week.monotony).toBeCloseTo(monotony, 4);
    expect(week.strain).toBeCloseTo(strain, 1);
  });

  it("the same load in hard and easy days has 40 % less strain than in days alike", () => {
    const alike = weekLoad([400, 400, 400, 400, 400, 400, 0]).strain ?? Number.NaN;
    const waves = weekLoad([600, 200, 600, 200, 600, 200, 0]).strain ?? Number.NaN;
    expect(1 - waves / alike).toBeCloseTo(0.4, 2);
  });

  it("has no monotony where all days are equal, instead of a number that means nothing", () => {
    expect(weekLoad([300, 300, 300, 300, 300, 300, 300])).toEqual({
      total: 2100,
      monotony: null,
      strain: null,
    });
    expect(weekLoad([0, 0, 0, 0, 0, 0, 0])).toEqual({ total: 0, monotony: null, strain: null });
    expect(weekLoad(Array<number>(7).fill(0.1)).monotony).toBeNull();
  });
});

describe("exponentially weighted average (Williams et al. 2017, Br J Sports Med 51(3):209-210)", () => {
  const LOADS = [400, 600, 0, 500, 700, 0, 300];
  // Values computed from the published formula, seeded with the first load.
  it.each([
    { span: 7, values: [400, 450, 337.5, 378.125, 458.5938, 343.9453, 332.959] },
    { span: 28, values: [400, 413.7931, 385.2556, 393.1691, 414.3298, 385.7553, 379.8412] },
  ])("span of $span days", ({ span, values }) => {
    const averages = ewma(LOADS, span);
    expect(averages).toHaveLength(values.length);
    averages.forEach((average, index) => expect(average).toBeCloseTo(values[index] ?? Number.NaN, 4));
  });

  it("lambda is 0.25 for 7 days and 0.0689655 for 28", () => {
    expect(ewma([0, 1], 7)[1]).toBe(0.25);
    expect(ewma([0, 1], 28)[1]).toBeCloseTo(0.0689655, 7);
  });

  it("the weekly cap is that average of the weeks before and 15 %; the first week has none", () => {
    expect(loadCap([], DEFAULT_RULES)).toBeNull();
    // Span 4 weeks, lambda 0.4: 0.4 x 2400 + 0.6 x 2000 = 2160.
    expect(loadCap([2000, 2400], DEFAULT_RULES)).toBeCloseTo(1.15 * 2160, 9);
  });
});
