import { randomUUID } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { auditLog, notices, revisions, sessions } from "@/db/schema";
import { AppError } from "@/lib/errors";
import type { Change } from "@/lib/schemas/change";
import { createCamp } from "@/lib/services/camps/create";
import { listChanges, readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import type { TeamContext } from "@/lib/services/context";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const NOW = new Date("2026-11-26T12:00:00Z");

async function camp() {
  const team = await teamWithEveryRole(db, NOW);
  const { id } = await createCamp(team.as("head"), { body: campForm({ athlete: { id: team.athlete.id } }) });
  return { ...team, id };
}

const read = (ctx: TeamContext, id: string) => readCamp(ctx, { params: { id } });
const save = (
  ctx: TeamContext,
  id: string,
  change: Change,
  baseRevision: number,
  idempotencyKey = randomUUID(),
) => saveChange(ctx, { params: { id }, body: { change, baseRevision, idempotencyKey } });

async function moveSaturday(ctx: TeamContext, id: string, baseRevision = 1) {
  const view = await read(ctx, id);
  const saturday = view.sport.find(
    (session) => session.kind === "hard-sparring" && session.id.endsWith("@2026-12-05"),
  );
  if (!saturday) throw new Error("no sparring");
  const change: Change = {
    kind: "sport.edit",
    sportId: saturday.id,
    scope: "this",
    values: { date: "2026-12-03", start: "18:00" },
  };
  return { view, change, answer: await save(ctx, id, change, baseRevision) };
}

const refusal = async (promise: Promise<unknown>): Promise<AppError> => {
  const error: unknown = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof AppError)) throw new Error(`not refused: ${String(error)}`);
  return error;
};

describe("saving a change", () => {
  it("writes sessions, revision, audit and notices together, and shows the same knock-on as the preview", async () => {
    const { as, id } = await camp();
    const { answer } = await moveSaturday(as("head"), id);
    expect(answer.revision).toBe(2);
    expect(answer.knockOn.sport).toMatchObject([{ kind: "moved" }]);
    expect(answer.knockOn.lifts.length).toBeGreaterThan(0);
    const [revision] = await db
      .select()
      .from(revisions)
      .where(and(eq(revisions.campId, id), eq(revisions.number, 2)));
    expect(revision?.summary).toMatch(/^Moved Hard sparring from Sat 5 Dec 11:00 to Thu 3 Dec 18:00$/);
    const rows = await db.select().from(sessions).where(eq(sessions.campId, id));
    const moved = rows.find((row) => row.id === answer.knockOn.sport[0]?.id);
    expect(moved).toMatchObject({ day: "2026-12-03", start: "18:00", sequence: 1, changedAt: NOW });
    expect(
      await db
        .select()
        .from(auditLog)
        .where(and(eq(auditLog.subject, id), eq(auditLog.action, "camp.change"))),
    ).toHaveLength(1);
    const told = await db.select().from(notices).where(eq(notices.campId, id));
    // Strength coach, skills coach and athlete; not the head coach who saved, nor medic and guest, whose dates did not move.
    expect(told).toHaveLength(3);
    expect(told.map((notice) => notice.userId)).not.toContain(as("head").userId);
  });

  it("a failure on the way leaves nothing behind", async () => {
    const { as, id } = await camp();
    await db.execute(
      sql`create or replace function refuse() returns trigger language plpgsql as $$ begin raise exception 'no'; end $$`,
    );
    await db.execute(
      sql`create trigger refuse_notice before insert on notices for each row execute function refuse()`,
    );
    await expect(moveSaturday(as("head"), id)).rejects.toThrow();
    await db.execute(sql`drop trigger refuse_notice on notices`);
    expect((await read(as("head"), id)).revision).toBe(1);
    expect(await db.select().from(revisions).where(eq(revisions.campId, id))).toHaveLength(1);
  });

  it("a retry with the same key changes nothing and answers the same revision", async () => {
    const { as, id } = await camp();
    const { change } = await moveSaturday(as("head"), id);
    const key = randomUUID();
    const other: Change = { ...change, values: { date: "2026-12-04", start: "18:00" } } as Change;
    const first = await save(as("head"), id, other, 2, key);
    const again = await save(as("head"), id, other, 2, key);
    expect([first.revision, again.revision]).toEqual([3, 3]);
    expect(await db.select().from(revisions).where(eq(revisions.campId, id))).toHaveLength(3);
  });

  it("on an old revision is refused with who changed what and the new state", async () => {
    const { as, id } = await camp();
    const { change } = await moveSaturday(as("head"), id);
    const error = await refusal(save(as("strength"), id, change, 1));
    expect(error.code).toBe("stale");
    expect(error.extra).toMatchObject({
      revision: 2,
      changes: [{ number: 2, by: expect.stringContaining("head") }],
      view: { revision: 2 },
    });
  });

  it("two at once: one is saved, the other is stale", async () => {
    const { as, id } = await camp();
    const view = await read(as("head"), id);
    const tuesday = view.sport.find((session) => session.id.endsWith("@2026-12-08"));
    const change: Change = {
      kind: "sport.edit",
      sportId: tuesday?.id ?? "",
      scope: "this",
      values: { date: "2026-12-09", start: "18:00" },
    };
    const results = await Promise.allSettled([
      save(as("head"), id, change, 1),
      save(as("strength"), id, change, 1),
    ]);
    expect(results.map((result) => result.status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  it.each([
    ["medic", "forbidden"],
    ["athlete", "forbidden"],
    ["guest", "forbidden"],
  ] as const)("is refused to the %s", async (role, code) => {
    const { as, id } = await camp();
    const view = await read(as("head"), id);
    const change: Change = { kind: "sport.drop", sportId: view.sport.at(-1)?.id ?? "", scope: "this" };
    expect((await refusal(save(as(role), id, change, 1))).code).toBe(code);
  });

  it("a foreign camp looks like a missing one", async () => {
    const mine = await camp();
    const theirs = await camp();
    expect(await refusal(read(mine.as("head"), theirs.id))).toMatchObject({ code: "not-found" });
    expect(await refusal(read(mine.as("head"), randomUUID()))).toMatchObject({ code: "not-found" });
    expect(await refusal(save(mine.as("head"), theirs.id, { kind: "bout.off" }, 1))).toMatchObject({
      code: "not-found",
    });
  });
});

describe("put back", () => {
  const standing = async (ctx: TeamContext, id: string) => {
    const view = await read(ctx, id);
    return { lifts: view.plan.lifts.map((lift) => ({ ...lift, past: null })), sport: view.sport };
  };

  it("restores the plan that stood before, as a new revision", async () => {
    const { as, id } = await camp();
    const before = await standing(as("head"), id);
    await moveSaturday(as("head"), id);
    const later = new Date(NOW.getTime() + 3 * 3_600_000);
    const answer = await save(as("strength", later), id, { kind: "put-back", revision: 2 }, 2);
    expect(answer.revision).toBe(3);
    expect(await standing(as("head", later), id)).toEqual(before);
    const { changes } = await listChanges(as("head"), { params: { id } });
    expect(changes.map(({ number, putBackOf, putBackBy }) => ({ number, putBackOf, putBackBy }))).toEqual([
      { number: 3, putBackOf: 2, putBackBy: null },
      { number: 2, putBackOf: null, putBackBy: 3 },
      { number: 1, putBackOf: null, putBackBy: null },
    ]);
  });

  it.each<[string, (view: Awaited<ReturnType<typeof read>>) => Change]>([
    [
      "a pin",
      (view) => {
        const lift = view.plan.lifts.filter((candidate) => !candidate.past).at(3);
        if (!lift) throw new Error("no lift");
        return {
          kind: "lift.move",
          liftId: lift.id,
          item: lift.item,
          week: lift.week,
          date: "2026-12-10",
          start: "12:00",
        };
      },
    ],
    [
      "a bout moved a week on",
      (view) => ({
        kind: "bout.change",
        bout: { ...view.book.bout, date: "2027-01-16" },
        weeks: 9,
        weighIn: { date: "2027-01-15", time: "11:00" },
      }),
    ],
    ["a bout marked off", () => ({ kind: "bout.off" })],
    [
      "a series taken out",
      (view) => ({
        kind: "sport.drop",
        sportId: view.sport.find((session) => session.id.endsWith("@2026-12-08"))?.id ?? "",
        scope: "following",
      }),
    ],
  ])("undoes %s", async (_, changeFor) => {
    const { as, id } = await camp();
    const before = await standing(as("head"), id);
    await save(as("head"), id, changeFor(await read(as("head"), id)), 1);
    expect(await standing(as("head"), id)).not.toEqual(before);
    await save(as("head"), id, { kind: "put-back", revision: 2 }, 2);
    expect(await standing(as("head"), id)).toEqual(before);
  });

  it("is refused where a later change touched the same session", async () => {
    const { as, id } = await camp();
    const { change } = await moveSaturday(as("head"), id);
    await save(as("head"), id, { ...change, values: { date: "2026-12-04", start: "18:00" } } as Change, 2);
    expect(await refusal(save(as("head"), id, { kind: "put-back", revision: 2 }, 3))).toMatchObject({
      code: "invalid",
    });
  });
});

describe("what each role sees of a camp", () => {
  it("a guest gets dates without numbers", async () => {
    const { as, id } = await camp();
    const view = await read(as("guest"), id);
    expect(view.plan.lifts.length).toBeGreaterThan(0);
    expect(view.plan.lifts.every((lift) => lift.sets === 0 && lift.reasons.length === 0)).toBe(true);
    expect(view.book.bout.limitKg).toBeNull();
    expect(view.may).not.toContain("lifts.detail");
  });

  it("an athlete sees the own camp with its sets, and not that of another", async () => {
    const { as, id, team } = await camp();
    expect((await read(as("athlete"), id)).plan.lifts[0]?.sets).toBeGreaterThan(0);
    const { id: other } = await createCamp(as("head"), {
      body: campForm({ athlete: { name: `Someone else of ${team.name}` } }),
    });
    expect(await refusal(read(as("athlete"), other))).toMatchObject({ code: "not-found" });
  });
});
