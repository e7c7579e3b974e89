import { writeAudit } from "@/db/queries/audit";
import { insertMembership } from "@/db/queries/memberships";
import { insertTeam } from "@/db/queries/teams";
import { findUserByEmail, insertUser, updateUser } from "@/db/queries/users";
import type { Tx } from "@/db/client";
import { rateLimit } from "@/lib/auth/limits";
import { hashPassword } from "@/lib/auth/password";
import { queueMail } from "@/lib/mail/queue";
import { signUpExistsMail } from "@/lib/mail/templates/sign-up-exists";
import type { SignUp } from "@/lib/schemas/account";
import type { PublicContext } from "@/lib/services/context";

const HOUR_MS = 3_600_000;

/** Tells the owner, at most once an hour, that someone gave their e-mail. */
async function tellOwner(tx: Tx, userId: string, email: string, now: Date): Promise<void> {
  const hour = Math.floor(now.getTime() / HOUR_MS);
  const key = `sign-up-exists:${userId}:${hour}`;
  await queueMail(tx, { key, kind: "sign-up-exists", to: email, userId, ...signUpExistsMail() });
}

async function makeTeam(tx: Tx, userId: string, form: SignUp, now: Date): Promise<void> {
  const teamId = await insertTeam(tx, { name: form.team, timeZone: form.timeZone });
  await insertMembership(tx, teamId, userId, { role: "head", athleteId: null, createdAt: now });
  await updateUser(tx, userId, { currentTeamId: teamId });
  await writeAudit(tx, { teamId, userId, now }, "team.create", teamId, { name: form.team });
}

/**
 * Makes a person and a team of which they are head coach. The answer is the same, after the same hashing, where the e-mail
 * has an account already: nothing is made then, and its owner gets a mail. Whoever signed up signs in next with what they
 * typed; that works for a new account, and for an old one only with its own password.
 */
export async function signUp(ctx: PublicContext, { body }: { body: SignUp }): Promise<Record<string, never>> {
  await rateLimit(ctx.db, "sign-up-address", ctx.address);
  await rateLimit(ctx.db, "sign-up-account", body.email);
  const passwordHash = await hashPassword(body.password);
  await ctx.db.transaction(async (tx) => {
    const { name, email, timeZone } = body;
    const known = await findUserByEmail(tx, email);
    if (known) return tellOwner(tx, known.id, known.email, ctx.now);
    const user = await insertUser(tx, { name, email, passwordHash, timeZone, createdAt: ctx.now });
    // Null: the same form was sent twice at once, and the other one made the account.
    if (user) await makeTeam(tx, user.id, body, ctx.now);
  });
  return {};
}
