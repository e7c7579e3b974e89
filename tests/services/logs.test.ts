import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { auditLog, holds, loggedSets, mails, notices, revisions, sessionLogs, sessions } from "@/db/schema";
import { sessionLogSchema } from "@/lib/schemas/today";
import { liftHold } from "@/lib/services/holds/holds";
import { createCamp } from "@/lib/services/camps/create";
import { campForm } from "../factories/camp-book";
import { testDatabase } from "../setup/database";
import { NOW, dayScene, done, keep, refusal } from "./day-scene";

const { db } = await testDatabase();

const SETS = [
  { slot: "main-lower", number: 1, exerciseId: "back-squat", kg: 80, reps: 5, reserve: 3 },
  { slot: "main-lower", number: 2, exerciseId: "back-squat", kg: 82.5, reps: 5, reserve: 2 },
  { slot: "trunk-1", number: 1, exerciseId: "hanging-leg-raise", kg: null, reps: 12, reserve: null },
];

describe("keeping a log", () => {
  it("keeps answers, sets and what was asked for, and notes who did it", async () => {
    const { as, campId, lastLift } = await dayScene(db);
    const lift = await lastLift();
    const late = { ...as("athlete"), now: new Date(lift.endsAt.getTime() + 600_000) };
    const view = await keep(late, campId, lift.id, done({ sets: SETS, effort: 7, note: "Felt light." }));
    expect(view).toMatchObject({ state: "done", effort: 7, note: "Felt light.", sets: SETS, version: 1 });
    const [row] = await db.select().from(sessionLogs).where(eq(sessionLogs.campId, campId));
    expect(row).toMatchObject({ sessionId: lift.id, day: lift.day, loggedAt: late.now });
    expect(row?.prescribed?.id).toBe(lift.id);
    expect(row?.prescribed?.lines.reduce((sum, line) => sum + line.sets, 0)).toBe(lift.lift?.sets);
    const audit = await db
      .select()
      .from(auditLog)
      .where(and(eq(auditLog.subject, campId), eq(auditLog.action, "log.save")));
    expect(audit).toMatchObject([{ userId: late.userId, detail: { sessionId: lift.id, version: 1 } }]);
  });

  it("writes sets whole: what the newer write leaves out is gone", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    await keep(as("athlete"), campId, id, done({ sets: SETS }));
    const view = await keep(as("athlete"), campId, id, done({ sets: SETS.slice(1) }), { baseVersion: 1 });
    expect(view).toMatchObject({ version: 2, sets: SETS.slice(1) });
    expect(await db.select().from(loggedSets).where(eq(loggedSets.campId, campId))).toHaveLength(2);
  });

  it("a retry with the same key changes nothing, also after a newer write, and answers the log as it stands", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    const key = randomUUID();
    const first = await keep(as("athlete"), campId, id, done(), { key });
    expect(await keep(as("athlete"), campId, id, done(), { key })).toEqual(first);
    const second = await keep(as("athlete"), campId, id, done({ effort: 8 }), { baseVersion: 1 });
    expect(await keep(as("athlete"), campId, id, done(), { key })).toEqual(second);
  });

  it("of two first logs at once one is kept, the other is told what stands", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    const results = await Promise.allSettled([
      keep(as("athlete"), campId, id, done({ effort: 5 })),
      keep(as("athlete"), campId, id, done({ effort: 6 })),
    ]);
    expect(results.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    const [row] = await db.select().from(sessionLogs).where(eq(sessionLogs.campId, campId));
    expect(row?.version).toBe(1);
  });

  it("on an older version is refused with the log as it stands, and nothing is lost", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    await keep(as("athlete"), campId, id, done({ effort: 4 }));
    const error = await refusal(keep(as("athlete"), campId, id, done({ effort: 9 })));
    expect(error.code).toBe("stale");
    expect(error.extra.current).toMatchObject({ effort: 4, version: 1 });
    const [row] = await db.select().from(sessionLogs).where(eq(sessionLogs.campId, campId));
    expect(row).toMatchObject({ effort: 4, version: 1 });
  });

  it("what was asked for stays as it was at the first log", async () => {
    const { as, campId, lastLift } = await dayScene(db);
    const lift = await lastLift();
    await keep(as("head"), campId, lift.id, done());
    const [before] = await db.select().from(sessionLogs).where(eq(sessionLogs.campId, campId));
    await db
      .update(sessions)
      .set({ lift: lift.lift && { ...lift.lift, sets: 1 } })
      .where(and(eq(sessions.campId, campId), eq(sessions.id, lift.id)));
    await keep(as("head"), campId, lift.id, done({ effort: 3 }), { baseVersion: 1 });
    const [after] = await db.select().from(sessionLogs).where(eq(sessionLogs.campId, campId));
    expect(after?.prescribed).toEqual(before?.prescribed);
  });
});

describe("when a log is refused", () => {
  it("a session that starts more than 12 h ahead", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const ahead = await sessionOn("2026-12-07");
    const error = await refusal(keep(as("athlete"), campId, ahead.id, done()));
    expect([error.code, error.userMessage]).toEqual(["conflict", expect.stringContaining("12 hours")]);
    const tonight = await sessionOn("2026-12-01");
    expect(await keep(as("athlete"), campId, tonight.id, done())).toMatchObject({ version: 1 });
  });

  it("by the athlete after the day that follows the session, in the athlete's own zone; a coach may still", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    // Lisbon keeps UTC in winter.
    const last = new Date("2026-12-01T23:59:00Z");
    const tooLate = new Date("2026-12-02T00:00:00Z");
    expect(await keep(as("athlete", last), campId, id, done())).toMatchObject({ version: 1 });
    const error = await refusal(keep(as("athlete", tooLate), campId, id, done(), { baseVersion: 1 }));
    expect(error.code).toBe("conflict");
    for (const [index, role] of (["head", "strength"] as const).entries())
      expect(await keep(as(role, tooLate), campId, id, done(), { baseVersion: index + 1 })).toMatchObject({
        version: index + 2,
      });
  });

  it("a session that was dropped and lies ahead; one that was dropped and is past is kept", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    for (const [day, ok] of [
      ["2026-12-01", false],
      ["2026-11-30", true],
    ] as const) {
      const { id } = await sessionOn(day);
      await db
        .update(sessions)
        .set({ status: "cancelled" })
        .where(and(eq(sessions.campId, campId), eq(sessions.id, id)));
      const saved = keep(as("athlete"), campId, id, done());
      if (ok) expect(await saved).toMatchObject({ version: 1 });
      else expect((await refusal(saved)).code).toBe("conflict");
    }
  });

  it("the weigh-in, which is a weight", async () => {
    const { as, campId } = await dayScene(db);
    expect((await refusal(keep(as("athlete"), campId, "weigh-in", done()))).code).toBe("conflict");
  });

  it("skills coach, medic and guest, who see the camp: 403; another athlete and what is not there: 404", async () => {
    const [own, other] = [await dayScene(db), await dayScene(db)];
    const { id } = await own.sessionOn("2026-11-30");
    for (const role of ["skills", "medic", "guest"] as const)
      expect((await refusal(keep(own.as(role), own.campId, id, done()))).code).toBe("forbidden");
    const stranger = {
      ...own.as("athlete"),
      member: { role: "athlete" as const, athleteId: other.athlete.id },
    };
    for (const ctx of [stranger, other.as("head")])
      expect((await refusal(keep(ctx, own.campId, id, done()))).code).toBe("not-found");
    expect((await refusal(keep(own.as("athlete"), own.campId, "no-such", done()))).code).toBe("not-found");
    expect((await refusal(keep(own.as("athlete"), "x", id, done({ knock: true })))).code).toBe("not-found");
  });

  it("a session id may come escaped", async () => {
    const { as, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    expect(await keep(as("athlete"), campId, encodeURIComponent(id), done())).toMatchObject({ version: 1 });
  });
});

describe("a knock to the head", () => {
  const knock = done({ knock: true, note: "Saw stars for a moment.", pain: 4, painPlace: "Left temple" });
  const mailsOf = async (teamId: string) =>
    (await db.select().from(mails).where(eq(mails.teamId, teamId))).filter((mail) => mail.kind === "knock");

  it("keeps the load, holds the athlete from the next day on and plans open camps again", async () => {
    const { as, athlete, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    const view = await keep(as("athlete"), campId, id, knock);
    expect(view).toMatchObject({ knock: true, effort: 6, minutes: 55, state: "done" });
    const standing = await db.select().from(holds).where(eq(holds.athleteId, athlete.id));
    expect(standing).toMatchObject([
      { fromDay: "2026-12-01", toDay: null, liftedAt: null, setBy: as("athlete").userId },
    ]);
    expect(standing[0]?.reason).toBe("Reported a knock to the head in Pads on Mon 30 Nov.");
    const rows = await db.select().from(sessions).where(eq(sessions.campId, campId));
    const ahead = rows.filter((row) => row.startsAt > NOW && row.status === "confirmed");
    expect(ahead.filter((row) => row.source === "lift" || row.kind === "hard-sparring")).toEqual([]);
    expect(ahead.filter((row) => row.kind === "skill").length).toBeGreaterThan(0);
  });

  it("tells head coach and medic at once: what was said goes to the medic alone", async () => {
    const { as, team, athlete, people, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    await keep(as("athlete"), campId, id, knock);
    const told = await mailsOf(team.id);
    const nameOf = (recipient: string) => people.find(({ email }) => email === recipient)?.name.split(" ")[0];
    expect(told.map(({ recipient }) => nameOf(recipient)).sort()).toEqual(["head", "medic"]);
    for (const mail of told) {
      expect(mail).toMatchObject({
        status: "waiting",
        subject: `${athlete.name} reported a knock to the head`,
      });
      for (const body of [mail.text, mail.html]) {
        expect(body).toContain("Pads on Mon 30 Nov");
        expect(body).toContain("Tue 1 Dec");
        expect(body.includes("Saw stars")).toBe(nameOf(mail.recipient) === "medic");
        expect(body.includes("Left temple")).toBe(nameOf(mail.recipient) === "medic");
      }
    }
    // The plan that changed is told in the usual way, to people who may not read of a knock: no summary says it.
    const saved = await db.select().from(revisions).where(eq(revisions.campId, campId));
    expect(saved.map(({ summary }) => summary).sort()).toEqual([
      "A hold was set",
      "Laid out the camp, 8 weeks",
    ]);
    const noticed = await db.select().from(notices).where(eq(notices.campId, campId));
    expect(noticed.map(({ userId }) => userId)).toContain(as("head").userId);
  });

  it("plans every open camp of the athlete again, also where two knocks arrive at once", async () => {
    const scene = await dayScene(db);
    const { as, athlete, campId, sessionOn } = scene;
    const later = campForm({ athlete: { id: athlete.id }, weighIn: null });
    const second = await createCamp(as("head", new Date("2026-11-20T12:00:00Z")), {
      body: { ...later, weeks: 10, bout: { ...later.bout, date: "2027-01-30" } },
    });
    const rows = await db.select().from(sessions).where(eq(sessions.campId, second.id));
    const other = rows.find((row) => row.source === "sport" && row.startsAt < NOW);
    const { id } = await sessionOn("2026-11-30");
    await Promise.all([
      keep(as("athlete"), campId, id, knock),
      keep(as("head"), second.id, other?.id ?? "", knock),
    ]);
    const standing = await db.select().from(holds).where(eq(holds.athleteId, athlete.id));
    expect(standing.filter((hold) => hold.toDay === null).length).toBeGreaterThan(0);
    for (const camp of [campId, second.id]) {
      const ahead = (await db.select().from(sessions).where(eq(sessions.campId, camp))).filter(
        (row) => row.startsAt > NOW && row.status === "confirmed" && row.source === "lift",
      );
      expect(ahead).toEqual([]);
    }
  });

  it("in the bout itself is logged with the bout, and tells like any other", async () => {
    const { as, team, athlete, campId } = await dayScene(db);
    const after = as("athlete", new Date("2027-01-09T23:00:00Z"));
    expect(await keep(after, campId, "bout", { ...knock, hardRounds: 3 })).toMatchObject({ knock: true });
    expect(await mailsOf(team.id)).toHaveLength(2);
    const standing = await db.select().from(holds).where(eq(holds.athleteId, athlete.id));
    expect(standing).toMatchObject([{ fromDay: "2027-01-10", toDay: null }]);
  });

  it("a retry, a later edit and a second knock set no second hold and send no second mail", async () => {
    const { as, team, athlete, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    const key = randomUUID();
    await keep(as("athlete"), campId, id, knock, { key });
    await keep(as("athlete"), campId, id, knock, { key });
    await keep(as("athlete"), campId, id, { ...knock, effort: 9 }, { baseVersion: 1 });
    expect(await db.select().from(holds).where(eq(holds.athleteId, athlete.id))).toHaveLength(1);
    expect(await mailsOf(team.id)).toHaveLength(2);
    const lift = await sessionOn("2026-11-28");
    await keep(as("strength"), campId, lift.id, knock);
    expect(await mailsOf(team.id)).toHaveLength(4);
  });

  it("one that is added later, to a log that stands, counts like one of the first write", async () => {
    const { as, team, athlete, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    await keep(as("athlete"), campId, id, done());
    expect(await mailsOf(team.id)).toEqual([]);
    await keep(as("athlete"), campId, id, knock, { baseVersion: 1 });
    expect(await mailsOf(team.id)).toHaveLength(2);
    expect(await db.select().from(holds).where(eq(holds.athleteId, athlete.id))).toHaveLength(1);
  });

  it("cannot be taken back in the log, by athlete or coach; the medic lifts the hold and an edit sets none again", async () => {
    const { as, athlete, campId, sessionOn } = await dayScene(db);
    const { id } = await sessionOn("2026-11-30");
    await keep(as("athlete"), campId, id, knock);
    for (const role of ["athlete", "head"] as const) {
      const error = await refusal(keep(as(role), campId, id, done(), { baseVersion: 1 }));
      expect([error.code, error.userMessage]).toEqual(["conflict", expect.stringContaining("medic")]);
    }
    const [hold] = await db.select().from(holds).where(eq(holds.athleteId, athlete.id));
    await liftHold(as("medic"), { params: { id: hold?.id ?? "" } });
    await keep(as("athlete"), campId, id, { ...knock, effort: 2 }, { baseVersion: 1 });
    const standing = await db.select().from(holds).where(eq(holds.athleteId, athlete.id));
    expect(standing.filter((one) => one.liftedAt === null)).toEqual([]);
  });
});

describe("what a log must say", () => {
  const problems = (over: Partial<ReturnType<typeof done>>) =>
    sessionLogSchema.safeParse(done(over)).error?.issues.map(({ path }) => path.join("/")) ?? [];

  it.each([
    ["done without effort", { effort: null }, "effort"],
    ["done without minutes", { minutes: null }, "minutes"],
    ["pain without a place", { pain: 3 }, "painPlace"],
    ["an effort above 10", { effort: 10.5 }, "effort"],
    ["the same set twice", { sets: [...SETS, ...SETS.slice(0, 1)] }, "sets"],
  ])("%s is refused beside its field", (_, over, path) => {
    expect(problems(over)).toEqual([path]);
  });

  it("missed and open ask for nothing more", () => {
    for (const state of ["missed", "open"] as const)
      expect(problems({ state, effort: null, minutes: null })).toEqual([]);
  });
});
