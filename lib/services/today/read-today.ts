import { listDaySessions } from "@/db/queries/athlete-day";
import { listCheckIns, type CheckInRow } from "@/db/queries/check-ins";
import { listHolds } from "@/db/queries/holds";
import { listLogs, listTopSets, type LogWithSets } from "@/db/queries/logs";
import { listRequestsOfCamps, type RequestRow } from "@/db/queries/requests";
import { findUser } from "@/db/queries/users";
import { listWeights } from "@/db/queries/weights";
import { dayFromIso, daysOutOf, isoFromDay } from "@/lib/engine";
import type { PrescribedLift } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { notFound } from "@/lib/errors";
import type { AthleteDay, CheckIn, DaySession, TodayView } from "@/lib/schemas/today";
import { loadPrescriptionParts, prescribeFrom } from "@/lib/services/prescription/prescribe-camp";
import type { TeamContext } from "@/lib/services/context";
import { athleteNow, spanOf, type AthleteNow } from "./athlete-day";
import { daySessionOf, exercisesIn, type SessionRow } from "./day-session";
import { weightViewOf, weightsFrom } from "./weight-view";

/** Days ahead that the phone keeps. */
const AHEAD_DAYS = 7;
/** Older figures say nothing of the next session; days. */
export const LAST_TIME_DAYS = 120;

const checkInOf = ({ sleep, fatigue, soreness, stress }: CheckInRow): CheckIn => ({
  sleep,
  fatigue,
  soreness,
  stress,
});
const keyOf = (campId: string, sessionId: string): string => `${campId} ${sessionId}`;

async function load(ctx: TeamContext, now: AthleteNow) {
  const { db, teamId, userId } = ctx;
  const { athlete, today } = now;
  const window = { from: isoFromDay((today - 1) as Day), to: isoFromDay((today + AHEAD_DAYS) as Day) };
  const campIds = now.camps
    .filter((one) => spanOf(one).from <= today + AHEAD_DAYS && dayFromIso(one.camp.boutDate) >= today - 1)
    .map(({ camp }) => camp.id);
  const weightWindow = { from: isoFromDay(weightsFrom(now)), to: isoFromDay(today) };
  const [sessions, logs, requests, checkIns, weights, holds, parts, user] = await Promise.all([
    listDaySessions(db, teamId, campIds, window),
    listLogs(db, teamId, athlete.id, window),
    listRequestsOfCamps(db, teamId, campIds),
    listCheckIns(db, teamId, athlete.id, window),
    now.minor ? [] : listWeights(db, teamId, athlete.id, weightWindow),
    listHolds(db, teamId, athlete.id),
    loadPrescriptionParts(db, teamId, athlete, campIds),
    findUser(db, userId),
  ]);
  return { window, sessions, logs, requests, checkIns, weights, holds, parts, user };
}

/** Sessions of the window with what was asked, logged and requested. */
async function sessionsOf(
  ctx: TeamContext,
  now: AthleteNow,
  { window, sessions, logs, requests, parts }: Awaited<ReturnType<typeof load>>,
): Promise<DaySession[]> {
  const prescribed = new Map<string, PrescribedLift>();
  for (const { camp } of now.camps) {
    const rows = sessions.filter((row) => row.campId === camp.id);
    for (const lift of prescribeFrom(parts, { row: camp, sessions: rows }, ctx.now))
      prescribed.set(keyOf(camp.id, lift.id), lift);
  }
  const logOf = new Map<string, LogWithSets>(
    logs.map((one) => [keyOf(one.log.campId, one.log.sessionId), one]),
  );
  const requestOf = new Map<string, RequestRow>();
  for (const row of requests) {
    const key = keyOf(row.campId, row.sessionId);
    if (!requestOf.has(key)) requestOf.set(key, row);
  }
  const shown = sessions.filter(
    (row) =>
      row.day >= window.from &&
      row.day <= window.to &&
      // What was logged stays in sight also where the plan dropped it.
      (row.status === "confirmed" || logOf.has(keyOf(row.campId, row.id))),
  );
  const wanted = (row: SessionRow) => {
    const key = keyOf(row.campId, row.id);
    const log = logOf.get(key) ?? null;
    return { row, log, request: requestOf.get(key) ?? null, prescription: prescribed.get(key) ?? null };
  };
  const all = shown.map(wanted);
  const exercises = new Set(
    all.flatMap(({ log, prescription }) => exercisesIn(log ? log.log.prescribed : prescription)),
  );
  const topSets = await listTopSets(ctx.db, ctx.teamId, now.athlete.id, [...exercises], {
    from: isoFromDay((now.today - LAST_TIME_DAYS) as Day),
    to: window.to,
  });
  return all.map(({ row, log, request, prescription }) =>
    daySessionOf(row, { prescription, log, request, topSets }),
  );
}

const nextHold = (
  holds: Awaited<ReturnType<typeof listHolds>>,
  { from, to }: { from: string; to: string },
): TodayView["hold"] => {
  const standing = holds
    .map(({ hold }) => hold)
    .filter(
      (hold) => hold.liftedAt === null && hold.fromDay <= to && (hold.toDay === null || hold.toDay >= from),
    )
    .sort((a, b) => a.fromDay.localeCompare(b.fromDay))[0];
  return standing ? { from: standing.fromDay, to: standing.toDay } : null;
};

function boutOf({ camps, today }: AthleteNow): TodayView["bout"] {
  const next = camps.find(({ camp }) => dayFromIso(camp.boutDate) >= today);
  if (!next) return null;
  const { id, boutDate, boutTime, place, limitKg } = next.camp;
  return { campId: id, date: boutDate, time: boutTime, place, limitKg };
}

function daysOutOn({ camps }: AthleteNow, day: Day): number | null {
  const covering = camps.find((one) => {
    const { from, to } = spanOf(one);
    return from <= day && day <= to;
  });
  return covering ? daysOutOf(dayFromIso(covering.camp.boutDate), day) : null;
}

/**
 * Yesterday, today and the next seven days of the signed-in athlete: sessions with what is asked and was logged, check-ins, and
 * weight against the line. Nobody else has a day of their own: 404.
 */
export async function readToday(ctx: TeamContext): Promise<TodayView> {
  const { role, athleteId } = ctx.member;
  const now = role === "athlete" && athleteId !== null ? await athleteNow(ctx.db, ctx, athleteId) : null;
  if (!now) throw notFound();
  const loaded = await load(ctx, now);
  const sessions = await sessionsOf(ctx, now, loaded);
  const window = Array.from({ length: AHEAD_DAYS + 2 }, (_, index) => (now.today - 1 + index) as Day);
  const days = window.map((day): AthleteDay => {
    const date = isoFromDay(day);
    const checkIn = loaded.checkIns.find((row) => row.day === date);
    return {
      date,
      daysOut: daysOutOn(now, day),
      sessions: sessions.filter((session) => session.date === date),
      checkIn: checkIn ? checkInOf(checkIn) : null,
      kg: loaded.weights.find((row) => row.day === date)?.kg ?? null,
    };
  });
  const bout = boutOf(now);
  return {
    athlete: { id: now.athlete.id, name: now.athlete.name, minor: now.minor },
    unit: loaded.user?.units ?? "kg",
    today: isoFromDay(now.today),
    madeAt: ctx.now.toISOString(),
    // Growing bodies are not brought to a limit: it is not shown under 18.
    bout: bout && now.minor ? { ...bout, limitKg: null } : bout,
    days,
    weight: weightViewOf(now, loaded.weights, window),
    hold: nextHold(loaded.holds, { from: isoFromDay(now.today), to: loaded.window.to }),
  };
}
