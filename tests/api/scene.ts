import { randomUUID } from "node:crypto";
import { and, asc, eq, gt } from "drizzle-orm";
import {
  feeds,
  holds,
  invites,
  memberships,
  requests,
  sessions,
  testTrials,
  timetableEntries,
} from "@/db/schema";
import type { Database } from "@/db/client";
import type { Role } from "@/lib/policy";
import { createCamp } from "@/lib/services/camps/create";
import { addExercise } from "@/lib/services/exercises/save";
import { addBest } from "@/lib/services/prescription/bests";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { cookieOf } from "./client";
import { BEST, EXERCISE_FORM, SESSION, TRIAL } from "./bodies";
import type { Scene } from "./routes";

const only = <T>([row]: readonly T[]): T => {
  if (row === undefined) throw new Error("no row");
  return row;
};

/** A team with one of everything that a route can name, and a cookie for each role. */
export async function sceneOf(db: Database, now: Date) {
  const team = await teamWithEveryRole(db, now);
  const teamId = team.team.id;
  const athleteId = team.athlete.id;
  const head = team.as("head");
  const { id: campId } = await createCamp(head, { body: campForm({ athlete: { id: athleteId } }) });
  const hold = only(
    await db
      .insert(holds)
      .values({ teamId, athleteId, fromDay: "2026-12-20", toDay: "2026-12-21", reason: "Check-up." })
      .returning(),
  );
  const invite = only(
    await db
      .insert(invites)
      .values({
        teamId,
        email: `${randomUUID()}@asked.example`,
        role: "skills",
        tokenHash: randomUUID(),
        expiresAt: new Date(now.getTime() + 86_400_000),
      })
      .returning(),
  );
  const members = await db.select().from(memberships).where(eq(memberships.teamId, teamId));
  const entryId = randomUUID();
  await db.insert(timetableEntries).values({ ...SESSION, exdate: [], id: entryId, teamId, series: entryId });
  const feed = only(
    await db
      .insert(feeds)
      .values({ teamId, userId: head.userId, scope: "team", tokenHash: randomUUID() })
      .returning(),
  );
  // Ids are made from names: another name for each team, so that a foreign id names nothing here.
  const { id: exerciseId } = await addExercise(head, {
    body: { ...EXERCISE_FORM, name: `Rope turn ${randomUUID()}` },
  });
  const requestId = randomUUID();
  await db.insert(requests).values({
    id: requestId,
    teamId,
    campId,
    athleteId,
    sessionId: "mon@2026-12-14",
    reason: "Exam.",
  });
  const [session] = await db
    .select({ id: sessions.id })
    .from(sessions)
    .where(and(eq(sessions.campId, campId), eq(sessions.source, "sport"), eq(sessions.day, "2026-11-30")));
  const lifts = await db
    .select({ id: sessions.id })
    .from(sessions)
    .where(and(eq(sessions.campId, campId), eq(sessions.source, "lift"), gt(sessions.startsAt, now)))
    .orderBy(asc(sessions.startsAt));
  const best = await addBest(head, { params: { id: athleteId }, body: BEST });
  const uploadId = randomUUID();
  const trial = only(
    await db
      .insert(testTrials)
      .values({ ...TRIAL, teamId, athleteId, uploadId })
      .returning(),
  );
  const scene: Scene = {
    athleteId,
    campId,
    holdId: hold.id,
    inviteId: invite.id,
    membershipId: only(members.filter((row) => row.role === "skills")).id,
    entryId,
    feedId: feed.id,
    exerciseId,
    requestId,
    sessionId: session?.id ?? "",
    liftId: only(lifts).id,
    bestId: best.id,
    trialId: trial.id,
    uploadId,
  };
  return { ...team, teamId, scene, cookie: (role: Role) => cookieOf(team.as(role).userId) };
}
