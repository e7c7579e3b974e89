import { isDeepStrictEqual } from "node:util";
import { writeAudit } from "@/db/queries/audit";
import type { Transaction } from "@/db/client";
import {
  findExercise,
  insertExerciseEdit,
  listExercises,
  lockTeamExercises,
  putTeamExercise,
  removeTeamExercise,
  type ExerciseState,
  type ListedExercise,
} from "@/db/queries/exercises";
import type { Exercise } from "@/lib/engine/prescription/exercise";
import { AppError, notFound } from "@/lib/errors";
import {
  exerciseOfForm,
  type ExerciseEdit,
  type ExerciseForm,
  type ExerciseRestore,
  type ExerciseShelve,
  type ExerciseView,
} from "@/lib/schemas/exercise";
import type { TeamContext } from "@/lib/services/context";
import { checkExercise } from "./check";
import { newExerciseId } from "./new-id";
import { readExercise, type ById } from "./read";

type Act = "exercise.create" | "exercise.update" | "exercise.shelve" | "exercise.restore";

/** A later change always carries a later time, also within one millisecond: the check for stale edits rests on it. */
export const timeAfter = (now: Date, before: Date | null): Date =>
  before && before >= now ? new Date(before.getTime() + 1) : now;

interface Write {
  readonly act: Act;
  readonly before: ListedExercise | null;
  readonly after: ExerciseState;
}

async function write(tx: Transaction, ctx: TeamContext, { act, before, after }: Write): Promise<void> {
  const { teamId, userId } = ctx;
  const { id } = after.exercise;
  const was = before && { exercise: before.exercise, shelved: before.shelved };
  if (isDeepStrictEqual(was, after)) return;
  const at = timeAfter(ctx.now, before?.changedAt ?? null);
  // A row that says what the library says would keep the team from the library's next form.
  const asShipped = !after.shelved && isDeepStrictEqual(after.exercise, before?.library);
  if (asShipped) await removeTeamExercise(tx, teamId, id);
  else await putTeamExercise(tx, teamId, after, at);
  const told = act === "exercise.restore" ? null : after;
  await insertExerciseEdit(tx, {
    ...{ teamId, userId, exerciseId: id, createdAt: at },
    ...{ before: was, after: told },
  });
  await writeAudit(tx, ctx, act, id);
}

/** The exercise under the team's lock. Throws `not-found`, or `stale` where someone changed it after it was read. */
async function unchanged(
  tx: Transaction,
  ctx: TeamContext,
  id: string | undefined,
  readAt: string | null,
): Promise<ListedExercise> {
  await lockTeamExercises(tx, ctx.teamId);
  const row = id ? await findExercise(tx, ctx.teamId, id) : null;
  if (!row) throw notFound();
  const changedAt = row.changedAt?.getTime() ?? null;
  if (changedAt !== (readAt === null ? null : Date.parse(readAt)))
    throw new AppError(
      "stale",
      "Someone else changed this exercise meanwhile. Load it again, then change it.",
    );
  return row;
}

const known = async (tx: Transaction, ctx: TeamContext): Promise<readonly Exercise[]> =>
  (await listExercises(tx, ctx.teamId)).map(({ exercise }) => exercise);

/** Adds an exercise of the team's own. Its id is made from its name and never that of another. */
export async function addExercise(
  ctx: TeamContext,
  { body }: { body: ExerciseForm },
): Promise<{ id: string }> {
  return ctx.db.transaction(async (tx) => {
    await lockTeamExercises(tx, ctx.teamId);
    const others = await known(tx, ctx);
    const id = newExerciseId(body.name, new Set(others.map((other) => other.id)));
    const exercise = exerciseOfForm(id, body);
    checkExercise(exercise, others);
    await write(tx, ctx, { act: "exercise.create", before: null, after: { exercise, shelved: false } });
    return { id };
  });
}

/** Changes an exercise for this team. */
export async function editExercise(
  ctx: TeamContext,
  { params, body }: ById & { body: ExerciseEdit },
): Promise<ExerciseView> {
  const { changedAt, ...form } = body;
  await ctx.db.transaction(async (tx) => {
    const before = await unchanged(tx, ctx, params.id, changedAt);
    const exercise = exerciseOfForm(before.exercise.id, form);
    checkExercise(exercise, await known(tx, ctx));
    await write(tx, ctx, { act: "exercise.update", before, after: { exercise, shelved: before.shelved } });
  });
  return readExercise(ctx, { params });
}

/** Takes an exercise out of use in this team, or brings it back. */
export async function shelveExercise(
  ctx: TeamContext,
  { params, body }: ById & { body: ExerciseShelve },
): Promise<ExerciseView> {
  await ctx.db.transaction(async (tx) => {
    const before = await unchanged(tx, ctx, params.id, body.changedAt);
    const after = { exercise: before.exercise, shelved: body.shelved };
    await write(tx, ctx, { act: "exercise.shelve", before, after });
  });
  return readExercise(ctx, { params });
}

/** Goes back to the library's form; shelved stays shelved. */
export async function restoreExercise(
  ctx: TeamContext,
  { params, body }: ById & { body: ExerciseRestore },
): Promise<ExerciseView> {
  await ctx.db.transaction(async (tx) => {
    const before = await unchanged(tx, ctx, params.id, body.changedAt);
    if (before.library === null)
      throw new AppError("conflict", "This exercise is the team’s own: the library has no form of it.");
    if (before.origin !== "changed") throw new AppError("conflict", "It is the library’s form already.");
    const after = { exercise: before.library, shelved: before.shelved };
    await write(tx, ctx, { act: "exercise.restore", before, after });
  });
  return readExercise(ctx, { params });
}
