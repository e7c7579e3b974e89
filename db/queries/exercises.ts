import { and, asc, desc, eq, gte, sql } from "drizzle-orm";
import type { Exercise } from "../../lib/engine/prescription/exercise";
import type { Tx } from "../client";
import {
  athletes,
  camps,
  exerciseEdits,
  libraryExercises,
  liftEdits,
  loggedSets,
  swaps,
  teamExercises,
  users,
} from "../schema";

// Any fixed number does, as long as every server process of one database uses the same.
const LIBRARY_LOCK = 7_235_002;

/**
 * Makes the library what `exercises` say: writes what differs, removes what is no longer there, leaves every team's own
 * rows alone. Processes that start together wait for each other; whoever comes second finds nothing to do.
 * @returns how many rows were written.
 */
export async function replaceLibrary(tx: Tx, exercises: readonly Exercise[]): Promise<number> {
  const given = JSON.stringify(exercises.map((exercise, position) => ({ position, exercise })));
  return tx.transaction(async (inner) => {
    await inner.execute(sql`select pg_advisory_xact_lock(${LIBRARY_LOCK})`);
    const rows = await inner.execute(sql`
      with given as (
        select exercise->>'id' as id, position, exercise
        from jsonb_to_recordset(${given}::jsonb) as row(position integer, exercise jsonb)
      ), gone as (
        delete from ${libraryExercises} where id not in (select id from given)
      )
      insert into ${libraryExercises} as kept (id, position, exercise)
      select id, position, exercise from given
      on conflict (id) do update set position = excluded.position, exercise = excluded.exercise
      where (kept.position, kept.exercise) is distinct from (excluded.position, excluded.exercise)
      returning id`);
    return rows.length;
  });
}

/** `changed`: of the library, in a form of the team's own. */
export type ExerciseOrigin = "library" | "team" | "changed";

export interface ListedExercise {
  readonly exercise: Exercise;
  readonly origin: ExerciseOrigin;
  /** Never prescribed in this team. */
  readonly shelved: boolean;
  /** When the team last wrote its own row; null where it has none. */
  readonly changedAt: Date | null;
  /** The library's own form; null for a team's own exercise. */
  readonly library: Exercise | null;
}

async function merged(tx: Tx, teamId: string, exerciseId?: string): Promise<ListedExercise[]> {
  const own = tx
    .select()
    .from(teamExercises)
    .where(
      and(
        eq(teamExercises.teamId, teamId),
        exerciseId === undefined ? undefined : eq(teamExercises.id, exerciseId),
      ),
    )
    .as("own");
  const rows = await tx
    .select({
      library: libraryExercises.exercise,
      own: own.exercise,
      shelved: own.shelved,
      changedAt: own.changedAt,
      same: sql<boolean | null>`${own.exercise} = ${libraryExercises.exercise}`,
    })
    .from(libraryExercises)
    .fullJoin(own, eq(own.id, libraryExercises.id))
    .where(
      exerciseId === undefined ? undefined : sql`coalesce(${own.id}, ${libraryExercises.id}) = ${exerciseId}`,
    )
    .orderBy(sql`${libraryExercises.position} nulls last`, asc(own.id));
  return rows.flatMap(({ library, own: changed, shelved, changedAt, same }): ListedExercise[] => {
    const exercise = changed ?? library;
    if (exercise === null) return [];
    const origin = library === null ? "team" : changed === null || same ? "library" : "changed";
    return [{ exercise, origin, shelved: shelved ?? false, changedAt, library }];
  });
}

/**
 * All exercises of a team in the library's order, the team's own ones behind: a team's form stands for the library's.
 * Shelved ones are in it, for what was logged with them; leave them out where something is prescribed.
 */
export const listExercises = (tx: Tx, teamId: string): Promise<ListedExercise[]> => merged(tx, teamId);

export async function findExercise(
  tx: Tx,
  teamId: string,
  exerciseId: string,
): Promise<ListedExercise | null> {
  const [row] = await merged(tx, teamId, exerciseId);
  return row ?? null;
}

/** Edits of a team's exercises wait for each other until the transaction ends: names and times of change stay unique. */
export async function lockTeamExercises(tx: Tx, teamId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`exercises ${teamId}`}, 0))`);
}

export interface ExerciseState {
  readonly exercise: Exercise;
  readonly shelved: boolean;
}

/** Writes the team's own row of an exercise, new or changed. */
export async function putTeamExercise(
  tx: Tx,
  teamId: string,
  { exercise, shelved }: ExerciseState,
  changedAt: Date,
): Promise<void> {
  await tx
    .insert(teamExercises)
    .values({ teamId, id: exercise.id, exercise, shelved, changedAt })
    .onConflictDoUpdate({
      target: [teamExercises.teamId, teamExercises.id],
      set: { exercise, shelved, changedAt },
    });
}

/** Back to the library's form. */
export async function removeTeamExercise(tx: Tx, teamId: string, exerciseId: string): Promise<void> {
  await tx
    .delete(teamExercises)
    .where(and(eq(teamExercises.teamId, teamId), eq(teamExercises.id, exerciseId)));
}

export async function insertExerciseEdit(
  tx: Tx,
  values: {
    readonly teamId: string;
    readonly exerciseId: string;
    readonly before: ExerciseState | null;
    readonly after: ExerciseState | null;
    readonly userId: string;
    readonly createdAt: Date;
  },
): Promise<void> {
  await tx.insert(exerciseEdits).values(values);
}

/** What a team did to an exercise, newest first, with the name of who did it. */
export async function listExerciseEdits(tx: Tx, teamId: string, exerciseId: string) {
  return tx
    .select({
      id: exerciseEdits.id,
      before: exerciseEdits.before,
      after: exerciseEdits.after,
      at: exerciseEdits.createdAt,
      by: users.name,
    })
    .from(exerciseEdits)
    .leftJoin(users, eq(users.id, exerciseEdits.userId))
    .where(and(eq(exerciseEdits.teamId, teamId), eq(exerciseEdits.exerciseId, exerciseId)))
    .orderBy(desc(exerciseEdits.createdAt), desc(exerciseEdits.id));
}

export interface ExerciseUse {
  readonly exerciseId: string;
  /** Camps whose bout is still to come in which it was swapped in, written in by a coach, or logged. */
  readonly camps: number;
  /** Sets logged since `setsFrom`, in any camp. */
  readonly sets: number;
}

/**
 * Where a team's exercises are used; those that are not used are left out.
 * @param today YYYY-MM-DD: camps with their bout on it or later are current.
 * @param setsFrom YYYY-MM-DD: first day of the sets that are counted.
 * @param exerciseId only this one; all where it is left out.
 */
export async function listExerciseUse(
  tx: Tx,
  teamId: string,
  {
    today,
    setsFrom,
    exerciseId,
  }: { readonly today: string; readonly setsFrom: string; readonly exerciseId?: string },
): Promise<ExerciseUse[]> {
  const current = tx
    .select({ id: camps.id })
    .from(camps)
    .where(and(eq(camps.teamId, teamId), eq(camps.status, "on"), gte(camps.boutDate, today)));
  const written = sql`jsonb_path_query(${liftEdits.edit}, '$.lines.*.exercise') #>> '{}'`;
  // Naming the athletes lets the index by athlete and exercise find one exercise's sets.
  const roster = tx.select({ id: athletes.id }).from(athletes).where(eq(athletes.teamId, teamId));
  const wanted =
    exerciseId === undefined
      ? sql``
      : sql`and ${loggedSets.exerciseId} = ${exerciseId} and ${loggedSets.athleteId} in ${roster}`;
  const named = exerciseId === undefined ? sql`` : sql`where exercise_id = ${exerciseId}`;
  const rows = await tx.execute<{ exercise_id: string; camps: number; sets: number }>(sql`
    with used as (
      select ${swaps.toExercise} as exercise_id, ${swaps.campId} as camp_id, 0 as sets
      from ${swaps} where ${swaps.teamId} = ${teamId}
      union all
      select ${written}, ${liftEdits.campId}, 0 from ${liftEdits} where ${liftEdits.teamId} = ${teamId}
      union all
      select ${loggedSets.exerciseId}, ${loggedSets.campId},
        (count(*) filter (where ${loggedSets.day} >= ${setsFrom}))::int
      from ${loggedSets} where ${loggedSets.teamId} = ${teamId}
        and (${loggedSets.day} >= ${setsFrom} or ${loggedSets.campId} in ${current}) ${wanted}
      group by 1, 2
    )
    select exercise_id,
      count(distinct camp_id) filter (where camp_id in ${current})::int as camps,
      sum(sets)::int as sets
    from used ${named} group by 1`);
  return rows
    .map((row) => ({ exerciseId: row.exercise_id, camps: row.camps, sets: row.sets }))
    .filter((use) => use.camps > 0 || use.sets > 0);
}
