import { writeAudit } from "@/db/queries/audit";
import { deleteWeight, putWeight } from "@/db/queries/weights";
import type { Tx } from "@/db/client";
import { MINOR_WORDS, isoFromDay } from "@/lib/engine";
import { AppError, notFound } from "@/lib/errors";
import type { TeamContext } from "@/lib/services/context";
import { athleteFor } from "./athlete-day";
import { dayParam } from "./date-param";

type OnDay = { params: Record<string, string> };

/** Days back for which a weight can still be added, changed or taken away. */
const BACK_DAYS = 7;

async function weighingFor(
  tx: Tx,
  ctx: TeamContext,
  { params }: OnDay,
): Promise<{ athleteId: string; day: string }> {
  const { athlete, today, minor } = await athleteFor(tx, ctx, params.id, "weight.write");
  const day = dayParam(params.date);
  if (minor) throw new AppError("conflict", MINOR_WORDS);
  if (day > today || day < today - BACK_DAYS)
    throw new AppError("conflict", `A weight is for today or one of the ${BACK_DAYS} days before.`);
  return { athleteId: athlete.id, day: isoFromDay(day) };
}

/** Keeps the weight of a day, kilograms, over an earlier one. Off under 18. */
export async function saveWeight(
  ctx: TeamContext,
  { params, body }: OnDay & { body: { kg: number } },
): Promise<{ kg: number }> {
  return ctx.db.transaction(async (tx) => {
    const on = await weighingFor(tx, ctx, { params });
    await putWeight(tx, ctx.teamId, { ...on, kg: body.kg }, ctx.now);
    // Who wrote it is of interest, the figure stands where only some may see it.
    await writeAudit(tx, ctx, "weight.save", on.athleteId, { day: on.day });
    return { kg: body.kg };
  });
}

/** Takes the weight of a day away. */
export async function dropWeight(ctx: TeamContext, { params }: OnDay): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    const { athleteId, day } = await weighingFor(tx, ctx, { params });
    if (!(await deleteWeight(tx, ctx.teamId, athleteId, day))) throw notFound();
    await writeAudit(tx, ctx, "weight.delete", athleteId, { day });
  });
}
