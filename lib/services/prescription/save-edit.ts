import { isDeepStrictEqual } from "node:util";
import { writeAudit } from "@/db/queries/audit";
import { findLog } from "@/db/queries/logs";
import { findEdit, putEdit, removeEdit } from "@/db/queries/overrides";
import { findAthlete } from "@/db/queries/athletes";
import type { Tx } from "@/db/client";
import { slotsOf, type LiftEdit, type LineEdit } from "@/lib/engine";
import { whyNot } from "@/lib/engine/prescription/empty";
import type { Item } from "@/lib/engine/types";
import { AppError, notFound, type FieldError } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { SaveEdit, SessionPageView } from "@/lib/schemas/prescription";
import { loadCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { timeAfter } from "@/lib/services/exercises/save";
import { sessionIn } from "@/lib/services/logs/session-for";
import { whyClosed } from "./closed";
import { readSession } from "./session-page";
import { usedExercises } from "./used-exercises";

/** What is said, without what was left out or left empty; null where nothing is. */
function saidIn({ lines, note }: SaveEdit["edit"]): LiftEdit | null {
  const said = Object.entries(lines).flatMap(([slot, given]): [string, LineEdit][] => {
    const { exercise, sets, reps, kg, note: words } = given;
    const line: LineEdit = {
      ...(exercise !== undefined && { exercise }),
      ...(sets !== undefined && { sets }),
      ...(reps !== undefined && { reps }),
      ...(kg !== undefined && { kg }),
      ...(words && { note: words }),
    };
    return Object.keys(line).length > 0 ? [[slot, line]] : [];
  });
  if (said.length === 0 && !note) return null;
  return { lines: Object.fromEntries(said), ...(note && { note }) };
}

/**
 * What does not fit: a place that the session does not have, an exercise that the team does not have or the athlete may not do.
 * A choice that stood before is let be: its line says where it does not stand any more.
 */
async function problemsOf(
  tx: Tx,
  ctx: TeamContext,
  subject: { readonly item: Item; readonly athleteId: string; readonly before: LiftEdit | null },
  edit: LiftEdit,
): Promise<FieldError[]> {
  const { item, athleteId, before } = subject;
  const [athlete, exercises] = await Promise.all([
    findAthlete(tx, ctx.teamId, athleteId),
    usedExercises(tx, ctx.teamId),
  ]);
  const bounds = {
    equipment: new Set(athlete?.equipment ?? []),
    limitations: new Set(athlete?.limitationCodes ?? []),
  };
  const slots = new Set(slotsOf(item).map(({ id }) => id));
  return Object.entries(edit.lines).flatMap(([slot, { exercise: id }]): FieldError[] => {
    const pointer = `/edit/lines/${slot}`;
    if (!slots.has(slot)) return [{ pointer, message: "This session has no such place." }];
    if (id === undefined || before?.lines[slot]?.exercise === id) return [];
    const exercise = exercises.find((one) => one.id === id);
    if (!exercise) return [{ pointer: `${pointer}/exercise`, message: "The team has no such exercise." }];
    const why = whyNot(exercise, bounds);
    return why === "" ? [] : [{ pointer: `${pointer}/exercise`, message: `${exercise.name}: ${why}.` }];
  });
}

/**
 * Keeps what a coach writes over one lifting session, whole; nothing written takes it away. It hangs on the lift's identity and so
 * survives re-planning. Throws `stale` with what stands where someone else wrote meanwhile, `conflict` in words once it was
 * logged, `invalid` with a pointer per problem.
 */
export async function saveEdit(
  ctx: TeamContext,
  { params, body }: { params: Record<string, string>; body: SaveEdit },
): Promise<SessionPageView> {
  await ctx.db.transaction(async (tx) => {
    const camp = await loadCamp(tx, ctx, params.id ?? "", { lock: true });
    if (!can(ctx.member, "prescription.write", camp.athlete.id))
      throw new AppError("forbidden", "Your role may not do this.");
    const session = sessionIn(camp, params.sid);
    const log = await findLog(tx, ctx.teamId, camp.row.id, session.id);
    if (!session.lift || (session.status === "cancelled" && !log)) throw notFound();
    const closed = whyClosed(camp, session, log);
    if (closed) throw new AppError("conflict", closed);
    const name = { teamId: ctx.teamId, campId: camp.row.id, liftId: session.id };
    const standing = await findEdit(tx, name);
    const base = body.base === null ? null : Date.parse(body.base);
    if ((standing?.changedAt.getTime() ?? null) !== base)
      throw new AppError("stale", "Another coach wrote on this session meanwhile. Load it again.", {
        current: standing && { ...standing, changedAt: standing.changedAt.toISOString() },
      });
    const edit = saidIn(body.edit);
    if (isDeepStrictEqual(edit, standing?.edit ?? null)) return;
    const subject = { item: session.lift.item, athleteId: camp.athlete.id, before: standing?.edit ?? null };
    const errors = edit ? await problemsOf(tx, ctx, subject, edit) : [];
    if (errors.length > 0)
      throw new AppError("invalid", errors[0]?.message ?? "This cannot be written.", { errors });
    const changedAt = timeAfter(ctx.now, standing?.changedAt ?? null);
    if (edit) await putEdit(tx, name, { edit, userId: ctx.userId, changedAt });
    else await removeEdit(tx, name);
    await writeAudit(tx, ctx, "prescription.edit", camp.row.id, { liftId: session.id, edit });
  });
  return readSession(ctx, { params });
}
