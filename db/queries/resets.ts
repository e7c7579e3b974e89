import { and, eq, gt, isNull, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { resetTokens } from "../schema";

export async function insertResetToken(
  tx: Tx,
  values: { userId: string; tokenHash: string; expiresAt: Date; createdAt: Date },
): Promise<void> {
  await tx.insert(resetTokens).values(values);
}

/** Uses a token up: the id of its person, or null where it is unknown, used or expired. One of two at once wins. */
export async function useResetToken(tx: Tx, tokenHash: string, now: Date): Promise<string | null> {
  const [row] = await tx
    .update(resetTokens)
    .set({ usedAt: now })
    .where(
      and(eq(resetTokens.tokenHash, tokenHash), isNull(resetTokens.usedAt), gt(resetTokens.expiresAt, now)),
    )
    .returning({ userId: resetTokens.userId });
  return row?.userId ?? null;
}

/** True while the token can still be used. */
export async function isResetTokenOpen(tx: Tx, tokenHash: string, now: Date): Promise<boolean> {
  const rows = await tx
    .select({ id: resetTokens.id })
    .from(resetTokens)
    .where(
      and(eq(resetTokens.tokenHash, tokenHash), isNull(resetTokens.usedAt), gt(resetTokens.expiresAt, now)),
    );
  return rows.length > 0;
}

/** Shuts all open tokens of a person: a newer one was asked for, or the password changed. */
export async function shutResetTokens(tx: Tx, userId: string, now: Date): Promise<void> {
  await tx
    .update(resetTokens)
    .set({ usedAt: now })
    .where(and(eq(resetTokens.userId, userId), isNull(resetTokens.usedAt)));
}

/** Adds the job that mails a reset link, if that e-mail has an account: asked for either way, so that nobody can tell. */
export async function addResetJob(tx: Tx, email: string): Promise<void> {
  await tx.execute(sql`select graphile_worker.add_job('mail-reset', ${JSON.stringify({ email })}::json)`);
}
