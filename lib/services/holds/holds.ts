import { findAthlete } from "@/db/queries/athletes";
import { writeAudit } from "@/db/queries/audit";
import { insertHold, lockHold, markHoldLifted } from "@/db/queries/holds";
import { AppError, notFound } from "@/lib/errors";
import type { HoldForm } from "@/lib/schemas/athlete";
import { replanAthlete } from "@/lib/services/camps/replan";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";

type ById = { params: Record<string, string> };

/** What a hold did: its id and how many open camps were planned again. */
export interface HoldSaved {
  readonly id: string;
  readonly replanned: number;
}

/** Sets a hold on an athlete; nothing is planned on its days, and open camps are planned again in the same transaction. */
export async function setHold(
  ctx: TeamContext,
  { params, body }: ById & { body: HoldForm },
): Promise<HoldSaved> {
  return ctx.db.transaction(async (tx) => {
    const athlete = isId(params.id) ? await findAthlete(tx, ctx.teamId, params.id) : null;
    if (!athlete) throw notFound();
    const { from, to, reason } = body;
    const id = await insertHold(tx, ctx.teamId, {
      athleteId: athlete.id,
      fromDay: from,
      toDay: to,
      reason,
      setBy: ctx.userId,
      createdAt: ctx.now,
    });
    // The reason is a medical note: it stands with the hold and nowhere else.
    await writeAudit(tx, ctx, "hold.set", id, { athleteId: athlete.id, from, to });
    return { id, replanned: await replanAthlete(tx, ctx, athlete.id, "A hold was set") };
  });
}

/** Lifts a hold; open camps are planned again. */
export async function liftHold(ctx: TeamContext, { params }: ById): Promise<HoldSaved> {
  return ctx.db.transaction(async (tx) => {
    const hold = isId(params.id) ? await lockHold(tx, ctx.teamId, params.id) : null;
    if (!hold) throw notFound();
    if (hold.liftedAt !== null) throw new AppError("conflict", "This hold is lifted already.");
    await markHoldLifted(tx, ctx.teamId, hold.id, ctx.now);
    await writeAudit(tx, ctx, "hold.lift", hold.id, { athleteId: hold.athleteId });
    return { id: hold.id, replanned: await replanAthlete(tx, ctx, hold.athleteId, "A hold was lifted") };
  });
}
