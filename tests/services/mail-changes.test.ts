import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { mails, notices, teams } from "@/db/schema";
import { queueChangeMail } from "@/lib/mail/notices";
import { sweep } from "@/lib/mail/tasks";
import { makeJobsDue, runDueJobs, waitingJobs } from "../mail/mailbox";
import { knockOn, liftMoved, revise, savedCamp, sportMoved } from "../mail/saved-camp";
import { MOVE, NOW, later, mailScene } from "../mail/scene";

const { database, deps, scene } = await mailScene();
const { db, sql, url } = database;

describe("a burst of changes", () => {
  it("is one mail, two minutes after its first change, however many follow", async () => {
    const { save, mailsTo } = await scene();
    await save({});
    await save({
      now: later(60),
      knockOn: knockOn({
        lifts: [liftMoved("strength-b.5", "strength-b", "2026-12-04 18:00", "2026-12-05 18:00")],
      }),
    });
    await save({ now: later(110) });
    const [first] = await waitingJobs(database);
    expect(first?.seconds).toBeGreaterThan(115);
    expect(first?.seconds).toBeLessThanOrEqual(120);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const caught = await mailsTo("athlete");
    expect(caught).toHaveLength(1);
    expect(caught[0]?.mail.subject).toBe("Your camp: 3 sessions changed");
  });

  it("is at once where something within 48 hours changed, and takes along what was waiting", async () => {
    const { save, mailsTo } = await scene();
    await save({});
    await save({
      now: later(30),
      urgent: true,
      knockOn: knockOn({
        lifts: [liftMoved("trunk-and-kick.6", "trunk-and-kick", "2026-11-27 18:00", "2026-11-28 18:00")],
      }),
    });
    await runDueJobs(url, deps);
    expect((await mailsTo("athlete")).map(({ mail }) => mail.subject)).toEqual([
      "Your camp: 3 sessions changed",
    ]);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(1);
  });

  it("a change after the mail begins a burst of its own: an earlier job does not cut it short", async () => {
    const { save, mailsTo } = await scene();
    await save({});
    await save({ now: later(60) });
    const [first] = await sql`select id from graphile_worker._private_jobs order by id limit 1`;
    await sql`update graphile_worker._private_jobs set run_at = now() where id = ${first?.id}`;
    await runDueJobs(url, deps);
    await save({
      now: later(150),
      knockOn: knockOn({
        lifts: [liftMoved("strength-b.5", "strength-b", "2026-12-04 18:00", "2026-12-05 18:00")],
      }),
    });
    const second = await sql`select id from graphile_worker._private_jobs order by id limit 1`;
    await sql`update graphile_worker._private_jobs set run_at = now() where id = ${second[0]?.id}`;
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(1);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(2);
  });

  it("that comes back to where it began is not told, and that is on record", async () => {
    const { save, mailsTo, id } = await scene();
    await save({});
    await save({
      now: later(40),
      knockOn: knockOn({
        sport: [sportMoved("sat@2026-12-05", "2026-12-03 18:00", "2026-12-05 11:00")],
        lifts: [
          liftMoved("strength-a.5", "strength-a", "2026-11-30 18:00", "2026-12-02 18:00", {
            setsBefore: 12,
            setsAfter: 16,
          }),
        ],
      }),
    });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
    const rows = await db
      .select({ status: mails.status })
      .from(mails)
      .where(eq(mails.userId, id("athlete")));
    expect(rows).toEqual([{ status: "withheld" }]);
  });

  it("over several camps of one person is one mail", async () => {
    const { save, mailsTo, team, athlete, id } = await scene();
    const other = await savedCamp(db, team.id, athlete.id);
    await save({ to: [id("strength")] });
    await revise(db, team.id, other, { knockOn: MOVE, by: id("head"), to: [id("strength")], now: later(20) });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const caught = await mailsTo("strength");
    expect(caught.map(({ mail }) => mail.subject)).toEqual(["2 camps: 4 sessions changed"]);
    expect(caught[0]?.mail.text).toContain(`/camps/${other}`);
  });

  it("tells the present, also where the reader's own change came after", async () => {
    const { save, mailsTo, id } = await scene();
    await save({ to: [id("strength")] });
    await save({
      by: id("strength"),
      to: [id("athlete")],
      now: later(30),
      knockOn: knockOn({
        lifts: [liftMoved("strength-a.5", "strength-a", "2026-11-30 18:00", "2026-12-01 18:00")],
      }),
    });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("strength");
    expect(caught?.mail.text).toContain("Wed 2 Dec 18:00 → Tue 1 Dec 18:00");
  });

  it("noted twice is told once", async () => {
    const { save, team, campId, id, mailsTo } = await scene();
    const revision = await save({});
    await db.transaction((tx) =>
      queueChangeMail(tx, {
        teamId: team.id,
        campId,
        revision,
        userIds: [id("athlete")],
        urgent: true,
        now: later(1),
      }),
    );
    expect(await waitingJobs(database)).toHaveLength(1);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(1);
  });

  it("collected by two processes at the same moment is one mail", async () => {
    const { save, mailsTo } = await scene();
    await save({});
    await save({ now: NOW });
    await makeJobsDue(database);
    await Promise.all([runDueJobs(url, deps), runDueJobs(url, deps), runDueJobs(url, deps)]);
    expect(await mailsTo("athlete")).toHaveLength(1);
  });

  it("whose collecting job died with its process is taken up by the sweeper", async () => {
    const { save, mailsTo } = await scene();
    await save({});
    await sql`update graphile_worker._private_jobs set locked_at = now(), locked_by = 'gone'`;
    expect(await sweep({ db, now: () => later(200) })).toEqual({ mails: 0, readers: 0 });
    expect(await sweep({ db, now: () => later(300) })).toEqual({ mails: 0, readers: 1 });
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(1);
  });
});

describe("saves at the same time on different camps", () => {
  it("that tell the same people do not block each other", async () => {
    const { team, athlete, id } = await scene();
    const people = [id("strength"), id("skills"), id("athlete")];
    const ids = await Promise.all(Array.from({ length: 8 }, () => savedCamp(db, team.id, athlete.id)));
    await Promise.all(
      ids.map((campId, index) =>
        revise(db, team.id, campId, {
          knockOn: MOVE,
          by: id("head"),
          to: index % 2 ? people : people.toReversed(),
          now: NOW,
        }),
      ),
    );
    expect(await db.select().from(notices).where(eq(notices.teamId, team.id))).toHaveLength(24);
  });
});

describe("a person's choice", () => {
  it("`none`: nothing is noted", async () => {
    const { save, set, id } = await scene();
    await set("athlete", { mailChoice: "none" });
    await save({});
    expect(
      await db
        .select()
        .from(notices)
        .where(eq(notices.userId, id("athlete"))),
    ).toEqual([]);
    expect(await waitingJobs(database)).toEqual([]);
  });

  it("`none`, chosen while something waits: it is withheld", async () => {
    const { save, set, id, mailsTo } = await scene();
    await save({});
    await set("athlete", { mailChoice: "none" });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
    expect(
      await db
        .select({ status: mails.status })
        .from(mails)
        .where(eq(mails.userId, id("athlete"))),
    ).toEqual([{ status: "withheld" }]);
  });

  it("`daily`: one mail at 06:00 of the person's zone with all of the day, urgent or not", async () => {
    const { save, set, mailsTo } = await scene();
    await set("athlete", { mailChoice: "daily", timeZone: "Asia/Kolkata" });
    await save({});
    await save({
      now: later(3600),
      urgent: true,
      knockOn: knockOn({
        lifts: [liftMoved("strength-b.5", "strength-b", "2026-12-04 18:00", "2026-12-05 18:00")],
      }),
    });
    const [first, second] = await waitingJobs(database);
    // 12:00 UTC is 17:30 in Kolkata: 12 h 30 min to six; an hour less for the second.
    expect(first?.seconds).toBeCloseTo(12.5 * 3600, -2);
    expect(second?.seconds).toBeCloseTo(11.5 * 3600, -2);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect((await mailsTo("athlete")).map(({ mail }) => mail.subject)).toEqual([
      "Your camp: 3 sessions changed",
    ]);
  });

  it("`daily`, chosen while something waits: it waits for six o'clock", async () => {
    const { save, set, mailsTo } = await scene();
    await save({});
    await set("athlete", { mailChoice: "daily" });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
    const [job] = await waitingJobs(database);
    // 12:02 in Lisbon: 17 h 58 min to six.
    expect(job?.seconds).toBeCloseTo(17 * 3600 + 58 * 60, -2);
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(1);
  });
});

describe("a team", () => {
  it("that is deleted takes its waiting notices along", async () => {
    const { save, team, mailsTo } = await scene();
    await save({});
    await db.delete(teams).where(eq(teams.id, team.id));
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
  });
});
