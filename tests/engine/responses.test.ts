import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  PlanInputError,
  inputProblems,
  plan,
  type AcceptedResponse,
  type Day,
  type Lift,
} from "@/lib/engine";
import { responseFactor } from "@/lib/engine/dose";
import { arbPlanInput, arbResponse, day, deepFreeze, planInput } from "../factories/plan-input";

const response = (from: string, to: string, factor: number): AcceptedResponse => ({
  from: day(from),
  to: day(to),
  factor,
});
const bout = planInput().bout;
const valueOn = (responses: readonly AcceptedResponse[], on: string): number =>
  responseFactor({ responses, bout }, day(on)).value;

describe("an accepted suggestion", () => {
  it("holds from its first day to its last and on no other", () => {
    const one = [response("2026-12-03", "2026-12-09", 0.8)];
    expect(
      ["2026-12-02", "2026-12-03", "2026-12-09", "2026-12-10"].map((date) => valueOn(one, date)),
    ).toEqual([1, 0.8, 0.8, 1]);
  });

  it("multiplies with others of the same day, in any order, and never goes below a half", () => {
    const two = [response("2026-12-01", "2026-12-31", 0.9), response("2026-12-05", "2026-12-06", 0.7)];
    expect(valueOn(two, "2026-12-05")).toBeCloseTo(0.63, 12);
    expect(valueOn([...two].reverse(), "2026-12-05")).toBe(valueOn(two, "2026-12-05"));
    expect(valueOn([...two, response("2026-12-05", "2026-12-05", 0.6)], "2026-12-05")).toBe(0.5);
  });

  it("is named in the factor, with its days and without its reason", () => {
    const text = (responses: readonly AcceptedResponse[]): string =>
      responseFactor({ responses, bout }, day("2026-12-05")).text;
    expect(text([])).toBe("No suggestion accepted");
    expect(text([response("2026-12-03", "2026-12-09", 0.8)])).toBe(
      "A suggestion was accepted, fewer sets from 37 to 31 days out",
    );
    expect(text([response("2026-12-05", "2026-12-05", 0.8)])).toBe(
      "A suggestion was accepted, fewer sets 35 days out",
    );
  });

  it("lowers the lifts of its days and leaves the week's other lifts where they were", () => {
    const before = plan(planInput()).lifts;
    const after = plan(planInput({ responses: [response("2026-12-03", "2026-12-09", 0.7)] })).lifts;
    const covered = (lift: Lift): boolean => lift.day >= day("2026-12-03") && lift.day <= day("2026-12-09");
    const sets = new Map(after.map((lift) => [lift.id, lift.sets]));
    expect(before.filter(covered).some((lift) => (sets.get(lift.id) ?? 99) < lift.sets)).toBe(true);
    for (const lift of before.filter((one) => !covered(one) && one.day < day("2026-12-10"))) {
      expect(sets.get(lift.id)).toBe(lift.sets);
    }
  });

  it("of factor 1 gives the same plan to the byte as none", () => {
    const none = JSON.stringify(plan(planInput()));
    expect(JSON.stringify(plan(planInput({ responses: [response("2026-11-15", "2027-01-09", 1)] })))).toBe(
      none,
    );
  });

  it("never raises the sets of any session and moves none (150 inputs)", { timeout: 180_000 }, () => {
    const withResponse = arbPlanInput({ maxWeeks: 12 }).chain((input) =>
      arbResponse(input.bout.day, input.weeks).map((accepted) => ({ input, accepted })),
    );
    let lowered = 0;
    fc.assert(
      fc.property(withResponse, ({ input, accepted }) => {
        const before = plan(input);
        const after = plan(deepFreeze({ ...input, responses: [...input.responses, accepted] }));
        expect(after.lifts.map(({ id, day: at, start }) => [id, at, start])).toEqual(
          before.lifts.map(({ id, day: at, start }) => [id, at, start]),
        );
        after.lifts.forEach((lift, index) => {
          const was = before.lifts[index]?.sets ?? Number.NaN;
          expect(lift.sets).toBeLessThanOrEqual(was);
          if (lift.sets < was) lowered += 1;
        });
      }),
      { numRuns: 150, seed: 321 },
    );
    expect(lowered).toBeGreaterThan(100);
  });

  it.each([
    {
      name: "days the wrong way round",
      bad: response("2026-12-09", "2026-12-03", 0.8),
      pointer: "/responses/0",
    },
    { name: "no day", bad: { from: Number.NaN as Day, to: bout.day, factor: 0.8 }, pointer: "/responses/0" },
    { name: "a raise", bad: response("2026-12-03", "2026-12-09", 1.1), pointer: "/responses/0/factor" },
    { name: "too little", bad: response("2026-12-03", "2026-12-09", 0.4), pointer: "/responses/0/factor" },
  ])("$name is refused", ({ bad, pointer }) => {
    const input = planInput({ responses: [bad] });
    expect(inputProblems(input)).toMatchObject([{ code: "number", pointer }]);
    expect(() => plan(input)).toThrow(PlanInputError);
  });
});
