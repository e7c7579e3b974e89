import { and, asc, eq } from "drizzle-orm";
import { expect, it } from "vitest";
import { revisions, sessions } from "@/db/schema";
import { createCamp } from "@/lib/services/camps/create";
import { liftHold, setHold } from "@/lib/services/holds/holds";
import { campForm } from "../factories/camp-book";
import { testDatabase } from "../setup/database";
import { NOW, dayScene, type DayScene } from "./day-scene";

const { db } = await testDatabase();

const sparring = async (campId: string) =>
  db
    .select({ day: sessions.day, startsAt: sessions.startsAt, status: sessions.status })
    .from(sessions)
    .where(and(eq(sessions.campId, campId), eq(sessions.kind, "hard-sparring")))
    .orderBy(asc(sessions.startsAt));

const hold = (scene: DayScene, from: string, to: string | null, now = NOW) =>
  setHold(
    { ...scene.as("medic"), now },
    { params: { id: scene.athlete.id }, body: { from, to, reason: "Knock to the head." } },
  );

/** A day on which only sparring stands: no lift is there that could move. */
async function sparringAlone(scene: DayScene): Promise<string> {
  const lifts = new Set((await scene.lifts()).map(({ day }) => day));
  const day = (await sparring(scene.campId)).find((row) => row.startsAt > NOW && !lifts.has(row.day));
  if (!day) throw new Error("every sparring day has a lift");
  return day.day;
}

it("a hold that moves no lift still takes the sparring of its days out of the calendar, and says so", async () => {
  const scene = await dayScene(db);
  const day = await sparringAlone(scene);
  await hold(scene, day, day);
  expect((await sparring(scene.campId)).filter((row) => row.day === day)).toMatchObject([
    { status: "cancelled" },
  ]);
  const [, second] = await db
    .select()
    .from(revisions)
    .where(eq(revisions.campId, scene.campId))
    .orderBy(asc(revisions.number));
  expect(second?.knockOn?.sport).toMatchObject([{ kind: "dropped", sport: "hard-sparring" }]);
});

it("what was before the hold was set stays, also on its days", async () => {
  const scene = await dayScene(db);
  const past = (await sparring(scene.campId)).filter((row) => row.startsAt < NOW);
  expect(past.length).toBeGreaterThan(0);
  await hold(scene, past[0]?.day ?? "", null);
  const rows = await sparring(scene.campId);
  expect(rows.filter((row) => row.startsAt < NOW).every((row) => row.status === "confirmed")).toBe(true);
  expect(rows.filter((row) => row.startsAt > NOW).every((row) => row.status === "cancelled")).toBe(true);
});

it("lifted, the sparring to come is planned again, and none comes back into the past", async () => {
  const scene = await dayScene(db);
  const before = await sparring(scene.campId);
  const { id } = await hold(scene, "2026-12-01", null);
  const later = new Date("2026-12-09T08:00:00Z");
  await liftHold({ ...scene.as("medic"), now: later }, { params: { id } });
  const rows = await sparring(scene.campId);
  const between = rows.filter((row) => row.startsAt > NOW && row.startsAt < later);
  expect(between.length).toBeGreaterThan(0);
  expect(between.every((row) => row.status === "cancelled")).toBe(true);
  const ahead = (all: typeof rows) => all.filter((row) => row.startsAt > later);
  expect(ahead(rows)).toEqual(ahead(before));
});

it("follows the athlete into a new camp", async () => {
  const scene = await dayScene(db);
  await hold(scene, "2026-12-01", null);
  const { id } = await createCamp(scene.as("head"), {
    body: campForm({ athlete: { id: scene.athlete.id } }),
  });
  const rows = await sparring(id);
  expect(rows.some((row) => row.startsAt > NOW)).toBe(false);
});
