import { and, asc, eq } from "drizzle-orm";
import type { Tx } from "../client";
import { athletes } from "../schema";

export type AthleteRow = typeof athletes.$inferSelect;
type AthleteValues = Omit<typeof athletes.$inferInsert, "id" | "teamId" | "createdAt">;

export async function findAthlete(tx: Tx, teamId: string, athleteId: string): Promise<AthleteRow | null> {
  const [row] = await tx
    .select()
    .from(athletes)
    .where(and(eq(athletes.teamId, teamId), eq(athletes.id, athleteId)));
  return row ?? null;
}

export async function listAthletes(tx: Tx, teamId: string): Promise<AthleteRow[]> {
  return tx
    .select()
    .from(athletes)
    .where(eq(athletes.teamId, teamId))
    .orderBy(asc(athletes.name), asc(athletes.id));
}

export async function insertAthlete(tx: Tx, teamId: string, values: AthleteValues): Promise<AthleteRow> {
  const [row] = await tx
    .insert(athletes)
    .values({ teamId, ...values })
    .returning();
  if (!row) throw new Error("Insert returned no row.");
  return row;
}

export async function updateAthlete(
  tx: Tx,
  teamId: string,
  athleteId: string,
  values: Partial<AthleteValues>,
): Promise<void> {
  await tx
    .update(athletes)
    .set(values)
    .where(and(eq(athletes.teamId, teamId), eq(athletes.id, athleteId)));
}
