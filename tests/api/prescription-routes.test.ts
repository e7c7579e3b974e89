import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { bests, swaps } from "@/db/schema";
import { GET as listBests, POST as addBest } from "@/app/api/athletes/[id]/bests/route";
import { DELETE as dropBest } from "@/app/api/bests/[id]/route";
import { PUT as putEdit } from "@/app/api/camps/[id]/sessions/[sid]/edit/route";
import { GET as readSession } from "@/app/api/camps/[id]/sessions/[sid]/route";
import { DELETE as dropSwap, POST as addSwap } from "@/app/api/camps/[id]/swaps/route";
import type { BestView, BestsView, SessionPageView } from "@/lib/schemas/prescription";
import { testDatabase } from "../setup/database";
import { call, problemOf } from "./client";
import { BEST } from "./bodies";
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
const lift = () => ({ id: own.scene.campId, sid: own.scene.liftId });

describe("GET /api/camps/:id/sessions/:sid", () => {
  it("answers with the prescription for those who may see it, whatever way the id was escaped", async () => {
    const cookie = await own.cookie("athlete");
    const view = await json<SessionPageView>(await call(readSession, { cookie, params: lift() }));
    expect(view.lift?.lines.length).toBeGreaterThan(0);
    const { campId, sessionId } = own.scene;
    const params = { id: campId, sid: encodeURIComponent(sessionId) };
    const sport = await json<SessionPageView>(await call(readSession, { cookie, params }));
    expect(sport).toMatchObject({ session: { id: sessionId, source: "sport" }, lift: null });
  });

  it("404 for a session that the camp does not have", async () => {
    const params = { id: own.scene.campId, sid: "none" };
    const response = await call(readSession, { cookie: await own.cookie("head"), params });
    expect(response.status).toBe(404);
  });
});

describe("PUT /api/camps/:id/sessions/:sid/edit", () => {
  const body = { base: null, edit: { lines: {}, note: "Slow and clean." } };
  const put = async (given: unknown) =>
    call(putEdit, { method: "PUT", cookie: await own.cookie("strength"), params: lift(), body: given });

  it("writes it, and 409 with what stands for an edit of what was there before", async () => {
    const view = await json<SessionPageView>(await put(body));
    expect(view.lift?.note).toBe("Slow and clean.");
    const response = await put(body);
    expect(response.status).toBe(409);
    expect(await problemOf(response)).toMatchObject({
      type: "tag:bellward,2026:stale",
      current: { edit: body.edit, changedAt: view.lift?.edit?.changedAt },
    });
  });

  it.each([
    [{ sets: 11 }, "/edit/lines/main-lower/sets"],
    [{ sets: 0 }, "/edit/lines/main-lower/sets"],
    [{ reps: { low: 8, high: 5 } }, "/edit/lines/main-lower/reps/high"],
    [{ reps: { low: 1, high: 101 } }, "/edit/lines/main-lower/reps/high"],
    [{ kg: 501 }, "/edit/lines/main-lower/kg"],
    [{ note: "x".repeat(301) }, "/edit/lines/main-lower/note"],
    [{ tempo: "fast" }, "/edit/lines/main-lower"],
  ])("422 for %j, beside its field", async (line, pointer) => {
    const response = await put({ base: null, edit: { lines: { "main-lower": line } } });
    expect(response.status).toBe(422);
    expect((await problemOf(response)).errors?.map((error) => error.pointer)).toEqual([pointer]);
  });

  it("422 for an exercise that the team does not have, and for a place that the session does not have", async () => {
    const cookie = await own.cookie("strength");
    const view = await json<SessionPageView>(await call(readSession, { cookie, params: lift() }));
    const slot = view.lift?.lines[0]?.slot ?? "";
    const lines = { [slot]: { exercise: "no-such-thing" }, elsewhere: { sets: 3 } };
    const response = await put({ base: null, edit: { lines } });
    expect(response.status).toBe(422);
    expect((await problemOf(response)).errors?.map((error) => error.pointer)).toEqual([
      `/edit/lines/${slot}/exercise`,
      "/edit/lines/elsewhere",
    ]);
  });
});

describe("/api/camps/:id/swaps", () => {
  const body = { item: "strength-a", from: "back-squat", to: "front-squat" };
  const params = () => ({ id: own.scene.campId });

  it("the athlete swaps and puts back; a second put-back finds nothing", async () => {
    const cookie = await own.cookie("athlete");
    const made = await call(addSwap, { cookie, params: params(), body });
    expect(await json(made)).toEqual({ swaps: [body] });
    const back = { method: "DELETE", cookie, params: params(), body: { item: body.item, from: body.from } };
    expect(await json(await call(dropSwap, back))).toEqual({ swaps: [] });
    expect(await db.select().from(swaps).where(eq(swaps.campId, own.scene.campId))).toEqual([]);
    expect((await call(dropSwap, back)).status).toBe(404);
  });

  it("422 in words for an exercise of another quality", async () => {
    const given = { cookie: await own.cookie("athlete"), params: params() };
    const response = await call(addSwap, { ...given, body: { ...body, to: "wall-sit-of-nobody" } });
    expect(response.status).toBe(422);
    expect((await problemOf(response)).errors).toMatchObject([{ pointer: "/to" }]);
  });
});

describe("bests", () => {
  const params = () => ({ id: own.scene.athleteId });

  it("are added and listed with their formula, and taken away", async () => {
    const cookie = await own.cookie("athlete");
    const best = await json<BestView>(
      await call(addBest, { cookie, params: params(), body: { ...BEST, kg: 120 } }),
      201,
    );
    const list = await json<BestsView>(await call(listBests, { cookie, params: params() }));
    expect(list.bests).toHaveLength(2);
    expect(list.bests).toContainEqual(best);
    expect(list.lifts).toContainEqual({ id: "back-squat", name: "Back squat" });
    expect(list.mayWrite).toBe(true);
    const gone = await call(dropBest, { method: "DELETE", cookie, params: { id: best.id } });
    expect(gone.status).toBe(204);
    const [row] = await db.select().from(bests).where(eq(bests.id, best.id));
    expect(row?.removedAt).toBeInstanceOf(Date);
  });

  it.each([
    [{ reps: 11 }, "/reps"],
    [{ reps: 4, formula: null }, "/formula"],
    [{ kg: 0 }, "/kg"],
    [{ formula: "guess" }, "/formula"],
    [{ day: "2026-12-24" }, "/day"],
    [{ day: "2026-02-30" }, "/day"],
  ])("422 for %j, beside its field", async (over, pointer) => {
    const given = { cookie: await own.cookie("athlete"), params: params() };
    const response = await call(addBest, { ...given, body: { ...BEST, ...over } });
    expect(response.status).toBe(422);
    expect((await problemOf(response)).errors?.map((error) => error.pointer)).toEqual([pointer]);
  });
});
