import { writeAudit } from "@/db/queries/audit";
import { insertBest, lockBest, removeBest } from "@/db/queries/overrides";
import { listBests } from "@/db/queries/prescription";
import { estimateBest, isoFromDay, type Exercise } from "@/lib/engine";
import { AppError, notFound, type FieldError } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { BestForm, BestView, BestsView } from "@/lib/schemas/prescription";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";
import { athleteFor } from "@/lib/services/today/athlete-day";
import { bestView, namesOf } from "./line-view";
import { unitFor } from "./session-page";
import { usedExercises } from "./used-exercises";

type ById = { params: Record<string, string> };

/** Lifts whose loads are a percent of their own best. */
const hasBest = ({ id, load, bestOf }: Exercise): boolean =>
  load === "best" && (bestOf === undefined || bestOf === id);

/** An athlete's bests, newest first, and the lifts that can have one. */
export async function listAthleteBests(ctx: TeamContext, { params }: ById): Promise<BestsView> {
  const { athlete } = await athleteFor(ctx.db, ctx, params.id, "tests.read");
  const [rows, exercises, unit] = await Promise.all([
    listBests(ctx.db, ctx.teamId, athlete.id),
    usedExercises(ctx.db, ctx.teamId),
    unitFor(ctx, athlete),
  ]);
  const names = namesOf(exercises);
  return {
    unit,
    bests: rows.map((row) => bestView(row, names)).reverse(),
    lifts: exercises
      .filter(hasBest)
      .map(({ id, name }) => ({ id, name }))
      .sort((a, b) => a.name.localeCompare(b.name, "en")),
    mayWrite: can(ctx.member, "bests.write", athlete.id),
  };
}

function problemsOf(
  { exerciseId, day }: BestForm,
  exercises: readonly Exercise[],
  today: string,
): FieldError[] {
  const exercise = exercises.find(({ id }) => id === exerciseId);
  const main = exercises.find(({ id }) => id === exercise?.bestOf);
  const errors: FieldError[] = [];
  const wrong = (pointer: string, message: string) => errors.push({ pointer, message });
  if (!exercise) wrong("/exerciseId", "The team has no such exercise.");
  else if (exercise.load !== "best") wrong("/exerciseId", `${exercise.name} is not loaded by a best.`);
  else if (!hasBest(exercise))
    wrong("/exerciseId", `Its loads come from the best of ${main?.name ?? "another lift"}: give that one.`);
  if (day > today) wrong("/day", "That day is still to come.");
  return errors;
}

/**
 * Keeps a best: measured where it was one repetition, else estimated by the named formula. The sessions from its day on are
 * loaded by it at once.
 */
export async function addBest(
  ctx: TeamContext,
  { params, body }: ById & { body: BestForm },
): Promise<BestView> {
  return ctx.db.transaction(async (tx) => {
    const { athlete, today } = await athleteFor(tx, ctx, params.id, "bests.write");
    const exercises = await usedExercises(tx, ctx.teamId);
    const errors = problemsOf(body, exercises, isoFromDay(today));
    const formula = body.reps === 1 ? null : body.formula;
    // Any formula does for one repetition, which is the best itself.
    const best = estimateBest(formula ?? "epley", body.kg, body.reps);
    if ("problem" in best)
      errors.push({
        pointer: best.problem === "reps" ? "/reps" : "/kg",
        message: "No best follows from this.",
      });
    if (errors.length > 0 || "problem" in best)
      throw new AppError("invalid", errors[0]?.message ?? "This is no best.", { errors });
    const row = await insertBest(tx, {
      teamId: ctx.teamId,
      athleteId: athlete.id,
      exerciseId: body.exerciseId,
      day: body.day,
      liftedKg: body.kg,
      reps: body.reps,
      formula,
      kg: best.kg,
      userId: ctx.userId,
      createdAt: ctx.now,
    });
    await writeAudit(tx, ctx, "best.add", row.id, { athleteId: athlete.id, exerciseId: row.exerciseId });
    return bestView(row, namesOf(exercises));
  });
}

/** Takes a best out of use; older ones count again. */
export async function dropBest(ctx: TeamContext, { params }: ById): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    const row = isId(params.id) ? await lockBest(tx, ctx.teamId, params.id) : null;
    if (!row || !can(ctx.member, "athletes.read", row.athleteId)) throw notFound();
    if (!can(ctx.member, "bests.write", row.athleteId))
      throw new AppError("forbidden", "Your role may not do this.");
    await removeBest(tx, ctx.teamId, row.id, ctx.now);
    await writeAudit(tx, ctx, "best.remove", row.id, { athleteId: row.athleteId });
  });
}
