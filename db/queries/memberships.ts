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
