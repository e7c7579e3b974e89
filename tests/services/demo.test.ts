import { spawnSync } from "node:child_process";
import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { athletes, checkIns, loggedSets, memberships, sessionLogs, weights } from "@/db/schema";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import { civilNow } from "@/lib/calendar/zones";
import { readToday } from "@/lib/services/today/read-today";
import { testDatabase } from "../setup/database";

const { db, url } = await testDatabase();

/** Lays the demo out as `npm start` does. */
function seed(): void {
  const { status, stderr } = spawnSync(process.execPath, ["--import", "tsx", "db/seed/run.ts"], {
    env: { ...process.env, DATABASE_URL: url },
    encoding: "utf8",
  });
  if (status !== 0) throw new Error(stderr);
}
seed();
const today = civilNow("Europe/Lisbon", new Date()).day;

const counts = async () =>
  Promise.all([sessionLogs, loggedSets, checkIns, weights].map(async (table) => db.$count(table)));

describe("the demo", () => {
  it("is logged for the days behind it and for none ahead, in every camp", async () => {
    const logs = await db
      .select({ name: athletes.name, log: sessionLogs })
      .from(sessionLogs)
      .innerJoin(athletes, eq(athletes.id, sessionLogs.athleteId));
    expect(new Set(logs.map(({ name }) => name)).size).toBe(5);
    expect(logs.filter(({ log }) => dayFromIso(log.day) >= today)).toEqual([]);
    expect(logs.some(({ log }) => log.state === "missed")).toBe(true);
    const knocks = logs.filter(({ log }) => log.knock);
    expect(knocks.map(({ name }) => name)).toEqual(["Bram Achterberg"]);
  });

  it("gives the athlete a day with figures of the last time, a line and a check-in still to do", async () => {
    const [member] = await db.select().from(memberships).where(eq(memberships.role, "athlete"));
    if (!member) throw new Error("no athlete");
    const { teamId, userId, role, athleteId } = member;
    const view = await readToday({ db, teamId, userId, member: { role, athleteId }, now: new Date() });
    expect(view.days.map((day) => day.date)).toHaveLength(9);
    expect(view.weight.off).toBeNull();
    expect(view.days.find((day) => day.date === isoFromDay(today))?.checkIn).toBeNull();
    const lifts = view.days.flatMap((day) => day.sessions).filter((session) => session.source === "lift");
    expect(lifts.length).toBeGreaterThan(0);
    for (const lift of lifts) expect(lift.prescription?.lines.length).toBeGreaterThan(0);
    expect(lifts.some((lift) => Object.keys(lift.lastTime).length > 0)).toBe(true);
  });

  it("laid out again adds nothing", async () => {
    const before = await counts();
    seed();
    expect(await counts()).toEqual(before);
  });
});
