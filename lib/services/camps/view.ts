import { listMembersToTell } from "@/db/queries/members-to-tell";
import type { Tx } from "@/db/client";
import { findAthlete } from "@/db/queries/athletes";
import { listWeights } from "@/db/queries/weights";
import { campSpan, planInputOf } from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import { instantAt, isoFromDay } from "@/lib/engine";
import type { Au, Plan } from "@/lib/engine/types";
import { POLICY, can, type Action, type Role } from "@/lib/policy";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { CampView } from "@/lib/schemas/camp";
import { isMinor } from "@/lib/services/athletes/age";
import type { TeamContext } from "@/lib/services/context";
import type { LoadedCamp } from "./load";

const ACTIONS = Object.keys(POLICY) as Action[];

/** Others whom a save of this camp may concern: athletes and guests only where the camp is theirs. */
export async function othersOf(
  tx: Tx,
  ctx: TeamContext,
  athleteId: string,
): Promise<{ userId: string; role: Role }[]> {
  const members = await listMembersToTell(tx, ctx.teamId, ctx.userId);
  return members.filter(
    ({ role, athleteId: tied }) => (role !== "athlete" && role !== "guest") || tied === athleteId,
  );
}

/** Dates without numbers: what a guest gets. */
function withoutLiftingDetail(plan: Plan): Plan {
  const none = 0 as Au;
  return {
    ...plan,
    lifts: plan.lifts.map((lift) => ({
      ...lift,
      sets: 0,
      baseSets: 0,
      floorSets: 0,
      effort: 0,
      factors: [],
      reasons: [],
    })),
    weeks: plan.weeks.map((week) => ({
      ...week,
      sets: 0,
      sportLoad: none,
      liftingLoad: none,
      monotony: null,
      strain: null,
      loadCap: null,
    })),
    days: plan.days.map((day) => ({ ...day, sets: 0, sport: none, lifting: none })),
    unplaced: [],
    violations: [],
    form: { ...plan.form, values: [] },
  };
}

const withoutDecisions = (book: CampBook): CampBook => ({
  ...book,
  bout: { ...book.bout, limitKg: null },
  pins: [],
  coachFactors: {},
  responses: [],
  holds: [],
  rules: {},
  athlete: { ...book.athlete, freeHours: [] },
  sport: book.sport.map((entry) => ({ ...entry, effort: 0 })),
});

/** Why a suggestion was made is told by check-ins and logs: kept from those who may not read them. */
const withoutReasons = (book: CampBook): CampBook => ({
  ...book,
  responses: book.responses.map((response) => ({ ...response, because: "" })),
});

function bookFor({ member }: TeamContext, { book, athlete }: LoadedCamp): CampBook {
  if (!can(member, "lifts.detail", athlete.id)) return withoutDecisions(book);
  return can(member, "checkins.read", athlete.id) ? book : withoutReasons(book);
}

/** Weights on the camp's days, for who may see them; none of a minor. */
async function weightsOf(tx: Tx, ctx: TeamContext, { athlete, book }: LoadedCamp) {
  if (!can(ctx.member, "weight.read", athlete.id)) return [];
  const span = campSpan(book);
  const days = { from: isoFromDay(span.from), to: isoFromDay(span.to) };
  const [person, rows] = await Promise.all([
    findAthlete(tx, ctx.teamId, athlete.id),
    listWeights(tx, ctx.teamId, athlete.id, days),
  ]);
  if (isMinor(person?.dateOfBirth ?? null, ctx.now.toISOString().slice(0, 10))) return [];
  return rows.map(({ day, kg }) => ({ date: day, kg }));
}

/** `known`: the others, where the caller has asked for them already. */
export async function viewOf(
  tx: Tx,
  ctx: TeamContext,
  camp: LoadedCamp,
  known?: Awaited<ReturnType<typeof othersOf>>,
): Promise<CampView> {
  const { athlete, row } = camp;
  const detail = can(ctx.member, "lifts.detail", athlete.id);
  const others = known ?? (await othersOf(tx, ctx, athlete.id));
  const now = instantOf(ctx.now);
  const input = planInputOf(camp.book, now);
  const sport = input.sport.filter(
    (session) => camp.book.status === "on" || instantAt(input.zone, session.day, session.start) <= now,
  );
  return {
    id: row.id,
    revision: row.revision,
    changedAt: row.changedAt.toISOString(),
    athlete,
    book: bookFor(ctx, camp),
    plan: detail ? camp.plan : withoutLiftingDetail(camp.plan),
    sport: detail ? sport : sport.map((session) => ({ ...session, effort: 0 })),
    weights: await weightsOf(tx, ctx, camp),
    may: ACTIONS.filter((action) => can(ctx.member, action, athlete.id)),
    others: others.map(({ role }) => role),
  };
}
