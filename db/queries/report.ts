import { and, asc, eq, inArray, sql } from "drizzle-orm";
import type { BoutResult } from "../../lib/schemas/result";
import type { Tx } from "../client";
import { camps, loggedSets, sessionLogs, sessions } from "../schema";

/** Every lift and sport session that stands in a camp, with what was answered for it. Oldest first. */
export async function listAnswered(tx: Tx, teamId: string, campId: string) {
  const setsDone = tx
    .select({ sessionId: loggedSets.sessionId, sets: sql<number>`count(*)::int`.as("sets") })
    .from(loggedSets)
    .where(and(eq(loggedSets.teamId, teamId), eq(loggedSets.campId, campId)))
    .groupBy(loggedSets.sessionId)
    .as("sets_done");
  return tx
    .select({
      id: sessions.id,
      source: sessions.source,
      kind: sessions.kind,
      title: sessions.title,
      day: sessions.day,
      minutes: sessions.minutes,
      effort: sessions.effort,
      lift: sessions.lift,
      startsAt: sessions.startsAt,
      state: sessionLogs.state,
      doneEffort: sessionLogs.effort,
      doneMinutes: sessionLogs.minutes,
      hardRounds: sessionLogs.hardRounds,
      doneSets: setsDone.sets,
    })
    .from(sessions)
    .leftJoin(
      sessionLogs,
      and(
        eq(sessionLogs.teamId, sessions.teamId),
        eq(sessionLogs.campId, sessions.campId),
        eq(sessionLogs.sessionId, sessions.id),
      ),
    )
    .leftJoin(setsDone, eq(setsDone.sessionId, sessions.id))
    .where(
      and(
        eq(sessions.teamId, teamId),
        eq(sessions.campId, campId),
        eq(sessions.status, "confirmed"),
        inArray(sessions.source, ["lift", "sport"]),
      ),
    )
    .orderBy(asc(sessions.startsAt), asc(sessions.id));
}
export type AnsweredRow = Awaited<ReturnType<typeof listAnswered>>[number];

export async function setResult(
  tx: Tx,
  teamId: string,
  campId: string,
  result: BoutResult | null,
): Promise<void> {
  await tx
    .update(camps)
    .set({ result })
    .where(and(eq(camps.teamId, teamId), eq(camps.id, campId)));
}
