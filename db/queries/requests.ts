import { and, desc, eq, inArray } from "drizzle-orm";
import type { Tx } from "../client";
import { requests } from "../schema";

export type RequestRow = typeof requests.$inferSelect;

/** Requests of some camps, newest first: the first of a session is the one that counts. */
export async function listRequestsOfCamps(
  tx: Tx,
  teamId: string,
  campIds: readonly string[],
): Promise<RequestRow[]> {
  if (campIds.length === 0) return [];
  return tx
    .select()
    .from(requests)
    .where(and(eq(requests.teamId, teamId), inArray(requests.campId, [...campIds])))
    .orderBy(desc(requests.createdAt), desc(requests.id));
}

/** The request, locked. */
export async function lockRequest(tx: Tx, teamId: string, requestId: string): Promise<RequestRow | null> {
  const [row] = await tx
    .select()
    .from(requests)
    .where(and(eq(requests.teamId, teamId), eq(requests.id, requestId)))
    .for("update");
  return row ?? null;
}

/** Null where the id is taken: a retry, or someone else's. */
export async function insertRequest(
  tx: Tx,
  teamId: string,
  values: Pick<RequestRow, "id" | "campId" | "athleteId" | "sessionId" | "reason" | "createdAt">,
): Promise<RequestRow | null> {
  const [row] = await tx
    .insert(requests)
    .values({ teamId, ...values })
    .onConflictDoNothing()
    .returning();
  return row ?? null;
}

export async function updateRequest(
  tx: Tx,
  teamId: string,
  requestId: string,
  values: Pick<RequestRow, "state"> & Partial<Pick<RequestRow, "answer" | "answeredBy" | "answeredAt">>,
): Promise<RequestRow> {
  const [row] = await tx
    .update(requests)
    .set(values)
    .where(and(eq(requests.teamId, teamId), eq(requests.id, requestId)))
    .returning();
  if (!row) throw new Error("Update of a request that is not there.");
  return row;
}
