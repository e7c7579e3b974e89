import { isDeepStrictEqual } from "node:util";
import {
  findAthlete,
  insertAthlete,
  listAthletes,
  updateAthlete,
  type AthleteRow,
} from "@/db/queries/athletes";
import { writeAudit } from "@/db/queries/audit";
import { listLimitationHistory } from "@/db/queries/limitations";
import { listHeldAthletes, listHolds } from "@/db/queries/holds";
import { findTeam } from "@/db/queries/teams";
import { civilNow } from "@/lib/calendar/zones";
import { isoFromDay } from "@/lib/engine";
import { notFound } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { AthleteForm, AthleteSummary, AthleteView, HoldDetail } from "@/lib/schemas/athlete";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";
import { isMinor } from "./age";
import { noteLimitations } from "./limitations";

type ById = { params: Record<string, string> };

/** Today where the team is at home, YYYY-MM-DD. */
export async function todayOf(ctx: TeamContext): Promise<string> {
  const team = await findTeam(ctx.db, ctx.teamId);
  return isoFromDay(civilNow(team?.timeZone ?? "UTC", ctx.now).day);
}

const factsOf = ({ trainingAge, strikingBase, liftsPerWeek, freeHours }: AthleteRow) => ({
  trainingAge,
  strikingBase,
  liftsPerWeek,
  freeHours,
});

/** What exercises and loads are chosen by. */
const trainingOf = (row: AthleteRow) => ({
  secondBase: row.secondBase,
  secondShare: row.secondShare,
  limitations: row.limitations,
  limitationCodes: row.limitationCodes,
  equipment: row.equipment,
  plateUnit: row.plateUnit,
  plateStep: row.plateStep,
});

/** Athletes whose profile this member may see: the roster for staff, oneself for an athlete. */
export async function listRoster(ctx: TeamContext): Promise<{ athletes: AthleteSummary[] }> {
  const today = await todayOf(ctx);
  const [rows, held] = await Promise.all([
    listAthletes(ctx.db, ctx.teamId),
    listHeldAthletes(ctx.db, ctx.teamId, today),
  ]);
  const athletes = rows
    .filter((row) => can(ctx.member, "athletes.read", row.id))
    .map((row): AthleteSummary => ({
      id: row.id,
      name: row.name,
      sport: row.sport,
      facts: factsOf(row),
      minor: isMinor(row.dateOfBirth, today),
      onHold: held.includes(row.id),
    }));
  return { athletes };
}

async function holdsOf(ctx: TeamContext, athleteId: string): Promise<HoldDetail[]> {
  if (!can(ctx.member, "holds.read", athleteId)) return [];
  const reason = can(ctx.member, "holds.reason", athleteId);
  const rows = await listHolds(ctx.db, ctx.teamId, athleteId);
  return rows.map(({ hold, setBy }) => ({
    id: hold.id,
    from: hold.fromDay,
    to: hold.toDay,
    reason: reason ? hold.reason : null,
    setBy,
    createdAt: hold.createdAt.toISOString(),
    liftedAt: hold.liftedAt?.toISOString() ?? null,
  }));
}

/** A profile with its holds; their reasons only for whom they are meant. */
export async function readAthlete(ctx: TeamContext, { params }: ById): Promise<AthleteView> {
  const row = isId(params.id) ? await findAthlete(ctx.db, ctx.teamId, params.id) : null;
  if (!row || !can(ctx.member, "athletes.read", row.id)) throw notFound();
  const { id, name, sport, dateOfBirth } = row;
  const [today, holds, limitations] = await Promise.all([
    todayOf(ctx),
    holdsOf(ctx, id),
    listLimitationHistory(ctx.db, ctx.teamId, id),
  ]);
  return {
    ...{ id, name, sport, dateOfBirth },
    ...factsOf(row),
    ...trainingOf(row),
    minor: isMinor(dateOfBirth, today),
    holds,
    limitationHistory: limitations.map(({ since, ...then }) => ({ ...then, since: since.toISOString() })),
  };
}

export async function addAthlete(ctx: TeamContext, { body }: { body: AthleteForm }): Promise<{ id: string }> {
  return ctx.db.transaction(async (tx) => {
    const { id } = await insertAthlete(tx, ctx.teamId, body);
    await noteLimitations(tx, ctx, null, { ...body, id });
    await writeAudit(tx, ctx, "athlete.create", id);
    return { id };
  });
}

/** Changes a profile. Camps that run keep the facts they were planned with. */
export async function editAthlete(
  ctx: TeamContext,
  { params, body }: ById & { body: AthleteForm },
): Promise<AthleteView> {
  await ctx.db.transaction(async (tx) => {
    const row = isId(params.id) ? await findAthlete(tx, ctx.teamId, params.id) : null;
    if (!row) throw notFound();
    await updateAthlete(tx, ctx.teamId, row.id, body);
    await noteLimitations(tx, ctx, row, { ...body, id: row.id });
    const changed = Object.entries(body).filter(
      ([key, value]) => !isDeepStrictEqual(row[key as keyof AthleteForm], value),
    );
    await writeAudit(tx, ctx, "athlete.update", row.id, { fields: changed.map(([key]) => key) });
  });
  return readAthlete(ctx, { params });
}
