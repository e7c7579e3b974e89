import { and, asc, eq, ne } from "drizzle-orm";
import type { Tx } from "../client";
import { memberships, users } from "../schema";

/** Members of a team but one, who want mail at all. */
export async function listMembersToTell(tx: Tx, teamId: string, butUserId: string) {
  return tx
    .select({ userId: memberships.userId, role: memberships.role, athleteId: memberships.athleteId })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(
      and(eq(memberships.teamId, teamId), ne(memberships.userId, butUserId), ne(users.mailChoice, "none")),
    )
    .orderBy(asc(memberships.userId));
}
