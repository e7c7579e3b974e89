import { writeAudit } from "@/db/queries/audit";
import { listTeamsOf } from "@/db/queries/memberships";
import { shutResetTokens } from "@/db/queries/resets";
import { findUser, replacePassword, updateUser } from "@/db/queries/users";
import { forgetTries, rateLimit } from "@/lib/auth/limits";
import { hashPassword, verifyPassword } from "@/lib/auth/password";
import { AppError, notFound } from "@/lib/errors";
import { queueMail } from "@/lib/mail/queue";
import { passwordChangedMail } from "@/lib/mail/templates/password-changed";
import type { AccountForm, AccountView, PasswordChange, TeamChoice } from "@/lib/schemas/account";
import type { TeamContext } from "@/lib/services/context";

/** One's own account, and the teams one is in. */
export async function readAccount(ctx: TeamContext): Promise<AccountView> {
  const [user, teams] = await Promise.all([findUser(ctx.db, ctx.userId), listTeamsOf(ctx.db, ctx.userId)]);
  if (!user) throw notFound();
  const { name, email, units, timeZone, mailChoice } = user;
  return {
    name,
    email,
    units,
    timeZone,
    mailChoice,
    teams: teams.map((team) => ({ ...team, current: team.id === ctx.teamId })),
  };
}

/** Changes name, units, time zone and mail choice. */
export async function updateAccount(ctx: TeamContext, { body }: { body: AccountForm }): Promise<AccountView> {
  await ctx.db.transaction(async (tx) => {
    await updateUser(tx, ctx.userId, body);
    await writeAudit(tx, ctx, "account.update", ctx.userId, { mailChoice: body.mailChoice });
  });
  return readAccount(ctx);
}

/** Changes the password after asking for the present one; every session ends, also the one that asks. */
export async function changePassword(ctx: TeamContext, { body }: { body: PasswordChange }): Promise<void> {
  await rateLimit(ctx.db, "password-account", ctx.userId);
  const user = await findUser(ctx.db, ctx.userId);
  if (!user || !(await verifyPassword(user.passwordHash, body.current))) {
    throw new AppError("invalid", "The present password is another one.", {
      errors: [{ pointer: "/current", message: "That is not your present password." }],
    });
  }
  const passwordHash = await hashPassword(body.password);
  await ctx.db.transaction(async (tx) => {
    const version = await replacePassword(tx, user.id, passwordHash);
    await shutResetTokens(tx, user.id, ctx.now);
    await writeAudit(tx, ctx, "account.password", user.id);
    const key = `password-changed:${user.id}:${version}`;
    await queueMail(tx, {
      key,
      kind: "password-changed",
      to: user.email,
      userId: user.id,
      ...passwordChangedMail(),
    });
  });
  await forgetTries(ctx.db, "password-account", ctx.userId);
}

/** Goes over to another of one's teams. */
export async function switchTeam(ctx: TeamContext, { body }: { body: TeamChoice }): Promise<void> {
  const teams = await listTeamsOf(ctx.db, ctx.userId);
  if (!teams.some((team) => team.id === body.teamId)) throw notFound();
  await updateUser(ctx.db, ctx.userId, { currentTeamId: body.teamId });
}
