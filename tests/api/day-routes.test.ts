import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { PUT as putCheckIn } from "@/app/api/athletes/[id]/check-ins/[date]/route";
import { DELETE as dropWeight, PUT as putWeight } from "@/app/api/athletes/[id]/weights/[date]/route";
import { PUT as putLog } from "@/app/api/camps/[id]/sessions/[sid]/log/route";
import { POST as ask } from "@/app/api/camps/[id]/sessions/[sid]/request/route";
import { POST as answer } from "@/app/api/requests/[id]/answer/route";
import { POST as withdraw } from "@/app/api/requests/[id]/withdraw/route";
import { GET as readToday } from "@/app/api/today/route";
import { sessionLogs, sessions } from "@/db/schema";
import type { Role } from "@/lib/policy";
import type { LogView, RequestView, TodayView } from "@/lib/schemas/today";
import { testDatabase } from "../setup/database";
import { call, problemOf } from "./client";
import { LOG } from "./bodies";
import { sceneOf } from "./scene";

const NOW = "2026-12-01T08:00:00Z";
process.env.BELLWARD_NOW = NOW;
const { db } = await testDatabase();

let own: Awaited<ReturnType<typeof sceneOf>>;
beforeEach(async () => {
  own = await sceneOf(db, new Date(NOW));
});

const json = async <T>(response: Response, status = 200): Promise<T> => {
  expect(response.status, await response.clone().text()).toBe(status);
  return (await response.json()) as T;
};
const sessionOn = async (day: string, source = "sport") => {
  const rows = await db.select().from(sessions).where(eq(sessions.campId, own.scene.campId));
  const row = rows.find((one) => one.day === day && one.source === source);
  if (!row) throw new Error(`no ${source} on ${day}`);
  return row.id;
};
const log = async (over: object, body: object = {}, role: Role = "athlete", sid = own.scene.sessionId) =>
  call(putLog, {
    method: "PUT",
    cookie: await own.cookie(role),
    params: { id: own.scene.campId, sid },
    body: { key: randomUUID(), baseVersion: 0, log: { ...LOG, ...over }, ...body },
  });

describe("GET /api/today", () => {
  it("is the signed-in athlete's, and nobody's cache keeps it; everyone else has none", async () => {
    const response = await call(readToday, { cookie: await own.cookie("athlete") });
    expect(response.headers.get("cache-control")).toBe("no-store");
    const view = await json<TodayView>(response);
    expect([view.today, view.days.length, view.athlete.id]).toEqual(["2026-12-01", 9, own.scene.athleteId]);
    for (const role of ["head", "strength", "skills", "medic", "guest"] as const) {
      const other = await call(readToday, { cookie: await own.cookie(role) });
      expect([role, other.status]).toEqual([role, 404]);
      expect((await problemOf(other)).type).toBe("tag:bellward,2026:not-found");
    }
  });
});

describe("PUT /api/camps/:id/sessions/:sid/log", () => {
  it("keeps a log, answers a retry the same, and an edit the next version", async () => {
    const key = randomUUID();
    const first = await json<LogView>(await log({ note: "Sharp." }, { key }));
    expect(first).toMatchObject({
      version: 1,
      note: "Sharp.",
      loggedAt: expect.stringMatching(/^2026-12-01T08:/),
    });
    expect(await json(await log({ note: "Sharp." }, { key }))).toEqual(first);
    expect(await json(await log({ effort: 8 }, { baseVersion: 1 }, "strength"))).toMatchObject({
      version: 2,
    });
  });

  it("409 stale carries the log as it stands", async () => {
    await json(await log({ effort: 5 }));
    const response = await log({ effort: 9 });
    expect(response.status).toBe(409);
    const problem = await problemOf(response);
    expect(problem).toMatchObject({
      type: "tag:bellward,2026:stale",
      current: { effort: 5, version: 1 },
    });
  });

  it("409 in words for a session ahead and for a knock taken back", async () => {
    const ahead = await log({}, {}, "athlete", await sessionOn("2026-12-07"));
    expect([ahead.status, (await problemOf(ahead)).detail]).toEqual([
      409,
      expect.stringContaining("12 hours"),
    ]);
    await json(await log({ knock: true }));
    const back = await log({}, { baseVersion: 1 });
    expect([back.status, (await problemOf(back)).detail]).toEqual([409, expect.stringContaining("medic")]);
  });

  it.each([
    ["done without effort", { effort: null }, "/log/effort"],
    ["pain above 10", { pain: 11, painPlace: "Hip" }, "/log/pain"],
    ["pain without a place", { pain: 4 }, "/log/painPlace"],
    ["a note of 1001 characters", { note: "x".repeat(1001) }, "/log/note"],
    [
      "201 sets",
      {
        sets: Array.from({ length: 201 }, (_, index) => ({
          slot: `s${index}`,
          number: 1,
          exerciseId: "x",
          kg: null,
          reps: 1,
          reserve: null,
        })),
      },
      "/log/sets",
    ],
    [
      "half a repetition",
      { sets: [{ slot: "s", number: 1, exerciseId: "x", kg: 20, reps: 1.5, reserve: null }] },
      "/log/sets/0/reps",
    ],
  ])("422 beside the field: %s", async (_, over, pointer) => {
    const response = await log(over);
    expect(response.status).toBe(422);
    expect((await problemOf(response)).errors?.map((error) => error.pointer)).toEqual([pointer]);
    expect(await db.$count(sessionLogs, eq(sessionLogs.campId, own.scene.campId))).toBe(0);
  });

  it("404 for a session that is not of this camp", async () => {
    const other = await sceneOf(db, new Date(NOW));
    expect((await log({}, {}, "athlete", other.scene.sessionId)).status).toBe(404);
  });
});

describe("requests", () => {
  const asked = async (reason = "Exam.") =>
    call(ask, {
      cookie: await own.cookie("athlete"),
      params: { id: own.scene.campId, sid: await sessionOn("2026-12-07") },
      body: { key: randomUUID(), reason },
    });
  const answered = async (id: string, state: string) =>
    call(answer, { cookie: await own.cookie("head"), params: { id }, body: { state, answer: "" } });

  it("are asked (201), answered once, and then not taken back", async () => {
    const { id } = await json<RequestView>(await asked(), 201);
    expect((await asked()).status).toBe(409);
    expect(await json(await answered(id, "accepted"))).toMatchObject({ state: "accepted" });
    expect((await answered(id, "declined")).status).toBe(409);
    const late = await call(withdraw, {
      method: "POST",
      cookie: await own.cookie("athlete"),
      params: { id },
    });
    expect(late.status).toBe(409);
  });

  it("are taken back by the athlete", async () => {
    const { id } = await json<RequestView>(await asked(), 201);
    const back = await call(withdraw, {
      method: "POST",
      cookie: await own.cookie("athlete"),
      params: { id },
    });
    expect(await json(back)).toMatchObject({ id, state: "withdrawn" });
  });

  it("422 without a reason, and for an answer that is none", async () => {
    expect((await problemOf(await asked("  "))).errors?.[0]?.pointer).toBe("/reason");
    expect((await problemOf(await answered(own.scene.requestId, "maybe"))).errors?.[0]?.pointer).toBe(
      "/state",
    );
  });
});

describe("check-ins and weights", () => {
  const on = (date: string) => ({ id: own.scene.athleteId, date });

  it("a check-in of today is kept; of yesterday 409; of no day 422; an answer of 8 beside its field", async () => {
    const cookie = await own.cookie("athlete");
    const body = { sleep: 2, fatigue: 3, soreness: 4, stress: 2 };
    const put = (date: string, values: object = body) =>
      call(putCheckIn, { method: "PUT", cookie, params: on(date), body: values });
    expect(await json(await put("2026-12-01"))).toEqual(body);
    expect((await put("2026-11-30")).status).toBe(409);
    expect((await put("today")).status).toBe(422);
    const bad = await problemOf(await put("2026-12-01", { ...body, stress: 8 }));
    expect(bad.errors?.[0]?.pointer).toBe("/stress");
  });

  it("a weight is kept and taken away (204); 409 outside of its days; 422 beside the field", async () => {
    const cookie = await own.cookie("strength");
    const put = (date: string, kg: number) =>
      call(putWeight, { method: "PUT", cookie, params: on(date), body: { kg } });
    expect(await json(await put("2026-12-01", 63.2))).toEqual({ kg: 63.2 });
    expect((await put("2026-11-23", 63)).status).toBe(409);
    expect((await problemOf(await put("2026-12-01", 10))).errors?.[0]?.pointer).toBe("/kg");
    const drop = () => call(dropWeight, { method: "DELETE", cookie, params: on("2026-12-01") });
    expect((await drop()).status).toBe(204);
    expect((await drop()).status).toBe(404);
  });
});
