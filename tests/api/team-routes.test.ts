import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { auditLog, camps, mails, memberships, revisions, teams } from "@/db/schema";
import { GET as readAccount, PUT as putAccount } from "@/app/api/account/route";
import { POST as switchTeam } from "@/app/api/account/team/route";
import { GET as readAthlete, PUT as putAthlete } from "@/app/api/athletes/[id]/route";
import { POST as setHold } from "@/app/api/athletes/[id]/holds/route";
import { GET as listAthletes, POST as addAthlete } from "@/app/api/athletes/route";
import { GET as readCamp } from "@/app/api/camps/[id]/route";
import { POST as liftHold } from "@/app/api/holds/[id]/lift/route";
import { GET as readRules, PUT as putRules } from "@/app/api/house-rules/route";
import { DELETE as takeBack } from "@/app/api/invites/[id]/route";
import { POST as invite } from "@/app/api/invites/route";
import { DELETE as removePerson, PATCH as changeRole } from "@/app/api/people/[id]/route";
import { GET as listPeople } from "@/app/api/people/route";
import { GET as readTeam, PUT as putTeam } from "@/app/api/team/route";
import { DELETE as dropEntry, PUT as putEntry } from "@/app/api/timetable/[id]/route";
import { GET as readTimetable, POST as addEntry } from "@/app/api/timetable/route";
import type { PeopleView } from "@/lib/schemas/account";
import type { AthleteView } from "@/lib/schemas/athlete";
import { testDatabase } from "../setup/database";
import { call, problemOf } from "./client";
import { PROFILE, SESSION } from "./bodies";
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
const membershipOf = async (role: "head" | "athlete" | "skills" | "medic") => {
  const rows = await db.select().from(memberships).where(eq(memberships.teamId, own.teamId));
  const found = rows.find((row) => row.role === role);
  if (!found) throw new Error(`no ${role}`);
  return found;
};
const auditOf = async (action: string) =>
  (await db.select().from(auditLog).where(eq(auditLog.teamId, own.teamId))).filter(
    (row) => row.action === action,
  );

describe("account", () => {
  const account = { name: "Ada Quill", units: "lb", timeZone: "Europe/Zagreb", mailChoice: "daily" };

  it("changes name, units, zone and mail choice, and nothing else", async () => {
    const cookie = await own.cookie("guest");
    const before = await json<Record<string, unknown>>(await call(readAccount, { cookie }));
    const body = { ...account, email: "thief@elsewhere.example", sessionVersion: 99 };
    const after = await json(await call(putAccount, { method: "PUT", cookie, body }));
    expect(after).toEqual({ ...before, ...account });
  });

  it("goes over to another of one's teams, and to no other", async () => {
    const other = await sceneOf(db, new Date(NOW));
    const userId = own.as("skills").userId;
    const cookie = await own.cookie("skills");
    const missing = await call(switchTeam, { cookie, body: { teamId: other.teamId } });
    expect(missing.status).toBe(404);
    await db.insert(memberships).values({ teamId: other.teamId, userId, role: "medic" });
    expect((await call(switchTeam, { cookie, body: { teamId: other.teamId } })).status).toBe(204);
    expect((await json<{ id: string }>(await call(readTeam, { cookie }))).id).toBe(other.teamId);
  });
});

describe("team and people", () => {
  it("the head coach names the team and its zone", async () => {
    const body = { name: "North Pier Gym", timeZone: "America/Sao_Paulo" };
    const cookie = await own.cookie("head");
    await json(await call(putTeam, { method: "PUT", cookie, body }));
    const [team] = await db.select().from(teams).where(eq(teams.id, own.teamId));
    expect(team).toMatchObject(body);
  });

  it("staff see the people of their team; only who may invite sees invitations", async () => {
    const seen = await json<PeopleView>(await call(listPeople, { cookie: await own.cookie("medic") }));
    expect(seen.people).toHaveLength(6);
    expect(seen.people.filter((person) => person.self).map((person) => person.role)).toEqual(["medic"]);
    expect(seen.invites).toEqual([]);
    const head = await json<PeopleView>(await call(listPeople, { cookie: await own.cookie("head") }));
    expect(head.invites.map((one) => one.id)).toEqual([own.scene.inviteId]);
  });

  it("an invitation is mailed with its role; one to a member is a conflict; one to a foreign athlete is wrong", async () => {
    const cookie = await own.cookie("head");
    const email = `wren-${own.teamId}@asked.example`;
    const body = { email, role: "guest", athleteId: own.athlete.id };
    await json(await call(invite, { cookie, body }), 201);
    const [mail] = await db.select().from(mails).where(eq(mails.recipient, email));
    expect(mail).toMatchObject({ kind: "invite", teamId: own.teamId, status: "waiting" });
    expect(mail?.text).toContain("Guest");
    expect(mail?.text).toMatch(/http:\/\/bellward\.test\/invite\/[\w-]{43}/);
    const member = own.people[1]?.email.toUpperCase() ?? "";
    const taken = await call(invite, { cookie, body: { email: member, role: "skills", athleteId: null } });
    expect(taken.status).toBe(409);
    const other = await sceneOf(db, new Date(NOW));
    const foreign = await call(invite, {
      cookie,
      body: { email: "x@asked.example", role: "athlete", athleteId: other.athlete.id },
    });
    expect((await problemOf(foreign)).errors).toEqual([
      { pointer: "/athleteId", message: "Pick an athlete of this team." },
    ]);
  });

  it("an athlete or guest needs an athlete, staff must have none", async () => {
    const cookie = await own.cookie("head");
    for (const [role, athleteId] of [
      ["athlete", null],
      ["guest", null],
      ["medic", own.athlete.id],
    ]) {
      const response = await call(invite, { cookie, body: { email: "y@asked.example", role, athleteId } });
      expect((await problemOf(response)).errors?.[0]?.pointer).toBe("/athleteId");
    }
  });

  it("an invitation is taken back once", async () => {
    const cookie = await own.cookie("head");
    const params = { id: own.scene.inviteId };
    expect((await call(takeBack, { method: "DELETE", cookie, params })).status).toBe(204);
    expect((await call(takeBack, { method: "DELETE", cookie, params })).status).toBe(404);
  });

  it("a new role holds from the next request on", async () => {
    const medic = await own.cookie("medic");
    expect((await call(readRules, { cookie: medic })).status).toBe(403);
    const params = { id: (await membershipOf("medic")).id };
    const body = { role: "strength", athleteId: null };
    await json(await call(changeRole, { method: "PATCH", cookie: await own.cookie("head"), params, body }));
    expect((await call(readRules, { cookie: medic })).status).toBe(200);
  });

  it("the last head coach stays head coach and stays in the team; with a second one both are free", async () => {
    const cookie = await own.cookie("head");
    const params = { id: (await membershipOf("head")).id };
    const body = { role: "skills", athleteId: null };
    expect((await call(changeRole, { method: "PATCH", cookie, params, body })).status).toBe(409);
    expect((await call(removePerson, { method: "DELETE", cookie, params })).status).toBe(409);
    const second = { id: (await membershipOf("skills")).id };
    await json(
      await call(changeRole, {
        method: "PATCH",
        cookie,
        params: second,
        body: { role: "head", athleteId: null },
      }),
    );
    expect((await call(removePerson, { method: "DELETE", cookie, params })).status).toBe(204);
    expect((await call(readTeam, { cookie })).status).toBe(401);
  });

  it("two head coaches who step down at the same moment leave one", async () => {
    const cookie = await own.cookie("head");
    const first = { id: (await membershipOf("head")).id };
    const second = { id: (await membershipOf("medic")).id };
    const head = { role: "head", athleteId: null };
    await json(await call(changeRole, { method: "PATCH", cookie, params: second, body: head }));
    const down = { role: "skills", athleteId: null };
    const answers = await Promise.all([
      call(changeRole, { method: "PATCH", cookie, params: first, body: down }),
      call(changeRole, { method: "PATCH", cookie: await own.cookie("medic"), params: second, body: down }),
    ]);
    expect(answers.map((response) => response.status).sort()).toEqual([200, 409]);
  });
});

describe("athletes and holds", () => {
  it("staff add and change a profile; who it is about reads it, a guest does not", async () => {
    const cookie = await own.cookie("strength");
    const { id } = await json<{ id: string }>(await call(addAthlete, { cookie, body: PROFILE }), 201);
    const params = { id };
    const changed = { ...PROFILE, dateOfBirth: "2009-01-01", limitations: "Left shoulder, overhead." };
    const view = await json<AthleteView>(
      await call(putAthlete, { method: "PUT", cookie, params, body: changed }),
    );
    expect(view).toMatchObject({ ...changed, minor: true });
    expect(await auditOf("athlete.update")).toMatchObject([
      { detail: { fields: ["dateOfBirth", "limitations"] } },
    ]);
    const athlete = await own.cookie("athlete");
    expect((await call(readAthlete, { cookie: athlete, params })).status).toBe(404);
    expect((await call(readAthlete, { cookie: athlete, params: { id: own.athlete.id } })).status).toBe(200);
    const roster = await json<{ athletes: { id: string }[] }>(await call(listAthletes, { cookie: athlete }));
    expect(roster.athletes.map((one) => one.id)).toEqual([own.athlete.id]);
  });

  it("limitations keep their history: what stood before the first change, then each change with who and when", async () => {
    const cookie = await own.cookie("strength");
    const params = { id: own.athlete.id };
    const put = async (part: object) =>
      json<AthleteView>(
        await call(putAthlete, { method: "PUT", cookie, params, body: { ...PROFILE, ...part } }),
      );
    expect((await put({ name: "Only the name" })).limitationHistory).toEqual([]);
    const knee = { limitations: "Right knee.", limitationCodes: ["knee-deep", "knee-impact"] };
    const by = own.people[1]?.name;
    expect((await put(knee)).limitationHistory).toMatchObject([
      { ...knee, by, since: expect.stringMatching(/^2026-12-01T/) as string },
      { limitations: "", limitationCodes: [], by: null },
    ]);
    expect((await put({ ...knee, sport: "Judo" })).limitationHistory).toHaveLength(2);
    expect((await put({})).limitationHistory.map((one) => one.limitationCodes)).toEqual([
      [],
      knee.limitationCodes,
      [],
    ]);
    const fresh = await json<{ id: string }>(
      await call(addAthlete, { cookie, body: { ...PROFILE, ...knee } }),
      201,
    );
    const view = await json<AthleteView>(await call(readAthlete, { cookie, params: { id: fresh.id } }));
    expect(view.limitationHistory).toMatchObject([{ ...knee, by }]);
  });

  it.each([
    ["the first base as second", { secondBase: "boxing", secondShare: 0.3 }, "/secondBase"],
    ["a second base without a share", { secondBase: "grappling" }, "/secondShare"],
    ["a share without a second base", { secondShare: 0.3 }, "/secondShare"],
    ["a share above 90 %", { secondBase: "grappling", secondShare: 0.95 }, "/secondShare"],
    ["a step of nothing", { plateStep: 0 }, "/plateStep"],
    ["unknown equipment", { equipment: ["trampoline"] }, "/equipment/0"],
    ["an unknown limitation", { limitationCodes: ["soul"] }, "/limitationCodes/0"],
  ])("a profile with %s is refused beside its field", async (_, part, pointer) => {
    const cookie = await own.cookie("strength");
    const response = await call(addAthlete, { cookie, body: { ...PROFILE, ...part } });
    expect((await problemOf(response)).errors?.map((error) => error.pointer)).toContain(pointer);
  });

  const hold = { from: "2026-12-05", to: null, reason: "Knock to the head on Friday." };

  it("a hold takes training out of open camps in the same step, and lifting it brings training back", async () => {
    const medic = await own.cookie("medic");
    const params = { id: own.athlete.id };
    type Camp = { plan: { lifts: { day: number }[] }; revision: number };
    const campNow = async () =>
      json<Camp>(await call(readCamp, { cookie: medic, params: { id: own.scene.campId } }));
    const before = await campNow();
    const set = await json<{ id: string; replanned: number }>(
      await call(setHold, { cookie: medic, params, body: hold }),
      201,
    );
    expect(set.replanned).toBe(1);
    const held = await campNow();
    const from = Date.UTC(2026, 11, 5) / 86_400_000;
    expect(before.plan.lifts.some(({ day }) => day >= from)).toBe(true);
    expect(held.plan.lifts.filter(({ day }) => day >= from)).toEqual([]);
    expect(held.revision).toBe(before.revision + 1);
    const lifted = await json<{ replanned: number }>(
      await call(liftHold, { method: "POST", cookie: medic, params: { id: set.id } }),
    );
    expect(lifted.replanned).toBe(1);
    expect((await campNow()).plan.lifts.length).toBe(before.plan.lifts.length);
    const again = await call(liftHold, { method: "POST", cookie: medic, params: { id: set.id } });
    expect(again.status).toBe(409);
  });

  it("the reason of a hold reaches medics and the athlete, and neither coaches nor the log nor the revisions", async () => {
    const medic = await own.cookie("medic");
    const params = { id: own.athlete.id };
    await json(await call(setHold, { cookie: medic, params, body: hold }), 201);
    for (const [role, shown] of [
      ["medic", true],
      ["athlete", true],
      ["head", false],
      ["strength", false],
      ["skills", false],
    ] as const) {
      const response = await call(readAthlete, { cookie: await own.cookie(role), params });
      const text = await response.text();
      expect([role, text.includes("Knock to the head")]).toEqual([role, shown]);
      expect(text).toContain("2026-12-05");
    }
    const kept = [
      await db.select().from(auditLog).where(eq(auditLog.teamId, own.teamId)),
      await db.select().from(revisions).where(eq(revisions.teamId, own.teamId)),
      await db.select().from(camps).where(eq(camps.teamId, own.teamId)),
      await db.select().from(mails).where(eq(mails.teamId, own.teamId)),
    ];
    expect(JSON.stringify(kept)).not.toContain("Knock to the head");
  });

  it("a hold that ends before it begins is refused beside its last day", async () => {
    const body = { ...hold, to: "2026-12-04" };
    const response = await call(setHold, {
      cookie: await own.cookie("medic"),
      params: { id: own.athlete.id },
      body,
    });
    expect((await problemOf(response)).errors?.[0]?.pointer).toBe("/to");
  });
});

describe("house rules", () => {
  it("keeps what differs from the default, plans open camps again, and follows the default where it is put back", async () => {
    const cookie = await own.cookie("strength");
    const overrides = { "heavy-before-hard.hours": 36, "clash.gap": 45 };
    const saved = await json<{ overrides: unknown; replanned: number }>(
      await call(putRules, { method: "PUT", cookie, body: { overrides } }),
    );
    expect(saved.overrides).toEqual({ "heavy-before-hard.hours": 36 });
    expect(await json(await call(readRules, { cookie }))).toEqual({
      overrides: { "heavy-before-hard.hours": 36 },
    });
    const defaults = { "heavy-before-hard.hours": 24 };
    await json(await call(putRules, { method: "PUT", cookie, body: { overrides: defaults } }));
    expect(await json(await call(readRules, { cookie }))).toEqual({ overrides: {} });
  });

  it.each([
    ["an unknown rule", { "no-such-rule": 1 }, "/overrides/no-such-rule"],
    ["a value below its range", { "clash.gap": -1 }, "/overrides/clash.gap"],
    ["a value above its range", { "clash.gap": 241 }, "/overrides/clash.gap"],
  ])("%s is refused with its pointer, and nothing is saved", async (_, overrides, pointer) => {
    const cookie = await own.cookie("head");
    const response = await call(putRules, { method: "PUT", cookie, body: { overrides } });
    expect((await problemOf(response)).errors?.[0]?.pointer).toBe(pointer);
    expect(await json(await call(readRules, { cookie }))).toEqual({ overrides: {} });
  });
});

describe("the gym's week", () => {
  it("a session is added, changed and deleted by a skills coach; a camp that runs keeps its own", async () => {
    const cookie = await own.cookie("skills");
    const { id } = await json<{ id: string }>(await call(addEntry, { cookie, body: SESSION }), 201);
    const changed = { ...SESSION, title: "Clinch drills", start: "2026-12-08T19:00" };
    await json(await call(putEntry, { method: "PUT", cookie, params: { id }, body: changed }));
    const { entries } = await json<{ entries: { id: string }[] }>(await call(readTimetable, { cookie }));
    expect(entries.find((entry) => entry.id === id)).toEqual({ ...changed, id });
    expect((await call(dropEntry, { method: "DELETE", cookie, params: { id } })).status).toBe(204);
    expect((await call(dropEntry, { method: "DELETE", cookie, params: { id } })).status).toBe(404);
    const [camp] = await db.select().from(camps).where(eq(camps.id, own.scene.campId));
    expect(camp?.revision).toBe(1);
  });

  it("a recurrence that cannot be expanded is refused beside the rule", async () => {
    const body = { ...SESSION, rrule: "FREQ=MINUTELY" };
    const response = await call(addEntry, { cookie: await own.cookie("head"), body });
    expect((await problemOf(response)).errors?.[0]?.pointer).toBe("/rrule");
  });
});
