import { and, desc, eq } from "drizzle-orm";
import type { Tx } from "../client";
import { limitationHistory, users } from "../schema";

/** What an athlete's limitations were, newest first; the first line is what stands now. */
export async function listLimitationHistory(tx: Tx, teamId: string, athleteId: string) {
  return tx
    .select({
      id: limitationHistory.id,
      limitations: limitationHistory.limitations,
      limitationCodes: limitationHistory.limitationCodes,
      since: limitationHistory.createdAt,
      by: users.name,
    })
    .from(limitationHistory)
    .leftJoin(users, eq(users.id, limitationHistory.userId))
    .where(and(eq(limitationHistory.teamId, teamId), eq(limitationHistory.athleteId, athleteId)))
    .orderBy(desc(limitationHistory.createdAt), desc(limitationHistory.id));
}

/** Limitations as they stand from `createdAt` on. */
export async function insertLimitations(
  tx: Tx,
  values: Omit<typeof limitationHistory.$inferInsert, "id">,
): Promise<void> {
  await tx.insert(limitationHistory).values(values);
}
