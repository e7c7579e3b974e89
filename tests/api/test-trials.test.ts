import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { athletes, testTrials } from "@/db/schema";
import { GET as csv } from "@/app/api/athletes/[id]/csv/[what]/route";
import { GET as listTests, POST as addTrial } from "@/app/api/athletes/[id]/tests/route";
import { POST as upload } from "@/app/api/athletes/[id]/tests/upload/route";
import { DELETE as takeBack } from "@/app/api/test-uploads/[id]/route";
import { POST as restore } from "@/app/api/tests/[id]/restore/route";
import { DELETE as remove } from "@/app/api/tests/[id]/route";
import { MOST_ROWS, type TestsView } from "@/lib/schemas/test-trial";
import { testDatabase } from "../setup/database";
import { call, problemOf } from "./client";
import { TRIAL } from "./bodies";
import { sceneOf } from "./scene";

const NOW = "2026-12-01T08:00:00Z";
process.env.BELLWARD_NOW = NOW;
const { db } = await testDatabase();

let own: Awaited<ReturnType<typeof sceneOf>>;
beforeEach(async () => {
  own = await sceneOf(db, new Date(NOW));
});

const byId = () => ({ id: own.scene.athleteId });
const kept = () => db.select().from(testTrials).where(eq(testTrials.teamId, own.teamId));

describe("trials over the API", () => {
  it("added (201), listed with what is said of them, removed (204), put back (204); twice is 409", async () => {
    const cookie = await own.cookie("strength");
    const added = await call(addTrial, { cookie, params: byId(), body: { ...TRIAL, value: 41 } });
    expect(added.status).toBe(201);
    const { id } = (await added.json()) as { id: string };
    const list = async (role: "head" | "athlete") => {
      const response = await call(listTests, { cookie: await own.cookie(role), params: byId() });
      expect(response.status).toBe(200);
      return ((await response.json()) as TestsView).series[0]?.days[0];
    };
    expect(await list("athlete")).toMatchObject({ best: 41, mean: 39.75, massKg: 80 });
    const params = { id };
    expect((await call(remove, { method: "DELETE", cookie, params })).status).toBe(204);
    expect((await call(remove, { method: "DELETE", cookie, params })).status).toBe(409);
    expect(await list("head")).toMatchObject({ best: 38.5 });
    expect((await call(restore, { method: "POST", cookie, params })).status).toBe(204);
    expect((await problemOf(await call(restore, { method: "POST", cookie, params }))).status).toBe(409);
    expect(await list("head")).toMatchObject({ best: 41 });
  });

  it("422 with a pointer and the range for a number out of it", async () => {
    const cookie = await own.cookie("head");
    const wrong = { ...TRIAL, value: 0.38, second: 12, day: "2026-13-01", massKg: 5 };
    const bad = await problemOf(await call(addTrial, { cookie, params: byId(), body: wrong }));
    expect(bad.errors?.map(({ pointer }) => pointer).sort()).toEqual([
      "/day",
      "/massKg",
      "/second",
      "/value",
    ]);
    const range = await problemOf(
      await call(addTrial, { cookie, params: byId(), body: { ...TRIAL, value: 0.38, second: 12 } }),
    );
    expect(range.errors).toEqual([
      { pointer: "/value", message: "Height: 3 to 120 cm." },
      { pointer: "/second", message: "This test has one number only." },
    ]);
    const record = await problemOf(
      await call(addTrial, { cookie, params: byId(), body: { ...TRIAL, kind: "rep-record", second: 5 } }),
    );
    expect(record.errors?.[0]).toEqual({
      pointer: "/kind",
      message: "A rep record belongs to an exercise: add it under Bests.",
    });
  });

  it("404 for an athlete that only another athlete of the team is", async () => {
    const [mate] = await db
      .insert(athletes)
      .values({
        teamId: own.teamId,
        name: "Mate",
        trainingAge: "novice",
        strikingBase: "boxing",
        liftsPerWeek: 2,
        freeHours: [],
      })
      .returning();
    const cookie = await own.cookie("athlete");
    const params = { id: mate?.id ?? "" };
    expect((await call(listTests, { cookie, params })).status).toBe(404);
    expect((await call(csv, { cookie, params: { ...params, what: "weights" } })).status).toBe(404);
  });
});

describe("a file over the API", () => {
  const file = (rows: unknown[]) => ({ uploadId: randomUUID(), rows });

  it("every row is checked again: 422 with a pointer a row, and nothing is kept", async () => {
    const before = (await kept()).length;
    const cookie = await own.cookie("strength");
    const rows = [TRIAL, { ...TRIAL, value: 999 }, TRIAL, { ...TRIAL, side: "middle" }];
    const problem = await problemOf(await call(upload, { cookie, params: byId(), body: file(rows) }));
    expect(problem.status).toBe(422);
    expect(problem.errors?.map(({ pointer }) => pointer)).toEqual(["/rows/1/value", "/rows/3/side"]);
    const many = Array.from({ length: MOST_ROWS + 1 }, () => ({ ...TRIAL }));
    expect((await call(upload, { cookie, params: byId(), body: file(many) })).status).toBe(422);
    expect((await call(upload, { cookie, params: byId(), body: file([]) })).status).toBe(422);
    expect((await kept()).length).toBe(before);
  });

  it("the most rows there may be fit into a body, are kept (201), and taken back whole (200, then 409)", async () => {
    const cookie = await own.cookie("strength");
    const long = {
      ...TRIAL,
      kind: "medicine-ball-throw",
      side: "right",
      value: 12.35,
      second: 2.5,
      massKg: 80.55,
    };
    const body = file(Array.from({ length: MOST_ROWS }, () => long));
    const saved = await call(upload, { cookie, params: byId(), body });
    expect(saved.status).toBe(201);
    expect(await saved.json()).toEqual({ uploadId: body.uploadId, count: MOST_ROWS });
    const undo = { method: "DELETE", cookie, params: { id: body.uploadId } };
    const undone = await call(takeBack, undo);
    expect([undone.status, await undone.json()]).toEqual([
      200,
      { uploadId: body.uploadId, count: MOST_ROWS },
    ]);
    expect((await call(takeBack, undo)).status).toBe(409);
    expect((await call(upload, { cookie, params: byId(), body })).status).toBe(409);
  });
});

describe("files to keep", () => {
  it("say what they are, under a name that every browser can keep (RFC 6266, RFC 8187)", async () => {
    await db.update(athletes).set({ name: 'Zoë "Q" Łum/🥊' }).where(eq(athletes.id, own.scene.athleteId));
    const response = await call(csv, {
      cookie: await own.cookie("head"),
      params: { ...byId(), what: "tests" },
    });
    expect(response.status).toBe(200);
    expect(response.headers.get("content-type")).toBe("text/csv; charset=utf-8");
    expect(response.headers.get("content-disposition")).toBe(
      `attachment; filename="Zoe-Q-um-tests-2026-12-01.csv"; filename*=UTF-8''${encodeURIComponent('Zoë "Q" Łum/🥊 tests 2026-12-01')}.csv`,
    );
    const bytes = new Uint8Array(await response.arrayBuffer());
    expect([...bytes.slice(0, 3)]).toEqual([0xef, 0xbb, 0xbf]);
  });

  it("403 for whom the table does not give the kind: no weights for skills coach and medic, check-ins for the medic", async () => {
    const status = async (what: string, role: "skills" | "medic" | "athlete") =>
      (await call(csv, { cookie: await own.cookie(role), params: { ...byId(), what } })).status;
    expect([await status("weights", "skills"), await status("weights", "medic")]).toEqual([403, 403]);
    expect([await status("check-ins", "skills"), await status("check-ins", "medic")]).toEqual([403, 200]);
    expect(await status("weights", "athlete")).toBe(200);
    expect(await status("passwords", "athlete")).toBe(404);
  });
});
