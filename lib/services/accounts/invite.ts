import { findAthlete } from "@/db/queries/athletes";
import { writeAudit } from "@/db/queries/audit";
import { deleteOpenInvite, deleteOpenInvitesTo, insertInvite, type InviteRow } from "@/db/queries/invites";
import { listMembers } from "@/db/queries/memberships";
import { findTeam } from "@/db/queries/teams";
import type { Tx } from "@/db/client";
import { rateLimit } from "@/lib/auth/limits";
import { AppError, notFound } from "@/lib/errors";
import { newSecret, secretHash } from "@/lib/ids";
import { queueMail } from "@/lib/mail/queue";
import { INVITE_DAYS, inviteMail } from "@/lib/mail/templates/invite";
import type { InviteForm, InviteView } from "@/lib/schemas/account";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";

const DAY_MS = 86_400_000;

/** An invitation as those who may send them see it; its link is in the mail alone. */
export const inviteView = (row: InviteRow, now: Date): InviteView => ({
  id: row.id,
  email: row.email,
  role: row.role,
  athleteId: row.athleteId,
  expiresAt: row.expiresAt.toISOString(),
  expired: row.expiresAt <= now,
});

/** Refuses a membership tied to an athlete who is not in this team. */
export async function mustHaveAthlete(tx: Tx, teamId: string, athleteId: string | null): Promise<void> {
  if (athleteId === null || (await findAthlete(tx, teamId, athleteId))) return;
  throw new AppError("invalid", "Pick an athlete of this team.", {
    errors: [{ pointer: "/athleteId", message: "Pick an athlete of this team." }],
  });
}

/** Mails an invitation. A newer one to the same e-mail takes the place of the older. */
export async function invite(ctx: TeamContext, { body }: { body: InviteForm }): Promise<InviteView> {
  await rateLimit(ctx.db, "invite-send-team", ctx.teamId);
  return ctx.db.transaction(async (tx) => {
    const team = await findTeam(tx, ctx.teamId);
    if (!team) throw notFound();
    await mustHaveAthlete(tx, ctx.teamId, body.athleteId);
    const people = await listMembers(tx, ctx.teamId);
    if (people.some((person) => person.email.toLowerCase() === body.email.toLowerCase()))
      throw new AppError("conflict", "Someone with this e-mail is in the team already.");
    const token = newSecret();
    const tokenHash = secretHash(token);
    await deleteOpenInvitesTo(tx, ctx.teamId, body.email);
    const row = await insertInvite(tx, ctx.teamId, {
      ...body,
      tokenHash,
      invitedBy: ctx.userId,
      expiresAt: new Date(ctx.now.getTime() + INVITE_DAYS * DAY_MS),
      createdAt: ctx.now,
    });
    const invitedBy = people.find((person) => person.userId === ctx.userId)?.name ?? team.name;
    await queueMail(tx, {
      key: `invite:${row.id}`,
      kind: "invite",
      to: body.email,
      teamId: ctx.teamId,
      ...inviteMail({ token, team: team.name, role: body.role, invitedBy }),
    });
    await writeAudit(tx, ctx, "team.invite", row.id, { email: body.email, role: body.role });
    return inviteView(row, ctx.now);
  });
}

/** Takes an invitation back: its link ends. */
export async function revokeInvite(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    if (!isId(params.id) || !(await deleteOpenInvite(tx, ctx.teamId, params.id))) throw notFound();
    await writeAudit(tx, ctx, "team.invite.revoke", params.id);
  });
}
