import { and, asc, eq, gte, inArray, isNotNull, lte, or, sql } from "drizzle-orm";
import type { Tx } from "../client";
import { athletes, camps, sessions, teams } from "../schema";

/** A camp that is on, with the last day of travel before its bout. */
const runningCamp = {
  camp: camps,
  // Columns are written out: inside a select drizzle may leave the table's name away.
  lastTravel: sql<string | null>`(select max(s.day)::text from ${sessions} s
    where s.team_id = "camps"."team_id" and s.camp_id = "camps"."id" and s.kind = 'travel'
      and s.status = 'confirmed' and s.day < "camps"."bout_date")`,
};

/**
 * An athlete with the team's zone and rules, and the camps that are on with a bout on or after `boutsFrom`, nearest first.
 * Null where the athlete is missing or foreign.
 */
export async function findAthleteDay(tx: Tx, teamId: string, athleteId: string, boutsFrom: string) {
  const rows = await tx
    .select({
      athlete: athletes,
      zone: teams.timeZone,
      rules: teams.ruleOverrides,
      ...runningCamp,
    })
    .from(athletes)
    .innerJoin(teams, eq(teams.id, athletes.teamId))
    .leftJoin(
      camps,
      and(
        eq(camps.teamId, athletes.teamId),
        eq(camps.athleteId, athletes.id),
        eq(camps.status, "on"),
        gte(camps.boutDate, boutsFrom),
      ),
    )
    .where(and(eq(athletes.teamId, teamId), eq(athletes.id, athleteId)))
    .orderBy(asc(camps.boutDate), asc(camps.id));
  const [first] = rows;
  if (!first) return null;
  const { athlete, zone, rules } = first;
  return {
    athlete,
    zone,
    rules,
    camps: rows.flatMap(({ camp, lastTravel }) => (camp ? [{ camp, lastTravel }] : [])),
  };
}
export type AthleteDayRow = NonNullable<Awaited<ReturnType<typeof findAthleteDay>>>;

/** Sessions of some camps: everything on the days `from` to `to`, and every lift, which prescriptions follow the order of. */
export async function listDaySessions(
  tx: Tx,
  teamId: string,
  campIds: readonly string[],
  { from, to }: { from: string; to: string },
) {
  if (campIds.length === 0) return [];
  return tx
    .select()
    .from(sessions)
    .where(
      and(
        eq(sessions.teamId, teamId),
        inArray(sessions.campId, [...campIds]),
        or(isNotNull(sessions.lift), and(gte(sessions.day, from), lte(sessions.day, to))),
      ),
    )
    .orderBy(asc(sessions.startsAt), asc(sessions.id));
}

/** One session of a camp, whatever its status. */
export async function findSession(tx: Tx, teamId: string, campId: string, sessionId: string) {
  const [row] = await tx
    .select()
    .from(sessions)
    .where(and(eq(sessions.teamId, teamId), eq(sessions.campId, campId), eq(sessions.id, sessionId)));
  return row ?? null;
}
