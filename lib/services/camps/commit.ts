import { insertRevision, notifyCampChanged, updateCamp, writeEdit } from "@/db/queries/camps";
import { sessionWrites, writeSessions } from "@/db/queries/sessions";
import { sessionsOf } from "@/db/mappers/sessions";
import { writeAudit } from "@/db/queries/audit";
import type { Tx } from "@/db/client";
import { inverseOf, type Preview } from "@/lib/book";
import type { Instant, KnockOn } from "@/lib/engine/types";
import { instantAt } from "@/lib/engine";
import { instantOf } from "@/lib/calendar/zones";
import { queueChangeMail } from "@/lib/mail/notices";
import { concerns } from "@/lib/policy";
import type { Change } from "@/lib/schemas/change";
import type { TeamContext } from "@/lib/services/context";
import type { LoadedCamp } from "./load";
import { othersOf } from "./view";

/** A change to a session this near is told at once instead of being collected. */
const URGENT_MINUTES = 48 * 60;

/** True where something that changes stands, or stood, within 48 h from now. */
function isUrgent({ knockOn, input }: Preview, now: Instant): boolean {
  const near = (
    at: { day: Parameters<typeof instantAt>[1]; start: Parameters<typeof instantAt>[2] } | null,
  ): boolean => {
    if (!at) return false;
    const wait = instantAt(input.zone, at.day, at.start) - now;
    return wait > 0 && wait <= URGENT_MINUTES;
  };
  const places = [...knockOn.lifts, ...knockOn.sport].flatMap(({ from, to }) => [from, to]);
  return places.some(near) || (knockOn.bout !== null && (near(knockOn.bout.from) || near(knockOn.bout.to)));
}

export interface Commit {
  readonly change: Change | null;
  readonly summary: string;
  readonly idempotencyKey: string;
  readonly putBackOf: number | null;
}

/**
 * Writes a previewed change: camp, sessions, revision, audit, notices and the signal to open pages, in the caller's
 * transaction. They commit together or not at all. Returns the revision and how many people will be told.
 */
export async function commitPreview(
  tx: Tx,
  ctx: TeamContext,
  camp: LoadedCamp,
  preview: Preview,
  commit: Commit,
): Promise<{ revision: number; told: number; others: Others }> {
  const revision = camp.row.revision + 1;
  const { lifts, ...summary } = preview.plan;
  const touched = new Set(preview.knockOn.lifts.map((effect) => effect.id));
  const planned = sessionsOf(preview.book, preview.input, { ...preview.plan, lifts });
  const scope = { teamId: ctx.teamId, campId: camp.row.id };
  const others = await othersOf(tx, ctx, camp.athlete.id);
  // None waits for another's answer: the driver sends them down the transaction's one connection in this order.
  const writes = [
    writeEdit(tx, ctx.teamId, camp.row.id, preview.edit),
    updateCamp(tx, camp.row, { book: preview.book, summary, revision, now: ctx.now }),
    writeSessions(tx, sessionWrites(scope, camp.sessions, planned, ctx.now)),
    writeAudit(tx, ctx, "camp.change", camp.row.id, { revision, summary: commit.summary }),
    notifyCampChanged(tx, camp.row.id, revision),
  ];
  const revised = insertRevision(tx, {
    teamId: ctx.teamId,
    campId: camp.row.id,
    number: revision,
    change: commit.change,
    edit: preview.edit,
    inverse: inverseOf(camp.book, preview.edit),
    knockOn: preview.knockOn,
    liftsBefore: camp.plan.lifts.filter((lift) => touched.has(lift.id)),
    summary: commit.summary,
    idempotencyKey: commit.idempotencyKey,
    userId: ctx.userId,
    putBackOf: commit.putBackOf,
    createdAt: ctx.now,
  });
  const [told] = await Promise.all([tell(tx, ctx, camp, preview, revision, others), revised, ...writes]);
  return { revision, told, others };
}

type Others = Awaited<ReturnType<typeof othersOf>>;

async function tell(
  tx: Tx,
  ctx: TeamContext,
  camp: LoadedCamp,
  preview: Preview,
  revision: number,
  others: Others,
): Promise<number> {
  const userIds = others.filter(({ role }) => concerns(role, preview)).map(({ userId }) => userId);
  if (userIds.length > 0) {
    const urgent = isUrgent(preview, instantOf(ctx.now));
    await queueChangeMail(tx, {
      teamId: ctx.teamId,
      campId: camp.row.id,
      revision,
      userIds,
      urgent,
      now: ctx.now,
    });
  }
  return userIds.length;
}

/** A knock-on of nothing. */
export const NOTHING: KnockOn = { lifts: [], sport: [], weeks: [], violations: [], bout: null };
