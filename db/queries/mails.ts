import { and, count, eq, getTableColumns, inArray, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { mails, users } from "../schema";

export type MailRow = typeof mails.$inferSelect;
export type NewMail = Pick<
  typeof mails.$inferInsert,
  | "teamId"
  | "userId"
  | "recipient"
  | "kind"
  | "key"
  | "messageId"
  | "subject"
  | "text"
  | "html"
  | "headers"
  | "status"
  | "createdAt"
>;

/** Name of the job that sends mail `id`: one job a mail. */
const sendKey = (id: string): string => `mail:${id}`;

/** Writes a mail once per key. Null where the key is already there. */
export async function insertMail(tx: Tx, mail: NewMail): Promise<string | null> {
  const [row] = await tx
    .insert(mails)
    .values(mail)
    .onConflictDoNothing({ target: mails.key })
    .returning({ id: mails.id });
  return row?.id ?? null;
}

/** Adds the job that sends a mail in `seconds` from now, in the caller's transaction; replaces one that waits. */
export async function addSendJob(tx: Tx, mailId: string, seconds = 0): Promise<void> {
  await tx.execute(sql`
    select graphile_worker.add_job(
      'send-mail', ${JSON.stringify({ mailId })}::json, job_key := ${sendKey(mailId)},
      run_at := now() + make_interval(secs => ${seconds}::float8))`);
}

/**
 * The mail, locked until the transaction ends, or null where it no longer waits or someone else is sending it. The lock is
 * the claim: when a process dies, its connection and with it the claim end at once.
 */
export async function claimMail(tx: Tx, mailId: string): Promise<(MailRow & { stale: boolean }) | null> {
  const [row] = await tx
    .select({
      ...getTableColumns(mails),
      // RFC 5321 4.5.4.1: one gives up after 4 to 5 days.
      stale: sql<boolean>`${mails.createdAt} < now() - interval '5 days'`,
    })
    .from(mails)
    .where(and(eq(mails.id, mailId), eq(mails.status, "waiting")))
    .for("update", { skipLocked: true });
  return row ?? null;
}

/**
 * Records the outcome of one try at sending. A mail that is done with keeps no content: it may hold a link that lets its
 * reader in, and what a camp was like is in its revisions.
 */
export async function updateMailAfterTry(
  tx: Tx,
  mailId: string,
  status: MailRow["status"],
  at: Date,
): Promise<void> {
  await tx
    .update(mails)
    .set({
      status,
      attempts: sql`${mails.attempts} + 1`,
      ...(status === "sent" && { sentAt: at }),
      ...(status !== "waiting" && { text: "", html: "", headers: {} }),
    })
    .where(eq(mails.id, mailId));
}

/**
 * Mails that wait though nobody works on them: no job, a job that gave up, or a job taken over a minute ago by a process
 * that no longer holds the mail. Their rows are locked, so that two sweepers do not take the same.
 */
export async function listStrandedMails(tx: Tx): Promise<string[]> {
  const rows = await tx.execute<{ id: string }>(sql`
    select mails.id
      from mails
      left join graphile_worker.jobs on jobs.key = 'mail:' || mails.id
     where mails.status = 'waiting'
       and mails.created_at < now() - interval '1 minute'
       and (jobs.id is null or jobs.locked_at < now() - interval '1 minute'
            or (jobs.locked_at is null and jobs.attempts >= jobs.max_attempts))
     order by mails.created_at
     limit 500
       for update of mails skip locked`);
  return rows.map((row) => row.id);
}

/** Sets a person's choice on mail about changes. False where there is no such person. */
export async function updateMailChoice(
  tx: Tx,
  userId: string,
  choice: typeof users.$inferSelect.mailChoice,
): Promise<boolean> {
  const rows = await tx
    .update(users)
    .set({ mailChoice: choice })
    .where(eq(users.id, userId))
    .returning({ id: users.id });
  return rows.length > 0;
}

/** How many mails wait, and how many were given up. */
export async function countMails(tx: Tx): Promise<{ waiting: number; failed: number }> {
  const rows = await tx
    .select({ status: mails.status, number: count() })
    .from(mails)
    .where(inArray(mails.status, ["waiting", "failed"]))
    .groupBy(mails.status);
  const of = (status: MailRow["status"]) => rows.find((row) => row.status === status)?.number ?? 0;
  return { waiting: of("waiting"), failed: of("failed") };
}
