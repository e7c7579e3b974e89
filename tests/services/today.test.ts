import { eq } from "drizzle-orm";
import { drizzle } from "drizzle-orm/postgres-js";
import { describe, expect, it } from "vitest";
import * as schema from "@/db/schema";
import { athletes, bests, camps, holds, users, weights } from "@/db/schema";
import { dayFromIso } from "@/lib/engine";
import type { TodayView } from "@/lib/schemas/today";
import { createCamp } from "@/lib/services/camps/create";
import { civilDayAt } from "@/lib/services/today/athlete-day";
import { saveCheckIn } from "@/lib/services/today/check-ins";
import { readToday } from "@/lib/services/today/read-today";
import { dropWeight, saveWeight } from "@/lib/services/today/weights";
import { campBook, campForm, weekly } from "../factories/camp-book";
import { testDatabase } from "../setup/database";
import { NOW, dayScene, done, keep, refusal } from "./day-scene";

const { db, sql } = await testDatabase();
const CHECK_IN = { sleep: 2, fatigue: 3, soreness: 5, stress: 1 };

const dayOf = (view: TodayView, date: string) => {
  const day = view.days.find((one) => one.date === date);
  if (!day) throw new Error(`no ${date}`);
  return day;
};

describe("the athlete's day", () => {
  it("is yesterday, today and the next seven days with every session that stands in them", async () => {
    const { as, athlete, campId } = await dayScene(db);
    const view = await readToday(as("athlete"));
    expect(view.today).toBe("2026-12-01");
    expect(view.days.map(({ date }) => date)).toEqual([
      "2026-11-30",
      "2026-12-01",
      "2026-12-02",
      "2026-12-03",
      "2026-12-04",
      "2026-12-05",
      "2026-12-06",
      "2026-12-07",
      "2026-12-08",
    ]);
    expect(view.athlete).toEqual({ id: athlete.id, name: athlete.name, minor: false });
    expect(view.bout).toMatchObject({ campId, date: "2027-01-09", limitKg: 60 });
    expect(dayOf(view, "2026-12-01").daysOut).toBe(39);
    const today = dayOf(view, "2026-12-01").sessions;
    expect(today.find((session) => session.source === "sport")).toMatchObject({
      kind: "hard-sparring",
      start: "18:00",
      effort: 8,
      editableUntil: "2026-12-02",
      log: null,
      request: null,
      prescription: null,
    });
    const lifts = view.days.flatMap(({ sessions }) => sessions).filter(({ source }) => source === "lift");
    expect(lifts.length).toBeGreaterThan(0);
    for (const lift of lifts)
      expect(lift.prescription?.lines.reduce((sum, line) => sum + line.sets, 0)).toBe(lift.sets);
  });

  it("shows logs, the figures of the last time before each session, and kilograms once a best is known", async () => {
    const { as, athlete, team, campId, lastLift } = await dayScene(db);
    const first = await readToday(as("athlete"));
    const next = first.days
      .flatMap(({ sessions }) => sessions)
      .find(
        ({ source, date, prescription }) =>
          source === "lift" && date > "2026-12-01" && prescription?.lines[0],
      );
    const line = next?.prescription?.lines[0];
    if (!next || !line) throw new Error("no lift ahead");
    const lift = await lastLift();
    const set = { slot: "main", exerciseId: line.exercise, reserve: null };
    const sets = [
      { ...set, number: 1, kg: 70, reps: 5 },
      { ...set, number: 2, kg: 75, reps: 4 },
      { ...set, number: 3, kg: 75, reps: 3 },
    ];
    await keep(as("head"), campId, lift.id, done({ sets }));
    await db.insert(bests).values({
      teamId: team.id,
      athleteId: athlete.id,
      exerciseId: line.exercise,
      day: "2026-11-13",
      liftedKg: 100,
      reps: 1,
      kg: 100,
    });
    const view = await readToday(as("athlete"));
    const again = dayOf(view, next.date).sessions.find(({ id }) => id === next.id);
    expect(again?.lastTime[line.exercise]).toEqual({ date: lift.day, kg: 75, reps: 4 });
    const load = again?.prescription?.lines.find(({ exercise }) => exercise === line.exercise)?.load;
    expect(load).toMatchObject({ of: "best", best: { kg: 100, from: "measured" } });
  });

  it("what was asked for at the first log stays beside the log, whatever the plan says since", async () => {
    const { as, athlete, team, campId, lastLift } = await dayScene(db);
    const lift = await lastLift();
    const athleteThen = as("athlete", lift.endsAt);
    await keep(athleteThen, campId, lift.id, done());
    const before = dayOf(await readToday(athleteThen), lift.day);
    const exercise = before.sessions.find(({ id }) => id === lift.id)?.prescription?.lines[0]?.exercise ?? "";
    await db.insert(bests).values({
      teamId: team.id,
      athleteId: athlete.id,
      exerciseId: exercise,
      day: "2026-11-13",
      liftedKg: 100,
      reps: 1,
      kg: 100,
    });
    const after = dayOf(await readToday(athleteThen), lift.day);
    expect(after.sessions.find(({ id }) => id === lift.id)).toEqual(
      before.sessions.find(({ id }) => id === lift.id),
    );
  });

  it("belongs to the athlete alone: staff and guest get 404, and so does one whose athlete is gone", async () => {
    const { as } = await dayScene(db);
    for (const role of ["head", "strength", "skills", "medic", "guest"] as const)
      expect((await refusal(readToday(as(role)))).code).toBe("not-found");
    const nobody = { ...as("athlete"), member: { role: "athlete" as const, athleteId: null } };
    expect((await refusal(readToday(nobody))).code).toBe("not-found");
  });

  it("without a camp it still has check-in and days, and no days out", async () => {
    const { as, campId } = await dayScene(db);
    await db.update(camps).set({ status: "off" }).where(eq(camps.id, campId));
    const view = await readToday(as("athlete"));
    expect(view).toMatchObject({ bout: null, weight: { off: "no-limit" } });
    expect(view.days.every(({ daysOut, sessions }) => daysOut === null && sessions.length === 0)).toBe(true);
  });

  it("follows the unit of the account and a hold that stands", async () => {
    const { as, athlete, team } = await dayScene(db);
    await db
      .update(users)
      .set({ units: "lb" })
      .where(eq(users.id, as("athlete").userId));
    await db.insert(holds).values({
      teamId: team.id,
      athleteId: athlete.id,
      fromDay: "2026-11-30",
      toDay: null,
      reason: "Check-up.",
    });
    expect(await readToday(as("athlete"))).toMatchObject({
      unit: "lb",
      hold: { from: "2026-11-30", to: null },
    });
  });
});

it("asks the database the same dozen questions, however many camps and logs there are", async () => {
  const questions: string[] = [];
  const counting = drizzle(sql, {
    schema,
    casing: "snake_case",
    logger: { logQuery: (query) => questions.push(query) },
  });
  const scene = await dayScene(db);
  const count = async () => {
    questions.length = 0;
    await readToday({ ...scene.as("athlete"), db: counting });
    return questions.length;
  };
  expect(await count()).toBe(12);
  await createCamp(scene.as("head"), {
    body: campForm({
      athlete: { id: scene.athlete.id },
      bout: { ...campBook().bout, date: "2027-01-16" },
      weighIn: null,
    }),
  });
  for (const day of ["2026-11-30", "2026-11-28"])
    await keep(scene.as("head"), scene.campId, (await scene.sessionOn(day)).id, done());
  expect(await count()).toBe(12);
});

describe("the civil day", () => {
  it("turns at midnight of the gym, and of the venue after the travel", async () => {
    const book = campBook();
    const travel = weekly("fly", "2026-12-03T09:00", { kind: "travel", title: "Travel", rrule: null });
    const { as } = await dayScene(db, {
      bout: { ...book.bout, timeZone: "Asia/Tokyo" },
      sport: [...book.sport, travel],
    });
    const todayAt = async (iso: string) => (await readToday(as("athlete", new Date(iso)))).today;
    expect(await todayAt("2026-12-01T23:59:00Z")).toBe("2026-12-01");
    expect(await todayAt("2026-12-02T00:00:00Z")).toBe("2026-12-02");
    // Japan is 9 h ahead of UTC.
    expect(await todayAt("2026-12-04T14:59:00Z")).toBe("2026-12-04");
    expect(await todayAt("2026-12-04T15:00:00Z")).toBe("2026-12-05");
  });

  it.each([
    [840, "2026-12-01T10:00:00Z", "2026-12-02"],
    [840, "2026-12-01T09:59:00Z", "2026-12-01"],
    [-720, "2026-12-01T11:59:00Z", "2026-11-30"],
    [-720, "2026-12-01T12:00:00Z", "2026-12-01"],
  ])("holds at %i minutes east of UTC", (offset, iso, date) => {
    expect(civilDayAt([{ from: 0, offset }], new Date(iso))).toBe(dayFromIso(date));
  });
});

describe("check-in", () => {
  const save = (scene: Awaited<ReturnType<typeof dayScene>>, date: string, now = NOW) =>
    saveCheckIn(scene.as("athlete", now), { params: { id: scene.athlete.id, date }, body: CHECK_IN });

  it("one a day, changed that day, and not before or after", async () => {
    const scene = await dayScene(db);
    await save(scene, "2026-12-01");
    await saveCheckIn(scene.as("athlete"), {
      params: { id: scene.athlete.id, date: "2026-12-01" },
      body: { ...CHECK_IN, sleep: 6 },
    });
    expect(dayOf(await readToday(scene.as("athlete")), "2026-12-01").checkIn).toEqual({
      ...CHECK_IN,
      sleep: 6,
    });
    for (const date of ["2026-11-30", "2026-12-02"])
      expect((await refusal(save(scene, date))).code).toBe("conflict");
    expect((await refusal(save(scene, "2026-12-01", new Date("2026-12-02T00:00:00Z")))).code).toBe(
      "conflict",
    );
    expect((await refusal(save(scene, "2026-13-01"))).code).toBe("invalid");
  });

  it("nobody answers for the athlete, and another athlete is missing", async () => {
    const [own, other] = [await dayScene(db), await dayScene(db)];
    const params = { id: own.athlete.id, date: "2026-12-01" };
    for (const role of ["head", "strength", "medic"] as const)
      expect((await refusal(saveCheckIn(own.as(role), { params, body: CHECK_IN }))).code).toBe("forbidden");
    expect((await refusal(saveCheckIn(other.as("athlete"), { params, body: CHECK_IN }))).code).toBe(
      "not-found",
    );
  });
});

describe("weight", () => {
  const put = (
    scene: Awaited<ReturnType<typeof dayScene>>,
    date: string,
    kg: number,
    role: "athlete" | "strength" | "skills" = "athlete",
  ) => saveWeight(scene.as(role), { params: { id: scene.athlete.id, date }, body: { kg } });

  it("stands beside the line to the limit, with what the engine says of the newest", async () => {
    const scene = await dayScene(db);
    expect((await readToday(scene.as("athlete"))).weight).toEqual({ off: "no-weight" });
    await put(scene, "2026-11-25", 63);
    await put(scene, "2026-12-01", 64);
    const view = await readToday(scene.as("athlete"));
    expect(dayOf(view, "2026-12-01").kg).toBe(64);
    if (view.weight.off !== null) throw new Error("off");
    expect(view.weight).toMatchObject({ limitKg: 60, weighIn: "2027-01-08", remarks: [{ kind: "behind" }] });
    expect(view.weight.line.map(({ date }) => date)).toEqual(view.days.map(({ date }) => date));
    // A line that falls by the same share each week, worked by hand: 63 kg on 25 Nov to 60 kg on 8 Jan is 44 days; on 1 Dec
    // 63 x (60 / 63)^(6 / 44) = 62.58.
    expect(view.weight.line.find(({ date }) => date === "2026-12-01")?.kg).toBeCloseTo(62.58, 2);
  });

  it("for today and seven days back, changed and taken away", async () => {
    const scene = await dayScene(db);
    for (const date of ["2026-12-01", "2026-11-24"]) await put(scene, date, 63);
    await put(scene, "2026-12-01", 62.8, "strength");
    for (const date of ["2026-12-02", "2026-11-23"])
      expect((await refusal(put(scene, date, 63))).code).toBe("conflict");
    const rows = await db.select().from(weights).where(eq(weights.athleteId, scene.athlete.id));
    expect(rows.map(({ day, kg }) => [day, kg]).sort()).toEqual([
      ["2026-11-24", 63],
      ["2026-12-01", 62.8],
    ]);
    const params = { id: scene.athlete.id, date: "2026-12-01" };
    await dropWeight(scene.as("athlete"), { params });
    expect((await refusal(dropWeight(scene.as("athlete"), { params }))).code).toBe("not-found");
  });

  it("is off under 18: no line, no limit, no figure, and none can be added", async () => {
    const scene = await dayScene(db);
    await put(scene, "2026-12-01", 63);
    await db.update(athletes).set({ dateOfBirth: "2008-12-02" }).where(eq(athletes.id, scene.athlete.id));
    const view = await readToday(scene.as("athlete"));
    expect(view).toMatchObject({
      athlete: { minor: true },
      weight: { off: "minor" },
      bout: { limitKg: null },
    });
    expect(view.days.every(({ kg }) => kg === null)).toBe(true);
    for (const role of ["athlete", "strength"] as const)
      expect((await refusal(put(scene, "2026-12-01", 62, role))).code).toBe("conflict");
    const grown = await readToday(scene.as("athlete", new Date("2026-12-02T08:00:00Z")));
    expect(grown.athlete.minor).toBe(false);
  });

  it("is not for those who may not see it", async () => {
    const scene = await dayScene(db);
    expect((await refusal(put(scene, "2026-12-01", 63, "skills"))).code).toBe("forbidden");
  });
});
