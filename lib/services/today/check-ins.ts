import { putCheckIn } from "@/db/queries/check-ins";
import { isoFromDay } from "@/lib/engine";
import { AppError } from "@/lib/errors";
import type { CheckIn } from "@/lib/schemas/today";
import type { TeamContext } from "@/lib/services/context";
import { athleteFor } from "./athlete-day";
import { dayParam } from "./date-param";

/** Keeps the athlete's check-in of today, over an earlier one. It can be changed that day and not after. */
export async function saveCheckIn(
  ctx: TeamContext,
  { params, body }: { params: Record<string, string>; body: CheckIn },
): Promise<CheckIn> {
  return ctx.db.transaction(async (tx) => {
    const { athlete, today } = await athleteFor(tx, ctx, params.id, "checkins.write");
    const day = dayParam(params.date);
    if (day !== today)
      throw new AppError("conflict", "A check-in is for the day itself, and can be changed on that day.");
    await putCheckIn(tx, ctx.teamId, { athleteId: athlete.id, day: isoFromDay(day) }, body, ctx.now);
    return body;
  });
}
