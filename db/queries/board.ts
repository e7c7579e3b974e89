import { and, asc, eq, gte, inArray, isNull, lte, or, sql } from "drizzle-orm";
import type { PhaseSpan } from "../../lib/engine/types";
import type { Tx } from "../client";
import { athletes, camps, checkIns, holds, requests, sessionLogs, sessions, teams, users, weights } from "../schema";

/*
 * What a whole team logged, a row per camp or athlete: lists come as JSON that PostgreSQL builds, since thousands of rows of a
 * driver cost more than the query. Days are civil, counted from 1970-01-01 as the engine does.
 */

const dayNumber = (column: unknown) => sql`(${column} - date '1970-01-01')`;

/** Zone and own house rules of the team, and the unit that the reader chose. */
export async function findBoardFrame(tx: Tx, teamId: string, userId: string) {
  const [row] = await tx
    .select({ zone: teams.timeZone, rules: teams.ruleOverrides, unit: users.units })
    .from(teams)
    .innerJoin(users, eq(users.id, userId))
    .where(eq(teams.id, teamId));
  return row ?? null;
}
export type BoardFrame = NonNullable<Awaited<ReturnType<typeof findBoardFrame>>>;

/** What of a plan's summary an answer is held against. */
interface PlanParts {
  readonly phases: readonly PhaseSpan[];
  readonly caps: readonly (readonly [from: number, to: number, cap: number | null])[];
  /** Of each lift without a place, the rule that shut most of its candidates. */
  readonly unplaced: readonly (string | null)[];
  /** Of each rule that is broken, what is said of it. */
  readonly violations: readonly string[];
}

const SUMMARY = sql`json_build_object(
  'phases', p.phases,
  'caps', (select json_agg(json_build_array(w.value->'from', w.value->'to', w.value->'loadCap')) from jsonb_array_elements(p.weeks) w),
  'unplaced', (select coalesce(json_agg(u.value->'rules'->0->'rule'), '[]'::json) from jsonb_array_elements(p.unplaced) u),
  'violations', (select coalesce(json_agg(v.value->'text'), '[]'::json) from jsonb_array_elements(p.violations) v))`;

/**
 * Camps that are on, with a bout on or after `boutsFrom`, nearest first; of one camp where `campId` is given, whatever its bout.
 * The plan's summary is taken apart once, in the database: most of it is curves that nobody asked for.
 */
export async function listBoardCamps(
  tx: Tx,
  teamId: string,
  { boutsFrom, campId }: { readonly boutsFrom: string; readonly campId?: string },
) {
  return tx
    .select({
      id: camps.id,
      athleteId: camps.athleteId,
      athleteName: athletes.name,
      dateOfBirth: athletes.dateOfBirth,
      homeZone: camps.homeZone,
      boutDate: camps.boutDate,
      boutZone: camps.boutZone,
      place: camps.place,
      opponent: camps.opponent,
      limitKg: camps.limitKg,
      weighInDate: camps.weighInDate,
      weighInTime: camps.weighInTime,
      weeks: camps.weeks,
      coachFactors: camps.coachFactors,
      responses: camps.responses,
      revision: camps.revision,
      plan: sql<PlanParts>`(select ${SUMMARY} from jsonb_to_record(${camps.summary})
        as p(phases jsonb, weeks jsonb, unplaced jsonb, violations jsonb))`,
      // Only a camp that travels to another zone needs to know when.
      lastTravel: sql<string | null>`case when "camps"."bout_zone" <> "camps"."home_zone" then
        (select max(s.day)::text from ${sessions} s where s.team_id = "camps"."team_id" and s.camp_id = "camps"."id"
          and s.kind = 'travel' and s.status = 'confirmed' and s.day < "camps"."bout_date") end`,
    })
    .from(camps)
    .innerJoin(athletes, and(eq(athletes.id, camps.athleteId), eq(athletes.teamId, camps.teamId)))
    .where(
      and(
        eq(camps.teamId, teamId),
        eq(camps.status, "on"),
        campId === undefined ? gte(camps.boutDate, boutsFrom) : eq(camps.id, campId),
      ),
    )
    .orderBy(asc(camps.boutDate), asc(athletes.name), asc(camps.id));
}
export type BoardCampRow = Awaited<ReturnType<typeof listBoardCamps>>[number];

/** One session with its log; the last six are null where nothing was logged, or where logs were not asked for. */
export type BoardSession = readonly [
  day: number,
  id: string,
  start: string,
  source: "lift" | "sport" | "bout" | "weigh-in",
  kind: string,
  title: string,
  minutes: number,
  effort: number,
  /** Minutes since 1970-01-01T00:00Z. */
  startsAt: number,
  state: "open" | "done" | "missed" | null,
  felt: number | null,
  took: number | null,
  pain: number | null,
  painPlace: string | null,
  knock: boolean | null,
];

const ofSession = and(
  eq(sessionLogs.teamId, sessions.teamId),
  eq(sessionLogs.campId, sessions.campId),
  eq(sessionLogs.sessionId, sessions.id),
);

const PLANNED = sql`${dayNumber(sessions.day)}, ${sessions.id}, ${sessions.start}, ${sessions.source}, ${sessions.kind},
  ${sessions.title}, ${sessions.minutes}, ${sessions.effort}, (extract(epoch from ${sessions.startsAt}) / 60)::int`;

/** Sessions of some camps on the days `from` to `to`, both inclusive: as planned, and those that left the plan and were logged. */
export async function listBoardSessions(
  tx: Tx,
  teamId: string,
  campIds: readonly string[],
  { from, to, logs }: { readonly from: string; readonly to: string; readonly logs: boolean },
): Promise<{ campId: string; sessions: readonly BoardSession[] }[]> {
  if (campIds.length === 0) return [];
  const inWindow = and(
    eq(sessions.teamId, teamId),
    inArray(sessions.campId, [...campIds]),
    gte(sessions.day, from),
    lte(sessions.day, to),
  );
  const order = sql`order by ${sessions.startsAt}, ${sessions.id}`;
  if (!logs)
    return tx
      .select({
        campId: sessions.campId,
        sessions: sql<
          BoardSession[]
        >`json_agg(json_build_array(${PLANNED}, null, null, null, null, null, null) ${order})`,
      })
      .from(sessions)
      .where(and(inWindow, eq(sessions.status, "confirmed")))
      .groupBy(sessions.campId);
  return tx
    .select({
      campId: sessions.campId,
      sessions: sql<BoardSession[]>`json_agg(json_build_array(${PLANNED}, ${sessionLogs.state}, ${sessionLogs.effort},
        ${sessionLogs.minutes}, ${sessionLogs.pain}, ${sessionLogs.painPlace}, ${sessionLogs.knock}) ${order})`,
    })
    .from(sessions)
    .leftJoin(sessionLogs, ofSession)
    .where(and(inWindow, or(eq(sessions.status, "confirmed"), sql`${sessionLogs.state} is not null`)))
    .groupBy(sessions.campId);
}

/** Check-ins of some athletes on the days `from` to `to`, both inclusive: day, sleep, fatigue, soreness, stress. */
export async function listBoardCheckIns(
  tx: Tx,
  teamId: string,
  athleteIds: readonly string[],
  { from, to }: { readonly from: string; readonly to: string },
) {
  if (athleteIds.length === 0) return [];
  return tx
    .select({
      athleteId: checkIns.athleteId,
      days: sql<
        [day: number, sleep: number, fatigue: number, soreness: number, stress: number][]
      >`json_agg(json_build_array(${dayNumber(checkIns.day)}, ${checkIns.sleep}, ${checkIns.fatigue}, ${checkIns.soreness}, ${checkIns.stress}))`,
    })
    .from(checkIns)
    .where(
      and(
        eq(checkIns.teamId, teamId),
        inArray(checkIns.athleteId, [...athleteIds]),
        gte(checkIns.day, from),
        lte(checkIns.day, to),
      ),
    )
    .groupBy(checkIns.athleteId);
}

/** Day and kilograms. */
export type BoardWeight = readonly [day: number, kg: number];

/**
 * Weights of the athletes of some camps on the days `from` to `to`, both inclusive, and the first one from the day on that each
 * camp's line may start on: what lies between says nothing of now.
 */
export async function listBoardWeights(
  tx: Tx,
  teamId: string,
  asked: readonly { readonly campId: string; readonly athleteId: string; readonly start: string }[],
  { from, to }: { readonly from: string; readonly to: string },
): Promise<{ campId: string; first: BoardWeight | null; recent: readonly BoardWeight[] | null }[]> {
  if (asked.length === 0) return [];
  const weight = sql`json_build_array(${dayNumber(sql`w.day`)}, w.kg)`;
  const own = sql`from ${weights} w where w.team_id = ${teamId} and w.athlete_id = a."athleteId"`;
  const rows = await tx.execute<{ campId: string; first: BoardWeight | null; recent: BoardWeight[] | null }>(
    sql`select a."campId",
      (select ${weight} ${own} and w.day between a.start and ${to}::date order by w.day limit 1) as first,
      (select json_agg(${weight}) ${own} and w.day between ${from}::date and ${to}::date) as recent
    from json_to_recordset(${JSON.stringify(asked)}::json) as a("campId" uuid, "athleteId" uuid, start date)`,
  );
  return [...rows];
}

/** Holds of a team that are not lifted and not over on `day`. */
export async function listStandingHolds(tx: Tx, teamId: string, day: string) {
  return tx
    .select({ athleteId: holds.athleteId, from: holds.fromDay, to: holds.toDay })
    .from(holds)
    .where(
      and(eq(holds.teamId, teamId), isNull(holds.liftedAt), or(isNull(holds.toDay), gte(holds.toDay, day))),
    )
    .orderBy(asc(holds.fromDay));
}

/** Requests that wait for an answer, and accepted ones of sessions on or after `from`, with their session; oldest first. */
export async function listBoardRequests(
  tx: Tx,
  teamId: string,
  campIds: readonly string[],
  { from }: { readonly from: string },
) {
  if (campIds.length === 0) return [];
  return tx
    .select({
      id: requests.id,
      campId: requests.campId,
      sessionId: requests.sessionId,
      reason: requests.reason,
      state: requests.state,
      title: sessions.title,
      day: sessions.day,
      start: sessions.start,
      source: sessions.source,
    })
    .from(requests)
    .innerJoin(
      sessions,
      and(
        eq(sessions.teamId, requests.teamId),
        eq(sessions.campId, requests.campId),
        eq(sessions.id, requests.sessionId),
      ),
    )
    .where(
      and(
        eq(requests.teamId, teamId),
        inArray(requests.campId, [...campIds]),
        or(eq(requests.state, "asked"), and(eq(requests.state, "accepted"), gte(sessions.day, from))),
      ),
    )
    .orderBy(asc(requests.createdAt), asc(requests.id));
}
export type BoardRequestRow = Awaited<ReturnType<typeof listBoardRequests>>[number];
