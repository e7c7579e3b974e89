import { and, asc, eq, gte, lte, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { weights } from "../schema";

export type WeightRow = typeof weights.$inferSelect;

/** An athlete's weights of the days `from` to `to`, both inclusive, oldest first. */
export async function listWeights(
  tx: Tx,
  teamId: string,
  athleteId: string,
  { from, to }: { from: string; to: string },
): Promise<Pick<WeightRow, "day" | "kg">[]> {
  return tx
    .select({ day: weights.day, kg: weights.kg })
    .from(weights)
    .where(
      and(
        eq(weights.teamId, teamId),
        eq(weights.athleteId, athleteId),
        gte(weights.day, from),
        lte(weights.day, to),
      ),
    )
    .orderBy(asc(weights.day));
}

/** Writes the one weight of a day over whatever it was. */
export async function putWeight(
  tx: Tx,
  teamId: string,
  { athleteId, day, kg }: { athleteId: string; day: string; kg: number },
  now: Date,
): Promise<void> {
  await tx
    .insert(weights)
    .values({ teamId, athleteId, day, kg, changedAt: now })
    .onConflictDoUpdate({
      target: [weights.athleteId, weights.day],
      set: { kg, changedAt: now },
      setWhere: sql`${weights.teamId} = ${teamId}`,
    });
}

/** False where there was none. */
export async function deleteWeight(tx: Tx, teamId: string, athleteId: string, day: string): Promise<boolean> {
  const rows = await tx
    .delete(weights)
    .where(and(eq(weights.teamId, teamId), eq(weights.athleteId, athleteId), eq(weights.day, day)))
    .returning({ day: weights.day });
  return rows.length > 0;
}
