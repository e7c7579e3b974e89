import { and, asc, eq, isNotNull, isNull, sql } from "drizzle-orm";
import { TEST_KINDS, TEST_SPECS } from "../../lib/engine/measures";
import type { Tx } from "../client";
import { athletes, testTrials } from "../schema";

export type TrialRow = typeof testTrials.$inferSelect;
type TrialValues = Omit<typeof testTrials.$inferInsert, "id" | "teamId" | "removedAt">;

/** An athlete's trials that were not removed, oldest first. */
export async function listTrials(tx: Tx, teamId: string, athleteId: string): Promise<TrialRow[]> {
  return tx
    .select()
    .from(testTrials)
    .where(
      and(eq(testTrials.teamId, teamId), eq(testTrials.athleteId, athleteId), isNull(testTrials.removedAt)),
    )
    .orderBy(asc(testTrials.day), asc(testTrials.createdAt), asc(testTrials.id));
}

export type TeamTrial = Pick<TrialRow, "athleteId" | "kind" | "side" | "value" | "second">;

const AT_SAME = TEST_KINDS.filter((kind) => TEST_SPECS[kind].comparesAtSame);

/** Trials of the newest day of each athlete of the team, by kind, side, and load or ball where that must be the same. */
export async function listNewestOfTeam(tx: Tx, teamId: string): Promise<TeamTrial[]> {
  const columns = {
    athleteId: testTrials.athleteId,
    kind: testTrials.kind,
    side: testTrials.side,
    value: testTrials.value,
    second: testTrials.second,
    day: testTrials.day,
    newest: sql<string>`max(${testTrials.day}) over (partition by ${testTrials.athleteId}, ${testTrials.kind},
      ${testTrials.side}, case when ${testTrials.kind} in ${AT_SAME} then ${testTrials.second} end)`.as(
      "newest",
    ),
  };
  const dated = tx
    .select(columns)
    .from(testTrials)
    .where(and(eq(testTrials.teamId, teamId), isNull(testTrials.removedAt)))
    .as("dated");
  return tx
    .select({
      athleteId: dated.athleteId,
      kind: dated.kind,
      side: dated.side,
      value: dated.value,
      second: dated.second,
    })
    .from(dated)
    .where(eq(dated.day, dated.newest));
}

/** Waits for whoever else adds to the same athlete. */
export async function lockAthlete(tx: Tx, teamId: string, athleteId: string): Promise<void> {
  await tx
    .select({ id: athletes.id })
    .from(athletes)
    .where(and(eq(athletes.teamId, teamId), eq(athletes.id, athleteId)))
    .for("update");
}

/** Trials in one statement: all of them or none. Gives back their ids in order. */
export async function insertTrials(
  tx: Tx,
  teamId: string,
  values: readonly TrialValues[],
): Promise<string[]> {
  const rows = await tx
    .insert(testTrials)
    .values(values.map((one) => ({ ...one, teamId })))
    .returning({ id: testTrials.id });
  return rows.map((row) => row.id);
}

/** The trial, removed or not, locked. */
export async function lockTrial(tx: Tx, teamId: string, trialId: string): Promise<TrialRow | null> {
  const [row] = await tx
    .select()
    .from(testTrials)
    .where(and(eq(testTrials.teamId, teamId), eq(testTrials.id, trialId)))
    .for("update");
  return row ?? null;
}

/** Removes a trial, or puts it back with null. */
export async function setTrialRemoved(
  tx: Tx,
  teamId: string,
  trialId: string,
  removedAt: Date | null,
): Promise<void> {
  await tx
    .update(testTrials)
    .set({ removedAt })
    .where(and(eq(testTrials.teamId, teamId), eq(testTrials.id, trialId)));
}

/** Whose upload it is, how many rows it brought and how many of them still stand. Null where there is none. */
export async function findUpload(tx: Tx, teamId: string, uploadId: string) {
  const [row] = await tx
    .select({
      athleteId: testTrials.athleteId,
      rows: sql<number>`count(*)::int`,
      standing: sql<number>`count(*) filter (where ${testTrials.removedAt} is null)::int`,
    })
    .from(testTrials)
    .where(and(eq(testTrials.teamId, teamId), eq(testTrials.uploadId, uploadId)))
    .groupBy(testTrials.athleteId);
  return row ?? null;
}

/** Removes what still stands of an upload; gives back how many. */
export async function removeUpload(tx: Tx, teamId: string, uploadId: string, now: Date): Promise<number> {
  const rows = await tx
    .update(testTrials)
    .set({ removedAt: now })
    .where(
      and(
        eq(testTrials.teamId, teamId),
        eq(testTrials.uploadId, uploadId),
        isNotNull(testTrials.uploadId),
        isNull(testTrials.removedAt),
      ),
    )
    .returning({ id: testTrials.id });
  return rows.length;
}
