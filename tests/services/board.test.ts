import { drizzle } from "drizzle-orm/postgres-js";
import { randomUUID } from "node:crypto";
import { describe, expect, it } from "vitest";
import { athletes, checkIns, holds, requests, weights } from "@/db/schema";
import * as schema from "@/db/schema";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { Role } from "@/lib/policy";
import type { BoardRow, FlagKind } from "@/lib/schemas/board";
import { readBoard } from "@/lib/services/board/read-board";
import { createCamp } from "@/lib/services/camps/create";
import { campForm } from "../factories/camp-book";
import { testDatabase } from "../setup/database";
import { NOW, dayScene, done, keep, refusal, type DayScene } from "./day-scene";

const { db, sql } = await testDatabase();
const TODAY = Math.floor(NOW.getTime() / 86_400_000) as Day;
const date = (offset: number): string => isoFromDay((TODAY + offset) as Day);

const rowOf = async (scene: DayScene, role: Role): Promise<BoardRow> => {
  const { rows } = await readBoard(scene.as(role));
  const row = rows.find(({ campId }) => campId === scene.campId);
  if (!row) throw new Error("not on the board");
  return row;
};
const kinds = (row: BoardRow): FlagKind[] => row.flags.map(({ kind }) => kind);
const textOf = (row: BoardRow, kind: FlagKind): string | undefined =>
  row.flags.find((flag) => flag.kind === kind)?.text;

/** An athlete of whom everything can be said: a hold, pain, a knock, a missed lift, a bad check-in, weight behind, a request. */
async function everything() {
  const scene = await dayScene(db);
  const athleteId = scene.athlete.id;
  const { id: teamId } = scene.team;
  const own = scene.as("strength");
  const lift = await scene.lastLift();
  await keep(own, scene.campId, lift.id, done({ pain: 5, painPlace: "left knee" }));
  const earlier = (await scene.lifts()).filter((row) => row.startsAt < lift.startsAt).at(-1);
  if (earlier)
    await keep(scene.as("strength"), scene.campId, earlier.id, {
      ...done(),
      state: "missed",
      effort: null,
      minutes: null,
    });
  await db.insert(checkIns).values(
    Array.from({ length: 21 }, (_, back) => ({
      teamId,
      athleteId,
      day: date(-back),
      // 8 on most days, 9 on every third, 20 today: invented.
      sleep: back === 0 ? 5 : back % 3 === 0 ? 3 : 2,
      fatigue: back === 0 ? 5 : 2,
      soreness: back === 0 ? 5 : 2,
      stress: back === 0 ? 5 : 2,
      changedAt: NOW,
    })),
  );
  await db.insert(weights).values(
    [
      [-14, 62],
      [0, 62.5],
    ].map(([back = 0, kg = 0]) => ({ teamId, athleteId, day: date(back), kg, changedAt: NOW })),
  );
  await db.insert(holds).values({ teamId, athleteId, fromDay: date(-1), toDay: null, reason: "Secret." });
  const next = (await scene.lifts()).find((row) => row.startsAt > NOW);
  await db.insert(requests).values({
    id: randomUUID(),
    teamId,
    campId: scene.campId,
    athleteId,
    sessionId: next?.id ?? "",
    reason: "Exam.",
  });
  return scene;
}

describe("the board", () => {
  it("says in words with numbers what there is to look at", async () => {
    const row = await rowOf(await everything(), "strength");
    expect(kinds(row)).toEqual(
      expect.arrayContaining(["hold", "pain", "request", "weight", "check-in", "missed", "suggestions"]),
    );
    expect(textOf(row, "pain")).toMatch(/^Pain 5 of 10, left knee, /);
    expect(textOf(row, "check-in")).toMatch(
      /^Check-in 20 of 28, own normal 8\.\d ± 0\.\d \(SD of 20 days\)$/,
    );
    expect(textOf(row, "missed")).toBe("1 session missed in 7 days");
    expect(textOf(row, "weight")).toMatch(/^62\.5 kg, \d(\.\d+)? kg above the line$/);
    expect(textOf(row, "hold")).toMatch(/until the medic lifts it$/);
    expect(textOf(row, "request")).toMatch(/^Asks to be let off /);
    expect(textOf(row, "suggestions")).toMatch(/^\d suggestions$/);
    expect(row.onHold).toBe(true);
    expect(row.requests).toMatchObject([{ reason: "Exam." }]);
  });

  it("shows each role what the policy lets it read, and never the reason of a hold", async () => {
    const scene = await everything();
    const seen = { skills: await rowOf(scene, "skills"), medic: await rowOf(scene, "medic") };
    expect(kinds(seen.skills)).toEqual(["hold"]);
    expect(seen.skills).toMatchObject({ attendance: null, load: null, requests: [] });
    expect(new Set(kinds(seen.medic))).toEqual(new Set(["hold", "pain", "check-in"]));
    expect(seen.medic).toMatchObject({ attendance: null, load: null, requests: [] });
    for (const role of ["skills", "medic"] as const)
      expect(seen[role].days.flatMap(({ marks }) => marks.map(({ state }) => state))).not.toContain("done");
    for (const role of ["head", "strength", "skills", "medic"] as const)
      expect(JSON.stringify(await readBoard(scene.as(role)))).not.toContain("Secret.");
    for (const role of ["athlete", "guest"] as const)
      expect((await refusal(readBoard(scene.as(role)))).code).toBe("forbidden");
  });

  it("says nothing of a minor's weight", async () => {
    const scene = await everything();
    await db.update(athletes).set({ dateOfBirth: "2010-01-01" });
    expect(kinds(await rowOf(scene, "head"))).not.toContain("weight");
    await db.update(athletes).set({ dateOfBirth: null });
  });

  it("gives weights in the unit that the reader chose", async () => {
    const scene = await everything();
    await sql`update users set units = 'lb' where id = ${scene.as("head").userId}`;
    expect(textOf(await rowOf(scene, "head"), "weight")).toMatch(/^137\.8 lb, .* lb above the line$/);
  });

  it("marks three days back as done or missed, today, and ten days ahead", async () => {
    const scene = await dayScene(db);
    const past = (await scene.lifts()).filter(({ day }) => day >= date(-3) && day < date(0));
    for (const [n, lift] of past.entries())
      await keep(
        scene.as("strength"),
        scene.campId,
        lift.id,
        n === 0 ? done() : { ...done(), state: "missed", effort: null, minutes: null },
      );
    const row = await rowOf(scene, "head");
    expect(row.days.map((day) => day.date)).toEqual(Array.from({ length: 14 }, (_, n) => date(n - 3)));
    const states = row.days
      .flatMap(({ marks }) => marks)
      .filter(({ id }) => past.some((lift) => lift.id === id));
    expect(states.map(({ state }) => state)).toEqual(past.map((_, n) => (n === 0 ? "done" : "missed")));
    expect(row.phase).not.toBeNull();
    expect(row.flags.map(({ kind }) => kind)).not.toContain("hold");
  });

  it("puts the nearest bout first, shows the next of an athlete's bouts, and leaves out what is over or off", async () => {
    const scene = await dayScene(db);
    const head = scene.as("head");
    const at = (iso: string) => ({ ...campForm().bout, date: iso });
    const soon = { athlete: { name: "Soon" }, bout: at("2026-12-20"), weighIn: null, weeks: 3 };
    const { id: first } = await createCamp(head, { body: campForm(soon) });
    const later = { athlete: { id: scene.athlete.id }, bout: at("2027-06-05"), weighIn: null, weeks: 8 };
    await createCamp(head, { body: campForm(later) });
    const off = await createCamp(head, { body: campForm({ ...soon, athlete: { name: "Off" } }) });
    await sql`update camps set status = 'off' where id = ${off.id}`;
    const before = new Date("2026-10-01T12:00:00Z");
    await createCamp(scene.as("head", before), {
      body: campForm({ athlete: { name: "Over" }, bout: at("2026-11-21"), weighIn: null, weeks: 3 }),
    });
    const { rows } = await readBoard(head);
    expect(rows.map(({ campId }) => campId)).toEqual([first, scene.campId]);
    expect(rows[0]?.daysOut).toBeLessThan(rows[1]?.daysOut ?? 0);
  });

  it("asks at most eight queries, for one athlete as for many, and shows no other team", async () => {
    const scene = await everything();
    await everything();
    const asked: string[] = [];
    const counted = drizzle(sql, {
      schema,
      casing: "snake_case",
      logger: { logQuery: (query) => void asked.push(query) },
    });
    const count = async (): Promise<number> => {
      asked.length = 0;
      await readBoard({ ...scene.as("head"), db: counted });
      return asked.length;
    };
    const one = await count();
    for (let n = 0; n < 4; n++)
      await createCamp(scene.as("head"), { body: campForm({ athlete: { name: `More ${n}` } }) });
    expect(await count()).toBe(one);
    expect(one).toBeLessThanOrEqual(8);
    const { rows } = await readBoard(scene.as("head"));
    expect(rows).toHaveLength(5);
  });

  it("adds up the load of the camp week: done as answered, due by now, planned in all", async () => {
    const scene = await dayScene(db);
    const before = (await rowOf(scene, "head")).load;
    const lift = await scene.lastLift();
    await keep(scene.as("strength"), scene.campId, lift.id, done({ effort: 7, minutes: 50 }));
    const after = (await rowOf(scene, "head")).load;
    // Camp weeks end on the weekday of the bout: the lift is of the week under way.
    const week = (iso: string) => Math.floor((Date.parse("2027-01-09") - Date.parse(iso)) / (7 * 86_400_000));
    expect(week(lift.day)).toBe(week(date(0)));
    expect(after?.done).toBe((before?.done ?? 0) + 350);
    expect(after?.planned).toBe(before?.planned);
  });
});
