import { insertResetToken, shutResetTokens } from "@/db/queries/resets";
import { findUserByEmail } from "@/db/queries/users";
import type { Database } from "@/db/client";
import { newSecret, secretHash } from "@/lib/ids";
import { queueMail } from "./queue";
import { RESET_MINUTES, resetMail } from "./templates/reset";

/**
 * Mails a link that sets a new password, where that e-mail has an account; only the newest link works. A job, so that the
 * request that asked for it takes the same time whether there is an account or not.
 */
export async function mailReset(deps: { db: Database; now: () => Date }, email: string): Promise<void> {
  const now = deps.now();
  await deps.db.transaction(async (tx) => {
    const user = await findUserByEmail(tx, email);
    if (!user) return;
    const token = newSecret();
    const tokenHash = secretHash(token);
    await shutResetTokens(tx, user.id, now);
    const expiresAt = new Date(now.getTime() + RESET_MINUTES * 60_000);
    await insertResetToken(tx, { userId: user.id, tokenHash, expiresAt, createdAt: now });
    await queueMail(tx, {
      key: `reset:${tokenHash}`,
      kind: "reset",
      to: user.email,
      userId: user.id,
      ...resetMail(token),
    });
  });
}
