import { writeAudit } from "@/db/queries/audit";
import {
  findUpload,
  insertTrials,
  listNewestOfTeam,
  listTrials,
  lockAthlete,
  lockTrial,
  removeUpload,
  setTrialRemoved,
} from "@/db/queries/tests";
import { listWeights } from "@/db/queries/weights";
import type { Tx } from "@/db/client";
import { isoFromDay } from "@/lib/engine";
import { AppError, notFound, type FieldError } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { TestsView, TrialForm, TrialUpload } from "@/lib/schemas/test-trial";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";
import { athleteFor } from "@/lib/services/today/athlete-day";
import { summarise } from "./summary";

type ById = { params: Record<string, string> };

/** Trials of an athlete with what can be said of them. */
export async function listTests(ctx: TeamContext, { params }: ById): Promise<TestsView> {
  const { athlete, minor } = await athleteFor(ctx.db, ctx, params.id, "tests.read");
  const [trials, people] = await Promise.all([
    listTrials(ctx.db, ctx.teamId, athlete.id),
    listNewestOfTeam(ctx.db, ctx.teamId),
  ]);
  const [first, last] = [trials[0]?.day, trials.at(-1)?.day];
  const seesWeights = can(ctx.member, "weight.read", athlete.id);
  const weights =
    first !== undefined && last !== undefined && seesWeights && !minor
      ? await listWeights(ctx.db, ctx.teamId, athlete.id, { from: first, to: last })
      : [];
  const shown = seesWeights ? trials : trials.map((trial) => ({ ...trial, massKg: null }));
  return summarise(shown, people, new Map(weights.map(({ day, kg }) => [day, kg])));
}

const FUTURE = "A test cannot be in the future.";

/** Nothing is measured tomorrow. */
function refuseFuture(rows: readonly TrialForm[], today: string, pointer: (index: number) => string): void {
  const errors = rows.flatMap(({ day }, index): FieldError[] =>
    day > today ? [{ pointer: `${pointer(index)}/day`, message: FUTURE }] : [],
  );
  if (errors.length > 0) throw new AppError("invalid", "Some fields need another look.", { errors });
}

async function writerOf(tx: Tx, ctx: TeamContext, id: string | undefined) {
  const { athlete, today } = await athleteFor(tx, ctx, id, "tests.write");
  return { athlete, today: isoFromDay(today) };
}

/** Adds one trial. */
export async function addTrial(
  ctx: TeamContext,
  { params, body }: ById & { body: TrialForm },
): Promise<{ id: string }> {
  return ctx.db.transaction(async (tx) => {
    const { athlete, today } = await writerOf(tx, ctx, params.id);
    refuseFuture([body], today, () => "");
    const [id] = await insertTrials(tx, ctx.teamId, [
      { ...body, athleteId: athlete.id, userId: ctx.userId, createdAt: ctx.now },
    ]);
    if (id === undefined) throw new Error("Insert returned no row.");
    await writeAudit(tx, ctx, "test.add", athlete.id, { trial: id });
    return { id };
  });
}

/** What an upload left behind. */
export interface UploadSaved {
  readonly uploadId: string;
  readonly count: number;
}

/** Keeps every row of a file or none. A file sent twice (same `uploadId`) is kept once; one that was taken back is refused (409). */
export async function uploadTrials(
  ctx: TeamContext,
  { params, body }: ById & { body: TrialUpload },
): Promise<UploadSaved> {
  const { uploadId, rows } = body;
  return ctx.db.transaction(async (tx) => {
    const { athlete, today } = await writerOf(tx, ctx, params.id);
    refuseFuture(rows, today, (index) => `/rows/${index}`);
    await lockAthlete(tx, ctx.teamId, athlete.id);
    const known = await findUpload(tx, ctx.teamId, uploadId);
    if (known && (known.athleteId !== athlete.id || known.standing < known.rows))
      throw new AppError(
        "conflict",
        "This file was imported before and taken back. Choose it again to import it anew.",
      );
    if (known) return { uploadId, count: known.rows };
    await insertTrials(
      tx,
      ctx.teamId,
      rows.map((row, index) => ({
        ...row,
        athleteId: athlete.id,
        userId: ctx.userId,
        uploadId,
        // A millisecond apart: the order of the file stays the order of the trials.
        createdAt: new Date(ctx.now.getTime() + index),
      })),
    );
    await writeAudit(tx, ctx, "test.upload", athlete.id, { uploadId, count: rows.length });
    return { uploadId, count: rows.length };
  });
}

/** Takes an upload back whole; what was removed of it before stays removed. */
export async function takeBackUpload(ctx: TeamContext, { params }: ById): Promise<UploadSaved> {
  const uploadId = params.id;
  return ctx.db.transaction(async (tx) => {
    const known = isId(uploadId) ? await findUpload(tx, ctx.teamId, uploadId) : null;
    if (!known || uploadId === undefined) throw notFound();
    await lockAthlete(tx, ctx.teamId, known.athleteId);
    const count = await removeUpload(tx, ctx.teamId, uploadId, ctx.now);
    if (count === 0) throw new AppError("conflict", "This file is taken back already.");
    await writeAudit(tx, ctx, "test.upload.remove", known.athleteId, { uploadId, count });
    return { uploadId, count };
  });
}

async function flip(ctx: TeamContext, id: string | undefined, remove: boolean): Promise<void> {
  await ctx.db.transaction(async (tx) => {
    const trial = isId(id) ? await lockTrial(tx, ctx.teamId, id) : null;
    if (!trial) throw notFound();
    if ((trial.removedAt !== null) === remove)
      throw new AppError(
        "conflict",
        remove ? "This trial is removed already." : "This trial stands already.",
      );
    await setTrialRemoved(tx, ctx.teamId, trial.id, remove ? ctx.now : null);
    await writeAudit(tx, ctx, remove ? "test.remove" : "test.restore", trial.athleteId, { trial: trial.id });
  });
}

/** Removes a trial; it can be put back. */
export const removeTrial = (ctx: TeamContext, { params }: ById): Promise<void> => flip(ctx, params.id, true);

/** Puts a removed trial back. */
export const restoreTrial = (ctx: TeamContext, { params }: ById): Promise<void> =>
  flip(ctx, params.id, false);
