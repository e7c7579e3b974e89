import { insertHold, listHolds } from "@/db/queries/holds";
import { writeAudit } from "@/db/queries/audit";
import { setResult } from "@/db/queries/report";
import type { Tx } from "@/db/client";
import { civilNow } from "@/lib/calendar/zones";
import { isoFromDay } from "@/lib/engine";
import { AppError } from "@/lib/errors";
import type { ReportView, ResultForm } from "@/lib/schemas/report";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import { replanAthlete } from "@/lib/services/camps/replan";
import type { TeamContext } from "@/lib/services/context";
import { boutIsOver, readReport } from "./read-report";
import { standDownOf } from "./stand-down";

/** An ordered stand-down is a hold: nothing is planned on its days, and only a medic lifts it early. */
async function holdFor(tx: Tx, ctx: TeamContext, camp: LoadedCamp, days: number): Promise<void> {
  const { from, to } = standDownOf(camp.book.bout.date, days);
  const standing = (await listHolds(tx, ctx.teamId, camp.athlete.id)).some(
    ({ hold }) => hold.liftedAt === null && hold.fromDay <= from && (hold.toDay === null || hold.toDay >= to),
  );
  if (standing) return;
  const id = await insertHold(tx, ctx.teamId, {
    athleteId: camp.athlete.id,
    fromDay: from,
    toDay: to,
    reason: `Stand-down of ${days} days ordered after the bout on ${camp.book.bout.date}.`,
    setBy: ctx.userId,
    createdAt: ctx.now,
  });
  await writeAudit(tx, ctx, "hold.set", id, { athleteId: camp.athlete.id, from, to });
  await replanAthlete(tx, ctx, camp.athlete.id, "A stand-down after a bout");
}

/**
 * Records how the bout ended, or takes that back. Throws `conflict` before the bout. A hold that an earlier record set stays: the
 * medic lifts it.
 */
export async function recordResult(
  ctx: TeamContext,
  { params, body }: { params: Record<string, string>; body: ResultForm },
): Promise<ReportView> {
  await ctx.db.transaction(async (tx) => {
    const camp = await loadCamp(tx, ctx, params.id ?? "", { lock: true });
    const { result } = body;
    if (result && !boutIsOver(camp, ctx.now)) throw new AppError("conflict", "The bout has not been yet.");
    const recordedOn = isoFromDay(civilNow(camp.book.homeZone, ctx.now).day);
    await setResult(tx, ctx.teamId, camp.row.id, result && { ...result, recordedOn });
    await writeAudit(tx, ctx, "bout.result", camp.row.id, { result: result?.result ?? null });
    const days = result?.standDownDays ?? 0;
    if (days > 0) await holdFor(tx, ctx, camp, days);
  });
  return readReport(ctx, { params });
}
