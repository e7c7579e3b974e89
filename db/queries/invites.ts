import { and, asc, eq, isNull, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { invites, teams, users } from "../schema";

export type InviteRow = typeof invites.$inferSelect;

type NewInvite = Pick<
  typeof invites.$inferInsert,
  "email" | "role" | "athleteId" | "tokenHash" | "invitedBy" | "expiresAt" | "createdAt"
>;

export async function insertInvite(tx: Tx, teamId: string, values: NewInvite): Promise<InviteRow> {
  const [row] = await tx
    .insert(invites)
    .values({ ...values, teamId })
    .returning();
  if (!row) throw new Error("Insert returned no row.");
  return row;
}

/** Invitations of a team that nobody has accepted yet, expired ones included. */
export async function listOpenInvites(tx: Tx, teamId: string): Promise<InviteRow[]> {
  return tx
    .select()
    .from(invites)
    .where(and(eq(invites.teamId, teamId), isNull(invites.acceptedAt)))
    .orderBy(asc(invites.createdAt), asc(invites.id));
}

/** Takes back what was sent to this e-mail before: the newest invitation is the one that counts. */
export async function deleteOpenInvitesTo(tx: Tx, teamId: string, email: string): Promise<void> {
  await tx
    .delete(invites)
    .where(
      and(
        eq(invites.teamId, teamId),
        eq(sql`lower(${invites.email})`, email.toLowerCase()),
        isNull(invites.acceptedAt),
      ),
    );
}

/** Takes back one invitation. False where there is none. */
export async function deleteOpenInvite(tx: Tx, teamId: string, inviteId: string): Promise<boolean> {
  const rows = await tx
    .delete(invites)
    .where(and(eq(invites.teamId, teamId), eq(invites.id, inviteId), isNull(invites.acceptedAt)))
    .returning({ id: invites.id });
  return rows.length > 0;
}

/** The invitation behind a token, locked, with its team's name and who sent it. The token is the authority here. */
export async function findInviteByToken(tx: Tx, tokenHash: string) {
  const [row] = await tx
    .select({
      invite: invites,
      teamName: teams.name,
      teamZone: teams.timeZone,
      invitedBy: users.name,
    })
    .from(invites)
    .innerJoin(teams, eq(teams.id, invites.teamId))
    .leftJoin(users, eq(users.id, invites.invitedBy))
    .where(eq(invites.tokenHash, tokenHash))
    .for("update", { of: invites });
  return row ?? null;
}
export type InviteByToken = NonNullable<Awaited<ReturnType<typeof findInviteByToken>>>;

export async function markInviteAccepted(tx: Tx, teamId: string, inviteId: string, now: Date): Promise<void> {
  await tx
    .update(invites)
    .set({ acceptedAt: now })
    .where(and(eq(invites.teamId, teamId), eq(invites.id, inviteId)));
}
