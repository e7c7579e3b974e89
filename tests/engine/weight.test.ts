import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { DEFAULT_RULES, withOverrides, type Day, type Kg } from "@/lib/engine";
import {
  ceilings,
  descentLine,
  lineKg,
  linePoints,
  weightRemark,
  type WeightFacts,
  type WeightState,
} from "@/lib/engine/weight";
import { arbRules } from "../factories/plan-input";

const day = (value: number): Day => value as Day;
const kg = (value: number): Kg => value as Kg;

/** 64 kg eight weeks before a weigh-in at 61 kg on day 156. */
const facts = (
  weights: readonly (readonly [number, number])[],
  over: Partial<WeightFacts> = {},
): WeightFacts => {
  const today = over.today ?? day(Math.max(100, ...weights.map(([at]) => at)));
  return {
    minor: false,
    limitKg: kg(61),
    weighIn: day(156),
    line: descentLine({ day: day(100), kg: kg(64) }, kg(61), day(156), DEFAULT_RULES),
    weights: weights.map(([at, value]) => ({ day: day(at), kg: kg(value) })),
    rules: DEFAULT_RULES,
    ...over,
    today,
  };
};
const kinds = (state: WeightState) =>
  state.off === null ? state.remarks.map((remark) => remark.kind) : state.off;

describe("the line of descent", () => {
  it("never rises, never falls faster than the fastest rate, never goes below the limit (400 lines)", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 45, max: 150, noNaN: true }),
        fc.double({ min: 45, max: 150, noNaN: true }),
        fc.integer({ min: 1, max: 140 }),
        arbRules,
        (start, limit, days, rules) => {
          const line = descentLine({ day: day(0), kg: kg(start) }, kg(limit), day(days), rules);
          if (!line) throw new Error("no line");
          const points = linePoints(line);
          expect(points).toHaveLength(days + 1);
          const daily = (1 - rules["weight.fastest"] / 100) ** (1 / 7);
          points.slice(1).forEach((point, index) => {
            const before = points[index]?.kg ?? Number.NaN;
            expect(point.kg).toBeLessThanOrEqual(before);
            expect(point.kg).toBeGreaterThanOrEqual(before * daily - 1e-9);
            expect(point.kg).toBeGreaterThanOrEqual(limit - 1e-9);
          });
          const end = points.at(-1)?.kg ?? Number.NaN;
          expect(end - limit).toBeCloseTo(line.shortKg, 6);
          expect(line.shortKg > 0).toBe(line.pace === "beyond-fastest");
        },
      ),
      { numRuns: 400, seed: 311 },
    );
  });

  it("there is none without a day left, and a level one at the limit for who is under it", () => {
    expect(descentLine({ day: day(9), kg: kg(64) }, kg(61), day(9), DEFAULT_RULES)).toBeNull();
    const under = descentLine({ day: day(0), kg: kg(59) }, kg(61), day(28), DEFAULT_RULES);
    expect(under).toMatchObject({ pace: "none", rate: 0, weeksNeeded: 0, shortKg: 0 });
    expect(under && lineKg(under, day(14))).toBe(61);
  });

  it("says when it is faster than recommended though not beyond the fastest", () => {
    const line = descentLine({ day: day(0), kg: kg(64) }, kg(61), day(28), DEFAULT_RULES);
    expect(line?.pace).toBe("faster-than-recommended");
  });
});

describe("ceilings", () => {
  it("come down towards the weigh-in, and never below the limit (200 limits)", () => {
    fc.assert(
      fc.property(fc.double({ min: 45, max: 150, noNaN: true }), (limit) => {
        const made = ceilings(kg(limit), day(100), DEFAULT_RULES).map((ceiling) => ceiling.kg as number);
        expect(made).toEqual([...made].sort((a, b) => b - a));
        expect(Math.min(...made)).toBeGreaterThan(limit);
      }),
      { numRuns: 200, seed: 312 },
    );
  });

  it("a team may set less than is published, and a weight over it is named against that", () => {
    const rules = withOverrides({ "weight.ceiling-48": 3 });
    expect(kinds(weightRemark(facts([[154, 63.5]], { rules })))).toContain("above-ceiling");
    expect(kinds(weightRemark(facts([[154, 63.5]])))).not.toContain("above-ceiling");
  });
});

describe("what is said of a weight", () => {
  it("on the line, with the weight and the line beside it", () => {
    const state = weightRemark(
      facts([
        [100, 64],
        [107, 63.6],
      ]),
    );
    expect(state).toMatchObject({
      off: null,
      latest: { day: 107 },
      remarks: [{ kind: "on-line", numbers: [{ value: 63.6 }, { value: expect.closeTo(63.62, 1) }] }],
    });
  });

  it("behind only by more than the margin", () => {
    const should = 64 * (61 / 64) ** (28 / 56);
    expect(kinds(weightRemark(facts([[128, should * 1.009]])))).toEqual(["on-line"]);
    expect(kinds(weightRemark(facts([[128, should * 1.011]])))).toEqual(["behind"]);
  });

  it("too fast by more than 1.5 % a week over a week or more, and not from one day to the next", () => {
    expect(
      kinds(
        weightRemark(
          facts([
            [100, 64],
            [107, 62.9],
          ]),
        ),
      ),
    ).toEqual(["too-fast"]);
    expect(
      kinds(
        weightRemark(
          facts([
            [100, 64],
            [107, 63.1],
          ]),
        ),
      ),
    ).toEqual(["on-line"]);
    expect(
      kinds(
        weightRemark(
          facts([
            [106, 64],
            [107, 62.9],
          ]),
        ),
      ),
    ).toEqual(["on-line"]);
  });

  it("in the last three days the ceilings judge, not the weekly rate", () => {
    const state = weightRemark(
      facts([
        [146, 64],
        [153, 62.2],
      ]),
    );
    expect(kinds(state)).toEqual(["behind"]);
  });

  it("above a ceiling comes first, with its basis declared and nothing on how to lose it", () => {
    const state = weightRemark(facts([[155, 64.2]]));
    expect(kinds(state)).toEqual(["above-ceiling", "behind"]);
    if (state.off !== null) throw new Error("off");
    expect(state.remarks[0]?.text).toContain("limit / (1 - share)");
    expect(state.remarks.map((remark) => remark.text).join(" ")).not.toMatch(
      /water|sauna|sweat|salt|dehydrat/i,
    );
  });

  it("nothing under 18, whatever the weight", () => {
    expect(weightRemark(facts([[155, 90]], { minor: true }))).toEqual({ off: "minor" });
  });

  it("nothing without a limit, without a weigh-in, after it, or without a weight of late", () => {
    expect(weightRemark(facts([[107, 64]], { limitKg: null }))).toEqual({ off: "no-limit" });
    expect(weightRemark(facts([[107, 64]], { weighIn: null }))).toEqual({ off: "no-limit" });
    expect(weightRemark(facts([[156, 61]], { today: day(157) }))).toEqual({ off: "weighed-in" });
    expect(weightRemark(facts([[100, 64]], { today: day(140) }))).toEqual({ off: "no-weight" });
    expect(weightRemark(facts([[120, 64]], { today: day(110) }))).toEqual({ off: "no-weight" });
  });

  it("does not depend on the order in which weights come", () => {
    const weights: [number, number][] = [
      [100, 64],
      [103, 63.2],
      [107, 62.9],
      [110, 62.1],
    ];
    expect(weightRemark(facts([...weights].reverse()))).toEqual(weightRemark(facts(weights)));
  });
});
