import { describe, expect, it } from "vitest";
import { DEFAULT_RULES, instantAt, plan, type Lift, type Plan, type PlanInput } from "@/lib/engine";
import { day, minute, planInput, weeklySport } from "../factories/plan-input";

const broken = (made: Plan): readonly string[] => made.violations.map(({ rule }) => rule);

/** Strength A pinned in a week whose only hard sparring is on Tuesday 1 December at 19:00. */
function pinned(date: string, start: string): Plan {
  const sport = weeklySport("hard-sparring", 2, "19:00", { effort: 8 }).filter(
    (session) => session.day === day("2026-12-01"),
  );
  const pin = {
    id: "strength-a.5",
    slot: { item: "strength-a", week: 5 },
    day: day(date),
    start: minute(start),
  } as const;
  return plan(planInput({ sport, pins: [pin] }));
}

describe("heavy legs and hard sparring (Eur J Sport Sci, time-course of changes after resistance training: volume load down at 24 h, restored from 48 h)", () => {
  it.each([
    { name: "25 h before: allowed, with fewer sets", date: "2026-11-30", start: "16:45", rules: [] },
    { name: "under 24 h before: broken", date: "2026-11-30", start: "18:30", rules: ["heavy-before-hard"] },
    { name: "over 48 h before: allowed", date: "2026-11-29", start: "12:00", rules: [] },
  ])("$name", ({ date, start, rules }) => {
    expect(broken(pinned(date, start))).toEqual(rules);
  });

  it("full sets from 48 h, the least at 24 h", () => {
    const before = (made: Plan) =>
      made.lifts.find(({ id }) => id === "strength-a.5")?.factors.find(({ name }) => name === "before")
        ?.value ?? Number.NaN;
    expect(before(pinned("2026-11-29", "12:00"))).toBe(1);
    expect(before(pinned("2026-11-30", "16:45"))).toBeLessThan(0.75);
  });
});

describe("heavy legs again (same source: first-set volume down at 48 h)", () => {
  it("never within 48 h of each other in a camp laid from scratch", () => {
    const input = planInput({ weeks: 12, athlete: { ...planInput().athlete, liftsPerWeek: 4 } });
    const heavy = plan(input).lifts.filter((lift) => lift.heavyLower);
    heavy.slice(1).forEach((lift, index) => {
      const before = heavy[index];
      if (!before) throw new Error("no lift");
      const gap =
        instantAt(input.zone, lift.day, lift.start) -
        instantAt(input.zone, before.day, before.start) -
        before.minutes;
      expect(gap).toBeGreaterThanOrEqual(48 * 60);
    });
  });
});

describe("lifting after rounds (Ghoul et al. 2019, J Strength Cond Res 33(6):1570-1579: jumps down, damage markers up at 24 h)", () => {
  it("heavy legs the same evening are broken", () => {
    expect(broken(pinned("2026-12-01", "20:45"))).toContain("lift-after-hard");
  });
});

describe("two qualities on a day (Robineau et al. 2016, J Strength Cond Res 30(3):672-683: gains lower with 0 h than with 6 h)", () => {
  it("6 h is what the engine asks for, and what it keeps where the day allows it", () => {
    expect(DEFAULT_RULES["sport-gap.hours"]).toBe(6);
    const input = planInput();
    for (const lift of plan(input).lifts) {
      for (const session of input.sport.filter(({ day: at }) => at === lift.day)) {
        expect(session.start - lift.start - lift.minutes).toBeGreaterThanOrEqual(6 * 60);
      }
    }
  });
});

describe("the last lifts", () => {
  const input = planInput({ weighIn: null });
  const made = plan(input);
  const out = (lift: Lift): number => input.bout.day - lift.day;

  it("the last heavy day is no nearer than the published 3.7 ± 1.6 days (Pritchard et al. 2016, J Strength Cond Res 30(7):1796-1804)", () => {
    expect(Math.min(...made.lifts.filter((lift) => lift.heavyLower).map(out))).toBeGreaterThanOrEqual(5.3);
  });

  it("no week off before the bout (same source: a week completely off was judged poor)", () => {
    expect(Math.min(...made.lifts.map(out))).toBeLessThan(7);
  });

  it("the primer lies 1 to 48 h ahead or little more, at 85 % or above (Harrison et al. 2019, Sports Med 49:1487-1514)", () => {
    const primer = made.lifts.find(({ item }) => item === "primer");
    expect(primer && out(primer)).toBe(2);
    expect(primer?.intensity).toMatchObject({ low: 85, of: "best" });
  });
});

describe("the taper as planned (Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365)", () => {
  const camps: readonly { readonly name: string; readonly input: PlanInput }[] = [
    { name: "8 weeks", input: planInput() },
    { name: "12 weeks", input: planInput({ weeks: 12 }) },
    { name: "4 lifts a week", input: planInput({ athlete: { ...planInput().athlete, liftsPerWeek: 4 } }) },
    { name: "2 lifts a week", input: planInput({ athlete: { ...planInput().athlete, liftsPerWeek: 2 } }) },
  ];

  it.each(camps)(
    "$name: as many lifts in the week before fight week as in the last building week",
    ({ input }) => {
      const made = plan(input);
      const lifts = (weeksOut: number) => made.lifts.filter((lift) => lift.week === weeksOut).length;
      expect(lifts(1)).toBe(lifts(2));
    },
  );

  it.each(camps)("$name: intensity of every item that goes on is kept", ({ input }) => {
    const made = plan(input);
    for (const lift of made.lifts.filter(({ phase }) => phase === "taper")) {
      const before = made.lifts.filter(({ item, phase }) => item === lift.item && phase === "power").at(-1);
      if (before) expect(lift.intensity).toEqual(before.intensity);
    }
  });

  it.each(camps)("$name: the factor of the taper's days cuts 41 to 60 % in the mean", ({ input }) => {
    // Each day of the taper holds one pinned lift, so that every day's factor can be read.
    const days = Array.from({ length: 14 }, (_, out) => out);
    const pins = days.map((out) => ({
      id: `power-touch.${out}`,
      slot: { item: "power-touch", week: Math.floor(out / 7) },
      day: (input.bout.day - out) as PlanInput["bout"]["day"],
      start: minute("08:00"),
    })) as PlanInput["pins"];
    const factors = plan({ ...input, pins })
      .lifts.filter((lift) => lift.pinned)
      .map((lift) => lift.factors.find(({ name }) => name === "taper")?.value ?? Number.NaN);
    expect(factors).toHaveLength(14);
    const cut = 1 - factors.reduce((sum, value) => sum + value, 0) / 14;
    expect(cut).toBeGreaterThanOrEqual(0.41);
    expect(cut).toBeLessThanOrEqual(0.6);
    expect(cut).toBeCloseTo(0.5, 9);
  });
});
