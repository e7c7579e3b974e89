import { and, asc, eq, gte, inArray, isNull, max, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { memberships, notices, revisions, users } from "../schema";

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
  /** The daily mail. */
  readonly digest: boolean;
  readonly now: Date;
  readonly runAt: Date;
  /** At most one waiting job of this name. */
  readonly key?: string;
}

/**
 * Adds collecting jobs in the caller's transaction. Those of a save have no job key on purpose: saves that tell the same people would
 * wait for each other on it, and could lock each other for good. A job that comes second finds nothing and ends.
 * They are set off by the database's clock, `runAt - now` from now on: the clocks of two machines need not agree.
 */
export async function addCollectJobs(tx: Tx, jobs: readonly CollectJob[]): Promise<void> {
  if (jobs.length === 0) return;
  const specs = jobs.map(({ userId, since, digest, now, runAt, key }) => {
    const payload = JSON.stringify({ userId, since: since.toISOString(), digest });
    const seconds = (runAt.getTime() - now.getTime()) / 1000;
    return sql`('collect-changes', ${payload}::json, null, now() + make_interval(secs => ${seconds}::float8), 25, ${key ?? null}::text, 0, null)::graphile_worker.job_spec`;
  });
  await tx.execute(sql`select from graphile_worker.add_jobs(array[${sql.join(specs, sql`, `)}])`);
}

/** A person with all memberships: what a mail needs to know of its reader. */
export async function findReader(tx: Tx, userId: string) {
  const [user] = await tx
    .select({ id: users.id, email: users.email, timeZone: users.timeZone, mailChoice: users.mailChoice })
    .from(users)
    .where(eq(users.id, userId));
  if (!user) return null;
  const rows = await tx
    .select({ teamId: memberships.teamId, role: memberships.role, athleteId: memberships.athleteId })
    .from(memberships)
    .where(eq(memberships.userId, userId));
  return { ...user, memberships: rows };
}

/** A revision as a mail needs it; `told` where the reader has a notice of it. */
export type ToldRevision = Awaited<ReturnType<typeof listRevisionsFrom>>[number] & { readonly told: boolean };

/** Revisions of a camp from number `from` on, oldest first, with who saved them. */
export async function listRevisionsFrom(tx: Tx, teamId: string, campId: string, from: number) {
  return tx
    .select({
      number: revisions.number,
      edit: revisions.edit,
      inverse: revisions.inverse,
      knockOn: revisions.knockOn,
      by: users.name,
    })
    .from(revisions)
    .leftJoin(users, eq(users.id, revisions.userId))
    .where(and(eq(revisions.teamId, teamId), eq(revisions.campId, campId), gte(revisions.number, from)))
    .orderBy(asc(revisions.number));
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
export async function listForgottenReaders(tx: Tx, now: Date): Promise<{ userId: string; since: Date }[]> {
  const rows = await tx
    .select({ userId: notices.userId, since: max(notices.createdAt) })
    .from(notices)
    .innerJoin(users, eq(users.id, notices.userId))
    .where(
      and(
        isNull(notices.mailId),
        sql`${notices.createdAt} < ${now.toISOString()}::timestamptz
            - case ${users.mailChoice} when 'daily' then interval '25 hours' else interval '4 minutes' end`,
      ),
    )
    .groupBy(notices.userId)
    .orderBy(asc(notices.userId))
    .limit(500);
  return rows.map(({ userId, since }) => ({ userId, since: since ?? now }));
}
