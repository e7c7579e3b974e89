import { findAthlete, type AthleteRow } from "@/db/queries/athletes";
import { findLog, listTopSets, type LogWithSets } from "@/db/queries/logs";
import { findEdit } from "@/db/queries/overrides";
import { listBests } from "@/db/queries/prescription";
import { findUser } from "@/db/queries/users";
import { dayFromIso, daysOutOf, isAllowed, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { Exercise, Line, PrescribedLift } from "@/lib/engine";
import { notFound } from "@/lib/errors";
import { can, type Action } from "@/lib/policy";
import type { LiftView, LineView, SessionLink, SessionPageView } from "@/lib/schemas/prescription";
import { loadCamp, type LoadedCamp } from "@/lib/services/camps/load";
import type { TeamContext } from "@/lib/services/context";
import { logView } from "@/lib/services/logs/log-view";
import { sessionIn, type SessionRow } from "@/lib/services/logs/session-for";
import { daySessionOf, exercisesIn } from "@/lib/services/today/day-session";
import { LAST_TIME_DAYS } from "@/lib/services/today/read-today";
import { whyClosed } from "./closed";
import { bestView, bestsBehind, lineView, namesOf, type LineReader } from "./line-view";
import { loadPrescriptionParts, prescribeFrom, type PrescriptionParts } from "./prescribe-camp";

/** What the page asks about its reader. */
const ASKED: readonly Action[] = ["lifts.detail", "prescription.write", "prescription.swap", "logs.read"];

/** The unit that a reader sees: athletes that of their plates, the others that of their account. */
export async function unitFor(ctx: TeamContext, athlete: AthleteRow): Promise<"kg" | "lb"> {
  if (ctx.member.role === "athlete") return athlete.plateUnit;
  return (await findUser(ctx.db, ctx.userId))?.units ?? "kg";
}

const linkOf = (row: SessionRow | undefined): SessionLink | null =>
  row ? { id: row.id, title: row.title, date: row.day, start: row.start } : null;

/** The sessions that stand before and after, in time. */
function neighbours({ sessions }: LoadedCamp, row: SessionRow) {
  const standing = sessions.filter(({ id, status }) => status === "confirmed" || id === row.id);
  const at = standing.findIndex(({ id }) => id === row.id);
  return { previous: linkOf(standing[at - 1]), next: linkOf(standing[at + 1]) };
}

/** The parts without what a coach wrote over one lift. */
export function withoutEdit(parts: PrescriptionParts, campId: string, liftId: string): PrescriptionParts {
  const own = parts.overrides.get(campId);
  if (!own) return parts;
  const edits = Object.fromEntries(Object.entries(own.edits).filter(([id]) => id !== liftId));
  return { ...parts, overrides: new Map([[campId, { ...own, edits }]]) };
}

interface Loaded {
  readonly camp: LoadedCamp;
  readonly row: SessionRow;
  readonly log: LogWithSets | null;
  readonly parts: PrescriptionParts;
  /** What is asked: as it was when it was first logged, else as planned now. */
  readonly prescription: PrescribedLift | null;
}

function namesFor({ log, parts }: Loaded, lines: readonly LineView[]): Record<string, string> {
  const all = namesOf(parts.exercises);
  const own = new Map(lines.map((line) => [line.exercise, line.name]));
  const wanted = [
    ...lines.flatMap((line) => [line.exercise, ...line.alternatives, ...line.swaps]),
    ...(log?.sets ?? []).map((set) => set.exerciseId),
  ];
  return Object.fromEntries(wanted.map((id) => [id, own.get(id) ?? all.get(id) ?? id]));
}

/** Exercises that the athlete may do. */
function allowedOf({ exercises, athlete }: PrescriptionParts): Exercise[] {
  const equipment = new Set(athlete.equipment);
  const limitations = new Set(athlete.limitationCodes);
  return exercises.filter((exercise) => isAllowed(exercise, equipment, limitations));
}

/** What a coach may choose from, warm-ups left out, by name. */
const choicesOf = (allowed: readonly Exercise[]): LiftView["choices"] =>
  allowed
    .filter(({ qualities }) => qualities[0] !== "mobility")
    .map(({ id, name }) => ({ id, name }))
    .sort((a, b) => a.name.localeCompare(b.name, "en"));

async function liftViewOf(ctx: TeamContext, loaded: Loaded): Promise<LiftView | null> {
  const { camp, row, log, parts, prescription } = loaded;
  if (!row.lift || !prescription) return null;
  const campId = camp.row.id;
  const seesBests = can(ctx.member, "tests.read", camp.athlete.id);
  const [edit, rows] = await Promise.all([
    findEdit(ctx.db, { teamId: ctx.teamId, campId, liftId: row.id }),
    seesBests ? listBests(ctx.db, ctx.teamId, camp.athlete.id) : [],
  ]);
  const bare = edit && !log ? prescribeFrom(withoutEdit(parts, campId, row.id), camp, ctx.now) : [];
  const names = namesOf(parts.exercises);
  const lines = [...prescription.warmUp, ...prescription.lines];
  const allowed = allowedOf(parts);
  const reader: LineReader = {
    item: row.lift.item,
    seesBests,
    swaps: parts.overrides.get(campId)?.swaps ?? [],
    names,
    allowed,
    inSession: new Set(lines.map((line) => line.exercise)),
    planned: bare.find(({ id }) => id === row.id) ?? null,
  };
  const views = (of: readonly Line[]) => of.map((line) => lineView(line, reader));
  const [warmUp, work] = [views(prescription.warmUp), views(prescription.lines)];
  return {
    lift: { ...row.lift, past: row.startsAt <= ctx.now },
    violations: camp.plan.violations.filter(({ ids }) => ids.includes(row.id)),
    warmUp,
    lines: work,
    empty: prescription.empty,
    note: prescription.note,
    edit: edit && { changedAt: edit.changedAt.toISOString(), by: edit.by, edit: edit.edit },
    closed: whyClosed(camp, row, log),
    names: namesFor(loaded, [...warmUp, ...work]),
    choices: can(ctx.member, "prescription.write", camp.athlete.id) ? choicesOf(allowed) : [],
    bests: bestsBehind(lines, rows).map((best) => bestView(best, names)),
  };
}

async function loadSession(ctx: TeamContext, camp: LoadedCamp, row: SessionRow): Promise<Loaded> {
  const athlete = await findAthlete(ctx.db, ctx.teamId, camp.athlete.id);
  if (!athlete) throw new Error("A camp without an athlete cannot be.");
  const [log, parts] = await Promise.all([
    findLog(ctx.db, ctx.teamId, camp.row.id, row.id),
    loadPrescriptionParts(ctx.db, ctx.teamId, athlete, [camp.row.id]),
  ]);
  const planned = row.lift && !log ? prescribeFrom(parts, camp, ctx.now) : [];
  const prescription = log ? log.log.prescribed : (planned.find(({ id }) => id === row.id) ?? null);
  return { camp, row, log, parts, prescription };
}

async function topSetsFor(ctx: TeamContext, { camp, row, prescription }: Loaded) {
  const from = isoFromDay((dayFromIso(row.day) - LAST_TIME_DAYS) as Day);
  const ids = exercisesIn(prescription);
  return listTopSets(ctx.db, ctx.teamId, camp.athlete.id, ids, { from, to: row.day });
}

/**
 * One session of a camp: what is asked with its reasons, what a coach wrote over it, what was logged. Numbers are left out for
 * readers who may not see them. A session that was taken out of the plan is missing unless it was logged.
 */
export async function readSession(
  ctx: TeamContext,
  { params }: { params: Record<string, string> },
): Promise<SessionPageView> {
  const camp = await loadCamp(ctx.db, ctx, params.id ?? "");
  const row = sessionIn(camp, params.sid);
  const loaded = await loadSession(ctx, camp, row);
  const { log, parts, prescription } = loaded;
  if (row.status === "cancelled" && !log) throw notFound();
  const may = ASKED.filter((action) => can(ctx.member, action, camp.athlete.id));
  const detail = may.includes("lifts.detail");
  const logs = may.includes("logs.read");
  const topSets = logs ? await topSetsFor(ctx, loaded) : [];
  const { lastTime } = daySessionOf(row, { prescription, log, request: null, topSets });
  return {
    campId: camp.row.id,
    athlete: camp.athlete,
    daysOut: daysOutOf(dayFromIso(camp.row.boutDate), dayFromIso(row.day)),
    session: {
      id: row.id,
      source: row.source,
      kind: row.kind,
      title: row.title,
      place: row.place,
      date: row.day,
      start: row.start,
      minutes: row.minutes,
      effort: detail ? row.effort : null,
      dropped: row.status === "cancelled",
    },
    past: row.startsAt <= ctx.now,
    unit: await unitFor(ctx, parts.athlete),
    may,
    lift: detail ? await liftViewOf(ctx, loaded) : null,
    lastTime,
    log: logs && log ? logView(log) : null,
    ...neighbours(camp, row),
  };
}
