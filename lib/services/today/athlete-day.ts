import { findAthleteDay, type AthleteDayRow } from "@/db/queries/athlete-day";
import type { Tx } from "@/db/client";
import { campSpan, zoneOf } from "@/lib/book";
import { civilNow, instantOf } from "@/lib/calendar/zones";
import { DAY_MINUTES, dayFromIso, instantAt, isoFromDay } from "@/lib/engine";
import type { Day, Minute, OffsetStep } from "@/lib/engine/types";
import { AppError, notFound } from "@/lib/errors";
import { can, type Action } from "@/lib/policy";
import { isMinor } from "@/lib/services/athletes/age";
import type { TeamContext } from "@/lib/services/context";
import { isId } from "@/lib/services/ids";

type RunningCamp = AthleteDayRow["camps"][number];

const whereabouts = ({ camp }: RunningCamp) => ({
  homeZone: camp.homeZone,
  weeks: camp.weeks,
  bout: { date: camp.boutDate, timeZone: camp.boutZone },
  weighIn:
    camp.weighInDate !== null && camp.weighInTime !== null
      ? { date: camp.weighInDate, time: camp.weighInTime }
      : null,
});

/** First and last day of a camp that runs. */
export const spanOf = (running: RunningCamp) => campSpan(whereabouts(running));

/** The civil day on a wall clock whose offsets are given by steps. */
export function civilDayAt(zone: readonly OffsetStep[], now: Date): Day {
  const instant = instantOf(now);
  // No place on earth is more than 14 h from UTC: the civil day is that of UTC, or a neighbour.
  const utc = Math.floor(instant / DAY_MINUTES);
  for (const day of [utc + 1, utc] as Day[]) if (instantAt(zone, day, 0 as Minute) <= instant) return day;
  return (utc - 1) as Day;
}

/** Today where the athlete is: in the zone of the camp that runs (the gym's, the venue's after the travel), else of the team. */
export function todayOf({ zone, camps }: AthleteDayRow, now: Date): Day {
  const home = civilNow(zone, now).day;
  const running = camps.find((one) => {
    const { from, to } = spanOf(one);
    return from <= home && home <= to + 1;
  });
  if (!running) return home;
  const sport =
    running.lastTravel === null ? [] : [{ kind: "travel" as const, day: dayFromIso(running.lastTravel) }];
  return civilDayAt(zoneOf(whereabouts(running), sport), now);
}

export interface AthleteNow extends AthleteDayRow {
  readonly today: Day;
  /** Under 18, today. */
  readonly minor: boolean;
}

/** Bouts of up to so many days ago still say where the athlete is. */
const BACK_DAYS = 3;

/** An athlete with what runs around now. Null where missing or foreign. */
export async function athleteNow(tx: Tx, ctx: TeamContext, athleteId: string): Promise<AthleteNow | null> {
  const utc = Math.floor(instantOf(ctx.now) / DAY_MINUTES);
  const found = await findAthleteDay(tx, ctx.teamId, athleteId, isoFromDay((utc - BACK_DAYS) as Day));
  if (!found) return null;
  const today = todayOf(found, ctx.now);
  return { ...found, today, minor: isMinor(found.athlete.dateOfBirth, isoFromDay(today)) };
}

/**
 * The athlete that a path names, for someone who may do `action` with them. Missing, foreign and not for this member's eyes
 * give the same 404; seen but not allowed is 403.
 */
export async function athleteFor(
  tx: Tx,
  ctx: TeamContext,
  athleteId: string | undefined,
  action: Action,
): Promise<AthleteNow> {
  const found =
    isId(athleteId) && can(ctx.member, "athletes.read", athleteId)
      ? await athleteNow(tx, ctx, athleteId)
      : null;
  if (!found) throw notFound();
  if (!can(ctx.member, action, found.athlete.id))
    throw new AppError("forbidden", "Your role may not do this.");
  return found;
}
