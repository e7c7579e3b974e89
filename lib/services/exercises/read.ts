import {
  findExercise,
  listExerciseEdits,
  listExercises,
  listExerciseUse,
  type ListedExercise,
} from "@/db/queries/exercises";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { notFound } from "@/lib/errors";
import type { ExerciseSummary, ExerciseView } from "@/lib/schemas/exercise";
import { todayOf } from "@/lib/services/athletes/athletes";
import type { TeamContext } from "@/lib/services/context";

/** Days back for which logged sets are counted: 8 weeks. */
const SET_DAYS = 56;

export type ById = { params: Record<string, string> };

async function countUse(
  ctx: TeamContext,
  exerciseId?: string,
): Promise<(exerciseId: string) => ExerciseSummary["use"]> {
  const today = await todayOf(ctx);
  const setsFrom = isoFromDay((dayFromIso(today) - SET_DAYS) as Day);
  const rows = await listExerciseUse(ctx.db, ctx.teamId, { today, setsFrom, exerciseId });
  const byId = new Map(rows.map(({ exerciseId, camps, sets }) => [exerciseId, { camps, sets }]));
  return (exerciseId) => byId.get(exerciseId) ?? { camps: 0, sets: 0 };
}

const summaryOf = (
  { exercise, origin, shelved, changedAt }: ListedExercise,
  use: ExerciseSummary["use"],
): ExerciseSummary => ({ exercise, origin, shelved, changedAt: changedAt?.toISOString() ?? null, use });

/** The team's exercises, shelved ones included, with where each is used. */
export async function listTeamExercises(ctx: TeamContext): Promise<{ exercises: ExerciseSummary[] }> {
  const [rows, countOf] = await Promise.all([listExercises(ctx.db, ctx.teamId), countUse(ctx)]);
  return { exercises: rows.map((row) => summaryOf(row, countOf(row.exercise.id))) };
}

/** One exercise with what the team changed about it. */
export async function readExercise(ctx: TeamContext, { params }: ById): Promise<ExerciseView> {
  const row = params.id ? await findExercise(ctx.db, ctx.teamId, params.id) : null;
  if (!row) throw notFound();
  const [edits, countOf] = await Promise.all([
    listExerciseEdits(ctx.db, ctx.teamId, row.exercise.id),
    countUse(ctx, row.exercise.id),
  ]);
  return {
    ...summaryOf(row, countOf(row.exercise.id)),
    history: edits.map(({ at, ...edit }) => ({ ...edit, at: at.toISOString() })),
  };
}
