import { listCampsOf, listDayLoads } from "@/db/queries/athlete-record";
import { listCheckIns } from "@/db/queries/check-ins";
import { findUser } from "@/db/queries/users";
import { listWeights } from "@/db/queries/weights";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { can, type Action } from "@/lib/policy";
import type { AthleteRecord } from "@/lib/schemas/athlete-record";
import type { TeamContext } from "@/lib/services/context";
import { athleteFor } from "@/lib/services/today/athlete-day";
import { CHECK_IN_DAYS, checkInRecordOf } from "./check-in-record";
import { LOAD_DAYS, loadRecordOf } from "./load-record";
import { weightRecordOf, weightsShownFrom } from "./weight-record";

/** Weight, load, check-ins and camps of an athlete; what the reader may not see is not read. */
export async function readAthleteRecord(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<AthleteRecord> {
  const now = await athleteFor(ctx.db, ctx, params.id, "athletes.read");
  const { athlete, today } = now;
  const { db, teamId } = ctx;
  const sees = (action: Action): boolean => can(ctx.member, action, athlete.id);
  const last = (days: number) => ({ from: isoFromDay((today - days + 1) as Day), to: isoFromDay(today) });
  const shown = { from: isoFromDay(weightsShownFrom(now)), to: isoFromDay(today) };
  const [user, weights, loads, checkIns, camps] = await Promise.all([
    findUser(db, ctx.userId),
    !sees("weight.read") ? null : now.minor ? [] : listWeights(db, teamId, athlete.id, shown),
    sees("logs.read") ? listDayLoads(db, teamId, athlete.id, last(LOAD_DAYS)) : null,
    sees("checkins.read") ? listCheckIns(db, teamId, athlete.id, last(CHECK_IN_DAYS)) : null,
    sees("camps.read") ? listCampsOf(db, teamId, athlete.id) : null,
  ]);
  return {
    unit: user?.units ?? "kg",
    today: isoFromDay(today),
    weight: weights && weightRecordOf(now, weights),
    load: loads && loadRecordOf(loads, today),
    checkIns: checkIns && checkInRecordOf(checkIns, today),
    camps:
      camps &&
      camps.map(({ id, status, boutDate, place, opponent, weeks, result }) => ({
        id,
        on: status === "on",
        bout: boutDate,
        place,
        opponent,
        weeks,
        result: result?.result ?? null,
      })),
  };
}
