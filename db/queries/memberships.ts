import { and, asc, eq } from "drizzle-orm";
import type { Tx } from "../client";
import { memberships, teams, users } from "../schema";

/**
 * A signed-in person with the membership in force: of the current team, else of the team joined first. Null where the
 * person is gone, the session version is old, or there is no membership left: the session is then over.
 */
export async function findActiveMember(tx: Tx, userId: string, sessionVersion: number) {
  const rows = await tx
    .select({
      userId: users.id,
      name: users.name,
      email: users.email,
      units: users.units,
      timeZone: users.timeZone,
      currentTeamId: users.currentTeamId,
      teamId: memberships.teamId,
      teamName: teams.name,
      role: memberships.role,
      athleteId: memberships.athleteId,
    })
    .from(users)
    .innerJoin(memberships, eq(memberships.userId, users.id))
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(and(eq(users.id, userId), eq(users.sessionVersion, sessionVersion)))
    .orderBy(asc(memberships.createdAt), asc(memberships.id));
  return rows.find((row) => row.teamId === row.currentTeamId) ?? rows[0] ?? null;
}

export type MembershipRow = typeof memberships.$inferSelect;
type MembershipValues = Pick<MembershipRow, "role" | "athleteId">;

/** False where the person is in the team already. */
export async function insertMembership(
  tx: Tx,
  teamId: string,
  userId: string,
  values: MembershipValues & { createdAt: Date },
): Promise<boolean> {
  const rows = await tx
    .insert(memberships)
    .values({ teamId, userId, ...values })
    .onConflictDoNothing()
    .returning({ id: memberships.id });
  return rows.length > 0;
}

/** Everyone in a team, by name. */
export async function listMembers(tx: Tx, teamId: string) {
  return tx
    .select({
      id: memberships.id,
      userId: users.id,
      name: users.name,
      email: users.email,
      role: memberships.role,
      athleteId: memberships.athleteId,
    })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.teamId, teamId))
    .orderBy(asc(users.name), asc(memberships.id));
}

/** Teams that a person is in, by name. */
export async function listTeamsOf(tx: Tx, userId: string) {
  return tx
    .select({ id: teams.id, name: teams.name, role: memberships.role })
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(eq(memberships.userId, userId))
    .orderBy(asc(teams.name), asc(teams.id));
}

/** All memberships of a team, locked in one order: two changes at once cannot both take the last head away. */
export async function lockMembers(tx: Tx, teamId: string): Promise<MembershipRow[]> {
  return tx
    .select()
    .from(memberships)
    .where(eq(memberships.teamId, teamId))
    .orderBy(asc(memberships.id))
    .for("update");
}

export async function updateMembership(
  tx: Tx,
  teamId: string,
  membershipId: string,
  values: MembershipValues,
): Promise<void> {
  await tx
    .update(memberships)
    .set(values)
    .where(and(eq(memberships.teamId, teamId), eq(memberships.id, membershipId)));
}

export async function deleteMembership(tx: Tx, teamId: string, membershipId: string): Promise<void> {
  await tx.delete(memberships).where(and(eq(memberships.teamId, teamId), eq(memberships.id, membershipId)));
}
