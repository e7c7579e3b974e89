import { writeAudit } from "@/db/queries/audit";
import { listTeamsOf } from "@/db/queries/memberships";
import { addResetJob, isResetTokenOpen, shutResetTokens, useResetToken } from "@/db/queries/resets";
import { findUser, replacePassword } from "@/db/queries/users";
import { rateLimit } from "@/lib/auth/limits";
import { hashPassword } from "@/lib/auth/password";
import { AppError } from "@/lib/errors";
import { secretHash } from "@/lib/ids";
import { queueMail } from "@/lib/mail/queue";
import { passwordChangedMail } from "@/lib/mail/templates/password-changed";
import type { ResetConfirm, ResetRequest } from "@/lib/schemas/account";
import type { PublicContext } from "@/lib/services/context";

/** Asks for a reset link. Says and does the same whether the e-mail has an account or not: a job finds out. */
export async function requestReset(ctx: PublicContext, { body }: { body: ResetRequest }): Promise<void> {
  await rateLimit(ctx.db, "reset-address", ctx.address);
  await rateLimit(ctx.db, "reset-account", body.email);
  await addResetJob(ctx.db, body.email);
}

/** True while a reset link can be used: for the page it leads to. */
export const isResetOpen = (ctx: Pick<PublicContext, "db" | "now">, token: string): Promise<boolean> =>
  isResetTokenOpen(ctx.db, secretHash(token), ctx.now);

/** Sets the new password, once per link; all sessions and all other links end. */
export async function resetPassword(ctx: PublicContext, { body }: { body: ResetConfirm }): Promise<void> {
  await rateLimit(ctx.db, "reset-confirm-address", ctx.address);
  const passwordHash = await hashPassword(body.password);
  await ctx.db.transaction(async (tx) => {
    const userId = await useResetToken(tx, secretHash(body.token), ctx.now);
    const user = userId === null ? null : await findUser(tx, userId);
    if (!user) throw new AppError("gone", "This link was used already or is too old. Ask for a new one.");
    const version = await replacePassword(tx, user.id, passwordHash);
    await shutResetTokens(tx, user.id, ctx.now);
    for (const { id: teamId } of await listTeamsOf(tx, user.id))
      await writeAudit(tx, { teamId, userId: user.id, now: ctx.now }, "account.reset", user.id);
    const key = `password-changed:${user.id}:${version}`;
    await queueMail(tx, {
      key,
      kind: "password-changed",
      to: user.email,
      userId: user.id,
      ...passwordChangedMail(),
    });
  });
}
