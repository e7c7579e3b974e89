import { and, asc, count, eq } from "drizzle-orm";
import type { Tx } from "../client";
import { timetableEntries } from "../schema";

export type TimetableRow = typeof timetableEntries.$inferSelect;
type TimetableValues = Omit<TimetableRow, "id" | "teamId" | "series" | "idShift">;

const one = (teamId: string, id: string) =>
  and(eq(timetableEntries.teamId, teamId), eq(timetableEntries.id, id));

/** The gym's week, oldest start first. */
export async function listTimetable(tx: Tx, teamId: string): Promise<TimetableRow[]> {
  return tx
    .select()
    .from(timetableEntries)
    .where(eq(timetableEntries.teamId, teamId))
    .orderBy(asc(timetableEntries.start), asc(timetableEntries.id));
}

export async function countTimetable(tx: Tx, teamId: string): Promise<number> {
  const [row] = await tx
    .select({ n: count() })
    .from(timetableEntries)
    .where(eq(timetableEntries.teamId, teamId));
  return row?.n ?? 0;
}

export async function insertTimetableEntry(
  tx: Tx,
  teamId: string,
  id: string,
  values: TimetableValues,
): Promise<void> {
  await tx.insert(timetableEntries).values({ ...values, id, teamId, series: id });
}

/** False where the team has no such entry. */
export async function updateTimetableEntry(
  tx: Tx,
  teamId: string,
  id: string,
  values: TimetableValues,
): Promise<boolean> {
  const rows = await tx
    .update(timetableEntries)
    .set(values)
    .where(one(teamId, id))
    .returning({ id: timetableEntries.id });
  return rows.length > 0;
}

/** False where the team has no such entry. */
export async function deleteTimetableEntry(tx: Tx, teamId: string, id: string): Promise<boolean> {
  const rows = await tx
    .delete(timetableEntries)
    .where(one(teamId, id))
    .returning({ id: timetableEntries.id });
  return rows.length > 0;
}
