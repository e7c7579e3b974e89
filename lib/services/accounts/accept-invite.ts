import { writeAudit } from "@/db/queries/audit";
import { findInviteByToken, markInviteAccepted, type InviteByToken } from "@/db/queries/invites";
import { insertMembership } from "@/db/queries/memberships";
import { findUserByEmail, insertUser, updateUser, type UserRow } from "@/db/queries/users";
import { rateLimit } from "@/lib/auth/limits";
import { hashPassword } from "@/lib/auth/password";
import { checkSignIn } from "@/lib/auth/sign-in";
import { AppError } from "@/lib/errors";
import { secretHash } from "@/lib/ids";
import type { Role } from "@/lib/policy";
import { newPassword, type AcceptInvite } from "@/lib/schemas/account";
import type { PublicContext } from "@/lib/services/context";

const gone = () =>
  new AppError("gone", "This invitation was used, taken back or is too old. Ask for a new one.");

const wrong = (pointer: string, message: string) =>
  new AppError("invalid", "Some fields need another look.", { errors: [{ pointer, message }] });

function mustBeOpen(found: InviteByToken | null, now: Date): InviteByToken {
  if (!found || found.invite.acceptedAt !== null || found.invite.expiresAt <= now) throw gone();
  return found;
}

/** What the page of an invitation says. */
export interface InvitePage {
  readonly team: string;
  readonly email: string;
  readonly role: Role;
  readonly invitedBy: string | null;
  /** There is an account for that e-mail: its owner joins with its password. Told to whoever got the mail, nobody else. */
  readonly hasAccount: boolean;
  /** The reader is signed in as the one who is invited. */
  readonly signedIn: boolean;
}

/** The invitation behind a link; null where it was used, taken back or has expired. */
export async function readInvite(
  ctx: Pick<PublicContext, "db" | "now">,
  token: string,
  userId: string | null,
): Promise<InvitePage | null> {
  const found = await findInviteByToken(ctx.db, secretHash(token));
  if (!found || found.invite.acceptedAt !== null || found.invite.expiresAt <= ctx.now) return null;
  const { invite, teamName, invitedBy } = found;
  const account = await findUserByEmail(ctx.db, invite.email);
  return {
    team: teamName,
    email: invite.email,
    role: invite.role,
    invitedBy,
    hasAccount: account !== null,
    signedIn: account !== null && account.id === userId,
  };
}

/** The account there is joins by its session or its password: the link alone does not open it. */
async function mustBeOwner(
  ctx: PublicContext,
  account: UserRow,
  password: string | undefined,
): Promise<void> {
  if ((await ctx.signedIn()) === account.id) return;
  const given = { email: account.email, password: password ?? "", address: ctx.address };
  if (!(await checkSignIn(ctx.db, given)))
    throw wrong("/password", "That is not the password of your account.");
}

/** Checks what a new account needs, and hashes outside of any transaction. */
async function newAccount(body: AcceptInvite): Promise<{ name: string; passwordHash: string }> {
  if (body.name === undefined) throw wrong("/name", "Give your name.");
  const password = newPassword.safeParse(body.password ?? "");
  if (!password.success) throw wrong("/password", password.error.issues[0]?.message ?? "Choose another one.");
  return { name: body.name, passwordHash: await hashPassword(password.data) };
}

/** Joins a team by the link of an invitation, once. Someone new gets an account; gives back the e-mail to sign in with. */
export async function acceptInvite(
  ctx: PublicContext,
  { body }: { body: AcceptInvite },
): Promise<{ email: string }> {
  await rateLimit(ctx.db, "invite-accept-address", ctx.address);
  const tokenHash = secretHash(body.token);
  const { invite } = mustBeOpen(await findInviteByToken(ctx.db, tokenHash), ctx.now);
  const account = await findUserByEmail(ctx.db, invite.email);
  if (account) await mustBeOwner(ctx, account, body.password);
  const fresh = account ? null : await newAccount(body);
  return ctx.db.transaction(async (tx) => {
    const { teamZone } = mustBeOpen(await findInviteByToken(tx, tokenHash), ctx.now);
    const { teamId, role, athleteId, email } = invite;
    const user =
      account ??
      (fresh &&
        (await insertUser(tx, {
          ...fresh,
          email,
          timeZone: body.timeZone ?? teamZone,
          createdAt: ctx.now,
        })));
    // The account was made a moment ago, by a form sent twice at once.
    if (!user) throw gone();
    await insertMembership(tx, teamId, user.id, { role, athleteId, createdAt: ctx.now });
    await updateUser(tx, user.id, { currentTeamId: teamId });
    await markInviteAccepted(tx, teamId, invite.id, ctx.now);
    await writeAudit(tx, { teamId, userId: user.id, now: ctx.now }, "team.join", user.id, { role });
    return { email: user.email };
  });
}
