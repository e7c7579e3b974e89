import { findAthlete } from "@/db/queries/athletes";
import { listLogs } from "@/db/queries/logs";
import { planInputOf } from "@/lib/book";
import { instantOf } from "@/lib/calendar/zones";
import { dayFromIso, daysOutOf, isoFromDay, weeksOutOf } from "@/lib/engine";
import type { PrescribedLift } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { can } from "@/lib/policy";
import type { SheetSession, SheetView } from "@/lib/schemas/prescription";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import type { SessionRow } from "@/lib/services/logs/session-for";
import { civilDayAt } from "@/lib/services/today/athlete-day";
import { lineView, namesOf } from "./line-view";
import { loadPrescriptionParts, prescribeFrom, type PrescriptionParts } from "./prescribe-camp";
import { unitFor } from "./session-page";

const NO_EXERCISES: ReadonlySet<string> = new Set();

/** The week that was asked for, else the one of today; never outside the camp. */
function weekOf(ctx: TeamContext, { book, row }: LoadedCamp, asked: string | null): number {
  const zone = planInputOf(book, instantOf(ctx.now)).zone;
  const current = weeksOutOf(dayFromIso(row.boutDate), civilDayAt(zone, ctx.now));
  const wanted = asked !== null && /^\d{1,2}$/.test(asked) ? Number(asked) : current;
  return Math.min(row.weeks - 1, Math.max(0, wanted));
}

/** What is asked in each lift of the week: as it was when it was logged, else as planned. Nothing for readers without detail. */
async function prescriptions(
  ctx: TeamContext,
  camp: LoadedCamp,
  parts: PrescriptionParts,
  days: { readonly from: string; readonly to: string },
): Promise<ReadonlyMap<string, PrescribedLift>> {
  if (!can(ctx.member, "lifts.detail", camp.athlete.id)) return new Map();
  const logs = await listLogs(ctx.db, ctx.teamId, camp.athlete.id, days);
  const asked = logs.flatMap(({ log }) =>
    log.campId === camp.row.id && log.prescribed ? [log.prescribed] : [],
  );
  return new Map([...prescribeFrom(parts, camp, ctx.now), ...asked].map((lift) => [lift.id, lift]));
}

function sheetLift(
  ctx: TeamContext,
  camp: LoadedCamp,
  parts: PrescriptionParts,
  row: SessionRow,
  given: PrescribedLift | undefined,
): SheetSession["lift"] {
  if (!row.lift || !given) return null;
  const reader = {
    item: row.lift.item,
    seesBests: can(ctx.member, "tests.read", camp.athlete.id),
    swaps: parts.overrides.get(camp.row.id)?.swaps ?? [],
    names: namesOf(parts.exercises),
    // Paper offers no choice.
    allowed: [],
    inSession: NO_EXERCISES,
    planned: null,
  };
  return {
    sets: row.lift.sets,
    warmUp: given.warmUp.map(({ name }) => name),
    lines: given.lines.map((line) => lineView(line, reader)),
    empty: given.empty,
    note: given.note,
  };
}

/**
 * One camp week for the gym wall. `week` is weeks out as it stood in the address; left out or no number, the week of today.
 */
export async function readSheet(
  ctx: TeamContext,
  { campId, week: asked }: { readonly campId: string; readonly week: string | null },
): Promise<SheetView> {
  const camp = await loadCamp(ctx.db, ctx, campId);
  const athlete = await findAthlete(ctx.db, ctx.teamId, camp.athlete.id);
  if (!athlete) throw new Error("A camp without an athlete cannot be.");
  const weeksOut = weekOf(ctx, camp, asked);
  const week = camp.plan.weeks.find((one) => one.weeksOut === weeksOut);
  if (!week) throw new Error(`A camp without its week ${weeksOut} cannot be.`);
  const span = { from: isoFromDay(week.from), to: isoFromDay(week.to) };
  const parts = await loadPrescriptionParts(ctx.db, ctx.teamId, athlete, [camp.row.id]);
  const lifts = await prescriptions(ctx, camp, parts, span);
  const sessionOf = (row: SessionRow): SheetSession => ({
    id: row.id,
    source: row.source,
    kind: row.kind,
    title: row.title,
    date: row.day,
    start: row.start,
    minutes: row.minutes,
    place: row.place,
    lift: sheetLift(ctx, camp, parts, row, lifts.get(row.id)),
  });
  const standing = camp.sessions.filter(({ status }) => status === "confirmed");
  const { boutDate, boutTime, place, opponent, status, weeks } = camp.row;
  return {
    campId: camp.row.id,
    athlete: camp.athlete,
    unit: await unitFor(ctx, athlete),
    bout: { date: boutDate, time: boutTime, place, opponent },
    off: status === "off",
    week: {
      weeksOut,
      phase: week.phase,
      deload: week.deload,
      ...span,
      daysOut: daysOutOf(dayFromIso(boutDate), week.from),
    },
    weeks: Array.from({ length: weeks }, (_, index) => weeks - 1 - index),
    days: Array.from({ length: week.to - week.from + 1 }, (_, index) => {
      const date = isoFromDay((week.from + index) as Day);
      return { date, sessions: standing.filter((row) => row.day === date).map(sessionOf) };
    }),
  };
}
