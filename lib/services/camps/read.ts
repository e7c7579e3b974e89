import { listCamps, listRevisions } from "@/db/queries/camps";
import { civilNow } from "@/lib/calendar/zones";
import { isoFromDay } from "@/lib/engine";
import { isStaff } from "@/lib/policy";
import type { CampSummary, CampView, ChangeView } from "@/lib/schemas/camp";
import type { TeamContext } from "@/lib/services/context";
import { loadCamp } from "./load";
import { viewOf } from "./view";

const DAY_MS = 86_400_000;
/** Days ahead that the board shows. */
const BOARD_DAYS = 14;

export async function readCamp(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<CampView> {
  return viewOf(ctx.db, ctx, await loadCamp(ctx.db, ctx, params.id ?? ""));
}

/** Camps that this member may see: staff see the team's, athletes and guests their own. */
export async function listCampSummaries(ctx: TeamContext): Promise<{ camps: CampSummary[] }> {
  const own = isStaff(ctx.member.role) ? undefined : (ctx.member.athleteId ?? undefined);
  if (!isStaff(ctx.member.role) && own === undefined) return { camps: [] };
  const { rows, next, held } = await listCamps(ctx.db, ctx.teamId, {
    from: ctx.now,
    to: new Date(ctx.now.getTime() + BOARD_DAYS * DAY_MS),
    ...(own !== undefined && { athleteId: own }),
  });
  const camps = rows.map(({ camp, athleteName }): CampSummary => {
    const today = isoFromDay(civilNow(camp.homeZone, ctx.now).day);
    return {
      id: camp.id,
      athlete: { id: camp.athleteId, name: athleteName },
      status: camp.status,
      bout: {
        date: camp.boutDate,
        time: camp.boutTime,
        timeZone: camp.boutZone,
        place: camp.place,
        opponent: camp.opponent,
        ruleset: camp.ruleset,
        rounds: camp.rounds,
        roundMinutes: camp.roundMinutes,
        limitKg: camp.limitKg,
      },
      weeks: camp.weeks,
      phases: camp.summary.phases,
      onHold: held.some(
        (hold) =>
          hold.athleteId === camp.athleteId &&
          hold.fromDay <= today &&
          (hold.toDay === null || hold.toDay >= today),
      ),
      unplaced: camp.summary.unplaced.length,
      violations: camp.summary.violations.length,
      next: next
        .filter((session) => session.campId === camp.id)
        .map(({ id, day, start, source, kind, title }) => ({ id, date: day, start, source, kind, title })),
    };
  });
  return { camps };
}

export async function listChanges(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<{ changes: ChangeView[] }> {
  const camp = await loadCamp(ctx.db, ctx, params.id ?? "");
  const rows = await listRevisions(ctx.db, ctx.teamId, camp.row.id);
  const putBack = new Map(
    rows.flatMap((row) => (row.putBackOf === null ? [] : [[row.putBackOf, row.number] as const])),
  );
  return {
    changes: rows.map((row) => ({
      number: row.number,
      by: row.by ?? "Someone who left the team",
      at: row.at.toISOString(),
      summary: row.summary,
      kind: row.change?.kind ?? null,
      knockOn: row.knockOn,
      putBackOf: row.putBackOf,
      putBackBy: putBack.get(row.number) ?? null,
      canPutBack: row.change !== null && row.inverse !== null && !putBack.has(row.number),
    })),
  };
}
