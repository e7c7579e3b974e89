import { isDeepStrictEqual } from "node:util";
import { sql } from "drizzle-orm";
import type { Tx } from "../client";
import type { PlannedSession } from "../mappers/sessions";
import { sessions } from "../schema";

type SessionRow = typeof sessions.$inferSelect;

const movedInTime = (row: SessionRow, planned: PlannedSession): boolean =>
  row.startsAt.getTime() !== planned.startsAt.getTime() || row.endsAt.getTime() !== planned.endsAt.getTime();

const contentOf = ({
  title,
  place,
  kind,
  day,
  start,
  effort,
  pinned,
  lift,
}: PlannedSession | SessionRow) => ({
  title,
  place,
  kind,
  day,
  start,
  effort,
  pinned,
  lift: lift && { ...lift, past: false },
});

/**
 * Rows to write so that the table holds the plan: new ones, changed ones with their sequence raised where the time
 * changed, and those that left the plan as cancelled. What is past at `now` is not touched.
 */
export function sessionWrites(
  scope: { teamId: string; campId: string },
  existing: readonly SessionRow[],
  planned: readonly PlannedSession[],
  now: Date,
): (typeof sessions.$inferInsert)[] {
  const known = new Map(existing.map((row) => [row.id, row]));
  const wanted = new Set(planned.map((session) => session.id));
  const writes: (typeof sessions.$inferInsert)[] = [];
  for (const session of planned) {
    const row = known.get(session.id);
    if (!row) {
      writes.push({ ...scope, ...session, changedAt: now });
    } else if (row.startsAt > now || session.startsAt > now) {
      const revived = row.status === "cancelled";
      const moved = revived || movedInTime(row, session);
      if (moved || !isDeepStrictEqual(contentOf(row), contentOf(session))) {
        writes.push({
          ...scope,
          ...session,
          uid: row.uid,
          status: "confirmed",
          sequence: row.sequence + (moved ? 1 : 0),
          changedAt: now,
        });
      }
    }
  }
  for (const row of existing) {
    if (wanted.has(row.id) || row.status === "cancelled" || row.startsAt <= now) continue;
    writes.push({ ...row, status: "cancelled", sequence: row.sequence + 1, changedAt: now });
  }
  return writes;
}

export async function writeSessions(
  tx: Tx,
  writes: readonly (typeof sessions.$inferInsert)[],
): Promise<void> {
  if (writes.length === 0) return;
  await tx
    .insert(sessions)
    .values([...writes])
    .onConflictDoUpdate({
      target: [sessions.campId, sessions.id],
      set: {
        source: sql`excluded.source`,
        kind: sql`excluded.kind`,
        title: sql`excluded.title`,
        place: sql`excluded.place`,
        day: sql`excluded.day`,
        start: sql`excluded.start`,
        minutes: sql`excluded.minutes`,
        startsAt: sql`excluded.starts_at`,
        endsAt: sql`excluded.ends_at`,
        effort: sql`excluded.effort`,
        pinned: sql`excluded.pinned`,
        lift: sql`excluded.lift`,
        status: sql`excluded.status`,
        sequence: sql`excluded.sequence`,
        changedAt: sql`excluded.changed_at`,
      },
    });
}
