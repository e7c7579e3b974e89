import { eq } from "drizzle-orm";
import type { Tx } from "../client";
import { teams } from "../schema";

export async function findTeam(tx: Tx, teamId: string) {
  const [row] = await tx.select().from(teams).where(eq(teams.id, teamId));
  return row ?? null;
}

export async function insertTeam(tx: Tx, values: { name: string; timeZone: string }): Promise<string> {
  const [row] = await tx.insert(teams).values(values).returning({ id: teams.id });
  if (!row) throw new Error("Insert returned no row.");
  return row.id;
}

export async function updateTeam(
  tx: Tx,
  teamId: string,
  values: { name?: string; timeZone?: string; ruleOverrides?: Record<string, number> },
): Promise<void> {
  await tx.update(teams).set(values).where(eq(teams.id, teamId));
}
