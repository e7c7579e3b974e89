import { and, asc, eq, gte, inArray, isNull, lte, or, sql } from "drizzle-orm";
import type { PhaseSpan } from "../../lib/engine/types";
import type { Tx } from "../client";
import {
  athletes,
  camps,
  checkIns,
  holds,
  requests,
  sessionLogs,
  sessions,
  suggestionDecisions,
  teams,
  users,
  weights,
} from "../schema";

/*
 * What a whole team logged, a row per camp or athlete. Lists come as one JSON array a column, which PostgreSQL builds and the driver
 * parses at once: a row of a driver for each session of two hundred camps costs more than the query. Days are civil, counted
 * from 1970-01-01 as the engine does.
 */

const dayNumber = (column: unknown) => sql`(${column} - date '1970-01-01')`;
const list = (column: unknown) => sql`json_agg(${column})`;

/** Camps that are on: of a team those with a bout on or after `boutsFrom`, or the one named whatever its bout. */
export type BoardScope = { readonly boutsFrom: string } | { readonly campId: string };

/** Inclusive. */
interface Days {
  readonly from: string;
  readonly to: string;
}

const inScope = (teamId: string, scope: BoardScope) =>
  and(
    eq(camps.teamId, teamId),
    eq(camps.status, "on"),
    "campId" in scope ? eq(camps.id, scope.campId) : gte(camps.boutDate, scope.boutsFrom),
  );

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
 * The camps of a scope, nearest bout first. The plan's summary is taken apart in the database: most of it is curves that nobody
 * asked for.
 */
export async function listBoardCamps(tx: Tx, teamId: string, scope: BoardScope) {
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
    .where(inScope(teamId, scope))
    .orderBy(asc(camps.boutDate), asc(athletes.name), asc(camps.id));
}
export type BoardCampRow = Awaited<ReturnType<typeof listBoardCamps>>[number];

const planned = {
  day: sql<number[]>`${list(dayNumber(sessions.day))}`,
  id: sql<string[]>`${list(sessions.id)}`,
  start: sql<string[]>`${list(sessions.start)}`,
  source: sql<("lift" | "sport" | "bout" | "weigh-in")[]>`${list(sessions.source)}`,
  kind: sql<string[]>`${list(sessions.kind)}`,
  title: sql<string[]>`${list(sessions.title)}`,
  minutes: sql<number[]>`${list(sessions.minutes)}`,
  effort: sql<number[]>`${list(sessions.effort)}`,
  /** Minutes since 1970-01-01T00:00Z. */
  startsAt: sql<number[]>`${list(sql`(extract(epoch from ${sessions.startsAt}) / 60)::int`)}`,
};

/** Null where nothing was logged. `l` is `logsOf`. */
const logged = {
  state: sql<("open" | "done" | "missed" | null)[]>`${list(sql`l.state`)}`,
  felt: sql<(number | null)[]>`${list(sql`l.effort`)}`,
  took: sql<(number | null)[]>`${list(sql`l.minutes`)}`,
  pain: sql<(number | null)[]>`${list(sql`l.pain`)}`,
  painPlace: sql<(string | null)[]>`${list(sql`l.pain_place`)}`,
  knock: sql<(boolean | null)[]>`${list(sql`l.knock`)}`,
};

/**
 * Logs of the window. A log lies on the day of its session, so the seasons before stay out of the join. `offset 0` keeps the planner
 * from looking each session's log up by itself, thousands of times: it reads the window once and joins by hash.
 */
const logsOf = (teamId: string, { from, to }: Days) => sql`(
  select camp_id, session_id, state, effort, minutes, pain, pain_place, knock from ${sessionLogs}
  where team_id = ${teamId} and day between ${from} and ${to} offset 0) as l`;

/** The same days by the clock, with room for every zone: the team's index is by time. */
const around = ({ from, to }: Days) =>
  and(
    sql`${sessions.startsAt} >= ${from}::date - 1`,
    sql`${sessions.startsAt} < ${to}::date + 2`,
    gte(sessions.day, from),
    lte(sessions.day, to),
  );

/** Sessions of the camps of a scope as planned, without their logs, in any order. */
export async function listBoardPlanned(tx: Tx, teamId: string, scope: BoardScope, days: Days) {
  return tx
    .select({ campId: sessions.campId, ...planned })
    .from(sessions)
    .innerJoin(camps, and(eq(camps.teamId, sessions.teamId), eq(camps.id, sessions.campId)))
    .where(
      and(
        inScope(teamId, scope),
        eq(sessions.teamId, teamId),
        eq(sessions.status, "confirmed"),
        around(days),
      ),
    )
    .groupBy(sessions.campId);
}

/** The same with their logs, and with those that left the plan and were logged. */
export async function listBoardSessions(tx: Tx, teamId: string, scope: BoardScope, days: Days) {
  return tx
    .select({ campId: sessions.campId, ...planned, ...logged })
    .from(sessions)
    .innerJoin(camps, and(eq(camps.teamId, sessions.teamId), eq(camps.id, sessions.campId)))
    .leftJoin(
      logsOf(teamId, days),
      and(eq(sql`l.camp_id`, sessions.campId), eq(sql`l.session_id`, sessions.id)),
    )
    .where(
      and(
        inScope(teamId, scope),
        eq(sessions.teamId, teamId),
        around(days),
        or(eq(sessions.status, "confirmed"), sql`l.state is not null`),
      ),
    )
    .groupBy(sessions.campId);
}
export type BoardSessionsRow = Awaited<ReturnType<typeof listBoardPlanned>>[number] &
  Partial<Awaited<ReturnType<typeof listBoardSessions>>[number]>;

const athletesIn = (tx: Tx, teamId: string, scope: BoardScope) =>
  tx.select({ id: camps.athleteId }).from(camps).where(inScope(teamId, scope));

/** Check-ins of the athletes of a scope, in any order. */
export async function listBoardCheckIns(tx: Tx, teamId: string, scope: BoardScope, { from, to }: Days) {
  const numbers = (column: unknown) => sql<number[]>`${list(column)}`;
  return tx
    .select({
      athleteId: checkIns.athleteId,
      day: numbers(dayNumber(checkIns.day)),
      sleep: numbers(checkIns.sleep),
      fatigue: numbers(checkIns.fatigue),
      soreness: numbers(checkIns.soreness),
      stress: numbers(checkIns.stress),
    })
    .from(checkIns)
    .where(
      and(
        eq(checkIns.teamId, teamId),
        inArray(checkIns.athleteId, athletesIn(tx, teamId, scope)),
        gte(checkIns.day, from),
        lte(checkIns.day, to),
      ),
    )
    .groupBy(checkIns.athleteId);
}

interface WeightsRow extends Record<string, unknown> {
  readonly campId: string;
  /** The first one that the camp's line may start from; null where there is none. */
  readonly firstDay: number | null;
  readonly firstKg: number | null;
  /** Of the days asked for, in any order; null where there is none. */
  readonly day: readonly number[] | null;
  readonly kg: readonly number[] | null;
}

/**
 * Weights of the athletes of a scope, and the first one from `startBack` days before each camp on, where its line starts: what lies
 * between says nothing of now.
 */
export async function listBoardWeights(
  tx: Tx,
  teamId: string,
  scope: BoardScope,
  { from, to, startBack }: Days & { readonly startBack: number },
): Promise<WeightsRow[]> {
  const asked = "campId" in scope ? sql`c.id = ${scope.campId}` : sql`c.bout_date >= ${scope.boutsFrom}`;
  const rows = await tx.execute<WeightsRow>(sql`
    select c.id as "campId", ${dayNumber(sql`f.day`)} as "firstDay", f.kg as "firstKg", r.day, r.kg
    from ${camps} c
    left join lateral (
      select w.day, w.kg from ${weights} w
      where w.team_id = ${teamId} and w.athlete_id = c.athlete_id and w.day > c.bout_date - 7 * c.weeks - ${startBack}::int
        and w.day <= ${to}
      order by w.day limit 1) f on true
    left join (
      select w.athlete_id, ${list(dayNumber(sql`w.day`))} as day, ${list(sql`w.kg`)} as kg from ${weights} w
      where w.team_id = ${teamId} and w.day between ${from} and ${to}
        and w.athlete_id in (select c.athlete_id from ${camps} c where c.team_id = ${teamId} and c.status = 'on' and ${asked})
      group by w.athlete_id) r on r.athlete_id = c.athlete_id
    where c.team_id = ${teamId} and c.status = 'on' and ${asked}`);
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

/** Requests that wait for an answer in the camps of a scope, and accepted ones of sessions on or after `from`, with their session; oldest first. */
export async function listBoardRequests(
  tx: Tx,
  teamId: string,
  scope: BoardScope,
  { from }: Pick<Days, "from">,
) {
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
    .innerJoin(camps, and(eq(camps.teamId, requests.teamId), eq(camps.id, requests.campId)))
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
        inScope(teamId, scope),
        eq(requests.teamId, teamId),
        or(eq(requests.state, "asked"), and(eq(requests.state, "accepted"), gte(sessions.day, from))),
      ),
    )
    .orderBy(asc(requests.createdAt), asc(requests.id));
}
export type BoardRequestRow = Awaited<ReturnType<typeof listBoardRequests>>[number];

/** Keys of suggestions that were decided on in the camps of a scope. */
export async function listDecidedKeys(tx: Tx, teamId: string, scope: BoardScope) {
  return tx
    .select({ campId: suggestionDecisions.campId, key: suggestionDecisions.key })
    .from(suggestionDecisions)
    .innerJoin(
      camps,
      and(eq(camps.teamId, suggestionDecisions.teamId), eq(camps.id, suggestionDecisions.campId)),
    )
    .where(and(inScope(teamId, scope), eq(suggestionDecisions.teamId, teamId)));
}
