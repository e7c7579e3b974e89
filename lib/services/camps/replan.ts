import { randomUUID } from "node:crypto";
import { listOpenCampIds } from "@/db/queries/camps";
import type { Tx } from "@/db/client";
import { isPreview, previewEdit } from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine";
import type { SportKind, SportSession } from "@/lib/engine/types";
import { AppError } from "@/lib/errors";
import type { TeamContext } from "@/lib/services/context";
import { commitPreview } from "./commit";
import { loadCamp, type LoadedCamp } from "./load";

/**
 * Plans open camps again after something outside the camp book changed (a hold, a house rule): each gets a revision of its
 * own where anything moved. Runs in the caller's transaction, so that the cause and its effects commit together.
 */
export async function replan(tx: Tx, ctx: TeamContext, summary: string, athleteId?: string): Promise<number> {
  const today = ctx.now.toISOString().slice(0, 10);
  const ids = await listOpenCampIds(tx, ctx.teamId, today, athleteId);
  let changed = 0;
  for (const id of ids) {
    const camp = await loadCamp(tx, ctx, id, { lock: true });
    if (boutIsOver(camp, ctx.now)) continue;
    const preview = previewEdit(camp, {}, instantOf(ctx.now), { sport: sportOfRows(camp.sessions) });
    if (!isPreview(preview))
      throw new AppError("invalid", preview.problems[0]?.message ?? "A camp cannot be planned.", {
        errors: preview.problems,
      });
    const { lifts, sport, weeks, violations } = preview.knockOn;
    if (lifts.length + sport.length + weeks.length + violations.length === 0) continue;
    await commitPreview(tx, ctx, camp, preview, {
      change: null,
      summary,
      idempotencyKey: randomUUID(),
      putBackOf: null,
    });
    changed++;
  }
  return changed;
}

/** Sport as it stands in the calendar: the book already holds what changed, so it cannot say what was there before. */
const sportOfRows = (rows: LoadedCamp["sessions"]): SportSession[] =>
  rows.flatMap(({ source, status, id, kind, title, day, start, minutes, effort }) =>
    source === "sport" && status === "confirmed"
      ? [
          {
            id,
            kind: kind as SportKind,
            title,
            day: dayFromIso(day),
            start: minuteFromHhmm(start),
            minutes,
            effort,
          },
        ]
      : [],
  );

const boutIsOver = (camp: LoadedCamp, now: Date): boolean =>
  camp.sessions.some((session) => session.source === "bout" && session.startsAt <= now);

/** After a hold was set or lifted. */
export const replanAthlete = (
  tx: Tx,
  ctx: TeamContext,
  athleteId: string,
  summary: string,
): Promise<number> => replan(tx, ctx, summary, athleteId);
