import { describe, expect, it } from "vitest";
import type { Day, Instant, PlanInput } from "@/lib/engine";
import { placeLifts, placementProblem, type FixedLift, type Slot } from "@/lib/engine/placement";
import {
  emptyCamp,
  pinnedLift,
  published,
  request,
  session,
  slotIn,
  type LiftAt,
} from "../factories/placement-request";
import { day, freeHours } from "../factories/plan-input";

type Rules = Readonly<Record<string, number>>;

/** Points that a lift pays for a place by itself; null where the place is shut. */
function pointsAt(
  { item, at, minutes = 60 }: LiftAt,
  {
    rules = {},
    fixed = () => [],
    slot = {},
    ...over
  }: Omit<Partial<PlanInput>, "rules"> & {
    rules?: Rules;
    fixed?: (input: PlanInput) => readonly FixedLift[];
    slot?: Partial<Slot>;
  } = {},
): number | null {
  const input = emptyCamp(over, rules);
  const [date = ""] = at.split(" ");
  const wanted = slotIn(input, date, item, { minutes, ...slot });
  const { problem } = placementProblem(request(input, { slots: [wanted], fixed: fixed(input) }));
  const place = published(at);
  return (
    problem.candidates.find(({ day: on, start }) => on === place.day && start === place.start)?.cost ?? null
  );
}

describe("sport-gap: 6 h to other sessions of the day, 6 points an hour short", () => {
  const rules = { "sport-gap.price": 6 };
  const sport = [session("skill", "2026-12-02 18:00")];
  it.each([
    { name: "6 h before: nothing", at: "2026-12-02 11:00", points: 0 },
    { name: "5 h before", at: "2026-12-02 12:00", points: 6 },
    { name: "3 h 30 min before", at: "2026-12-02 13:30", points: 15 },
    { name: "2 h after", at: "2026-12-02 21:00", points: 24 },
    { name: "the day after, 5 h away: another day, nothing", at: "2026-12-03 00:00", points: 0 },
  ])("$name", ({ at, points }) => expect(pointsAt({ at }, { rules, sport })).toBe(points));

  // evidence: a gap of 5 h is one too few. It costs and does not forbid, so that a short gap still beats a lost session.
  it("a lift on Monday at 10:00, conditioning at 15:00: 2 h short, paid for and not shut", () => {
    const conditioning = [session("conditioning", "2026-11-30 15:00", { effort: 8 })];
    expect(pointsAt({ at: "2026-11-30 10:00" }, { rules, sport: conditioning })).toBe(12);
    expect(pointsAt({ at: "2026-11-30 08:00" }, { rules, sport: conditioning })).toBe(0);
  });

  it("two sessions are paid for each", () => {
    const both = [...sport, session("skill", "2026-12-02 07:00")];
    expect(
      pointsAt({ at: "2026-12-02 12:00" }, { rules: { ...rules, "sessions-a-day": 3 }, sport: both }),
    ).toBe(6 + 12);
  });
});

describe("heavy-before-hard-48: heavy legs 48 h rather than 24 h before hard sparring", () => {
  const rules = { "heavy-before-hard-48.price": 30 };
  const sport = [session("hard-sparring", "2026-12-03 19:00")];
  it.each([
    { name: "48 h before: nothing", item: "strength-a", at: "2026-12-01 18:00", points: 0 },
    { name: "47 h 55 min before", item: "strength-a", at: "2026-12-01 18:05", points: 30 },
    { name: "25 h before: allowed, and paid for", item: "strength-a", at: "2026-12-02 17:00", points: 30 },
    { name: "23 h before: shut", item: "strength-a", at: "2026-12-02 19:00", points: null },
    { name: "25 h before, not heavy: nothing", item: "strength-b", at: "2026-12-02 17:00", points: 0 },
  ] as const)("$name", ({ item, at, points }) =>
    expect(pointsAt({ item, at }, { rules, sport })).toBe(points),
  );
});

describe("full-dose: 8 points each tenth of its sets that hard sparring takes", () => {
  const rules = { "full-dose.price": 8 };
  const sport = [session("hard-sparring", "2026-12-03 19:00")];
  it.each([
    { name: "48 h before: nothing", at: "2026-12-01 18:00", points: 0 },
    { name: "24 h before, three tenths", at: "2026-12-02 18:00", points: 24 },
    { name: "36 h after: nothing", at: "2026-12-05 08:00", points: 0 },
    { name: "12 h after, a fifth", at: "2026-12-04 08:00", points: 16 },
  ])("$name", ({ at, points }) => expect(pointsAt({ at }, { rules, sport })).toBe(points));
});

describe("fresh-first: strength A and power A pay 4 points each 100 AU left from before", () => {
  const rules = { "fresh-first.price": 4 };
  const sport = [session("conditioning", "2026-12-01 09:00", { minutes: 60, effort: 10 })];
  // 600 AU x exp(-hours / 24), to whole points.
  it.each([
    { name: "24 h after it", item: "strength-a", at: "2026-12-02 10:00", points: 9 },
    { name: "48 h after it", item: "power-a", at: "2026-12-03 10:00", points: 3 },
    { name: "before it: nothing", item: "strength-a", at: "2026-11-30 10:00", points: 0 },
    { name: "another item: nothing", item: "strength-b", at: "2026-12-02 10:00", points: 0 },
  ] as const)("$name", ({ item, at, points }) =>
    expect(pointsAt({ item, at }, { rules, sport })).toBe(points),
  );

  it("a session that was done counts as it was done", () => {
    const done = sport.map((one) => ({ ...one, doneLoad: 1200 as NonNullable<typeof one.doneLoad> }));
    expect(pointsAt({ item: "strength-a", at: "2026-12-02 10:00" }, { rules, sport: done })).toBe(18);
  });
});

describe("spread: 14 points for lifts a day apart, 2 for two days", () => {
  const rules = { "spread.next-day": 14, "spread.second-day": 2 };
  const fixed = (input: PlanInput): FixedLift[] => [
    pinnedLift(input, { at: "2026-12-02 12:00", item: "power-touch" }),
  ];
  it.each([
    { name: "the day after a pinned lift", at: "2026-12-03 12:00", points: 14 },
    { name: "two days before it", at: "2026-11-30 12:00", points: 2 },
    { name: "three days after it: nothing", at: "2026-12-05 12:00", points: 0 },
  ])("$name", ({ at, points }) => expect(pointsAt({ at }, { rules, fixed })).toBe(points));

  it("between two pins both count", () => {
    const both = (input: PlanInput): FixedLift[] => [
      ...fixed(input),
      { ...pinnedLift(input, { at: "2026-12-05 12:00", item: "power-b" }) },
    ];
    expect(pointsAt({ at: "2026-12-04 12:00" }, { rules, fixed: both })).toBe(16);
  });

  it("three lifts of an empty week lie two days and three days apart, over the border of the week too", () => {
    const input = emptyCamp({}, rules);
    const items = ["strength-b", "trunk-and-kick", "power-touch"] as const;
    const slots = ["2026-11-25", "2026-12-02"].flatMap((date) =>
      items.map((item, order) => slotIn(input, date, item, { order })),
    );
    const days = placeLifts(request(input, { slots })).placed.map((lift) => lift.day);
    const gaps = [...days].sort((a, b) => a - b).map((on, index, all) => on - (all[index - 1] ?? on));
    expect(gaps.slice(1).every((gap) => gap >= 2)).toBe(true);
  });
});

describe("hard-days-hard: off unless a team asks for it", () => {
  const on = { "hard-days-hard.on": 1, "hard-days-hard.price": 12 };
  const sport = [session("hard-sparring", "2026-12-02 10:00")];
  it.each([
    { name: "off: nothing", rules: { ...on, "hard-days-hard.on": 0 }, at: "2026-12-03 12:00", points: 0 },
    { name: "on, a day without hard sparring", rules: on, at: "2026-12-03 12:00", points: 12 },
    { name: "on, after the sparring: nothing", rules: on, at: "2026-12-02 18:00", points: 0 },
    {
      name: "on, before the sparring: easy days would not be easy",
      rules: on,
      at: "2026-12-02 08:00",
      points: 12,
    },
  ])("$name", ({ rules, at, points }) => expect(pointsAt({ at }, { rules, sport })).toBe(points));
});

describe("rest-day: a week keeps one day without training where the timetable leaves one", () => {
  const rules = { "rest-day.price": 60 };
  const busy = ["2026-11-29", "2026-11-30", "2026-12-01", "2026-12-02", "2026-12-03"].map((date) =>
    session("skill", `${date} 07:00`),
  );
  const items = ["strength-b", "trunk-and-kick"] as const;

  it("two lifts leave one of two free days alone", () => {
    const input = emptyCamp({ sport: busy }, { ...rules, "sport-gap.price": 6 });
    const athlete = { ...input.athlete, freeHours: freeHours("10:00", "11:00") };
    const slots = items.map((item, order) => slotIn(input, "2026-12-02", item, { order }));
    const { placed, cost } = placeLifts(request({ ...input, athlete }, { slots }));
    expect(placed.filter((lift) => lift.day >= day("2026-12-04"))).toHaveLength(1);
    // The other lies 2 h after a session, 4 h short: cheaper than a week without a free day.
    expect(cost).toBe(24);
  });

  it("where each other day costs more than 60 points, both are taken and the week is paid for", () => {
    const input = emptyCamp({ sport: busy }, { ...rules, "sport-gap.price": 100, "sport-gap.hours": 12 });
    const athlete = { ...input.athlete, freeHours: freeHours("10:00", "11:00") };
    const slots = items.map((item, order) => slotIn(input, "2026-12-02", item, { order }));
    const { placed, cost } = placeLifts(request({ ...input, athlete }, { slots }));
    expect(placed.map((lift) => lift.day)).toEqual([day("2026-12-04"), day("2026-12-05")]);
    expect(cost).toBe(60);
  });

  it("rest and travel days are free days, sport, pinned lifts and the bout are not", () => {
    const sport = [
      session("rest", "2027-01-03 00:00"),
      session("travel", "2027-01-04 08:00"),
      session("skill", "2027-01-05 08:00"),
    ];
    const input = emptyCamp({ sport }, rules);
    const fixed = [pinnedLift(input, { item: "power-touch", at: "2027-01-06 10:00" })];
    const { problem } = placementProblem(
      request(input, { slots: [slotIn(input, "2027-01-06", "primer")], fixed }),
    );
    expect(problem.weekly).toEqual([
      {
        week: 0,
        freeDays: ["2027-01-03", "2027-01-04", "2027-01-07", "2027-01-08"].map(day),
        noRestCost: 60,
      },
    ]);
  });
});

describe("stay-put: a published session moves only for a reason", () => {
  const prices = { "stay-put.near": 80, "stay-put.far": 8, "stay-put.locked.hours": 36 };
  const base = published("2026-12-02 12:00");
  const hoursAhead = (hours: number): Instant => (base.day * 1440 + base.start - hours * 60) as Instant;

  it.each([
    { name: "two weeks ahead", hours: 336, points: 8 },
    { name: "five weeks ahead", hours: 840, points: 8 },
    { name: "half way to the locked hours", hours: 186, points: 44 },
    { name: "36 h ahead", hours: 36, points: 80 },
    {
      name: "under 36 h ahead: more than all should rules and lost lifts of a week",
      hours: 35.9,
      points: 2_000_000,
    },
  ])("$name: $points points to move or to leave out", ({ hours, points }) => {
    const input = emptyCamp({ now: hoursAhead(hours) }, prices);
    const slots = [slotIn(input, "2026-12-02", "strength-b", { base })];
    const { problem } = placementProblem(request(input, { slots }));
    const plain = placementProblem(
      request(input, { slots: [slotIn(input, "2026-12-02", "strength-b")] }),
    ).problem;
    for (const { day: on, start, cost } of problem.candidates) {
      expect(cost).toBe(on === base.day && start === base.start ? 0 : points);
    }
    expect((problem.items[0]?.unplaced ?? 0) - (plain.items[0]?.unplaced ?? 0)).toBe(points);
  });

  it("a published start off the grid is kept", () => {
    const odd = published("2026-12-02 12:17");
    const input = emptyCamp({}, prices);
    const slots = [
      slotIn(input, "2026-12-02", "strength-b", { base: odd }),
      slotIn(input, "2026-12-02", "power-touch", { order: 1 }),
    ];
    const { placed } = placeLifts(request(input, { slots }));
    expect(placed[0]).toMatchObject(odd);
  });

  it("a better place that saves less than the move costs is left alone, one that saves more is taken", () => {
    const sport = [session("skill", "2026-12-02 14:00")];
    const placedAt = (price: number): Day | undefined => {
      const input = emptyCamp({ sport }, { ...prices, "sport-gap.price": price });
      return placeLifts(request(input, { slots: [slotIn(input, "2026-12-02", "strength-b", { base })] }))
        .placed[0]?.day;
    };
    // 5 h short.
    expect(placedAt(1)).toBe(base.day);
    expect(placedAt(2)).not.toBe(base.day);
  });

  it("within 36 h no price moves it, a must rule does", () => {
    const at = { now: hoursAhead(20) };
    const rules = { ...prices, "sport-gap.price": 100, "sport-gap.hours": 12, "fresh-first.price": 50 };
    const placed = (sport: PlanInput["sport"]) => {
      const input = emptyCamp({ ...at, sport }, rules);
      const slot = slotIn(input, "2026-12-02", "strength-b", { base, fresh: true });
      const other = slotIn(input, "2026-12-02", "strength-a", { order: 1 });
      return placeLifts(request(input, { slots: [slot, other] })).placed.find(
        (lift) => lift.slot.id === slot.id,
      );
    };
    expect(placed([session("skill", "2026-12-02 14:00", { minutes: 600, effort: 10 })])).toMatchObject(base);
    expect(placed([session("skill", "2026-12-02 12:30")])).not.toMatchObject(base);
  });
});

describe("unplaced lifts", () => {
  const oneHour = { ...emptyCamp().athlete, freeHours: freeHours("12:00", "13:00", [3]) };
  const wanted = (input: PlanInput) =>
    (["strength-a", "strength-b", "trunk-and-kick", "power-touch"] as const).map((item, order) =>
      slotIn(input, "2026-12-02", item, { order }),
    );

  it("where one place is left the most important lift has it, and the others say why not", () => {
    const input = emptyCamp({ athlete: oneHour });
    const { placed, unplaced } = placeLifts(request(input, { slots: wanted(input) }));
    expect(placed.map(({ slot }) => slot.item)).toEqual(["strength-a"]);
    expect(unplaced.map(({ slot }) => slot.item)).toEqual(["strength-b", "trunk-and-kick", "power-touch"]);
    expect(unplaced[0]?.rules[0]).toEqual({
      rule: "one-lift",
      text: "1 start left by the rules, and all needed by lifts that come first.",
    });
  });

  it("no prices that a team can set leave a lift out, nor the more important one", () => {
    const dear = {
      ...{
        "sport-gap.price": 100,
        "sport-gap.hours": 12,
        "heavy-before-hard-48.price": 500,
        "heavy-before-hard-48.hours": 96,
      },
      ...{
        "fresh-first.price": 50,
        "fresh-first.hours": 96,
        "spread.next-day": 200,
        "spread.second-day": 200,
      },
      ...{
        "rest-day.price": 500,
        "full-dose.price": 100,
        "hard-days-hard.on": 1,
        "hard-days-hard.price": 200,
      },
    };
    const sport = ["2026-11-29", "2026-12-01", "2026-12-03"].flatMap((date) => [
      session("conditioning", `${date} 00:00`, { minutes: 600, effort: 10 }),
    ]);
    const input = emptyCamp(
      { sport: [...sport, session("hard-sparring", "2026-12-06 19:00", { effort: 10 })] },
      dear,
    );
    const { unplaced } = placeLifts(request(input, { slots: wanted(input) }));
    expect(unplaced).toEqual([]);
    const athlete = { ...input.athlete, freeHours: freeHours("20:00", "21:00", [1, 2, 3]) };
    const some = placeLifts(request({ ...input, athlete }, { slots: wanted(input) }));
    expect(some.unplaced.map(({ slot }) => slot.item)).toEqual(["power-touch"]);
  });

  it("says which rules shut its starts, most frequent first, with how many", () => {
    const sport = [session("hard-sparring", "2026-12-03 12:00"), session("rest", "2026-12-04 00:00")];
    const athlete = { ...emptyCamp().athlete, freeHours: freeHours("12:00", "13:30", [3, 5]) };
    const input = emptyCamp({ sport, athlete }, { "start-step.minutes": 30 });
    const { unplaced } = placeLifts(request(input, { slots: [slotIn(input, "2026-12-02", "strength-a")] }));
    expect(unplaced[0]?.rules).toEqual([
      { rule: "free-hours", text: "Outside the free hours, or a day without lifting: 9 of 11 starts." },
      { rule: "heavy-before-hard", text: "Less than 24 h before hard sparring: 3 of 11 starts." },
    ]);
  });

  it("a week whose hours are past has no place any more", () => {
    const input = emptyCamp({ now: (day("2026-12-05") * 1440 + 1439) as Instant });
    const { unplaced } = placeLifts(request(input, { slots: [slotIn(input, "2026-12-02")] }));
    expect(unplaced[0]?.rules).toEqual([{ rule: "past", text: "Already past: every start." }]);
  });

  it("what starts now is past, what starts a step later is not", () => {
    const input = emptyCamp({ now: (day("2026-12-05") * 1440 + 1200) as Instant });
    const { placed } = placeLifts(request(input, { slots: [slotIn(input, "2026-12-02")] }));
    expect(placed[0]).toMatchObject(published("2026-12-05 20:05"));
  });
});

describe("reasons of a placed lift", () => {
  it("name hard sparring on either side with what the rules ask, then what the place pays for", () => {
    const sport = [
      session("hard-sparring", "2026-12-01 10:00", { title: "Hard rounds" }),
      session("hard-sparring", "2026-12-05 10:00", { title: "Hard rounds" }),
      session("skill", "2026-12-02 18:00", { title: "Pads" }),
    ];
    const athlete = { ...emptyCamp().athlete, freeHours: freeHours("12:00", "13:00", [3]) };
    const input = emptyCamp({ sport, athlete }, { "sport-gap.price": 6 });
    const { placed } = placeLifts(request(input, { slots: [slotIn(input, "2026-12-02", "strength-a")] }));
    expect(placed[0]?.reasons).toEqual([
      { rule: "heavy-before-hard", text: "Ends 69 h before Hard rounds; house rule asks 24 h." },
      { rule: "lift-after-hard", text: "Starts 25 h after Hard rounds; house rule asks 12 h." },
      { rule: "sport-gap", text: "5 h before Pads; house rule would like 6 h." },
    ]);
  });

  it("why a lift is not where it was: the rule that shuts the place, the lift that has the day, or what it would pay", () => {
    const sport = [
      session("hard-sparring", "2026-12-01 10:00", { title: "Hard rounds" }),
      session("skill", "2026-12-04 18:00", { title: "Pads" }),
    ];
    const input = emptyCamp({ sport }, { "sport-gap.price": 6, "stay-put.far": 8 });
    const slots = [
      slotIn(input, "2026-12-02", "strength-a", { base: published("2026-12-02 12:00") }),
      slotIn(input, "2026-12-02", "strength-b", { order: 1 }),
    ];
    const { whyNot } = placeLifts(request(input, { slots }));
    const texts = (at: string): string[] => {
      const place = published(at);
      return whyNot("strength-b.5", place.day, place.start).map(({ text }) => text);
    };
    expect(texts("2026-12-01 12:00")).toEqual([
      "Strength B starts 1 h after Hard rounds; house rule asks 6 h.",
    ]);
    expect(texts("2026-12-02 08:00")).toEqual(["Strength A has that day now."]);
    expect(texts("2026-12-04 14:00")).toEqual(["3 h before Pads; house rule would like 6 h."]);
    expect(whyNot("nobody", day("2026-12-01"), published("2026-12-01 12:00").start)).toEqual([]);
  });
});
