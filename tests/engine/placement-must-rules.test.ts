import { describe, expect, it } from "vitest";
import { type PlanInput, type SportSession } from "@/lib/engine";
import { placeLifts, placementProblem, type FixedLift } from "@/lib/engine/placement";
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

interface Row {
  readonly name: string;
  readonly lift: LiftAt;
  readonly sport?: readonly SportSession[];
  readonly other?: LiftAt;
  readonly input?: Partial<PlanInput>;
  readonly rules?: Readonly<Record<string, number>>;
  /** What a lift there breaks; nothing where it is allowed. */
  readonly breaks: readonly string[];
}

/** What a pinned lift breaks at the place, and whether a lift could have been placed there. */
function judge({ lift, sport = [], other, input: over, rules }: Row): {
  breaks: string[];
  isCandidate: boolean;
} {
  const input = emptyCamp({ sport, ...over }, rules);
  const standing: FixedLift[] = other ? [{ ...pinnedLift(input, other), id: "other" }] : [];
  const pinned = pinnedLift(input, lift);
  const { violations } = placeLifts(request(input, { fixed: [...standing, pinned] }));
  const [date = ""] = lift.at.split(" ");
  const slot = slotIn(input, date, lift.item, { minutes: lift.minutes ?? 60 });
  const { problem } = placementProblem(request(input, { slots: [slot], fixed: standing }));
  const at = published(lift.at);
  return {
    breaks: violations.filter(({ ids }) => ids.includes(pinned.id)).map(({ rule }) => rule),
    isCandidate: problem.candidates.some(({ day: on, start }) => on === at.day && start === at.start),
  };
}

const check = (rows: readonly Row[]): void =>
  it.each(rows)("$name", (row) => {
    const { breaks, isCandidate } = judge(row);
    expect(breaks).toEqual(row.breaks);
    expect(isCandidate).toBe(row.breaks.length === 0);
  });

// Week 5 of the camp: Sunday 29 November to Saturday 5 December 2026.

describe("clash: 45 min to other sessions", () => {
  const sport = [session("skill", "2026-12-02 12:00")];
  const midnight = [session("skill", "2026-12-02 00:20")];
  check([
    { name: "ends 45 min before: allowed", lift: { at: "2026-12-02 10:15" }, sport, breaks: [] },
    { name: "ends 40 min before: broken", lift: { at: "2026-12-02 10:20" }, sport, breaks: ["clash"] },
    { name: "starts 45 min after: allowed", lift: { at: "2026-12-02 13:45" }, sport, breaks: [] },
    { name: "starts 40 min after: broken", lift: { at: "2026-12-02 13:40" }, sport, breaks: ["clash"] },
    { name: "overlaps: broken", lift: { at: "2026-12-02 12:30" }, sport, breaks: ["clash"] },
    { name: "45 min over midnight: allowed", lift: { at: "2026-12-01 22:35" }, sport: midnight, breaks: [] },
    {
      name: "40 min over midnight: broken",
      lift: { at: "2026-12-01 22:40" },
      sport: midnight,
      breaks: ["clash"],
    },
    {
      name: "a lift that runs into the next day's session: broken",
      lift: { at: "2026-12-01 23:00", minutes: 60 },
      sport: midnight,
      breaks: ["clash"],
    },
    {
      name: "a team's own gap of 0: touching is allowed",
      lift: { at: "2026-12-02 11:00" },
      sport,
      rules: { "clash.gap": 0 },
      breaks: [],
    },
  ]);
});

describe("free-hours: inside the free hours, on a day that is open", () => {
  const athlete = { ...emptyCamp().athlete, freeHours: freeHours("10:00", "12:00", [3]) };
  const closed = (over: Partial<PlanInput>): Partial<PlanInput> => over;
  check([
    {
      name: "from the first minute: allowed",
      lift: { at: "2026-12-02 10:00" },
      input: { athlete },
      breaks: [],
    },
    { name: "to the last minute: allowed", lift: { at: "2026-12-02 11:00" }, input: { athlete }, breaks: [] },
    {
      name: "5 min too early: broken",
      lift: { at: "2026-12-02 09:55" },
      input: { athlete },
      breaks: ["free-hours"],
    },
    {
      name: "5 min too long: broken",
      lift: { at: "2026-12-02 11:05" },
      input: { athlete },
      breaks: ["free-hours"],
    },
    {
      name: "on another weekday: broken",
      lift: { at: "2026-12-03 10:00" },
      input: { athlete },
      breaks: ["free-hours"],
    },
    {
      name: "on a rest day: broken",
      lift: { at: "2026-12-02 10:00" },
      sport: [session("rest", "2026-12-02 00:00")],
      breaks: ["free-hours"],
    },
    {
      name: "on a travel day, at another hour: broken",
      lift: { at: "2026-12-02 20:00" },
      sport: [session("travel", "2026-12-02 08:00")],
      breaks: ["free-hours"],
    },
    {
      name: "on the weigh-in day: broken",
      lift: { at: "2027-01-06 10:00" },
      input: closed({ weighIn: published("2027-01-06 11:00") }),
      breaks: ["free-hours"],
    },
    {
      name: "on the last held day: broken",
      lift: { at: "2026-12-02 10:00" },
      input: closed({ holds: [{ from: day("2026-11-30"), to: day("2026-12-02") }] }),
      breaks: ["free-hours"],
    },
    {
      name: "on the day after a hold: allowed",
      lift: { at: "2026-12-03 10:00" },
      input: closed({ holds: [{ from: day("2026-11-30"), to: day("2026-12-02") }] }),
      breaks: [],
    },
    {
      name: "under a hold with no end: broken",
      lift: { at: "2026-12-30 10:00" },
      input: closed({ holds: [{ from: day("2026-12-02"), to: null }] }),
      breaks: ["free-hours"],
    },
  ]);
});

describe("heavy-before-hard: heavy legs end 24 h before hard sparring", () => {
  // Tuesday 1 December, 19:00.
  const sport = [session("hard-sparring", "2026-12-01 19:00")];
  check([
    { name: "25 h before: allowed", lift: { item: "strength-a", at: "2026-11-30 17:00" }, sport, breaks: [] },
    {
      name: "heavy squats on Monday at 18:00 for an hour, sparring on Tuesday at 19:00, so 24 h from the end: allowed",
      lift: { item: "strength-a", at: "2026-11-30 18:00" },
      sport,
      breaks: [],
    },
    {
      name: "the same for 65 min, so 23 h 55 min: broken",
      lift: { item: "strength-a", at: "2026-11-30 18:00", minutes: 65 },
      sport,
      breaks: ["heavy-before-hard"],
    },
    {
      name: "23 h before: broken",
      lift: { item: "strength-a", at: "2026-11-30 19:00" },
      sport,
      breaks: ["heavy-before-hard"],
    },
    { name: "23 h before, but not heavy: allowed", lift: { at: "2026-11-30 19:00" }, sport, breaks: [] },
    {
      name: "23 h before technical sparring: allowed",
      lift: { item: "strength-a", at: "2026-11-30 19:00" },
      sport: [session("technical-sparring", "2026-12-01 19:00")],
      breaks: [],
    },
    {
      name: "24 h on the wall over the night the clocks go forward are 23: broken",
      lift: { item: "strength-a", at: "2026-11-30 18:00" },
      sport,
      input: {
        zone: [
          { from: 0, offset: 0 },
          { from: day("2026-12-01") * 1440 + 180, offset: 60 },
        ],
      },
      breaks: ["heavy-before-hard"],
    },
    {
      name: "a team's own 48 h, 47 h before: broken",
      lift: { item: "strength-a", at: "2026-11-29 19:00" },
      sport,
      rules: { "heavy-before-hard.hours": 48 },
      breaks: ["heavy-before-hard"],
    },
  ]);
});

describe("lift-after-hard: a lift starts 6 h after hard sparring, heavy legs 12 h", () => {
  // Tuesday, 10:00 to 11:00.
  const sport = [session("hard-sparring", "2026-12-01 10:00")];
  check([
    { name: "6 h after: allowed", lift: { at: "2026-12-01 17:00" }, sport, breaks: [] },
    {
      name: "5 h 55 min after: broken",
      lift: { at: "2026-12-01 16:55" },
      sport,
      breaks: ["lift-after-hard"],
    },
    {
      name: "12 h after, heavy: allowed",
      lift: { item: "strength-a", at: "2026-12-01 23:00" },
      sport,
      breaks: [],
    },
    {
      name: "11 h 55 min after, heavy: broken",
      lift: { item: "strength-a", at: "2026-12-01 22:55" },
      sport,
      breaks: ["lift-after-hard"],
    },
    {
      name: "the long session that began first counts, not the short one that began later",
      lift: { at: "2026-12-01 17:00" },
      sport: [
        session("hard-sparring", "2026-12-01 08:00", { minutes: 240 }),
        session("hard-sparring", "2026-12-01 08:30", { minutes: 30 }),
      ],
      rules: { "sessions-a-day": 3 },
      breaks: ["lift-after-hard"],
    },
  ]);
});

describe("heavy-apart: 48 h between two heavy lifts", () => {
  const other: LiftAt = { item: "strength-keep", at: "2026-12-01 10:00" };
  check([
    { name: "48 h after: allowed", lift: { item: "strength-a", at: "2026-12-03 11:00" }, other, breaks: [] },
    {
      name: "47 h 55 min after: broken",
      lift: { item: "strength-a", at: "2026-12-03 10:55" },
      other,
      breaks: ["heavy-apart"],
    },
    {
      name: "47 h 55 min before, over the border of two weeks: broken",
      lift: { item: "strength-a", at: "2026-11-28 10:05" },
      other: { item: "strength-keep", at: "2026-11-30 11:00" },
      breaks: ["heavy-apart"],
    },
    {
      name: "47 h 55 min after, but not heavy: allowed",
      lift: { at: "2026-12-03 10:55" },
      other,
      breaks: [],
    },
  ]);
});

describe("one-lift: one lift a day, two sessions at most", () => {
  const morning = session("skill", "2026-12-02 07:00");
  const evening = session("skill", "2026-12-02 20:00");
  check([
    {
      name: "a second lift on the day: broken",
      lift: { at: "2026-12-02 12:00" },
      other: { item: "power-touch", at: "2026-12-02 22:00" },
      breaks: ["one-lift"],
    },
    {
      name: "a lift the day after: allowed",
      lift: { at: "2026-12-03 12:00" },
      other: { item: "power-touch", at: "2026-12-02 22:00" },
      breaks: [],
    },
    {
      name: "second session of the day: allowed",
      lift: { at: "2026-12-02 12:00" },
      sport: [morning],
      breaks: [],
    },
    {
      name: "third session of the day: broken",
      lift: { at: "2026-12-02 12:00" },
      sport: [morning, evening],
      breaks: ["one-lift"],
    },
    {
      name: "third session where the team allows three: allowed",
      lift: { at: "2026-12-02 12:00" },
      sport: [morning, evening],
      rules: { "sessions-a-day": 3 },
      breaks: [],
    },
  ]);
});

describe("last-heavy: no heavy legs at fewer than 7 days out", () => {
  check([
    { name: "7 days out: allowed", lift: { item: "strength-keep", at: "2027-01-02 10:00" }, breaks: [] },
    {
      name: "6 days out: broken",
      lift: { item: "strength-keep", at: "2027-01-03 10:00" },
      breaks: ["last-heavy"],
    },
    {
      name: "6 days out, not heavy: allowed",
      lift: { item: "power-short", at: "2027-01-03 10:00" },
      breaks: [],
    },
    {
      name: "5 days out where the team lifts until 4: allowed",
      lift: { item: "strength-keep", at: "2027-01-04 10:00" },
      rules: { "last-heavy.days": 4 },
      breaks: [],
    },
  ]);
});

describe("last-lift: only the primer from 2 days out, nothing from 1", () => {
  check([
    { name: "3 days out: allowed", lift: { item: "power-short", at: "2027-01-06 10:00" }, breaks: [] },
    {
      name: "2 days out: broken",
      lift: { item: "power-short", at: "2027-01-07 10:00" },
      breaks: ["last-lift"],
    },
    { name: "2 days out, the primer: allowed", lift: { item: "primer", at: "2027-01-07 10:00" }, breaks: [] },
    {
      name: "1 day out, the primer: broken",
      lift: { item: "primer", at: "2027-01-08 10:00" },
      breaks: ["last-lift"],
    },
    {
      name: "on the bout day, where a team lifts until then: still broken",
      lift: { item: "primer", at: "2027-01-09 10:00" },
      rules: { "last-lift.days": 0 },
      breaks: ["free-hours", "last-lift"],
    },
  ]);
});
