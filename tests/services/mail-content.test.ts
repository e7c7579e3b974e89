import { and, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { camps, memberships } from "@/db/schema";
import { makeJobsDue, runDueJobs } from "../mail/mailbox";
import { at, knockOn, liftMoved, sportMoved } from "../mail/saved-camp";
import { MOVE, WHY, mailScene } from "../mail/scene";

const { database, deps, scene } = await mailScene();
const { db, sql, url } = database;

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
      `http://bellward.test/camps/${campId}?session=strength-a.5`,
      `http://bellward.test/camps/${campId}?session=sat%402026-12-05`,
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
