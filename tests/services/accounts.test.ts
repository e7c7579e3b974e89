import { asc, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { mails, memberships, rateLimits, resetTokens, teams, users } from "@/db/schema";
import { POST as acceptInvite } from "@/app/api/invites/accept/route";
import { POST as confirmReset } from "@/app/api/reset/confirm/route";
import { POST as askReset } from "@/app/api/reset/route";
import { POST as signUp } from "@/app/api/sign-up/route";
import { POST as changePassword } from "@/app/api/account/password/route";
import { GET as readAccount } from "@/app/api/account/route";
import { DELETE as removePerson } from "@/app/api/people/[id]/route";
import { LIMITS } from "@/lib/auth/limits";
import { hashPassword, verifyPassword } from "@/lib/auth/password";
import { mailReset } from "@/lib/mail/reset";
import { invite } from "@/lib/services/accounts/invite";
import { resetPassword } from "@/lib/services/accounts/reset";
import { call, cookieOf, problemOf } from "../api/client";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db, sql } = await testDatabase();
const NEW_PASSWORD = "another passphrase of mine";

beforeEach(() => db.delete(rateLimits));

const userBy = async (email: string) => {
  const [row] = await db.select().from(users).where(eq(users.email, email));
  return row ?? null;
};
const mailsTo = (email: string) =>
  db.select().from(mails).where(eq(mails.recipient, email)).orderBy(asc(mails.createdAt));
const linkIn = (text: string | undefined, path: string): string =>
  new RegExp(`http://bellward\\.test/${path}/([\\w-]{43})`).exec(text ?? "")?.[1] ?? "";

describe("sign-up", () => {
  const form = (n: string) => ({
    name: "Corin Vale",
    email: `corin-${n}@new.example`,
    password: NEW_PASSWORD,
    team: "Harbour Light Gym",
    timeZone: "Europe/Lisbon",
  });

  it("makes a person and a team of which they are head coach", async () => {
    const body = form("first");
    expect((await call(signUp, { body })).status).toBe(202);
    const user = await userBy(body.email);
    if (!user) throw new Error("no user");
    expect(user.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    const [membership] = await db.select().from(memberships).where(eq(memberships.userId, user.id));
    expect(membership).toMatchObject({ role: "head", athleteId: null, teamId: user.currentTeamId });
    const [team] = await db
      .select()
      .from(teams)
      .where(eq(teams.id, user.currentTeamId ?? ""));
    expect(team).toMatchObject({ name: body.team, timeZone: body.timeZone });
    expect((await call(readAccount, { cookie: await cookieOf(user.id) })).status).toBe(200);
  });

  it("answers the same for an e-mail that has an account, changes nothing, and mails its owner once an hour", async () => {
    const body = form("known");
    const first = await call(signUp, { body });
    const before = await userBy(body.email);
    const again = { ...body, email: body.email.toUpperCase(), password: "the password of a stranger" };
    const second = await call(signUp, { body: again });
    await call(signUp, { body: again });
    expect([second.status, await second.text()]).toEqual([first.status, await first.text()]);
    expect(await userBy(body.email)).toEqual(before);
    const told = await mailsTo(body.email);
    expect(told.map((mail) => mail.kind)).toEqual(["sign-up-exists"]);
    expect(told[0]?.text).toContain("http://bellward.test/sign-in");
  });

  it("the same form sent twice at once makes one person and one team", async () => {
    const body = { ...form("twice"), team: "Twice Gym" };
    const answers = await Promise.all([call(signUp, { body }), call(signUp, { body })]);
    expect(answers.map((response) => response.status)).toEqual([202, 202]);
    expect(await db.select().from(teams).where(eq(teams.name, "Twice Gym"))).toHaveLength(1);
  });

  it("refuses what is missing or too short, each with its pointer", async () => {
    const body = {
      name: "  ",
      email: "not an address",
      password: "too short",
      team: "",
      timeZone: "Mars/Base",
    };
    const { errors = [] } = await problemOf(await call(signUp, { body }));
    expect(errors.map((error) => error.pointer).sort()).toEqual([
      "/email",
      "/name",
      "/password",
      "/team",
      "/timeZone",
    ]);
  });

  it("refuses line breaks in names, which would stand in the subjects of mails", async () => {
    const body = { ...form("break"), name: "Corin\r\nBcc: all@new.example", team: "Gym\n2" };
    const { errors = [] } = await problemOf(await call(signUp, { body }));
    expect(errors.map((error) => error.pointer).sort()).toEqual(["/name", "/team"]);
  });

  it("is limited per address, with Retry-After", async () => {
    const body = form("limit");
    for (let n = 0; n < LIMITS["sign-up-account"].points; n++) await call(signUp, { body });
    const refused = await call(signUp, { body });
    expect(refused.status).toBe(429);
    expect(Number(refused.headers.get("retry-after"))).toBeGreaterThan(0);
  });
});

describe("reset", () => {
  const NOW = new Date("2026-12-01T08:00:00Z");
  const at = (minutes: number) => ({
    db,
    now: new Date(NOW.getTime() + minutes * 60_000),
    address: "192.0.2.1",
    signedIn: async () => null,
  });

  async function asked() {
    const { people } = await teamWithEveryRole(db, NOW);
    const person = people[1];
    if (!person) throw new Error("no person");
    await mailReset({ db, now: () => NOW }, person.email);
    const sent = await mailsTo(person.email);
    return { person, token: linkIn(sent.at(-1)?.text, "reset") };
  }
  const reset = (token: string, minutes: number) =>
    resetPassword(at(minutes), { body: { token, password: NEW_PASSWORD } });
  const passwordOf = async (id: string) => {
    const [row] = await db.select().from(users).where(eq(users.id, id));
    return row?.passwordHash ?? "";
  };

  it("asking says and does the same for an account and for none: one job, no mail yet", async () => {
    const { people } = await teamWithEveryRole(db, NOW);
    const known = people[0]?.email ?? "";
    const answers = [];
    for (const email of [known, "nobody@nowhere.example"]) {
      const response = await call(askReset, { body: { email } });
      answers.push([response.status, await response.text()]);
      const jobs =
        await sql`select payload from graphile_worker._private_jobs where payload->>'email' = ${email}`;
      expect(jobs).toHaveLength(1);
    }
    expect(answers[0]).toEqual([204, ""]);
    expect(answers[1]).toEqual(answers[0]);
    expect(await mailsTo(known)).toEqual([]);
  });

  it("the job mails an account, and nobody else", async () => {
    const { token } = await asked();
    expect(token).not.toBe("");
    const before = await db.select().from(mails);
    await mailReset({ db, now: () => NOW }, "nobody@nowhere.example");
    expect(await db.select().from(mails)).toHaveLength(before.length);
  });

  it("the link sets the password once, ends all sessions, and tells the owner", async () => {
    const { person, token } = await asked();
    const cookie = await cookieOf(person.id);
    expect((await call(readAccount, { cookie })).status).toBe(200);
    await reset(token, 5);
    expect(await verifyPassword(await passwordOf(person.id), NEW_PASSWORD)).toBe(true);
    expect((await call(readAccount, { cookie })).status).toBe(401);
    expect((await call(readAccount, { cookie: await cookieOf(person.id, 2) })).status).toBe(200);
    expect((await mailsTo(person.email)).map((mail) => mail.kind).sort()).toEqual([
      "password-changed",
      "reset",
    ]);
    await expect(reset(token, 6)).rejects.toMatchObject({ code: "gone" });
  });

  it("of two uses at the same moment one wins", async () => {
    const { token } = await asked();
    const outcomes = await Promise.allSettled([reset(token, 1), reset(token, 1)]);
    expect(outcomes.map((outcome) => outcome.status).sort()).toEqual(["fulfilled", "rejected"]);
  });

  it.each([
    [29, true],
    [30, false],
    [31, false],
  ])("%i minutes after it was sent it works: %s", async (minutes, works) => {
    const { person, token } = await asked();
    const before = await passwordOf(person.id);
    await (works
      ? reset(token, minutes)
      : expect(reset(token, minutes)).rejects.toMatchObject({ code: "gone" }));
    expect((await passwordOf(person.id)) !== before).toBe(works);
  });

  it("a newer link ends the older one", async () => {
    const { person, token } = await asked();
    await mailReset({ db, now: () => NOW }, person.email);
    await expect(reset(token, 1)).rejects.toMatchObject({ code: "gone" });
  });

  it("what is stored is a hash: the table opens no account", async () => {
    const { person, token } = await asked();
    const [row] = await db.select().from(resetTokens).where(eq(resetTokens.userId, person.id));
    expect(row?.tokenHash).not.toBe(token);
    await expect(reset(row?.tokenHash ?? "", 1)).rejects.toMatchObject({ code: "gone" });
  });

  it("an unknown link is 410, and asking is limited per account", async () => {
    const gone = await call(confirmReset, { body: { token: "made-up", password: NEW_PASSWORD } });
    expect(gone.status).toBe(410);
    await problemOf(gone);
    const body = { email: "often@nowhere.example" };
    for (let n = 0; n < LIMITS["reset-account"].points; n++)
      expect((await call(askReset, { body })).status).toBe(204);
    const refused = await call(askReset, { body });
    expect([refused.status, refused.headers.has("retry-after")]).toEqual([429, true]);
  });
});

describe("sessions", () => {
  it("end at once when the person is removed, and nothing of the team is left to them", async () => {
    const team = await teamWithEveryRole(db);
    const skills = await cookieOf(team.as("skills").userId);
    expect((await call(readAccount, { cookie: skills })).status).toBe(200);
    const rows = await db
      .select()
      .from(memberships)
      .where(eq(memberships.userId, team.as("skills").userId));
    const params = { id: rows[0]?.id ?? "" };
    const head = await cookieOf(team.as("head").userId);
    expect((await call(removePerson, { method: "DELETE", cookie: head, params })).status).toBe(204);
    expect((await call(readAccount, { cookie: skills })).status).toBe(401);
    // Also under the raised version: there is no membership to act under.
    const later = await cookieOf(team.as("skills").userId, 2);
    expect((await call(readAccount, { cookie: later })).status).toBe(401);
  });

  it("end at once when the password is changed, all of them", async () => {
    const team = await teamWithEveryRole(db);
    const { userId } = team.as("medic");
    await db
      .update(users)
      .set({ passwordHash: await hashPassword("the present passphrase") })
      .where(eq(users.id, userId));
    const cookie = await cookieOf(userId);
    const wrong = await call(changePassword, {
      cookie,
      body: { current: "a guess", password: NEW_PASSWORD },
    });
    expect((await problemOf(wrong)).errors?.[0]?.pointer).toBe("/current");
    expect((await call(readAccount, { cookie })).status).toBe(200);
    const body = { current: "the present passphrase", password: NEW_PASSWORD };
    expect((await call(changePassword, { cookie, body })).status).toBe(204);
    expect((await call(readAccount, { cookie })).status).toBe(401);
  });

  it("guessing the present password from inside a session is limited", async () => {
    const team = await teamWithEveryRole(db);
    const cookie = await cookieOf(team.as("head").userId);
    const body = { current: "a guess", password: NEW_PASSWORD };
    for (let n = 0; n < LIMITS["password-account"].points; n++) await call(changePassword, { cookie, body });
    expect((await call(changePassword, { cookie, body })).status).toBe(429);
  });
});

describe("invitations", () => {
  async function invited(email: string, now = new Date()) {
    const team = await teamWithEveryRole(db, now);
    await invite({ ...team.as("head"), now }, { body: { email, role: "strength", athleteId: null } });
    const sent = await mailsTo(email);
    return { team, token: linkIn(sent.at(-1)?.text, "invite") };
  }
  const joined = async (teamId: string, email: string) => {
    const user = await userBy(email);
    if (!user) return null;
    const rows = await db.select().from(memberships).where(eq(memberships.userId, user.id));
    return rows.find((row) => row.teamId === teamId)?.role ?? null;
  };

  it("someone new gives a name and a password and is in the team, in the role of the invitation", async () => {
    const email = "fresh@asked.example";
    const { team, token } = await invited(email);
    const body = {
      token,
      name: "Wren Oakes",
      password: NEW_PASSWORD,
      timeZone: "Europe/Zagreb",
      role: "head",
    };
    const response = await call(acceptInvite, { body });
    expect([response.status, await response.json()]).toEqual([200, { email }]);
    expect(await joined(team.team.id, email)).toBe("strength");
    expect(await userBy(email)).toMatchObject({ name: "Wren Oakes", timeZone: "Europe/Zagreb" });
    expect((await call(acceptInvite, { body })).status).toBe(410);
  });

  it("someone new without name or with a short password is told which, and the link stays good", async () => {
    const email = "halting@asked.example";
    const { team, token } = await invited(email);
    const noName = await call(acceptInvite, { body: { token, password: NEW_PASSWORD } });
    expect((await problemOf(noName)).errors?.[0]?.pointer).toBe("/name");
    const short = await call(acceptInvite, { body: { token, name: "Wren", password: "short" } });
    expect((await problemOf(short)).errors?.[0]?.pointer).toBe("/password");
    expect(await userBy(email)).toBeNull();
    expect((await call(acceptInvite, { body: { token, name: "Wren", password: NEW_PASSWORD } })).status).toBe(
      200,
    );
    expect(await joined(team.team.id, email)).toBe("strength");
  });

  it("the account there is joins by its own password or session, never by the link alone", async () => {
    const other = await teamWithEveryRole(db);
    const person = other.people[2];
    if (!person) throw new Error("no person");
    await db
      .update(users)
      .set({ passwordHash: await hashPassword("a passphrase of my own") })
      .where(eq(users.id, person.id));
    const first = await invited(person.email);
    for (const password of [undefined, "a guess of a password"]) {
      const refused = await call(acceptInvite, { body: { token: first.token, name: "Me", password } });
      expect((await problemOf(refused)).errors?.[0]?.pointer).toBe("/password");
    }
    expect(await joined(first.team.team.id, person.email)).toBeNull();
    const own = await call(acceptInvite, {
      body: { token: first.token, password: "a passphrase of my own" },
    });
    expect(own.status).toBe(200);
    expect(await joined(first.team.team.id, person.email)).toBe("strength");
    const second = await invited(person.email);
    const stranger = await cookieOf(other.as("head").userId);
    expect((await call(acceptInvite, { cookie: stranger, body: { token: second.token } })).status).toBe(422);
    const cookie = await cookieOf(person.id);
    expect((await call(acceptInvite, { cookie, body: { token: second.token } })).status).toBe(200);
    expect(await joined(second.team.team.id, person.email)).toBe("strength");
  });

  it("an old invitation is 410, and a newer one to the same e-mail ends it", async () => {
    const late = await invited("late@asked.example", new Date(Date.now() - 7 * 86_400_000 - 1000));
    const body = { name: "Wren", password: NEW_PASSWORD };
    expect((await call(acceptInvite, { body: { ...body, token: late.token } })).status).toBe(410);
    const email = "twice@asked.example";
    const { team, token } = await invited(email);
    await invite(team.as("head", new Date()), { body: { email, role: "medic", athleteId: null } });
    expect((await call(acceptInvite, { body: { ...body, token } })).status).toBe(410);
    const newer = linkIn((await mailsTo(email)).find((mail) => mail.text.includes("Medic"))?.text, "invite");
    expect((await call(acceptInvite, { body: { ...body, token: newer } })).status).toBe(200);
    expect(await joined(team.team.id, email)).toBe("medic");
  });

  it("trying links is limited per address", async () => {
    const body = { token: "made-up", name: "Wren", password: NEW_PASSWORD };
    for (let n = 0; n < LIMITS["invite-accept-address"].points; n++)
      expect((await call(acceptInvite, { body })).status).toBe(410);
    expect((await call(acceptInvite, { body })).status).toBe(429);
  });
});
