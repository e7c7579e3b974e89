import { and, asc, desc, eq, gte, inArray, lte, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { loggedSets, sessionLogs } from "../schema";

export type LogRow = typeof sessionLogs.$inferSelect;
export type SetRow = Pick<
  typeof loggedSets.$inferSelect,
  "slot" | "number" | "exerciseId" | "kg" | "reps" | "reserve"
>;
/** A log with its sets in the order of slot and number. */
export interface LogWithSets {
  readonly log: LogRow;
  readonly sets: readonly SetRow[];
}

const setColumns = {
  slot: loggedSets.slot,
  number: loggedSets.number,
  exerciseId: loggedSets.exerciseId,
  kg: loggedSets.kg,
  reps: loggedSets.reps,
  reserve: loggedSets.reserve,
};

const ofLog = and(
  eq(loggedSets.teamId, sessionLogs.teamId),
  eq(loggedSets.campId, sessionLogs.campId),
  eq(loggedSets.sessionId, sessionLogs.sessionId),
);

function grouped(rows: readonly { log: LogRow; set: SetRow | null }[]): LogWithSets[] {
  const found = new Map<string, { log: LogRow; sets: SetRow[] }>();
  for (const { log, set } of rows) {
    const key = `${log.campId} ${log.sessionId}`;
    const known = found.get(key) ?? { log, sets: [] };
    if (set) known.sets.push(set);
    found.set(key, known);
  }
  return [...found.values()];
}

/** An athlete's logs of sessions on the days `from` to `to`, both inclusive, oldest first. */
export async function listLogs(
  tx: Tx,
  teamId: string,
  athleteId: string,
  { from, to }: { from: string; to: string },
): Promise<LogWithSets[]> {
  const rows = await tx
    .select({ log: sessionLogs, set: setColumns })
    .from(sessionLogs)
    .leftJoin(loggedSets, ofLog)
    .where(
      and(
        eq(sessionLogs.teamId, teamId),
        eq(sessionLogs.athleteId, athleteId),
        gte(sessionLogs.day, from),
        lte(sessionLogs.day, to),
      ),
    )
    .orderBy(asc(sessionLogs.day), asc(sessionLogs.sessionId), asc(loggedSets.slot), asc(loggedSets.number));
  return grouped(rows);
}

/** The log of one session with its sets. */
export async function findLog(
  tx: Tx,
  teamId: string,
  campId: string,
  sessionId: string,
): Promise<LogWithSets | null> {
  const rows = await tx
    .select({ log: sessionLogs, set: setColumns })
    .from(sessionLogs)
    .leftJoin(loggedSets, ofLog)
    .where(
      and(
        eq(sessionLogs.teamId, teamId),
        eq(sessionLogs.campId, campId),
        eq(sessionLogs.sessionId, sessionId),
      ),
    )
    .orderBy(asc(loggedSets.slot), asc(loggedSets.number));
  return grouped(rows)[0] ?? null;
}

/** Writes a log and its sets whole. The caller holds the camp's lock, so that two devices wait for each other. */
export async function writeLog(tx: Tx, log: LogRow, sets: readonly SetRow[]): Promise<void> {
  const { teamId, campId, sessionId, athleteId, day, ...rest } = log;
  await tx
    .insert(sessionLogs)
    .values(log)
    .onConflictDoUpdate({
      target: [sessionLogs.campId, sessionLogs.sessionId],
      set: { ...rest, day },
      setWhere: sql`${sessionLogs.teamId} = ${teamId}`,
    });
  await tx
    .delete(loggedSets)
    .where(
      and(eq(loggedSets.teamId, teamId), eq(loggedSets.campId, campId), eq(loggedSets.sessionId, sessionId)),
    );
  if (sets.length === 0) return;
  await tx.insert(loggedSets).values(
    sets.map(({ slot, number, exerciseId, kg, reps, reserve }) => ({
      teamId,
      campId,
      athleteId,
      sessionId,
      day,
      slot,
      number,
      exerciseId,
      kg,
      reps,
      reserve,
    })),
  );
}

/**
 * The best set of each of some exercises on each day, heaviest first and then most repetitions; newest day first. Days `from` to
 * `to`, both inclusive.
 */
export async function listTopSets(
  tx: Tx,
  teamId: string,
  athleteId: string,
  exerciseIds: readonly string[],
  { from, to }: { from: string; to: string },
): Promise<{ exerciseId: string; day: string; kg: number | null; reps: number }[]> {
  if (exerciseIds.length === 0) return [];
  return tx
    .selectDistinctOn([loggedSets.exerciseId, loggedSets.day], {
      exerciseId: loggedSets.exerciseId,
      day: loggedSets.day,
      kg: loggedSets.kg,
      reps: loggedSets.reps,
    })
    .from(loggedSets)
    .where(
      and(
        eq(loggedSets.teamId, teamId),
        eq(loggedSets.athleteId, athleteId),
        inArray(loggedSets.exerciseId, [...exerciseIds]),
        gte(loggedSets.day, from),
        lte(loggedSets.day, to),
      ),
    )
    .orderBy(
      asc(loggedSets.exerciseId),
      desc(loggedSets.day),
      sql`${loggedSets.kg} desc nulls last`,
      desc(loggedSets.reps),
    );
}
