import { and, asc, eq, gte, lte, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { checkIns } from "../schema";

export type CheckInRow = typeof checkIns.$inferSelect;
type CheckInValues = Pick<CheckInRow, "sleep" | "fatigue" | "soreness" | "stress">;

/** An athlete's check-ins of the days `from` to `to`, both inclusive, oldest first. */
export async function listCheckIns(
  tx: Tx,
  teamId: string,
  athleteId: string,
  { from, to }: { from: string; to: string },
): Promise<CheckInRow[]> {
  return tx
    .select()
    .from(checkIns)
    .where(
      and(
        eq(checkIns.teamId, teamId),
        eq(checkIns.athleteId, athleteId),
        gte(checkIns.day, from),
        lte(checkIns.day, to),
      ),
    )
    .orderBy(asc(checkIns.day));
}

/** Writes the one check-in of a day over whatever it was. */
export async function putCheckIn(
  tx: Tx,
  teamId: string,
  key: { athleteId: string; day: string },
  { sleep, fatigue, soreness, stress }: CheckInValues,
  now: Date,
): Promise<void> {
  await tx
    .insert(checkIns)
    .values({ teamId, ...key, sleep, fatigue, soreness, stress, changedAt: now })
    .onConflictDoUpdate({
      target: [checkIns.athleteId, checkIns.day],
      set: { sleep, fatigue, soreness, stress, changedAt: now },
      setWhere: sql`${checkIns.teamId} = ${teamId}`,
    });
}
