import { and, asc, eq, inArray, isNull, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { notices, users } from "../schema";

export type NoticeRow = typeof notices.$inferSelect;

/** Who is told how: choice and zone of each person, without those who want nothing. */
export async function listReaders(tx: Tx, userIds: readonly string[]) {
  return tx
    .select({ userId: users.id, mailChoice: users.mailChoice, timeZone: users.timeZone })
    .from(users)
    .where(and(inArray(users.id, [...userIds]), sql`${users.mailChoice} <> 'none'`))
    .orderBy(asc(users.id));
}

/** Writes a notice per person, once per revision. Returns those that were not there before. */
export async function insertNotices(
  tx: Tx,
  values: { teamId: string; campId: string; revision: number; userIds: readonly string[]; now: Date },
): Promise<string[]> {
  const { userIds, now, ...scope } = values;
  if (userIds.length === 0) return [];
  const rows = await tx
    .insert(notices)
    .values(userIds.map((userId) => ({ ...scope, userId, createdAt: now })))
    .onConflictDoNothing()
    .returning({ userId: notices.userId });
  return rows.map((row) => row.userId);
}

/** A collecting job: at `runAt` it mails everything that waits for the person, if what was there at `since` still waits. */
export interface CollectJob {
  readonly userId: string;
  readonly since: Date;
  readonly runAt: Date;
}

/**
 * Adds collecting jobs in the caller's transaction. They have no job key on purpose: saves that tell the same people would
 * wait for each other on it, and could lock each other for good. A job that comes second finds nothing and ends.
 */
export async function addCollectJobs(tx: Tx, jobs: readonly CollectJob[]): Promise<void> {
  if (jobs.length === 0) return;
  const specs = jobs.map(
    ({ userId, since, runAt }) =>
      sql`('collect-changes', ${JSON.stringify({ userId, since: since.toISOString() })}::json, null, ${runAt.toISOString()}::timestamptz, 25, null, 0, null)::graphile_worker.job_spec`,
  );
  await tx.execute(sql`select from graphile_worker.add_jobs(array[${sql.join(specs, sql`, `)}])`);
}

/** What waits for a person, oldest first, locked: a second collector waits and then finds it done. */
export async function claimNotices(tx: Tx, userId: string): Promise<NoticeRow[]> {
  return tx
    .select()
    .from(notices)
    .where(and(eq(notices.userId, userId), isNull(notices.mailId)))
    .orderBy(asc(notices.createdAt), asc(notices.revision), asc(notices.id))
    .for("update");
}

export async function markNotices(tx: Tx, noticeIds: readonly string[], mailId: string): Promise<void> {
  await tx
    .update(notices)
    .set({ mailId })
    .where(inArray(notices.id, [...noticeIds]));
}

/** People for whom something waits longer than any job could have left it: their job died with its process. */
export async function listForgottenReaders(tx: Tx): Promise<{ userId: string; since: Date }[]> {
  const rows = await tx
    .select({ userId: notices.userId, since: sql<string>`max(${notices.createdAt})` })
    .from(notices)
    .innerJoin(users, eq(users.id, notices.userId))
    .where(
      and(
        isNull(notices.mailId),
        sql`${notices.createdAt} < now() - case ${users.mailChoice} when 'daily' then interval '25 hours' else interval '4 minutes' end`,
      ),
    )
    .groupBy(notices.userId)
    .orderBy(asc(notices.userId))
    .limit(500);
  return rows.map(({ userId, since }) => ({ userId, since: new Date(since) }));
}
