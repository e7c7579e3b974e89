import { writeAudit } from "@/db/queries/audit";
import { listOpenInvites } from "@/db/queries/invites";
import {
  deleteMembership,
  listMembers,
  lockMembers,
  updateMembership,
  type MembershipRow,
} from "@/db/queries/memberships";
import { endSessions } from "@/db/queries/users";
import type { Tx } from "@/db/client";
import { AppError, notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { PeopleView, RoleChange } from "@/lib/schemas/account";
import type { TeamContext } from "@/lib/services/context";
import { inviteView, mustHaveAthlete } from "./invite";

type ById = { params: Record<string, string> };

/** Who is in the team, and, for those who may send them, the invitations that are open. */
export async function listPeople(ctx: TeamContext): Promise<PeopleView> {
  const mayInvite = can(ctx.member, "team.manage");
  const [people, invites] = await Promise.all([
    listMembers(ctx.db, ctx.teamId),
    mayInvite ? listOpenInvites(ctx.db, ctx.teamId) : [],
  ]);
  return {
    people: people.map(({ userId, ...person }) => ({ ...person, self: userId === ctx.userId })),
    invites: invites.map((row) => inviteView(row, ctx.now)),
  };
}

async function lockedMember(tx: Tx, ctx: TeamContext, { params }: ById) {
  const members = await lockMembers(tx, ctx.teamId);
  const member = members.find((row) => row.id === params.id);
  if (!member) throw notFound();
  return { member, members };
}

/** Somebody must be left who can invite and remove. */
function mustKeepHead(member: MembershipRow, members: readonly MembershipRow[]): void {
  const heads = members.filter((row) => row.role === "head");
  if (member.role === "head" && heads.length === 1)
    throw new AppError("conflict", "A team needs a head coach. Make someone else head coach first.");
}

/** Gives a person another role; it holds from their next request on. */
export async function changeRole(ctx: TeamContext, input: ById & { body: RoleChange }): Promise<PeopleView> {
  await ctx.db.transaction(async (tx) => {
    const { member, members } = await lockedMember(tx, ctx, input);
    const { role, athleteId } = input.body;
    if (role !== "head") mustKeepHead(member, members);
    await mustHaveAthlete(tx, ctx.teamId, athleteId);
    await updateMembership(tx, ctx.teamId, member.id, { role, athleteId });
    await writeAudit(tx, ctx, "team.role", member.userId, { from: member.role, to: role });
  });
  return listPeople(ctx);
}

/** Takes a person out of the team: their sessions end at once, and with the membership all that they saw of it. */
export async function removeMember(ctx: TeamContext, input: ById): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    const { member, members } = await lockedMember(tx, ctx, input);
    mustKeepHead(member, members);
    await deleteMembership(tx, ctx.teamId, member.id);
    await endSessions(tx, member.userId, ctx.teamId);
    await writeAudit(tx, ctx, "team.remove", member.userId, { role: member.role });
  });
}
