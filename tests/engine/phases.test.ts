import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { campWeeks, phaseSpans } from "@/lib/engine/phases";
import { dayFromIso } from "@/lib/engine/geometry";
import { DEFAULT_RULES, withOverrides } from "@/lib/engine/rules/house-rules";
import { TRAINING_AGES, type HouseRules, type TrainingAge } from "@/lib/engine/types";
import { arbRules } from "../factories/plan-input";

const BOUT = dayFromIso("2027-01-09");
const spans = (weeks: number, trainingAge: TrainingAge = "intermediate", rules: HouseRules = DEFAULT_RULES) =>
  phaseSpans({ boutDay: BOUT, weeks, trainingAge, rules });
const lengths = (weeks: number, trainingAge?: TrainingAge, rules?: HouseRules) =>
  Object.fromEntries(spans(weeks, trainingAge, rules).map(({ phase, from, to }) => [phase, to - from + 1]));
const weeksOf = (weeks: number, rules: HouseRules = DEFAULT_RULES) =>
  campWeeks({ boutDay: BOUT, weeks, trainingAge: "intermediate", rules });

describe("phases, counted back from the bout", () => {
  it.each([
    { weeks: 1, taper: 7 },
    { weeks: 2, power: 7, taper: 7 },
    { weeks: 3, strength: 7, power: 7, taper: 7 },
    { weeks: 4, strength: 11, power: 7, taper: 10 },
    { weeks: 5, strength: 18, power: 7, taper: 10 },
    { weeks: 6, strength: 14, power: 14, taper: 14 },
    { weeks: 8, strength: 28, power: 14, taper: 14 },
    { weeks: 10, foundation: 14, strength: 28, power: 14, taper: 14 },
    { weeks: 12, foundation: 21, strength: 28, power: 21, taper: 14 },
    { weeks: 20, foundation: 21, strength: 77, power: 28, taper: 14 },
  ])("$weeks weeks", ({ weeks, ...days }) => {
    expect(lengths(weeks)).toEqual(days);
  });

  it("the longer someone has trained, the more of building is power", () => {
    expect(TRAINING_AGES.map((age) => lengths(8, age).power)).toEqual([14, 14, 21]);
    expect(TRAINING_AGES.map((age) => lengths(12, age).power)).toEqual([14, 21, 28]);
  });

  it("cover every camp day once, end with the bout, and come in order, whatever the house rules", () => {
    const order = ["foundation", "strength", "power", "taper"];
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 20 }),
        fc.constantFrom(...TRAINING_AGES),
        arbRules,
        (weeks, age, rules) => {
          const found = spans(weeks, age, rules);
          expect(found[0]?.from).toBe(BOUT - 7 * weeks + 1);
          expect(found.at(-1)).toMatchObject({ phase: "taper", to: BOUT });
          found.forEach((span, index) => {
            expect(span.to).toBeGreaterThanOrEqual(span.from);
            const next = found[index + 1];
            if (next)
              expect([next.from, order.indexOf(next.phase) > order.indexOf(span.phase)]).toEqual([
                span.to + 1,
                true,
              ]);
          });
          const building = 7 * weeks - (lengths(weeks, age, rules).taper ?? 0);
          if (building >= 7) expect(lengths(weeks, age, rules).power).toBeGreaterThanOrEqual(7);
        },
      ),
      { numRuns: 500, seed: 21 },
    );
  });
});

describe("camp weeks", () => {
  it("8 weeks: three of strength, a lighter one, two of power, two of taper", () => {
    expect(
      weeksOf(8).map(({ phase, deload, step }) => (deload ? `${phase} light` : `${phase} ${step}`)),
    ).toEqual([
      ...[
        "strength 1",
        "strength 2",
        "strength 3",
        "strength light",
        "power 1",
        "power 2",
        "taper 0",
        "taper 0",
      ],
    ]);
  });

  it("a week that the phases share equally or not belongs to the one with most of its days", () => {
    // 4 weeks: 11 days of strength, 7 of power, 10 of taper.
    expect(weeksOf(4).map((week) => week.phase)).toEqual(["strength", "strength", "power", "taper"]);
  });

  it("every fourth building week is lighter, never the last before the taper and never one of the taper", () => {
    for (let weeks = 1; weeks <= 20; weeks++) {
      const rows = weeksOf(weeks);
      const building = rows.filter((row) => row.phase !== "taper");
      rows.forEach((row, index) => {
        const expected = index < building.length - 1 && (index + 1) % 4 === 0;
        expect(row.deload).toBe(expected);
      });
    }
  });

  it("a team may put the lighter week elsewhere", () => {
    const light = weeksOf(12, withOverrides({ "deload.every": 3 })).filter((row) => row.deload);
    expect(light.map((row) => row.weeksOut)).toEqual([9, 6, 3]);
  });

  it("the step counts from 1 after a lighter week and at the start of a phase", () => {
    expect(weeksOf(12).map((row) => row.step)).toEqual([1, 2, 3, 0, 1, 2, 3, 0, 1, 2, 0, 0]);
  });
});
