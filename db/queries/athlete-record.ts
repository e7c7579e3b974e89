import { and, asc, desc, eq, gte, inArray, lte, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { camps, sessionLogs, sessions } from "../schema";

/** Load of an athlete's days from `from` to `to`, both inclusive: planned where it stands, done where it was logged as done. AU. */
export async function listDayLoads(
  tx: Tx,
  teamId: string,
  athleteId: string,
  { from, to }: { from: string; to: string },
) {
  const load = (
    effort: typeof sessions.effort | typeof sessionLogs.effort,
    minutes: unknown,
    when: unknown,
  ) => sql<number>`coalesce(sum(${effort} * ${minutes}) filter (where ${when}), 0)::float8`;
  return tx
    .select({
      day: sessions.day,
      source: sessions.source,
      planned: load(sessions.effort, sessions.minutes, sql`${sessions.status} = 'confirmed'`),
      done: load(sessionLogs.effort, sessionLogs.minutes, sql`${sessionLogs.state} = 'done'`),
      answered: sql<number>`count(*) filter (where ${sessionLogs.state} = 'done')::int`,
    })
    .from(sessions)
    .innerJoin(camps, and(eq(camps.teamId, sessions.teamId), eq(camps.id, sessions.campId)))
    .leftJoin(
      sessionLogs,
      and(
        eq(sessionLogs.teamId, sessions.teamId),
        eq(sessionLogs.campId, sessions.campId),
        eq(sessionLogs.sessionId, sessions.id),
      ),
    )
    .where(
      and(
        eq(sessions.teamId, teamId),
        eq(camps.athleteId, athleteId),
        // The bout and the weigh-in are no training.
        inArray(sessions.source, ["lift", "sport"]),
        gte(sessions.day, from),
        lte(sessions.day, to),
      ),
    )
    .groupBy(sessions.day, sessions.source)
    .orderBy(asc(sessions.day), asc(sessions.source));
}
export type DayLoadRow = Awaited<ReturnType<typeof listDayLoads>>[number];

/** Every camp of an athlete, the newest bout first. */
export async function listCampsOf(tx: Tx, teamId: string, athleteId: string) {
  return tx
    .select({
      id: camps.id,
      status: camps.status,
      boutDate: camps.boutDate,
      place: camps.place,
      opponent: camps.opponent,
      weeks: camps.weeks,
      result: camps.result,
    })
    .from(camps)
    .where(and(eq(camps.teamId, teamId), eq(camps.athleteId, athleteId)))
    .orderBy(desc(camps.boutDate), asc(camps.id));
}
