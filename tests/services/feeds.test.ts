import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { athletes, auditLog, feeds, memberships, sessions } from "@/db/schema";
import { AppError } from "@/lib/errors";
import type { Role } from "@/lib/policy";
import type { Change } from "@/lib/schemas/change";
import type { FeedForm } from "@/lib/schemas/feed";
import { createCamp } from "@/lib/services/camps/create";
import { readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import { createFeed, listFeeds, renewFeed, revokeFeed } from "@/lib/services/feeds/manage";
import { readFeed } from "@/lib/services/feeds/read";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const NOW = new Date("2026-11-26T12:00:00Z");
const DAY_MS = 86_400_000;
const later = (days: number): Date => new Date(NOW.getTime() + days * DAY_MS);

const team = await teamWithEveryRole(db, NOW);
const other = await teamWithEveryRole(db, NOW);
const { id: campId } = await createCamp(team.as("head"), {
  body: campForm({ athlete: { id: team.athlete.id } }),
});
await createCamp(other.as("head"), {
  body: campForm({
    athlete: { id: other.athlete.id },
    bout: { ...campForm().bout, opponent: "Foreign Opponent" },
  }),
});

const own: FeedForm = { scope: "athlete", athleteId: team.athlete.id, discreet: false };
const whole: FeedForm = { scope: "team", discreet: false };

const tokenOf = (address: string): string => /\/feeds\/([\w-]{43})\/calendar\.ics$/.exec(address)?.[1] ?? "";

async function subscribe(role: Role, form: FeedForm = own) {
  const { feed, address } = await createFeed(team.as(role), { body: form });
  return { id: feed.id, feed, address, token: tokenOf(address) };
}

const unfold = (text: string): string => text.replace(/\r\n[ \t]/g, "");
const bodyOf = async (token: string, now = NOW): Promise<string> =>
  unfold((await (await readFeed(db, token, now)).build()).body);
const tagOf = async (token: string, now = NOW): Promise<string> => (await readFeed(db, token, now)).etag;
const eventsIn = (text: string): string[] => text.split("BEGIN:VEVENT").slice(1);
const eventOf = (text: string, uid: string): string =>
  eventsIn(text).find((event) => event.includes(`UID:${uid}\r\n`)) ?? "";

const codeOf = (promise: Promise<unknown>): Promise<string> =>
  promise.then(
    () => "done",
    (error: unknown) => {
      if (error instanceof AppError) return error.code;
      throw error;
    },
  );

async function save(change: Change, now: Date): Promise<void> {
  const ctx = team.as("head", now);
  const { revision } = await readCamp(ctx, { params: { id: campId } });
  await saveChange(ctx, {
    params: { id: campId },
    body: { change, baseRevision: revision, idempotencyKey: randomUUID() },
  });
}

async function sessionOf(id: string) {
  const [row] = await db
    .select()
    .from(sessions)
    .where(and(eq(sessions.campId, campId), eq(sessions.id, id)));
  if (!row) throw new Error(`no session ${id}`);
  return row;
}

async function sparringOn(date: string): Promise<string> {
  const view = await readCamp(team.as("head"), { params: { id: campId } });
  const found = view.sport.find(
    (session) => session.kind === "hard-sparring" && session.id.endsWith(`@${date}`),
  );
  if (!found) throw new Error(`no sparring on ${date}`);
  return found.id;
}

describe("the address of a subscription", () => {
  it("is told once: only its hash is stored, and the list does not hold it", async () => {
    const { id, token, address } = await subscribe("athlete");
    expect(token).toMatch(/^[\w-]{43}$/);
    const [row] = await db.select().from(feeds).where(eq(feeds.id, id));
    expect(JSON.stringify(row)).not.toContain(token);
    const listed = JSON.stringify(await listFeeds(team.as("athlete")));
    expect(listed).toContain(id);
    expect(listed).not.toContain(token);
    expect(listed).not.toContain(row?.tokenHash);
    const log = await db.select().from(auditLog).where(eq(auditLog.subject, id));
    expect(log.map((entry) => entry.action)).toEqual(["feed.create"]);
    expect(JSON.stringify(log)).not.toContain(token);
    expect(address.startsWith("http")).toBe(true);
  });

  it("renewed is another one, and the old answers nothing from then on", async () => {
    const first = await subscribe("athlete");
    await bodyOf(first.token);
    const renewed = await renewFeed(team.as("athlete"), { params: { id: first.id } });
    expect(tokenOf(renewed.address)).not.toBe(first.token);
    expect(renewed.feed).toMatchObject({ id: first.id, lastReadAt: null });
    expect(await codeOf(readFeed(db, first.token, NOW))).toBe("not-found");
    expect(eventsIn(await bodyOf(tokenOf(renewed.address))).length).toBeGreaterThan(0);
  });

  it("ended answers nothing from then on, and cannot be renewed or ended again", async () => {
    const { id, token } = await subscribe("athlete");
    const reading = await readFeed(db, token, NOW);
    await revokeFeed(team.as("athlete"), { params: { id } });
    expect(await codeOf(readFeed(db, token, NOW))).toBe("not-found");
    expect(await codeOf(reading.build())).toBe("not-found");
    expect(await codeOf(renewFeed(team.as("athlete"), { params: { id } }))).toBe("not-found");
    expect(await codeOf(revokeFeed(team.as("athlete"), { params: { id } }))).toBe("not-found");
    expect((await listFeeds(team.as("athlete"))).feeds.map((feed) => feed.id)).not.toContain(id);
  });

  it.each(["", "x", "a".repeat(43), "../../etc/passwd", "a'; drop table feeds; --".padEnd(43, "a")])(
    "that nobody was given answers nothing: %j",
    async (token) => {
      expect(await codeOf(readFeed(db, token, NOW))).toBe("not-found");
    },
  );

  it("belongs to one person: others of the team, and of another, can neither renew nor end it", async () => {
    const { id, token } = await subscribe("athlete");
    for (const ctx of [team.as("head"), other.as("athlete"), other.as("head")]) {
      expect(await codeOf(renewFeed(ctx, { params: { id } }))).toBe("not-found");
      expect(await codeOf(revokeFeed(ctx, { params: { id } }))).toBe("not-found");
      expect((await listFeeds(ctx)).feeds.map((feed) => feed.id)).not.toContain(id);
    }
    expect(await codeOf(revokeFeed(team.as("athlete"), { params: { id: "no-id" } }))).toBe("not-found");
    expect(await codeOf(readFeed(db, token, NOW))).toBe("done");
  });
});

describe("who may subscribe", () => {
  it.each([
    ["head", "done", "done"],
    ["strength", "done", "done"],
    ["skills", "done", "done"],
    ["medic", "done", "done"],
    ["athlete", "done", "forbidden"],
    ["guest", "done", "forbidden"],
  ] as const)("%s: to the athlete %s, to the whole team %s", async (role, one, all) => {
    expect(await codeOf(createFeed(team.as(role), { body: own }))).toBe(one);
    expect(await codeOf(createFeed(team.as(role), { body: whole }))).toBe(all);
  });

  it("an athlete of another team looks like none at all, to every role", async () => {
    const [mate] = await db
      .insert(athletes)
      .values({ ...team.athlete, id: randomUUID(), name: "Team mate" })
      .returning();
    for (const role of ["head", "athlete", "guest"] as const) {
      for (const athleteId of [
        other.athlete.id,
        randomUUID(),
        ...(role === "head" ? [] : [mate?.id ?? ""]),
      ]) {
        expect(
          await codeOf(createFeed(team.as(role), { body: { scope: "athlete", athleteId, discreet: false } })),
        ).toBe("not-found");
      }
    }
  });

  it("a person who left the team reads nothing any more", async () => {
    const gone = await teamWithEveryRole(db, NOW);
    const { address } = await createFeed(gone.as("skills"), { body: whole });
    expect(await codeOf(readFeed(db, tokenOf(address), NOW))).toBe("done");
    await db
      .delete(memberships)
      .where(and(eq(memberships.teamId, gone.team.id), eq(memberships.userId, gone.as("skills").userId)));
    expect(await codeOf(readFeed(db, tokenOf(address), NOW))).toBe("not-found");
  });

  it("a coach who became a guest reads no team calendar any more, and sees why in the list", async () => {
    const changed = await teamWithEveryRole(db, NOW);
    const { address } = await createFeed(changed.as("skills"), { body: whole });
    const mine = and(
      eq(memberships.teamId, changed.team.id),
      eq(memberships.userId, changed.as("skills").userId),
    );
    await db.update(memberships).set({ role: "guest", athleteId: changed.athlete.id }).where(mine);
    expect(await codeOf(readFeed(db, tokenOf(address), NOW))).toBe("not-found");
    const ctx = {
      ...changed.as("skills"),
      member: { role: "guest" as const, athleteId: changed.athlete.id },
    };
    expect((await listFeeds(ctx)).feeds).toMatchObject([{ allowed: false, athlete: null }]);
    expect(await codeOf(renewFeed(ctx, { params: { id: (await listFeeds(ctx)).feeds[0]?.id ?? "" } }))).toBe(
      "forbidden",
    );
  });

  it("is refused at the fifty-first", async () => {
    const many = await teamWithEveryRole(db, NOW);
    for (let n = 0; n < 50; n++) await createFeed(many.as("head"), { body: whole });
    expect(await codeOf(createFeed(many.as("head"), { body: whole }))).toBe("conflict");
  });
});

describe("what a subscription shows", () => {
  it("every session of the athlete's camp, at its instant, and nothing of another team", async () => {
    const text = await bodyOf((await subscribe("athlete")).token);
    const rows = await db
      .select()
      .from(sessions)
      .where(and(eq(sessions.campId, campId), eq(sessions.status, "confirmed")));
    expect(eventsIn(text)).toHaveLength(rows.length);
    for (const row of rows) {
      const utc = `${row.startsAt.toISOString().slice(0, 19).replace(/[-:]/g, "")}Z`;
      expect(eventOf(text, row.uid), row.id).toContain(`DTSTART:${utc}\r\n`);
    }
    expect(text).not.toContain("Foreign Opponent");
    expect(text).toContain(`NAME:${team.athlete.name}\\, ${team.team.name}\r\n`);
  });

  it("sets to athlete, S&C coach, head coach and medic; that there is lifting, without sets, to skills coach and guest", async () => {
    for (const role of ["athlete", "strength", "head", "medic"] as const) {
      expect(await bodyOf((await subscribe(role)).token), role).toMatch(/DESCRIPTION:\d+ working sets? /);
    }
    for (const role of ["skills", "guest"] as const) {
      const text = await bodyOf((await subscribe(role)).token);
      expect(text, role).toContain("SUMMARY:Strength");
      expect(text, role).not.toMatch(/working set/);
    }
    expect(await bodyOf((await subscribe("guest")).token)).not.toContain("Expected effort");
    expect(await bodyOf((await subscribe("skills")).token)).toContain("Expected effort 8 of 10");
  });

  it("the whole team's says whose each session is; a discreet one says nothing", async () => {
    const text = await bodyOf((await subscribe("head", whole)).token);
    const titles = text.match(/SUMMARY:.*/g) ?? [];
    expect(titles.length).toBeGreaterThan(0);
    for (const title of titles) expect(title).toContain(`SUMMARY:${team.athlete.name}: `);
    const discreet = await bodyOf((await subscribe("head", { ...whole, discreet: true })).token);
    expect(new Set(discreet.match(/SUMMARY:.*/g))).toEqual(
      new Set(["SUMMARY:Training", "SUMMARY:Sport", "SUMMARY:Bout", "SUMMARY:Appointment"]),
    );
    expect(discreet).not.toContain(team.athlete.name);
    expect(discreet).not.toContain(team.team.name);
  });

  it("is an empty calendar for an athlete without a camp", async () => {
    const idle = await teamWithEveryRole(db, NOW);
    const { address } = await createFeed(idle.as("athlete"), {
      body: { ...own, athleteId: idle.athlete.id },
    });
    expect(eventsIn(await bodyOf(tokenOf(address)))).toEqual([]);
  });

  it("leaves out a camp a year after its bout", async () => {
    const { token } = await subscribe("athlete");
    expect(eventsIn(await bodyOf(token, later(44 + 365))).length).toBeGreaterThan(0);
    expect(eventsIn(await bodyOf(token, later(44 + 367)))).toEqual([]);
  });
});

describe("a saved change", () => {
  it("moves the session under the same UID with a higher SEQUENCE and the revision's time, and changes the tag", async () => {
    const { token } = await subscribe("athlete");
    const id = await sparringOn("2026-12-05");
    const [before, tag] = [await sessionOf(id), await tagOf(token)];
    const savedAt = later(0.5);
    await save(
      { kind: "sport.edit", sportId: id, scope: "this", values: { date: "2026-12-03", start: "18:00" } },
      savedAt,
    );
    const event = eventOf(await bodyOf(token), before.uid);
    expect(event).toContain("DTSTART:20261203T180000Z\r\n");
    expect(event).toContain(`SEQUENCE:${before.sequence + 1}\r\n`);
    expect(event).toContain("DTSTAMP:20261127T000000Z\r\n");
    expect(await tagOf(token)).not.toBe(tag);
  });

  it("that changes only words keeps the SEQUENCE", async () => {
    const { token } = await subscribe("athlete");
    const id = await sparringOn("2026-12-08");
    const before = await sessionOf(id);
    await save(
      { kind: "sport.edit", sportId: id, scope: "this", values: { title: "Hard sparring, small gloves" } },
      later(0.6),
    );
    const event = eventOf(await bodyOf(token), before.uid);
    expect(event).toContain("SUMMARY:Hard sparring\\, small gloves\r\n");
    expect(event).toContain(`SEQUENCE:${before.sequence}\r\n`);
  });

  it("that drops a session leaves it as cancelled for 30 days, with a higher SEQUENCE, then it is gone and the tag another", async () => {
    const { token } = await subscribe("athlete");
    const id = await sparringOn("2026-12-12");
    const before = await sessionOf(id);
    const droppedAt = later(0.7);
    await save({ kind: "sport.drop", sportId: id, scope: "this" }, droppedAt);
    const after = (days: number) => new Date(droppedAt.getTime() + days * DAY_MS);
    const event = eventOf(await bodyOf(token, after(1)), before.uid);
    expect(event).toContain("STATUS:CANCELLED\r\n");
    expect(event).toContain(`SEQUENCE:${before.sequence + 1}\r\n`);
    // The window moves at midnight UTC: 30 days at least, 31 at most.
    expect(eventOf(await bodyOf(token, after(30)), before.uid)).toContain("STATUS:CANCELLED");
    expect(eventOf(await bodyOf(token, after(31)), before.uid)).toBe("");
    expect(await tagOf(token, after(31))).not.toBe(await tagOf(token, after(30)));
  });
});

describe("the tag", () => {
  it("and the bytes are the same for the same state, at another time, and belong together", async () => {
    const { token } = await subscribe("head", whole);
    const at = async (days: number) => (await readFeed(db, token, later(days))).build();
    const first = await at(1);
    expect(await at(1.4)).toEqual(first);
    expect(await tagOf(token, later(1.4))).toBe(first.etag);
    expect((await at(2)).body).toBe(first.body);
    // Without a change for a month nothing can drop out of the calendar any more, and the tag stands.
    expect(await at(40)).toEqual(await at(35));
    expect(first.etag).toMatch(/^"[\w-]+"$/);
  });

  it("differs between subscriptions, and with what the role may see", async () => {
    const [one, two] = [await subscribe("head"), await subscribe("head", { ...own, discreet: true })];
    expect(await tagOf(one.token)).not.toBe(await tagOf(two.token));
    const ctx = team.as("strength");
    const { token } = await subscribe("strength");
    const tag = await tagOf(token);
    const mine = and(eq(memberships.teamId, ctx.teamId), eq(memberships.userId, ctx.userId));
    await db.update(memberships).set({ role: "skills" }).where(mine);
    expect(await tagOf(token)).not.toBe(tag);
    await db.update(memberships).set({ role: "strength" }).where(mine);
    expect(await tagOf(token)).toBe(tag);
  });

  it("changes with the athlete's name, which the calendar shows", async () => {
    const { token } = await subscribe("head");
    const tag = await tagOf(token);
    await db.update(athletes).set({ name: "Renamed" }).where(eq(athletes.id, team.athlete.id));
    expect(await tagOf(token)).not.toBe(tag);
    await db.update(athletes).set({ name: team.athlete.name }).where(eq(athletes.id, team.athlete.id));
  });
});

it("a reading is noted, at most once an hour", async () => {
  const { id, token } = await subscribe("medic");
  const lastRead = async () =>
    (await listFeeds(team.as("medic"))).feeds.find((feed) => feed.id === id)?.lastReadAt;
  expect(await lastRead()).toBeNull();
  await readFeed(db, token, NOW);
  await readFeed(db, token, new Date(NOW.getTime() + 30 * 60_000));
  expect(await lastRead()).toBe(NOW.toISOString());
  await readFeed(db, token, new Date(NOW.getTime() + 61 * 60_000));
  expect(await lastRead()).toBe("2026-11-26T13:01:00.000Z");
});
