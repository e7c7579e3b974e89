import { and, asc, eq, inArray, isNull, sql } from "drizzle-orm";
import type { LiftEdit, Swap } from "../../lib/engine/prescription/types";
import type { Tx } from "../client";
import { bests, camps, liftEdits, swaps } from "../schema";

export type BestRow = typeof bests.$inferSelect;

/** An athlete's bests that were not removed, oldest first; of one lift and day the last counts. */
export async function listBests(tx: Tx, teamId: string, athleteId: string): Promise<BestRow[]> {
  return tx
    .select()
    .from(bests)
    .where(and(eq(bests.teamId, teamId), eq(bests.athleteId, athleteId), isNull(bests.removedAt)))
    .orderBy(asc(bests.day), asc(bests.createdAt), asc(bests.id));
}

/** What people wrote over the prescription of some camps: swaps, and edits by lift. One question for all of them. */
export async function listOverrides(
  tx: Tx,
  teamId: string,
  campIds: readonly string[],
): Promise<{ campId: string; swaps: Swap[]; edits: Record<string, LiftEdit> }[]> {
  if (campIds.length === 0) return [];
  return tx
    .select({
      campId: camps.id,
      // Columns are written out: inside a select of one table drizzle leaves the table's name away.
      swaps: sql<Swap[]>`coalesce((select jsonb_agg(
        jsonb_build_object('item', s.item, 'from', s.from_exercise, 'to', s.to_exercise) order by s.created_at, s.item, s.from_exercise)
        from ${swaps} s where s.team_id = "camps"."team_id" and s.camp_id = "camps"."id"), '[]')`,
      edits: sql<Record<string, LiftEdit>>`coalesce((select jsonb_object_agg(e.lift_id, e.edit)
        from ${liftEdits} e where e.team_id = "camps"."team_id" and e.camp_id = "camps"."id"), '{}')`,
    })
    .from(camps)
    .where(and(eq(camps.teamId, teamId), inArray(camps.id, [...campIds])));
}
