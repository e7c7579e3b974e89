import { isDeepStrictEqual } from "node:util";
import { findRevision, findRevisionByKey, listRevisions } from "@/db/queries/camps";
import type { Tx } from "@/db/client";
import {
  changeWords,
  isPreview,
  previewChange,
  previewEdit,
  putBackBase,
  putBackProblem,
  type PreviewResult,
} from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import { AppError } from "@/lib/errors";
import { CHANGE_ACTION, can } from "@/lib/policy";
import type { SaveAnswer } from "@/lib/schemas/camp";
import type { Change, SaveChange } from "@/lib/schemas/change";
import type { TeamContext } from "@/lib/services/context";
import { NOTHING, commitPreview } from "./commit";
import { loadCamp, type LoadedCamp } from "./load";
import { viewOf } from "./view";

/**
 * Saves one change: locks the camp, checks the base revision, runs the same engine as the preview in the browser and
 * writes everything in one transaction. Retrying with the same key answers the same again and changes nothing.
 * Throws `stale` with what changed and the new state, `invalid` with a pointer per problem.
 */
export async function saveChange(
  ctx: TeamContext,
  { body, params }: { body: SaveChange; params: Record<string, string> },
): Promise<SaveAnswer> {
  return ctx.db.transaction(async (tx) =>
    saveChangeIn(tx, ctx, await loadCamp(tx, ctx, params.id ?? "", { lock: true }), body),
  );
}

/** The same in the caller's transaction, for a camp that it has locked: what it writes beside the change stands or falls with it. */
export async function saveChangeIn(
  tx: Tx,
  ctx: TeamContext,
  camp: LoadedCamp,
  body: SaveChange,
): Promise<SaveAnswer> {
  if (!can(ctx.member, CHANGE_ACTION[body.change.kind], camp.athlete.id)) {
    throw new AppError("forbidden", "Your role may not make this change.");
  }
  const earlier = await findRevisionByKey(tx, ctx.teamId, camp.row.id, body.idempotencyKey);
  if (earlier) {
    return {
      revision: earlier.number,
      view: await viewOf(tx, ctx, camp),
      knockOn: earlier.knockOn ?? NOTHING,
      told: 0,
    };
  }
  if (body.baseRevision !== camp.row.revision) throw await staleError(tx, ctx, camp, body.baseRevision);
  const { preview, putBackOf } = await previewOf(tx, ctx, camp, body.change);
  if (!isPreview(preview))
    throw new AppError("invalid", preview.problems[0]?.message ?? "This change cannot be made.", {
      errors: preview.problems,
    });
  if (isDeepStrictEqual(preview.book, camp.book)) {
    return { revision: camp.row.revision, view: await viewOf(tx, ctx, camp), knockOn: NOTHING, told: 0 };
  }
  const { revision, told, others } = await commitPreview(tx, ctx, camp, preview, {
    change: body.change,
    summary: changeWords(body.change, camp, preview.knockOn),
    idempotencyKey: body.idempotencyKey,
    putBackOf,
  });
  // What was written is at hand: reading it back would cost as much as planning it.
  const written = {
    ...camp,
    row: { ...camp.row, revision, changedAt: ctx.now },
    book: preview.book,
    plan: preview.plan,
  };
  return { revision, view: await viewOf(tx, ctx, written, others), knockOn: preview.knockOn, told };
}

async function previewOf(
  tx: Tx,
  ctx: TeamContext,
  camp: LoadedCamp,
  change: Change,
): Promise<{ preview: PreviewResult; putBackOf: number | null }> {
  const now = instantOf(ctx.now);
  if (change.kind !== "put-back") return { preview: previewChange(camp, change, now), putBackOf: null };
  const saved = await findRevision(tx, ctx.teamId, camp.row.id, change.revision);
  if (!saved?.edit || !saved.inverse || !saved.knockOn || !saved.change) {
    return refused({ pointer: "/change/revision", message: "That revision cannot be put back." });
  }
  const past = {
    edit: saved.edit,
    inverse: saved.inverse,
    knockOn: saved.knockOn,
    liftsBefore: saved.liftsBefore,
  };
  const problem = putBackProblem(camp.book, past);
  if (problem) return refused(problem);
  return {
    preview: previewEdit(camp, past.inverse, now, { base: putBackBase(camp.plan, past) }),
    putBackOf: change.revision,
  };
}

const refused = (problem: { pointer: string; message: string }) => ({
  preview: { problems: [problem] },
  putBackOf: null,
});

async function staleError(
  tx: Tx,
  ctx: TeamContext,
  camp: LoadedCamp,
  baseRevision: number,
): Promise<AppError> {
  const since = await listRevisions(tx, ctx.teamId, camp.row.id, baseRevision);
  return new AppError("stale", "Someone else changed this camp in the meantime.", {
    revision: camp.row.revision,
    changes: since.map(({ number, by, at, summary }) => ({
      number,
      by: by ?? "Someone who left the team",
      at: at.toISOString(),
      summary,
    })),
    view: await viewOf(tx, ctx, camp),
  });
}
