import { describe, expect, it } from "vitest";
import { dayTitle, endOf, presentDate, stripStart } from "@/components/today/days";
import { effortText, EFFORT_WORDS } from "@/components/today/effort-words";
import { swipeOf } from "@/components/today/swipe";
import { fromKg, massText, toKg } from "@/lib/format/load";
import type { Entry } from "@/lib/offline/entry";
import { EMPTY_LOG, overlay, settled } from "@/lib/offline/overlay";
import { clockText, readRest, restAt, startRest, stretchRest } from "@/lib/offline/rest";
import type { DaySession, TodayView } from "@/lib/schemas/today";

describe("loads in the athlete's unit", () => {
  // The international avoirdupois pound is exactly 0.45359237 kg (international yard and pound agreement, 1959).
  it("turns pounds into kilograms by the exact pound", () => {
    expect(toKg(1, "lb")).toBe(0.45359237);
    expect(toKg(225, "lb")).toBeCloseTo(102.05828325, 10);
    expect(fromKg(0.45359237, "lb")).toBe(1);
  });

  it("shows a load that was typed in pounds as it was typed, after a way through kilograms", () => {
    for (let lb = 5; lb <= 900; lb += 2.5) expect(massText(toKg(lb, "lb"), "lb")).toBe(`${lb} lb`);
    for (let kg = 1.25; kg <= 400; kg += 1.25) expect(massText(toKg(kg, "kg"), "kg")).toBe(`${kg} kg`);
  });
});

describe("the rest timer", () => {
  const rest = startRest(1_000_000, 180, "Trap-bar deadlift, set 2");

  it("knows what is left from its end alone, also after sleeping", () => {
    expect(restAt(rest, 1_000_000)).toEqual({ seconds: 180, over: false });
    expect(restAt(rest, 1_000_000 + 179_800)).toEqual({ seconds: 1, over: false });
    expect(restAt(rest, 1_000_000 + 180_000)).toEqual({ seconds: 0, over: true });
    expect(restAt(rest, 1_000_000 + 192_000)).toEqual({ seconds: 12, over: true });
  });

  it("is forgotten half an hour after its end", () => {
    expect(restAt(rest, 1_000_000 + 180_000 + 30 * 60_000)).toBeNull();
  });

  it("survives storage, and takes nothing else for a rest", () => {
    expect(readRest(JSON.stringify(rest))).toEqual(rest);
    for (const none of [null, "", "{", "null", "[]", '{"endsAt":"soon","next":"x"}'])
      expect(readRest(none)).toBeNull();
  });

  it("is stretched from now when it is over, and may then be told again", () => {
    const told = { ...rest, told: true };
    expect(stretchRest(told, 30, 1_200_000)).toMatchObject({ endsAt: 1_230_000, told: false });
    expect(stretchRest(rest, 30, 1_000_000).endsAt).toBe(rest.endsAt + 30_000);
  });

  it("reads as a clock", () => {
    expect([0, 9, 65, 180].map(clockText)).toEqual(["0:00", "0:09", "1:05", "3:00"]);
  });
});

describe("days on the phone", () => {
  it("takes a finger's way across for a day, and a scroll or a slip for nothing", () => {
    const from = { x: 200, y: 300 };
    expect(swipeOf(from, { x: 100, y: 310 })).toBe(1);
    expect(swipeOf(from, { x: 320, y: 280 })).toBe(-1);
    expect(swipeOf(from, { x: 150, y: 300 })).toBe(0);
    expect(swipeOf(from, { x: 100, y: 400 })).toBe(0);
  });

  it("moves the strip of seven only when the chosen day would fall out of it", () => {
    expect([0, 1, 6, 7, 8].map((chosen) => stripStart(chosen, 9))).toEqual([0, 0, 0, 1, 2]);
  });

  const view = {
    today: "2026-12-02",
    madeAt: new Date(2026, 11, 2, 20, 0).toISOString(),
    days: [
      { date: "2026-12-01" },
      { date: "2026-12-02" },
      { date: "2026-12-09" },
    ] as unknown as TodayView["days"],
  };

  it("goes on to the next day without a net, and never past what it holds or back", () => {
    expect(presentDate(view, new Date(2026, 11, 2, 23, 59))).toBe("2026-12-02");
    expect(presentDate(view, new Date(2026, 11, 3, 0, 1))).toBe("2026-12-03");
    expect(presentDate(view, new Date(2026, 11, 30))).toBe("2026-12-09");
    expect(presentDate(view, new Date(2026, 10, 30))).toBe("2026-12-02");
  });

  it("calls the near days by their names", () => {
    expect(dayTitle("2026-12-01", "2026-12-02")).toBe("Yesterday, Tue 1 Dec");
    expect(dayTitle("2026-12-02", "2026-12-02")).toBe("Today, Wed 2 Dec");
    expect(dayTitle("2026-12-05", "2026-12-02")).toBe("Sat 5 Dec");
  });

  it("ends a session on the wall clock", () => {
    expect(endOf("10:00", 65)).toBe("11:05");
    expect(endOf("23:30", 60)).toBe("00:30");
  });
});

describe("words of effort", () => {
  // Modified CR-10 as in Foster et al. 2001, J Strength Cond Res 15(1):109-115: 6, 8 and 9 have no word.
  it("are the published ones", () => {
    expect(EFFORT_WORDS).toEqual([
      "rest",
      "very, very easy",
      "easy",
      "moderate",
      "somewhat hard",
      "hard",
      null,
      "very hard",
      null,
      null,
      "maximal",
    ]);
    expect([5, 6, 10].map(effortText)).toEqual(["5, hard", "6", "10, maximal"]);
  });
});

describe("what the athlete sees", () => {
  const session = {
    campId: "camp",
    id: "lift-1",
    source: "lift",
    date: "2026-12-02",
    log: null,
    request: null,
  } as unknown as DaySession;
  const view = {
    days: [
      {
        date: "2026-12-02",
        daysOut: 38,
        sessions: [session, { ...session, campId: "other" }],
        checkIn: null,
        kg: null,
      },
    ],
  } as unknown as TodayView;
  const entry = (work: Entry["work"]): Entry => ({
    key: "k",
    madeAt: "2026-12-02T10:00:00.000Z",
    title: "",
    work,
    tried: false,
    stuck: null,
  });
  const log = entry({
    kind: "log",
    campId: "camp",
    sessionId: "lift-1",
    baseVersion: 2,
    log: { ...EMPTY_LOG, effort: 7 },
  });

  it("is the server's word with what waits laid over it, session by session and day by day", () => {
    const answers = { sleep: 1, fatigue: 2, soreness: 3, stress: 4 };
    const seen = overlay(view, [
      log,
      entry({ kind: "check-in", athleteId: "a", date: "2026-12-02", answers }),
      entry({ kind: "weight", athleteId: "a", date: "2026-12-01", kg: 70 }),
      entry({ kind: "request", campId: "camp", sessionId: "lift-1", reason: "Exam" }),
    ]);
    expect(seen.days[0]?.sessions[0]).toMatchObject({
      log: { effort: 7, version: 2 },
      request: { id: "k", state: "asked", reason: "Exam" },
    });
    expect(seen.days[0]?.sessions[1]?.log).toBeNull();
    expect(seen.days[0]).toMatchObject({ checkIn: answers, kg: null });
    expect(view.days[0]?.sessions[0]?.log).toBeNull();
  });

  it("has the version that the server gave once a write is taken", () => {
    expect(settled(view, log, 3).days[0]?.sessions[0]?.log?.version).toBe(3);
  });
});
