import { and, desc, eq, gte, isNull, lte, or } from "drizzle-orm";
import type { Tx } from "../client";
import { holds, users } from "../schema";

export type HoldRow = typeof holds.$inferSelect;

/** An athlete's holds, newest first, lifted ones included. */
export async function listHolds(tx: Tx, teamId: string, athleteId: string) {
  return tx
    .select({ hold: holds, setBy: users.name })
    .from(holds)
    .leftJoin(users, eq(users.id, holds.setBy))
    .where(and(eq(holds.teamId, teamId), eq(holds.athleteId, athleteId)))
    .orderBy(desc(holds.fromDay), desc(holds.createdAt), desc(holds.id));
}

/** Athletes of a team on whom a hold stands on `day`. */
export async function listHeldAthletes(tx: Tx, teamId: string, day: string): Promise<string[]> {
  const rows = await tx
    .selectDistinct({ athleteId: holds.athleteId })
    .from(holds)
    .where(
      and(
        eq(holds.teamId, teamId),
        isNull(holds.liftedAt),
        lte(holds.fromDay, day),
        or(isNull(holds.toDay), gte(holds.toDay, day)),
      ),
    );
  return rows.map((row) => row.athleteId);
}

export async function insertHold(
  tx: Tx,
  teamId: string,
  values: Pick<HoldRow, "athleteId" | "fromDay" | "toDay" | "reason" | "setBy" | "createdAt">,
): Promise<string> {
  const [row] = await tx
    .insert(holds)
    .values({ teamId, ...values })
    .returning({ id: holds.id });
  if (!row) throw new Error("Insert returned no row.");
  return row.id;
}

/** The hold, locked. */
export async function lockHold(tx: Tx, teamId: string, holdId: string): Promise<HoldRow | null> {
  const [row] = await tx
    .select()
    .from(holds)
    .where(and(eq(holds.teamId, teamId), eq(holds.id, holdId)))
    .for("update");
  return row ?? null;
}

export async function markHoldLifted(tx: Tx, teamId: string, holdId: string, now: Date): Promise<void> {
  await tx
    .update(holds)
    .set({ liftedAt: now })
    .where(and(eq(holds.teamId, teamId), eq(holds.id, holdId)));
}
