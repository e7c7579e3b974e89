import { and, desc, eq } from "drizzle-orm";
import type { Tx } from "../client";
import { revisions, suggestionDecisions, users } from "../schema";

type DecisionRow = typeof suggestionDecisions.$inferSelect;

/** What was decided in a camp, newest first, with who did it and the revision that put an accepted one back. */
export async function listDecisions(tx: Tx, teamId: string, campId: string) {
  return tx
    .select({
      key: suggestionDecisions.key,
      decision: suggestionDecisions.decision,
      title: suggestionDecisions.title,
      reason: suggestionDecisions.reason,
      revision: suggestionDecisions.revision,
      at: suggestionDecisions.createdAt,
      by: users.name,
      putBackBy: revisions.number,
    })
    .from(suggestionDecisions)
    .leftJoin(users, eq(users.id, suggestionDecisions.userId))
    .leftJoin(
      revisions,
      and(
        eq(revisions.teamId, suggestionDecisions.teamId),
        eq(revisions.campId, suggestionDecisions.campId),
        eq(revisions.putBackOf, suggestionDecisions.revision),
      ),
    )
    .where(and(eq(suggestionDecisions.teamId, teamId), eq(suggestionDecisions.campId, campId)))
    .orderBy(desc(suggestionDecisions.createdAt), desc(suggestionDecisions.key));
}

export async function findDecision(
  tx: Tx,
  teamId: string,
  campId: string,
  key: string,
): Promise<DecisionRow | null> {
  const [row] = await tx
    .select()
    .from(suggestionDecisions)
    .where(
      and(
        eq(suggestionDecisions.teamId, teamId),
        eq(suggestionDecisions.campId, campId),
        eq(suggestionDecisions.key, key),
      ),
    );
  return row ?? null;
}

/** The caller holds the camp's lock and has seen that nothing was decided on this key. */
export async function insertDecision(tx: Tx, values: typeof suggestionDecisions.$inferInsert): Promise<void> {
  await tx.insert(suggestionDecisions).values(values);
}
