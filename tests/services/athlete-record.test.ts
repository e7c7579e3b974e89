import { randomUUID } from "node:crypto";
import Papa from "papaparse";
import { describe, expect, it } from "vitest";
import { athletes, bests, checkIns, sessionLogs, sessions, testTrials, users, weights } from "@/db/schema";
import { eq } from "drizzle-orm";
import { ROLES, can, type Role } from "@/lib/policy";
import { CSV_KINDS } from "@/lib/schemas/athlete-record";
import { createCamp } from "@/lib/services/camps/create";
import { exportCsv } from "@/lib/services/record/csv";
import { readAthleteRecord } from "@/lib/services/record/read-record";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const CHANGED = new Date("2026-11-26T06:00:00Z");

async function scene() {
  const made = await teamWithEveryRole(db);
  const scope = { teamId: made.team.id, athleteId: made.athlete.id };
  const params = { id: made.athlete.id };
  const weigh = (day: string, kg: number) =>
    db.insert(weights).values({ ...scope, day, kg, changedAt: CHANGED });
  const checkIn = (day: string, sleep: number) =>
    db
      .insert(checkIns)
      .values({ ...scope, day, sleep, fatigue: 3, soreness: 4, stress: 2, changedAt: CHANGED });
  const camp = async () => {
    const { id } = await createCamp(made.as("head"), { body: campForm({ athlete: params }) });
    return id;
  };
  /** A session of a camp, logged as done where `done` gives effort and minutes. */
  const session = async (
    campId: string,
    given: { day: string; source: "lift" | "sport"; effort: number; minutes: number; cancelled?: boolean },
    done?: { effort: number; minutes: number },
  ) => {
    const id = randomUUID();
    const { day, source, effort, minutes, cancelled } = given;
    await db.insert(sessions).values({
      teamId: made.team.id,
      campId,
      id,
      source,
      kind: source === "lift" ? "heavy" : "skill",
      title: "Session",
      day,
      start: "18:00",
      minutes,
      startsAt: new Date(`${day}T18:00:00Z`),
      endsAt: new Date(`${day}T19:00:00Z`),
      effort,
      status: cancelled ? "cancelled" : "confirmed",
      changedAt: CHANGED,
    });
    if (done)
      await db.insert(sessionLogs).values({
        ...scope,
        campId,
        sessionId: id,
        day,
        state: "done",
        effort: done.effort,
        minutes: done.minutes,
        loggedAt: CHANGED,
        changedAt: CHANGED,
      });
  };
  const read = (role: Role = "head") => readAthleteRecord(made.as(role), { params });
  const csv = (what: string, role: Role = "head") =>
    exportCsv(made.as(role), { params: { ...params, what } });
  return { ...made, scope, params, weigh, checkIn, camp, session, read, csv };
}

const minorBirth = "2010-01-01";

describe("sections of an athlete's page", () => {
  it("are null for a role that may not see them, and are what the policy says for every role", async () => {
    const { read, as, athlete } = await scene();
    const seen = async (role: Role) => {
      const { weight, load, checkIns: answers, camps } = await read(role);
      return [weight, load, answers, camps].map((section) => section !== null);
    };
    expect(await seen("head")).toEqual([true, true, true, true]);
    expect(await seen("athlete")).toEqual([true, true, true, true]);
    // The skills coach sees no weights, logs and check-ins; the medic check-ins but no weights.
    expect(await seen("skills")).toEqual([false, false, false, true]);
    expect(await seen("medic")).toEqual([false, false, true, true]);
    await expect(read("guest")).rejects.toMatchObject({ code: "not-found" });
    for (const role of ROLES.filter((one) => one !== "guest")) {
      const actions = ["weight.read", "logs.read", "checkins.read", "camps.read"] as const;
      expect([role, await seen(role)]).toEqual([
        role,
        actions.map((action) => can(as(role).member, action, athlete.id)),
      ]);
    }
  });

  it("of another team, of nobody and of another athlete are the same 404", async () => {
    const { as, team } = await scene();
    const other = await scene();
    const [mate] = await db
      .insert(athletes)
      .values({
        teamId: team.id,
        name: "Mate",
        trainingAge: "novice",
        strikingBase: "boxing",
        liftsPerWeek: 2,
        freeHours: [],
      })
      .returning();
    const gone = { code: "not-found" };
    await expect(readAthleteRecord(as("head"), { params: other.params })).rejects.toMatchObject(gone);
    await expect(readAthleteRecord(as("head"), { params: { id: randomUUID() } })).rejects.toMatchObject(gone);
    await expect(readAthleteRecord(as("head"), { params: { id: "x" } })).rejects.toMatchObject(gone);
    await expect(readAthleteRecord(as("athlete"), { params: { id: mate?.id ?? "" } })).rejects.toMatchObject(
      gone,
    );
  });
});

describe("weight", () => {
  it("is switched off for a minor with the reason, and not read", async () => {
    const { read, weigh, athlete } = await scene();
    await weigh("2026-11-20", 60);
    await db.update(athletes).set({ dateOfBirth: minorBirth }).where(eq(athletes.id, athlete.id));
    expect((await read()).weight).toEqual({ off: "minor", reason: expect.stringContaining("under 18") });
    expect((await read("athlete")).weight).toMatchObject({ off: "minor" });
  });

  it("stands alone without a camp that has a limit", async () => {
    const { read, weigh } = await scene();
    await weigh("2026-11-20", 80);
    expect((await read()).weight).toEqual({ off: null, weights: [{ date: "2026-11-20", kg: 80 }], to: null });
  });

  it("has the line from the first weight of the camp to the limit, and the ceilings at 72, 48 and 24 h (Ricci et al. 2025)", async () => {
    const { read, weigh, camp } = await scene();
    await camp();
    await weigh("2026-11-16", 64);
    await weigh("2026-11-25", 63.4);
    const { weight } = await read();
    if (weight === null || weight.off !== null || weight.to === null) throw new Error("no way to a limit");
    const { line, ceilings, limitKg, weighIn, pace } = weight.to;
    expect([limitKg, weighIn]).toEqual([60, "2027-01-08"]);
    expect(line[0]).toEqual({ date: "2026-11-16", kg: 64 });
    expect(line.at(-1)?.date).toBe("2027-01-08");
    expect(line.at(-1)?.kg).toBeCloseTo(60, 10);
    // 53 days: 1 - (60 / 64)^(7 / 53) = 0.85 % a week, above 0.7 % and below 1.5 %.
    expect(pace).toContain("faster than recommended");
    expect(ceilings.map(({ date, hours, kg }) => [date, hours, Number(kg.toFixed(3))])).toEqual([
      ["2027-01-05", 72, 64.309],
      ["2027-01-06", 48, 63.627],
      ["2027-01-07", 24, 62.762],
    ]);
    expect(weight.to.remarks.map(({ text }) => text)).toEqual(["On the line."]);
  });
});

describe("load", () => {
  it("is planned where the session stands, done where it was logged, and 0 on days without one", async () => {
    const { read, camp, session } = await scene();
    const campId = await camp();
    const day = "2026-10-20";
    await session(campId, { day, source: "sport", effort: 5, minutes: 60 }, { effort: 6, minutes: 70 });
    await session(campId, { day, source: "lift", effort: 6, minutes: 50 }, { effort: 7, minutes: 40 });
    await session(campId, { day, source: "lift", effort: 6, minutes: 50 });
    // Logged, and dropped from the plan after that: it was done and is no longer planned.
    await session(
      campId,
      { day, source: "sport", effort: 3, minutes: 30, cancelled: true },
      { effort: 3, minutes: 30 },
    );
    const load = (await read()).load;
    expect(load?.days).toHaveLength(56);
    expect(load?.days.at(-1)?.date).toBe("2026-11-26");
    expect(load?.days.find((one) => one.date === day)).toEqual({
      date: day,
      plannedSport: 300,
      plannedLifting: 600,
      doneSport: 510,
      doneLifting: 280,
    });
    expect(load?.days.find((one) => one.date === "2026-10-19")).toMatchObject({
      plannedSport: 0,
      doneLifting: 0,
    });
  });

  it("weeks have total, monotony and strain of what was done: 360, 480, 0, 540, 420, 720, 0 give 2520, 1.3306 and 3353.1 (Foster 1998, sample SD)", async () => {
    const { read, camp, session } = await scene();
    const campId = await camp();
    const daily = [360, 480, 0, 540, 420, 720, 0];
    // The seven days to 12 November are the third last of eight.
    for (const [index, load] of daily.entries())
      if (load > 0)
        await session(
          campId,
          { day: `2026-11-${String(6 + index).padStart(2, "0")}`, source: "sport", effort: 1, minutes: 60 },
          { effort: load / 60, minutes: 60 },
        );
    const weeks = (await read()).load?.weeks ?? [];
    expect(weeks).toHaveLength(8);
    const week = weeks.find((one) => one.to === "2026-11-12");
    expect(week).toMatchObject({ from: "2026-11-06", done: expect.closeTo(2520, 6) });
    expect(week?.monotony).toBeCloseTo(1.3306, 4);
    expect(week?.strain).toBeCloseTo(3353.1, 1);
    // Nothing was logged then: no figure, not a 0.
    expect(weeks[0]).toMatchObject({ done: null, monotony: null, strain: null });
  });
});

describe("check-ins", () => {
  it("of the last 28 days with the athlete's own mean and sample SD of each answer", async () => {
    const { read, checkIn } = await scene();
    await checkIn("2026-10-29", 7);
    await checkIn("2026-10-30", 2);
    await checkIn("2026-10-31", 3);
    await checkIn("2026-11-10", 6);
    const record = (await read()).checkIns;
    expect([record?.from, record?.to]).toEqual(["2026-10-30", "2026-11-26"]);
    expect(record?.days.map(({ date, sleep }) => [date, sleep])).toEqual([
      ["2026-10-30", 2],
      ["2026-10-31", 3],
      ["2026-11-10", 6],
    ]);
    expect(record?.own.sleep?.mean).toBeCloseTo(11 / 3, 12);
    expect(record?.own.sleep?.sd).toBeCloseTo(2.0817, 4);
    expect(record?.own.fatigue).toEqual({ mean: 3, sd: 0 });
  });
});

describe("CSV files", () => {
  const parsed = (text: string): string[][] => {
    expect(text.startsWith("\uFEFF")).toBe(true);
    return Papa.parse<string[]>(text.slice(1).trimEnd()).data;
  };

  it("each kind is for whom the policy says, and for nobody else", async () => {
    const { csv, as, athlete } = await scene();
    const action = {
      tests: "tests.read",
      bests: "tests.read",
      weights: "weight.read",
      "check-ins": "checkins.read",
      load: "logs.read",
    } as const;
    for (const what of CSV_KINDS)
      for (const role of ROLES.filter((one) => one !== "guest")) {
        const allowed = can(as(role).member, action[what], athlete.id);
        const outcome = await csv(what, role).then(
          () => "given",
          (error: { code?: string }) => error.code,
        );
        expect([what, role, outcome]).toEqual([what, role, allowed ? "given" : "forbidden"]);
      }
    await expect(csv("weights", "guest")).rejects.toMatchObject({ code: "not-found" });
    await expect(csv("secrets")).rejects.toMatchObject({ code: "not-found" });
  });

  it("of tests keep commas, quotes, line ends and other scripts, and take the teeth out of formulas", async () => {
    const { csv, scope } = await scene();
    const notes = ['a "b", c', "two\nlines", "=HYPERLINK(1)", "+1", "-1", "@x", "\tx", "日本 é 🥊", "=1\n2"];
    await db.insert(testTrials).values(
      notes.map((note, index) => ({
        ...scope,
        day: `2026-11-0${index + 1}`,
        kind: "jump-height",
        value: 40,
        massKg: 80,
        note,
      })),
    );
    const { text, name } = await csv("tests");
    expect(name).toMatch(/^Athlete \d+ tests 2026-11-26$/);
    const rows = parsed(text);
    expect(rows[0]?.slice(0, 7)).toEqual(["Date", "Test", "Side", "Value", "Second", "Body mass kg", "Note"]);
    expect(rows.slice(1).map((row) => row[6])).toEqual([
      'a "b", c',
      "two\nlines",
      "'=HYPERLINK(1)",
      "'+1",
      "'-1",
      "'@x",
      "'\tx",
      "日本 é 🥊",
      "'=1\n2",
    ]);
    expect(rows[1]).toEqual(["2026-11-01", "Jump height", "both", "40", "", "80", 'a "b", c', "cm", ""]);
  });

  it("masses are in the reader's unit, and the head says which", async () => {
    const { csv, weigh, as } = await scene();
    await weigh("2026-11-20", 70);
    expect(parsed((await csv("weights")).text)).toEqual([
      ["Date", "Weight kg"],
      ["2026-11-20", "70"],
    ]);
    await db
      .update(users)
      .set({ units: "lb" })
      .where(eq(users.id, as("head").userId));
    expect(parsed((await csv("weights")).text)).toEqual([
      ["Date", "Weight lb"],
      ["2026-11-20", "154.32"],
    ]);
  });

  it("of check-ins, load and bests say what the pages say", async () => {
    const { csv, checkIn, camp, session, scope } = await scene();
    await checkIn("2026-11-20", 2);
    const campId = await camp();
    await session(
      campId,
      { day: "2026-11-14", source: "sport", effort: 5, minutes: 60 },
      { effort: 6, minutes: 60 },
    );
    await db.insert(bests).values({
      ...scope,
      exerciseId: "no-longer-known",
      day: "2026-11-01",
      liftedKg: 110,
      reps: 4,
      formula: "epley",
      kg: 124.666_666,
    });
    expect(parsed((await csv("check-ins")).text)[1]).toEqual(["2026-11-20", "2", "3", "4", "2"]);
    expect(parsed((await csv("load")).text)[1]).toEqual(["2026-11-14", "300", "0", "360", "0"]);
    expect(parsed((await csv("bests")).text)[1]).toEqual([
      "2026-11-01",
      "no-longer-known",
      "110",
      "4",
      "epley",
      "124.67",
    ]);
  });

  it("weights of a minor are refused with the reason", async () => {
    const { csv, athlete } = await scene();
    await db.update(athletes).set({ dateOfBirth: minorBirth }).where(eq(athletes.id, athlete.id));
    await expect(csv("weights")).rejects.toMatchObject({ code: "conflict" });
  });
});
