import { findLog, writeLog, type LogRow, type LogWithSets } from "@/db/queries/logs";
import { findCamp, listOpenCampIds, lockCamp } from "@/db/queries/camps";
import { writeAudit } from "@/db/queries/audit";
import type { Tx } from "@/db/client";
import { planInputOf } from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import { isoFromDay } from "@/lib/engine";
import { AppError } from "@/lib/errors";
import { can } from "@/lib/policy";
import type { LogView, SaveLog, SessionLog } from "@/lib/schemas/today";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";
import { prescribeCamp } from "@/lib/services/prescription/prescribe-camp";
import { civilDayAt } from "@/lib/services/today/athlete-day";
import { editableUntil } from "@/lib/services/today/day-session";
import { actOnKnock } from "./knock";
import { logView } from "./log-view";
import { sessionIn, sessionOnDay, type SessionRow } from "./session-for";

/** A session may be logged at most so long before it starts: someone trained early. */
const AHEAD_MS = 12 * 3_600_000;
/** Retries come within days; a phone sends a handful of writes a session. */
const KEPT_KEYS = 20;

/**
 * Locks the camp; where a knock may plan others of the athlete again, all of them in the order in which re-planning locks them, so
 * that two saves never wait for each other in a ring.
 */
async function lockFor(tx: Tx, ctx: TeamContext, campId: string, knock: boolean): Promise<LoadedCamp> {
  const row = knock && isId(campId) ? await findCamp(tx, ctx.teamId, campId) : null;
  if (row) {
    const open = await listOpenCampIds(tx, ctx.teamId, ctx.now.toISOString().slice(0, 10), row.athleteId);
    for (const id of [...new Set([...open, row.id])].sort()) await lockCamp(tx, ctx.teamId, id);
  }
  return loadCamp(tx, ctx, campId, { lock: true });
}

/** Refuses a session that is not there to be logged, or is not any more. */
function mustBeLoggable(ctx: TeamContext, camp: LoadedCamp, session: SessionRow): void {
  if (session.source === "weigh-in")
    throw new AppError("conflict", "A weigh-in is not logged. Add the weight of the day instead.");
  if (session.startsAt.getTime() - ctx.now.getTime() > AHEAD_MS)
    throw new AppError("conflict", "This session is more than 12 hours ahead. Log it once it was done.");
  if (session.status === "cancelled" && session.startsAt > ctx.now)
    throw new AppError("conflict", "This session was taken out of the plan in the meantime.");
  if (ctx.member.role !== "athlete") return;
  const today = isoFromDay(civilDayAt(planInputOf(camp.book, instantOf(ctx.now)).zone, ctx.now));
  if (today > editableUntil(session.day))
    throw new AppError(
      "conflict",
      "A log can be changed until the day after the session. Ask your coach to change it.",
    );
}

/** Refuses a write on an older version, and one that takes a knock back. */
function mustFit(known: LogWithSets | null, { baseVersion, log }: SaveLog): void {
  if ((known?.log.version ?? 0) !== baseVersion)
    throw new AppError("stale", "This log was changed on another device in the meantime.", {
      current: known && logView(known),
    });
  if (known?.log.knock && !log.knock)
    throw new AppError(
      "conflict",
      "A knock to the head cannot be taken back in the log. The medic decides how to go on.",
    );
}

async function prescribedFor(tx: Tx, ctx: TeamContext, camp: LoadedCamp, session: SessionRow) {
  if (session.source !== "lift") return null;
  const lifts = await prescribeCamp(tx, ctx, camp);
  return lifts.find((lift) => lift.id === session.id) ?? null;
}

/** The row that a write makes of what stood. */
function rowOf(
  ctx: TeamContext,
  camp: LoadedCamp,
  session: SessionRow,
  given: { known: LogRow | null; key: string; log: SessionLog; prescribed: LogRow["prescribed"] },
): LogRow {
  const { known, key, prescribed } = given;
  const { sets: _, ...answers } = given.log;
  return {
    teamId: ctx.teamId,
    campId: camp.row.id,
    athleteId: camp.athlete.id,
    sessionId: session.id,
    day: session.day,
    ...answers,
    prescribed,
    version: (known?.version ?? 0) + 1,
    keys: [key, ...(known?.keys ?? [])].slice(0, KEPT_KEYS),
    loggedAt: known?.loggedAt ?? ctx.now,
    changedAt: ctx.now,
  };
}

/**
 * Keeps what was answered for one session, sets written whole. A retry with a key that was used answers the log as it stands and
 * changes nothing. Throws `stale` with `current` where the device edited an older version; `conflict` in words for a session
 * that cannot be logged now and for a knock taken back.
 */
export async function saveLog(
  ctx: TeamContext,
  { params, body }: { params: Record<string, string>; body: SaveLog },
): Promise<LogView> {
  return ctx.db.transaction(async (tx) => {
    const camp = await lockFor(tx, ctx, params.id ?? "", body.log.knock);
    if (!can(ctx.member, "logs.write", camp.athlete.id))
      throw new AppError("forbidden", "Your role may not log for this athlete.");
    const session = sessionIn(camp, params.sid);
    const known = await findLog(tx, ctx.teamId, camp.row.id, session.id);
    if (known?.log.keys.includes(body.key)) return logView(known);
    mustBeLoggable(ctx, camp, session);
    mustFit(known, body);
    const { log, key } = body;
    const prescribed = known ? known.log.prescribed : await prescribedFor(tx, ctx, camp, session);
    const row = rowOf(ctx, camp, session, { known: known?.log ?? null, key, log, prescribed });
    await writeLog(tx, row, log.sets);
    await writeAudit(tx, ctx, "log.save", camp.row.id, {
      sessionId: session.id,
      version: row.version,
      state: log.state,
      sets: log.sets.length,
    });
    if (log.knock && !known?.log.knock)
      await actOnKnock(tx, ctx, {
        campId: camp.row.id,
        sessionId: session.id,
        athlete: camp.athlete,
        session: sessionOnDay(session),
        day: session.day,
        log,
      });
    const saved = await findLog(tx, ctx.teamId, camp.row.id, session.id);
    if (!saved) throw new Error("A log that was written is not there.");
    return logView(saved);
  });
}
