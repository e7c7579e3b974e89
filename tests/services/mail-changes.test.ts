import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { camps, mails, memberships, notices, teams, users } from "@/db/schema";
import { queueChangeMail } from "@/lib/mail/notices";
import { sweep } from "@/lib/mail/tasks";
import type { Role } from "@/lib/policy";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";
import { mailDeps, mailbox, makeJobsDue, runDueJobs, waitingJobs } from "../mail/mailbox";
import { at, knockOn, liftMoved, revise, savedCamp, sportMoved, type Saved } from "../mail/saved-camp";

const database = await testDatabase();
const { db, sql, url } = database;
const box = await mailbox();
const NOW = new Date("2026-11-26T12:00:00Z");
const later = (seconds: number) => new Date(NOW.getTime() + seconds * 1000);
const deps = mailDeps(database, box.url, () => later(120));

beforeEach(async () => {
  await sql`delete from graphile_worker._private_jobs`;
});

async function scene() {
  const team = await teamWithEveryRole(db, NOW);
  const campId = await savedCamp(db, team.team.id, team.athlete.id);
  const id = (role: Role) => team.as(role).userId;
  const address = (role: Role) =>
    team.people[["head", "strength", "skills", "medic", "athlete", "guest"].indexOf(role)]?.email ?? "";
  return {
    ...team,
    campId,
    id,
    save: (saved: Partial<Saved>) =>
      revise(db, team.team.id, campId, {
        knockOn: MOVE,
        by: id("head"),
        to: [id("athlete")],
        now: NOW,
        ...saved,
      }),
    mailsTo: async (role: Role) =>
      (await box.caught()).filter(({ envelope }) => envelope.to.includes(address(role))),
    set: (role: Role, values: Partial<typeof users.$inferInsert>) =>
      db
        .update(users)
        .set(values)
        .where(eq(users.id, id(role))),
  };
}

const WHY = { rule: "rest.before-contact", text: "Was 17 h before the sparring; house rule asks 24 h." };
const MOVE = knockOn({
  sport: [sportMoved("sat@2026-12-05", "2026-12-05 11:00", "2026-12-03 18:00")],
  lifts: [
    liftMoved("strength-a.5", "strength-a", "2026-12-02 18:00", "2026-11-30 18:00", { because: [WHY] }),
  ],
});

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

describe("what the mail says", () => {
  const FACTS = [
    "Hard sparring",
    "Sat 5 Dec 11:00 → Thu 3 Dec 18:00",
    "Strength A",
    "Wed 2 Dec 18:00 → Mon 30 Nov 18:00",
    "16 → 12 sets",
    WHY.text,
  ];

  it("stands in the text and in the HTML alike: what, from, to, sets, why, who, and a link to each session", async () => {
    const { save, mailsTo, campId } = await scene();
    await save({});
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("athlete");
    const html = (caught?.mail.html || "").replaceAll("&#39;", "'");
    const links = [
      `http://bellward.test/camps/${campId}#session-strength-a.5`,
      `http://bellward.test/camps/${campId}#session-sat%402026-12-05`,
    ];
    for (const fact of [...FACTS, ...links, "Saved by head", "Petra Holm-Aziz"]) {
      expect(caught?.mail.text).toContain(fact);
      expect(html).toContain(fact);
    }
  });

  it("is in the reader's time zone, with the session's own time beside", async () => {
    const { save, set, mailsTo } = await scene();
    await set("athlete", { timeZone: "America/Sao_Paulo" });
    await save({});
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("athlete");
    expect(caught?.mail.text).toContain(
      "Wed 2 Dec 15:00 (Wed 2 Dec 18:00 local time) → Mon 30 Nov 15:00 (Mon 30 Nov 18:00 local time)",
    );
    expect(caught?.mail.text).toContain("Times are in America/Sao_Paulo");
  });

  it("has neither sets nor reasons for a skills coach and a guest", async () => {
    const { save, mailsTo, id } = await scene();
    const dose = liftMoved("strength-b.5", "strength-b", "2026-12-04 18:00", "2026-12-04 18:00", {
      kind: "dose",
    });
    await save({
      to: [id("skills"), id("guest")],
      knockOn: knockOn({ ...MOVE, lifts: [...MOVE.lifts, dose] }),
    });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    for (const role of ["skills", "guest"] as const) {
      const [caught] = await mailsTo(role);
      expect(caught?.mail.text).toContain("Wed 2 Dec 18:00 → Mon 30 Nov 18:00");
      expect(caught?.source).not.toMatch(/\bsets\b/);
      expect(caught?.mail.text).not.toContain(WHY.text);
      expect(caught?.mail.subject).toMatch(/^Athlete's camp: 2 sessions changed$/);
    }
  });

  it("goes to nobody who has left the team", async () => {
    const { save, mailsTo, team, id } = await scene();
    await save({});
    await db
      .delete(memberships)
      .where(and(eq(memberships.teamId, team.id), eq(memberships.userId, id("athlete"))));
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    expect(await mailsTo("athlete")).toHaveLength(0);
  });

  it("says of the bout what became of it, at the venue and by the reader's clock", async () => {
    const { save, mailsTo, campId, id } = await scene();
    const [camp] = await db.select().from(camps).where(eq(camps.id, campId));
    const bout = {
      date: "2027-01-16",
      time: "21:00",
      timeZone: "Europe/Zagreb",
      place: "Dom",
      opponent: "Petra Holm-Aziz",
      ruleset: "Kickboxing",
      rounds: 3,
      roundMinutes: 3,
      limitKg: 60,
    };
    const before = {
      ...bout,
      date: "2027-01-09",
      time: "20:30",
      timeZone: "Europe/Lisbon",
      place: camp?.place ?? "",
    };
    await db
      .update(camps)
      .set({
        boutDate: bout.date,
        boutTime: bout.time,
        boutZone: bout.timeZone,
        place: bout.place,
        weighInDate: "2027-01-15",
      })
      .where(eq(camps.id, campId));
    await save({
      to: [id("guest")],
      edit: { bout, weighIn: { date: "2027-01-15", time: "11:00" } },
      inverse: { bout: before, weighIn: { date: "2027-01-08", time: "11:00" } },
      knockOn: knockOn({ bout: { from: at("2027-01-09 20:30"), to: at("2027-01-16 21:00") } }),
    });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("guest");
    expect(caught?.mail.subject).toBe("Athlete's camp: the bout changed");
    expect(caught?.mail.text).toContain(
      "Bout: Sat 9 January 2027 20:30 → Sat 16 January 2027 20:00 (Sat 16 Jan 21:00 at the venue)",
    );
    expect(caught?.mail.text).toContain(
      "Weigh-in: Fri 8 January 2027 11:00 → Fri 15 January 2027 10:00 (Fri 15 Jan 11:00 at the venue)",
    );
    expect(caught?.mail.text).toContain("Place: Ellery Hall → Dom");
  });

  it("says that the bout is off, and counts the sessions instead of listing them", async () => {
    const { save, mailsTo, campId } = await scene();
    await db.update(camps).set({ status: "off" }).where(eq(camps.id, campId));
    const dropped = liftMoved("strength-a.5", "strength-a", "2026-12-02 18:00", "2026-12-02 18:00", {
      kind: "dropped",
      to: null,
      setsAfter: null,
    });
    await save({
      edit: { status: "off" },
      inverse: { status: "on" },
      knockOn: knockOn({ lifts: [dropped] }),
    });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("athlete");
    expect(caught?.mail.subject).toBe("Your camp: the bout is off");
    expect(caught?.mail.text).toContain("The bout of Sat 9 January 2027 20:30 is off.");
    expect(caught?.mail.text).toContain("1 session ahead is taken out.");
    expect(caught?.mail.text).not.toContain("Strength A");
  });

  it("takes titles as text: no header, no line and no markup of their own", async () => {
    const { save, mailsTo, athlete, id } = await scene();
    const title = 'Pads\r\nBcc: spy@gym.example\r\n\r\n<img src=x onerror="alert(1)"> 稽古';
    await sql`update athletes set name = ${"Tam\r\nX-Evil: 1\r\n\r\nsin O'Hara"} where id = ${athlete.id}`;
    await save({
      to: [id("head")],
      by: id("strength"),
      knockOn: knockOn({ sport: [sportMoved("x", "2026-12-05 11:00", "2026-12-03 18:00", { title })] }),
    });
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("head");
    expect([...(caught?.mail.headers.keys() ?? [])]).not.toEqual(expect.arrayContaining(["x-evil"]));
    expect(caught?.mail.headers.has("bcc")).toBe(false);
    expect(caught?.mail.text).toContain('Pads Bcc: spy@gym.example <img src=x onerror="alert(1)"> 稽古\n');
    expect(caught?.mail.html).not.toContain("<img");
    expect(caught?.mail.html).toContain("&lt;img src=x");
    expect(caught?.mail.subject).toBe("Tam's camp: 1 session changed");
  });
});

describe("its headers", () => {
  it("let a mail program stop it with one click, and name the list", async () => {
    const { save, mailsTo } = await scene();
    await save({});
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    const [caught] = await mailsTo("athlete");
    const raw = Object.fromEntries(
      caught?.mail.headerLines.map(({ key, line }) => [key, line.replace(/\r?\n[ \t]+/g, " ")]) ?? [],
    );
    // RFC 8058 section 2 and 3.1: exactly this value, and one HTTPS address (http on a test host) beside it.
    expect(raw["list-unsubscribe-post"]).toBe("List-Unsubscribe-Post: List-Unsubscribe=One-Click");
    expect(raw["list-unsubscribe"]).toMatch(
      /^List-Unsubscribe: <http:\/\/bellward\.test\/api\/unsubscribe\/[\w-]{64}>$/,
    );
    // RFC 2919 section 3.
    expect(raw["list-id"]).toBe("List-ID: Bellward changes <changes.bellward.bellward.test>");
    // RFC 3834 section 5.
    expect(raw["auto-submitted"]).toBe("Auto-Submitted: auto-generated");
    // RFC 5322 3.6: exactly one of each.
    for (const key of ["date", "from", "to", "message-id", "subject"]) {
      expect(caught?.mail.headerLines.filter((line) => line.key === key)).toHaveLength(1);
    }
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
