import type { BoardRequestRow } from "@/db/queries/board";
import type { WaitingRequest } from "@/lib/schemas/board";

/** A request that waits for an answer, with the session that it is about. */
export const waitingRequest = (row: BoardRequestRow): WaitingRequest => ({
  id: row.id,
  campId: row.campId,
  sessionId: row.sessionId,
  source: row.source,
  title: row.title,
  date: row.day,
  start: row.start,
  reason: row.reason,
});
