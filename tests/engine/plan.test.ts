import { describe, expect, it } from "vitest";
import {
  PlanInputError,
  dayFromIso,
  instantAt,
  inputProblems,
  isoFromDay,
  plan,
  weekdayOf,
  withOverrides,
  type Day,
  type Instant,
  type Minute,
  type PlanInput,
} from "@/lib/engine";
import { day, freeHours, gymWeek, minute, planInput, weeklySport } from "../factories/plan-input";

const items = (weeksOut: number, input: PlanInput = planInput()) =>
  plan(input)
    .lifts.filter((lift) => lift.week === weeksOut)
    .map((lift) => lift.item)
    .sort();

describe("an ordinary camp of 8 weeks", () => {
  const input = planInput();
  const camp = plan(input);

  it("has three lifts in every week and two in fight week, all placed, nothing broken", () => {
    expect(camp.weeks.map((week) => camp.lifts.filter((lift) => lift.week === week.weeksOut).length)).toEqual(
      [...[3, 3, 3, 3, 3, 3, 3, 2]],
    );
    expect(camp.unplaced).toEqual([]);
    expect(camp.violations).toEqual([]);
  });

  it("goes from strength over power to the taper", () => {
    expect(items(7)).toEqual(["strength-a", "strength-b", "trunk-and-kick"]);
    expect(items(3)).toEqual(["power-a", "power-b", "strength-keep"]);
    expect(items(1)).toEqual(["power-a", "strength-keep", "trunk-and-kick"]);
    expect(items(0)).toEqual(["power-short", "primer"]);
  });

  it("the lifts of a week lie where hard sparring takes least of them, the main one on the freshest day", () => {
    const days = (weeksOut: number) =>
      camp.lifts
        .filter((lift) => lift.week === weeksOut)
        .map(
          (lift) =>
            `${lift.item} ${["", "Mon", "Tue", "Wed", "Thu", "Fri", "Sat", "Sun"][weekdayOf(lift.day)]}`,
        );
    // Hard sparring on Tuesday evening and Saturday noon.
    for (const week of [7, 6, 5, 4])
      expect(days(week)).toEqual(["strength-a Sun", "strength-b Wed", "trunk-and-kick Thu"]);
    for (const week of [3, 2])
      expect(days(week)).toEqual(["power-a Sun", "strength-keep Wed", "power-b Thu"]);
    expect(days(0)).toEqual(["power-short Mon", "primer Thu"]);
  });

  it("sets climb over three weeks, fall in the lighter one, and halve over the taper", () => {
    const sets = camp.weeks.map((week) => week.sets);
    const [w7 = 0, w6 = 0, w5 = 0, w4 = 0, w3 = 0, w2 = 0, w1 = 0, w0 = 0] = sets;
    expect(w7 < w6 && w6 < w5).toBe(true);
    expect(w4).toBeLessThan(0.75 * w5);
    expect((w1 + w0) / (w3 + w2)).toBeLessThan(0.6);
  });

  it("counts the same sets and loads by session, day and week", () => {
    const total = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0);
    const lifting = total(camp.lifts.map((lift) => lift.effort * lift.minutes));
    expect(total(camp.days.map((row) => row.lifting))).toBe(lifting);
    expect(total(camp.weeks.map((week) => week.liftingLoad))).toBe(lifting);
    expect(total(camp.weeks.map((week) => week.sets))).toBe(total(camp.lifts.map((lift) => lift.sets)));
    expect(total(camp.weeks.map((week) => week.sportLoad))).toBe(
      total(input.sport.map((session) => session.effort * session.minutes)),
    );
  });

  it("has a form value for each of the camp's mornings, 0 on the first", () => {
    expect(camp.form.values).toHaveLength(56);
    expect(camp.form.values[0]).toBe(0);
    expect(camp.days).toHaveLength(56);
  });

  it("says of every lift why it stands where it stands, in sentences", () => {
    for (const lift of camp.lifts) {
      for (const { text } of lift.reasons) expect(text).toMatch(/^[A-Z0-9].*\.$/);
      expect(lift.factors).toHaveLength(7);
    }
  });
});

describe("camps of every length", () => {
  it.each(Array.from({ length: 20 }, (_, index) => index + 1))(
    "%i weeks: planned, from the first day to the bout",
    (weeks) => {
      const camp = plan(planInput({ weeks }));
      expect(camp.weeks).toHaveLength(weeks);
      expect(camp.days[0]?.day).toBe(camp.bout.day - 7 * weeks + 1);
      expect(camp.violations).toEqual([]);
      expect(camp.lifts.every((lift) => lift.day < camp.bout.day)).toBe(true);
      expect(camp.lifts.length + camp.unplaced.length).toBe(weeks === 1 ? 2 : 3 * (weeks - 1) + 2);
    },
  );
});

describe("awkward days", () => {
  it.each([
    { name: "a bout on leap day", bout: "2028-02-29" },
    { name: "a bout on the last day of the year", bout: "2026-12-31" },
    { name: "a bout on New Year's Day", bout: "2027-01-01" },
    { name: "a bout the day after leap day", bout: "2028-03-01" },
  ])("$name", ({ bout }) => {
    const camp = plan(planInput({ bout: { day: day(bout), start: minute("20:00") } }));
    expect(isoFromDay(camp.bout.day)).toBe(bout);
    expect(camp.lifts.length).toBe(23);
    expect(camp.violations).toEqual([]);
  });

  it("24 hours before hard sparring are 24 hours on the night the clocks go forward", () => {
    const boutDay = day("2027-04-24");
    const change = day("2027-03-28");
    const input = planInput({
      bout: { day: boutDay, start: minute("20:00") },
      zone: [
        { from: 0, offset: 0 },
        { from: change * 1440 + 120, offset: 60 },
      ],
      sport: weeklySport("hard-sparring", 7, "12:00", { effort: 8, boutDay, lastDaysOut: 11 }),
      athlete: { ...planInput().athlete, freeHours: freeHours("09:30", "20:00", [6]) },
    });
    const heavy = plan(input).lifts.filter((lift) => lift.heavyLower);
    for (const lift of heavy) {
      const endsAt = instantAt(input.zone, lift.day, (lift.start + lift.minutes) as Minute);
      const sparring = instantAt(input.zone, (lift.day + 1) as Day, minute("12:00"));
      expect(sparring - endsAt).toBeGreaterThanOrEqual(24 * 60);
    }
    expect(heavy.length).toBeGreaterThan(0);
  });

  it("a bout tomorrow: nothing is planned any more, and nothing fails", () => {
    const input = planInput();
    const camp = plan({ ...input, now: instantAt(input.zone, (input.bout.day - 1) as Day, minute("08:00")) });
    expect(camp.lifts).toEqual([]);
    expect(camp.weeks).toHaveLength(8);
  });

  it("a bout today, before it starts: planned", () => {
    const input = planInput();
    expect(plan({ ...input, now: instantAt(input.zone, input.bout.day, minute("20:29")) }).lifts).toEqual([]);
  });

  it("a bout that has begun or is over: refused with what to do", () => {
    const input = planInput();
    const late = { ...input, now: instantAt(input.zone, input.bout.day, input.bout.start) };
    expect(inputProblems(late)).toEqual([
      {
        code: "bout-past",
        pointer: "/bout/date",
        message: "The bout is over: give a date that is today or later.",
      },
    ]);
    expect(() => plan(late)).toThrow(PlanInputError);
  });

  it("no free hours: every lift comes back unplaced with the rule that shut it", () => {
    const camp = plan(planInput({ athlete: { ...planInput().athlete, freeHours: [] } }));
    expect(camp.lifts).toEqual([]);
    expect(camp.unplaced).toHaveLength(23);
    for (const { rules } of camp.unplaced) expect(rules[0]?.rule).toBe("free-hours");
  });

  it("hard sparring every day: one lift a week less, and what is placed breaks nothing", () => {
    const everyDay = [1, 2, 3, 4, 5, 6, 7].flatMap((weekday) =>
      weeklySport("hard-sparring", weekday, "19:00", { effort: 8 }),
    );
    const camp = plan(planInput({ sport: everyDay }));
    expect(camp.violations).toEqual([]);
    expect(camp.lifts.length + camp.unplaced.length).toBe(2 * 7 + 1);
    expect(camp.unplaced.some(({ rules }) => rules.some(({ rule }) => rule === "heavy-before-hard"))).toBe(
      true,
    );
  });
});

describe("pins", () => {
  const input = planInput();
  const tuesday = day("2026-12-01");

  it("stay where the coach put them, from scratch too, and what they break is reported", () => {
    const pin = {
      id: "strength-a.5",
      slot: { item: "strength-a", week: 5 },
      day: tuesday,
      start: minute("12:00"),
    } as const;
    const camp = plan({ ...input, pins: [pin] });
    expect(camp.lifts.find((lift) => lift.id === pin.id)).toMatchObject({
      day: tuesday,
      start: pin.start,
      pinned: true,
    });
    expect(camp.violations.map(({ rule, ids }) => ({ rule, hit: ids.includes(pin.id) }))).toContainEqual({
      rule: "heavy-before-hard",
      hit: true,
    });
    expect(camp.lifts.filter((lift) => lift.week === 5)).toHaveLength(3);
  });

  it("an item that the week would drop stays, and the least important other goes", () => {
    const pin = {
      id: "power-touch.6",
      slot: { item: "power-touch", week: 6 },
      day: day("2026-11-25"),
      start: minute("10:00"),
    } as const;
    expect(items(6, { ...input, pins: [pin] })).toEqual(["power-touch", "strength-a", "strength-b"]);
  });

  it("one outside the camp's days holds nothing", () => {
    const pin = {
      id: "strength-a.5",
      slot: { item: "strength-a", week: 5 },
      day: day("2026-10-01"),
      start: minute("12:00"),
    } as const;
    expect(plan({ ...input, pins: [pin] }).lifts).toEqual(plan(input).lifts);
  });
});

describe("input that cannot be planned", () => {
  const input = planInput();
  const athlete = input.athlete;
  const [first] = input.sport;
  if (!first) throw new Error("no sport");
  it.each<{ name: string; bad: Partial<PlanInput>; code: string; pointer: string }>([
    { name: "no weeks", bad: { weeks: 0 }, code: "weeks-range", pointer: "/weeks" },
    { name: "21 weeks", bad: { weeks: 21 }, code: "weeks-range", pointer: "/weeks" },
    { name: "half a week", bad: { weeks: 7.5 }, code: "weeks-range", pointer: "/weeks" },
    {
      name: "no lifts",
      bad: { athlete: { ...athlete, liftsPerWeek: 0 } },
      code: "lifts-range",
      pointer: "/athlete/liftsPerWeek",
    },
    {
      name: "five lifts",
      bad: { athlete: { ...athlete, liftsPerWeek: 5 } },
      code: "lifts-range",
      pointer: "/athlete/liftsPerWeek",
    },
    {
      name: "free hours backwards",
      bad: {
        athlete: { ...athlete, freeHours: [{ weekday: 1, from: minute("20:00"), to: minute("10:00") }] },
      },
      code: "free-hours",
      pointer: "/athlete/freeHours/0",
    },
    {
      name: "a house rule out of its range",
      bad: { rules: withOverrides({ "taper.cut": 0.9 }) },
      code: "rule-range",
      pointer: "/houseRules/taper.cut",
    },
    {
      name: "half a day of taper",
      bad: { rules: withOverrides({ "taper.days.long": 13.5 }) },
      code: "rule-range",
      pointer: "/houseRules/taper.days.long",
    },
    {
      name: "a session without minutes",
      bad: { sport: [{ ...first, minutes: 0 }] },
      code: "sport-range",
      pointer: "/sport/0/minutes",
    },
    {
      name: "an effort of 11",
      bad: { sport: [{ ...first, effort: 11 }] },
      code: "sport-range",
      pointer: "/sport/0/effort",
    },
    {
      name: "a session on no day",
      bad: { sport: [{ ...first, day: Number.NaN as Day }] },
      code: "number",
      pointer: "/sport/0/start",
    },
    {
      name: "a weigh-in after the bout",
      bad: { weighIn: { day: (input.bout.day + 1) as Day, start: minute("09:00") } },
      code: "weigh-in-order",
      pointer: "/weighIn/date",
    },
    { name: "no clock", bad: { now: Number.NaN as Instant }, code: "number", pointer: "/bout/timeZone" },
    {
      name: "a factor of 3",
      bad: { coachFactors: { "strength-a.2": 3 } },
      code: "number",
      pointer: "/coachFactors/strength-a.2",
    },
  ])("$name", ({ bad, code, pointer }) => {
    const problems = inputProblems({ ...input, ...bad });
    expect(problems).toMatchObject([{ code, pointer }]);
    expect(problems[0]?.message).toMatch(/^[A-Z].*\.$/);
    expect(() => plan({ ...input, ...bad })).toThrow(PlanInputError);
  });

  it("a weigh-in at the hour of the bout is allowed, and the defaults of all house rules are in range", () => {
    expect(inputProblems({ ...input, weighIn: { ...input.bout } })).toEqual([]);
  });
});

describe("weekly cap", () => {
  it("a week whose sport jumps holds lifting back, and says by how much", () => {
    const jump = [0, 1, 2, 3, 4].flatMap((n) =>
      weeklySport("conditioning", n + 1, "07:00", { minutes: 90, effort: 9 }).filter(
        (session) =>
          session.day >= dayFromIso("2026-12-06") - 14 && session.day < dayFromIso("2026-12-06") - 7,
      ),
    );
    const calm = plan(planInput());
    const camp = plan(planInput({ sport: [...gymWeek(), ...jump] }));
    const [before, after] = [calm, camp].map(
      (made) => made.weeks.find((week) => week.weeksOut === 6)?.sets ?? 0,
    );
    expect(after).toBeLessThan(before ?? 0);
    const cap = camp.lifts.find((lift) => lift.week === 6)?.factors.find((factor) => factor.name === "cap");
    expect(cap?.value).toBeLessThan(1);
    expect(cap?.text).toMatch(/^Week held to \d+ AU, 15 % over the weeks before$/);
  });

  it("the first week has none, and every week that keeps under its cap stays there", () => {
    const camp = plan(planInput());
    expect(camp.weeks[0]?.loadCap).toBeNull();
    for (const week of camp.weeks.slice(1)) {
      expect(week.sportLoad + week.liftingLoad).toBeLessThanOrEqual((week.loadCap ?? 0) + 1e-9);
    }
  });
});
