import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  DEFAULT_RULES,
  SUGGESTION_KINDS,
  againstNormal,
  checkInSum,
  descentLine,
  suggestions,
  withOverrides,
  type Day,
  type Kg,
  type ResponseInput,
  type Suggestion,
} from "@/lib/engine";
import { deepFreeze } from "../factories/plan-input";
import {
  TODAY,
  ahead,
  arbResponseInput,
  checkIn,
  logged,
  responseInput,
  weekAnswer,
} from "../factories/response-input";

const of = (over: Partial<ResponseInput>): readonly Suggestion[] => suggestions(responseInput(over));
const at = (offset: number): Day => (TODAY + offset) as Day;
/** Ten ordinary days, 10 and 12 in turn: mean 11, SD 1.054. */
const ordinary = Array.from({ length: 10 }, (_, index) => checkIn(-1 - index, index % 2 ? 12 : 10));

describe("effort against expected", () => {
  const hard = (id: string, offset: number, effort: number) => logged(id, offset, { effort });

  it("two points above, twice running, offers fewer sets for a week", () => {
    const made = of({ logs: [hard("a", -3, 9), hard("b", -1, 9)], liftsAhead: [ahead("c", 1)] });
    expect(made).toMatchObject([
      {
        key: "effort:b",
        kind: "effort",
        numbers: [{ value: 2 }, { value: 2 }],
        change: { kind: "response", from: TODAY, to: TODAY + 6, factor: 0.8 },
      },
    ]);
  });

  it.each([
    ["once", [hard("a", -3, 7), hard("b", -1, 9)]],
    ["by one point", [hard("a", -3, 8), hard("b", -1, 9)]],
    ["not running", [hard("a", -5, 9), hard("b", -3, 7), hard("c", -1, 9)]],
    ["long ago", [hard("a", -12, 9), hard("b", -10, 9)]],
    ["where one was missed and never felt", [hard("a", -3, 9), logged("b", -1, { missed: true, effort: 9 })]],
  ])("%s is nothing", (_, logs) => {
    expect(of({ logs }).filter(({ kind }) => kind === "effort")).toEqual([]);
  });

  it("a light sport session in between does not hide two heavy lifts, nor count as one", () => {
    const skill = logged("skill", -2, { of: "sport" });
    expect(of({ logs: [hard("a", -3, 9), skill, hard("b", -1, 10)] })).toMatchObject([{ key: "effort:b" }]);
    const hardSkill = logged("skill", -2, { of: "sport", effort: 10 });
    expect(of({ logs: [hard("a", -3, 7), hardSkill, hard("b", -1, 9)] })).toEqual([]);
  });

  it("stays the same occasion tomorrow, and is a talk where no lift is left to lower", () => {
    const logs = [hard("a", -3, 9), hard("b", -1, 9)];
    expect(of({ logs, today: at(1) })[0]).toMatchObject({ key: "effort:b", change: null });
  });
});

describe("check-in against own normal", () => {
  it("the four answers are added, 4 to 28", () => {
    expect([4, 15, 28].map((sum) => checkInSum(checkIn(0, sum)))).toEqual([4, 15, 28]);
  });

  it("is beyond it above the mean and one and a half SD of the four weeks before, today left out", () => {
    // Mean 11, SD sqrt(10 / 9) = 1.0541; the line is at 12.581, and two points above the mean is 13.
    expect(againstNormal(checkIn(0, 13), ordinary, DEFAULT_RULES)).toMatchObject({
      mean: 11,
      sd: expect.closeTo(1.0541, 4),
      days: 10,
      beyond: true,
    });
    expect(againstNormal(checkIn(0, 12), ordinary, DEFAULT_RULES)?.beyond).toBe(false);
    const made = of({ checkIns: [...ordinary, checkIn(0, 13)], liftsAhead: [ahead("c", 2)] });
    expect(made).toMatchObject([
      {
        key: `check-in:${TODAY}`,
        source: "common practice, no published source",
        change: { kind: "response", from: TODAY, to: TODAY + 2, factor: 0.8 },
      },
    ]);
  });

  it("has no normal from nine days, nor from days older than four weeks", () => {
    expect(of({ checkIns: [...ordinary.slice(1), checkIn(0, 28)] })).toEqual([]);
    const old = Array.from({ length: 20 }, (_, index) => checkIn(-29 - index, 8));
    expect(of({ checkIns: [...old, checkIn(0, 28)] })).toEqual([]);
  });

  it("one point more than ever is not news for who answers the same every day", () => {
    const same = Array.from({ length: 14 }, (_, index) => checkIn(-1 - index, 8));
    expect(of({ checkIns: [...same, checkIn(0, 9)] })).toEqual([]);
    expect(of({ checkIns: [...same, checkIn(0, 10)] })).toHaveLength(1);
  });

  it("one from before yesterday is not brought up any more", () => {
    const bad = checkIn(0, 20);
    expect(of({ checkIns: [...ordinary, bad], today: at(1) })).toHaveLength(1);
    expect(of({ checkIns: [...ordinary, bad], today: at(2) })).toEqual([]);
  });
});

describe("missed lifts", () => {
  const missed = (id: string, offset: number) => logged(id, offset, { missed: true, effort: null });

  it("one is a question and changes nothing", () => {
    expect(of({ logs: [logged("a", -3), missed("b", -1)], liftsAhead: [ahead("c", 1)] })).toMatchObject([
      { key: "missed:b", kind: "missed", change: null },
    ]);
  });

  it("two running offer a lower start of the next one, on top of the coach's own factor", () => {
    const logs = [missed("a", -3), missed("b", -1)];
    expect(of({ logs, liftsAhead: [ahead("d", 3), ahead("c", 1, { coachFactor: 0.9 })] })).toMatchObject([
      { change: { kind: "factor", liftId: "c", factor: 0.72 } },
    ]);
    expect(of({ logs, liftsAhead: [ahead("c", 1, { coachFactor: 0.5 })] })).toMatchObject([{ change: null }]);
  });

  it("missed sport is not a missed lift", () => {
    expect(of({ logs: [logged("a", -1, { of: "sport", missed: true, effort: null })] })).toEqual([]);
  });
});

describe("pain", () => {
  it("above 3 is a talk with the newest, the worst and the count; 3 is not brought up", () => {
    const logs = [logged("a", -4, { pain: 7 }), logged("b", -1, { pain: 4 }), logged("c", -2, { pain: 3 })];
    expect(of({ logs })).toMatchObject([
      { key: "pain:b", numbers: [{ value: 4 }, { value: 7 }, { value: 2 }], change: null },
    ]);
    expect(of({ logs: [logged("c", -2, { pain: 3 })] })).toEqual([]);
  });
});

describe("weight", () => {
  const weight = (kg: number, over: Partial<NonNullable<ResponseInput["weight"]>> = {}) => ({
    minor: false,
    limitKg: 61 as Kg,
    weighIn: at(29),
    line: descentLine({ day: at(-27), kg: 64 as Kg }, 61 as Kg, at(29), DEFAULT_RULES),
    weights: [{ day: at(0), kg: kg as Kg }],
    ...over,
  });

  it("behind the line is a talk with the caution, asked once a week and not with each weighing", () => {
    const made = of({ weight: weight(64) });
    expect(made).toMatchObject([{ key: "weight:behind:4", kind: "weight", change: null }]);
    expect(made[0]?.text).toContain("Rapid weight loss can injure or kill.");
    const next = of({
      today: at(1),
      weight: weight(64, { weights: [{ day: at(1), kg: 63.9 as Kg }] }),
    });
    expect(next[0]?.key).toBe("weight:behind:4");
  });

  it("too fast, and above a ceiling, each by its own name", () => {
    const fast = weight(62, {
      weights: [
        { day: at(-7), kg: 64 as Kg },
        { day: at(0), kg: 62 as Kg },
      ],
    });
    expect(of({ weight: fast }).map(({ key }) => key)).toEqual(["weight:too-fast:4"]);
    const late = weight(65, { weighIn: at(2), line: null });
    expect(of({ weight: late }).map(({ key }) => key)).toEqual([
      "weight:above-ceiling:48h",
      "weight:behind:0",
    ]);
  });

  it("says nothing on the line, and never anything under 18", () => {
    expect(of({ weight: weight(62.4) })).toEqual([]);
    expect(of({ weight: weight(80, { minor: true }) })).toEqual([]);
  });
});

describe("the week's load", () => {
  it("beyond its cap offers the share of the lifting still ahead that brings it back", () => {
    // 2200 of 2000 AU, 800 of them lifting ahead: 200 / 800 less.
    const made = of({
      weeks: [weekAnswer(3, 2000, 1200, 1000)],
      liftsAhead: [ahead("a", 0), ahead("b", 2), ahead("next week", 5)],
    });
    expect(made).toMatchObject([
      {
        key: `week-load:${TODAY - 3}`,
        numbers: [{ value: 2200 }, { value: 2000 }, { value: expect.closeTo(10, 9) }],
        change: { kind: "response", from: TODAY, to: TODAY + 3, factor: 0.75 },
      },
    ]);
  });

  it("never offers less than a half, and nothing where only sport is left", () => {
    const weeks = [weekAnswer(3, 2000, 2900, 500)];
    expect(of({ weeks, liftsAhead: [ahead("a", 1)] })[0]?.change).toMatchObject({ factor: 0.5 });
    expect(of({ weeks, liftsAhead: [ahead("a", 9)] })).toMatchObject([{ change: null }]);
  });

  it("at its cap is nothing, and so is a week without one", () => {
    expect(of({ weeks: [weekAnswer(3, 2000, 1500, 500)] })).toEqual([]);
    expect(of({ weeks: [weekAnswer(3, null, 5000, 500)] })).toEqual([]);
  });

  it("of a week that is over is told and changes nothing", () => {
    expect(of({ weeks: [weekAnswer(8, 2000, 2600, 0)], liftsAhead: [ahead("a", 1)] })).toMatchObject([
      { title: "Last week ended beyond its cap", change: null },
    ]);
  });
});

describe("all suggestions", () => {
  it("thresholds are the team's own house rules", () => {
    const logs = [logged("a", -1, { pain: 4 })];
    expect(of({ logs, rules: withOverrides({ "response.pain": 5 }) })).toEqual([]);
    expect(of({ logs, rules: withOverrides({ "response.pain": 2 }) })).toHaveLength(1);
  });

  it("are the same in whatever order the lists come, touch nothing, and have keys of their own (300 inputs)", () => {
    const seen = new Set<string>();
    fc.assert(
      fc.property(arbResponseInput, (input) => {
        const made = suggestions(deepFreeze(input));
        const turned = suggestions({
          ...input,
          checkIns: [...input.checkIns].reverse(),
          logs: [...input.logs].reverse(),
          weeks: [...input.weeks].reverse(),
          liftsAhead: [...input.liftsAhead].reverse(),
          weight: input.weight && { ...input.weight, weights: [...input.weight.weights].reverse() },
        });
        expect(turned).toEqual(made);
        expect(new Set(made.map(({ key }) => key)).size).toBe(made.length);
        made.forEach(({ kind }) => seen.add(kind));
      }),
      { numRuns: 300, seed: 331 },
    );
    expect([...seen].sort()).toEqual([...SUGGESTION_KINDS].sort());
  });

  it("only ever lower sets, inside the camp and not in the past; weight and pain change nothing; each has numbers and a source (300 inputs)", () => {
    fc.assert(
      fc.property(arbResponseInput, (input) => {
        for (const { kind, change, numbers, source, title, text } of suggestions(input)) {
          expect(numbers.length).toBeGreaterThan(0);
          expect(numbers.every(({ value }) => Number.isFinite(value))).toBe(true);
          expect([source, title, text].every((words) => words.length > 0)).toBe(true);
          if (kind === "weight" || kind === "pain") expect(change).toBeNull();
          if (change?.kind === "response") {
            expect(change.from).toBeGreaterThanOrEqual(Math.max(input.today, input.camp.from));
            expect(change.to).toBeLessThanOrEqual(input.camp.to);
            expect(change.from).toBeLessThanOrEqual(change.to);
            expect(change.factor).toBeGreaterThanOrEqual(0.5);
            expect(change.factor).toBeLessThan(1);
          }
          if (change?.kind === "factor") {
            const lift = input.liftsAhead.find(({ id }) => id === change.liftId);
            expect(change.factor).toBeLessThan(lift?.coachFactor ?? 0);
            expect(change.factor).toBeGreaterThanOrEqual(0.5);
          }
        }
      }),
      { numRuns: 300, seed: 332 },
    );
  });
});
