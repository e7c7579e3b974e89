import { and, asc, eq, isNull } from "drizzle-orm";
import type { LiftEdit, Swap } from "../../lib/engine/prescription/types";
import type { Tx } from "../client";
import { bests, liftEdits, swaps, users } from "../schema";
import type { BestRow } from "./prescription";

/** Writes of people over prescriptions: edits, swaps and bests. Reading for a whole camp is in `prescription.ts`. */

interface LiftName {
  readonly teamId: string;
  readonly campId: string;
  readonly liftId: string;
}

const isEdit = ({ teamId, campId, liftId }: LiftName) =>
  and(eq(liftEdits.teamId, teamId), eq(liftEdits.campId, campId), eq(liftEdits.liftId, liftId));

/** What a coach wrote over one lift, with the name of who did. */
export async function findEdit(tx: Tx, name: LiftName) {
  const [row] = await tx
    .select({ edit: liftEdits.edit, changedAt: liftEdits.changedAt, by: users.name })
    .from(liftEdits)
    .leftJoin(users, eq(users.id, liftEdits.userId))
    .where(isEdit(name));
  return row ?? null;
}

export async function putEdit(
  tx: Tx,
  name: LiftName,
  values: { readonly edit: LiftEdit; readonly userId: string; readonly changedAt: Date },
): Promise<void> {
  await tx
    .insert(liftEdits)
    .values({ ...name, ...values })
    .onConflictDoUpdate({ target: [liftEdits.campId, liftEdits.liftId], set: values });
}

export async function removeEdit(tx: Tx, name: LiftName): Promise<void> {
  await tx.delete(liftEdits).where(isEdit(name));
}

interface CampName {
  readonly teamId: string;
  readonly campId: string;
}

/** A camp's swaps in the order in which they were made. */
export async function listSwaps(tx: Tx, { teamId, campId }: CampName): Promise<Swap[]> {
  return tx
    .select({ item: swaps.item, from: swaps.fromExercise, to: swaps.toExercise })
    .from(swaps)
    .where(and(eq(swaps.teamId, teamId), eq(swaps.campId, campId)))
    .orderBy(asc(swaps.createdAt), asc(swaps.item), asc(swaps.fromExercise));
}

export async function putSwap(
  tx: Tx,
  { teamId, campId }: CampName,
  { item, from, to }: Swap,
  by: { readonly userId: string; readonly at: Date },
): Promise<void> {
  const set = { toExercise: to, userId: by.userId, createdAt: by.at };
  await tx
    .insert(swaps)
    .values({ teamId, campId, item, fromExercise: from, ...set })
    .onConflictDoUpdate({ target: [swaps.campId, swaps.item, swaps.fromExercise], set });
}

/** True where there was such a swap. */
export async function removeSwap(
  tx: Tx,
  { teamId, campId }: CampName,
  { item, from }: Pick<Swap, "item" | "from">,
): Promise<boolean> {
  const rows = await tx
    .delete(swaps)
    .where(
      and(
        eq(swaps.teamId, teamId),
        eq(swaps.campId, campId),
        eq(swaps.item, item),
        eq(swaps.fromExercise, from),
      ),
    )
    .returning({ from: swaps.fromExercise });
  return rows.length > 0;
}

export async function insertBest(tx: Tx, values: typeof bests.$inferInsert): Promise<BestRow> {
  const [row] = await tx.insert(bests).values(values).returning();
  if (!row) throw new Error("Insert returned no row.");
  return row;
}

/** A best that was not removed; locked for the rest of the transaction. */
export async function lockBest(tx: Tx, teamId: string, bestId: string): Promise<BestRow | null> {
  const [row] = await tx
    .select()
    .from(bests)
    .where(and(eq(bests.teamId, teamId), eq(bests.id, bestId), isNull(bests.removedAt)))
    .for("update");
  return row ?? null;
}

/** Takes a best out of use; the row stays. */
export async function removeBest(tx: Tx, teamId: string, bestId: string, at: Date): Promise<void> {
  await tx
    .update(bests)
    .set({ removedAt: at })
    .where(and(eq(bests.teamId, teamId), eq(bests.id, bestId)));
}
