import { and, asc, eq } from "drizzle-orm";
import { campSpan } from "../../lib/book";
import { dayFromIso } from "../../lib/engine";
import type { Exercise, PrescribedLift } from "../../lib/engine";
import type { Day } from "../../lib/engine/types";
import { ensureLibrary } from "../../lib/services/exercises/library";
import { prescribeCamp } from "../../lib/services/prescription/prescribe-camp";
import type { Database, Transaction } from "../client";
import { listExercises } from "../queries/exercises";
import { listHolds } from "../queries/holds";
import type { LogRow } from "../queries/logs";
import {
  athletes,
  bests,
  camps,
  checkIns,
  loggedSets,
  requests,
  sessionLogs,
  sessions,
  testTrials,
  weights,
} from "../schema";
import { bestRows, checkInRows, weightRows } from "./answers";
import { between, chance } from "./chance";
import { doneSets } from "./done-sets";
import { STORIES, type AthleteStory } from "./log-scenario";
import { trialRows } from "./trials";

type CampRow = typeof camps.$inferSelect;
type SessionRow = typeof sessions.$inferSelect;

interface Seeding {
  readonly teamId: string;
  readonly today: Day;
  readonly now: Date;
}

const MINUTE_MS = 60_000;
const clamp = (value: number, low: number, high: number): number => Math.min(high, Math.max(low, value));
const half = (value: number): number => Math.round(value * 2) / 2;

/** Rows are written a thousand at a time: a statement has at most 65,535 parameters. */
async function inPieces<T>(rows: readonly T[], write: (piece: T[]) => Promise<unknown>): Promise<void> {
  for (let from = 0; from < rows.length; from += 1000) await write(rows.slice(from, from + 1000));
}

/** What stands out in some of an athlete's sessions. */
function marksOf(rows: readonly SessionRow[], story: AthleteStory) {
  const lifts = rows.filter((row) => row.source === "lift").slice(-2);
  const sparring = rows.filter((row) => row.kind === "hard-sparring").at(-1);
  return {
    hard: new Set(story.hardLately > 0 ? lifts.map((row) => row.id) : []),
    pain: story.pain ? rows.at(-1)?.id : undefined,
    knock: story.knock === undefined ? undefined : sparring?.id,
  };
}

function logRow(
  row: SessionRow,
  name: string,
  given: {
    story: AthleteStory;
    marks: ReturnType<typeof marksOf>;
    prescribed: PrescribedLift | null;
    /** Position in the camp: words of chance must not change from one seeding to the next. */
    index: number;
  },
): Omit<LogRow, "athleteId"> {
  const { story, marks, prescribed, index } = given;
  const { teamId, campId, id, day } = row;
  const special = marks.hard.has(row.id) || row.id === marks.pain || row.id === marks.knock;
  const missed = !special && chance(name, index, "missed") < 0.06;
  const felt =
    row.effort + between(-1, 1, 0.5, name, index, "effort") + (marks.hard.has(id) ? story.hardLately : 0);
  const loggedAt = new Date(row.endsAt.getTime() + 20 * MINUTE_MS);
  const pain = id === marks.pain ? story.pain : undefined;
  return {
    teamId,
    campId,
    sessionId: id,
    day,
    state: missed ? "missed" : "done",
    effort: missed ? null : half(clamp(felt, 1, 10)),
    minutes: missed ? null : Math.max(10, row.minutes + between(-5, 10, 5, name, index, "minutes")),
    hardRounds: !missed && row.kind === "hard-sparring" ? between(4, 6, 1, name, index, "rounds") : null,
    knock: id === marks.knock,
    painPlace: pain?.place ?? "",
    pain: pain?.of10 ?? null,
    note: (id === marks.knock ? story.knock : undefined) ?? (missed ? "Could not get away from work." : ""),
    prescribed,
    version: 1,
    keys: [],
    loggedAt,
    changedAt: loggedAt,
  };
}

async function seedCamp(
  tx: Transaction,
  seeding: Seeding,
  { athlete, camp, story }: { athlete: { id: string; name: string }; camp: CampRow; story: AthleteStory },
  exercises: ReadonlyMap<string, Exercise>,
): Promise<void> {
  const { teamId, today, now } = seeding;
  const { from } = campSpan({ bout: { date: camp.boutDate }, weeks: camp.weeks });
  await tx.insert(bests).values(bestRows(story, { teamId, athleteId: athlete.id }, (from - 2) as Day));
  const all = await tx
    .select()
    .from(sessions)
    .where(and(eq(sessions.teamId, teamId), eq(sessions.campId, camp.id), eq(sessions.status, "confirmed")))
    .orderBy(asc(sessions.startsAt), asc(sessions.id));
  const holds = (await listHolds(tx, teamId, athlete.id)).map(({ hold }) => hold);
  const past = all.filter(
    (row) =>
      !holds.some(({ fromDay, toDay }) => fromDay <= row.day && (toDay === null || row.day <= toDay)) &&
      (row.source === "lift" || row.source === "sport") &&
      row.kind !== "rest" &&
      row.kind !== "travel" &&
      dayFromIso(row.day) < today,
  );
  const lifts = new Map(
    (await prescribeCamp(tx, { teamId, now }, { row: camp, sessions: all })).map((lift) => [lift.id, lift]),
  );
  const marks = marksOf(past, story);
  const logs = past.map((row, index) => ({
    athleteId: athlete.id,
    ...logRow(row, athlete.name, { story, marks, prescribed: lifts.get(row.id) ?? null, index }),
  }));
  const sets = logs.flatMap(({ sessionId, campId, day, state, prescribed }, index) =>
    state === "done" && prescribed
      ? doneSets(prescribed, { exercises, mass: story.mass, key: `${athlete.name} ${index}` }).map((set) => ({
          teamId,
          campId,
          athleteId: athlete.id,
          sessionId,
          day,
          ...set,
        }))
      : [],
  );
  await inPieces(logs, (piece) => tx.insert(sessionLogs).values(piece));
  await inPieces(sets, (piece) => tx.insert(loggedSets).values(piece));
  const found = weightRows(athlete.name, story, { teamId, athleteId: athlete.id }, camp, today);
  await inPieces(found, (piece) => tx.insert(weights).values(piece));
  const trials = trialRows(athlete.name, story, { teamId, athleteId: athlete.id }, camp, today);
  await inPieces(trials, (piece) => tx.insert(testTrials).values(piece));
  const asked = all.find((row) => row.title === story.cannot?.title && row.startsAt > now);
  if (asked && story.cannot)
    await tx.insert(requests).values({
      teamId,
      campId: camp.id,
      athleteId: athlete.id,
      sessionId: asked.id,
      reason: story.cannot.reason,
      createdAt: new Date(now.getTime() - 3 * 3_600_000),
    });
}

/** What the demo's athletes logged on the days behind them: sessions, sets, bests, check-ins, weights and one request. */
export async function seedLogs(db: Database, seeding: Seeding): Promise<void> {
  await ensureLibrary(db);
  const { teamId, today } = seeding;
  await db.transaction(async (tx) => {
    const listed = await listExercises(tx, teamId);
    const exercises = new Map(listed.map(({ exercise }) => [exercise.id, exercise]));
    const rows = await tx
      .select({ athlete: { id: athletes.id, name: athletes.name }, camp: camps })
      .from(athletes)
      .leftJoin(camps, and(eq(camps.teamId, athletes.teamId), eq(camps.athleteId, athletes.id)))
      .where(eq(athletes.teamId, teamId))
      .orderBy(asc(athletes.name));
    for (const { athlete, camp } of rows) {
      const story = STORIES[athlete.name];
      if (!story) continue;
      const answers = checkInRows(athlete.name, story, { teamId, athleteId: athlete.id }, today);
      await tx.insert(checkIns).values(answers);
      if (camp) await seedCamp(tx, seeding, { athlete, camp, story }, exercises);
    }
  });
}
