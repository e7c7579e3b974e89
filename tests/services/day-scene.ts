import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { sessions } from "@/db/schema";
import type { Database } from "@/db/client";
import { AppError } from "@/lib/errors";
import type { SaveLog, SessionLog } from "@/lib/schemas/today";
import { createCamp } from "@/lib/services/camps/create";
import type { TeamContext } from "@/lib/services/context";
import { saveLog } from "@/lib/services/logs/save-log";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";

/** Tuesday morning in Lisbon; hard sparring is at 18:00, pads were yesterday at 18:00. */
export const NOW = new Date("2026-12-01T08:00:00Z");

/** A team whose athlete is in the third week of a camp that was laid out before it began. */
export async function dayScene(db: Database, form: Parameters<typeof campForm>[0] = {}) {
  const team = await teamWithEveryRole(db, NOW);
  const { id: campId } = await createCamp(team.as("head", new Date("2026-11-14T12:00:00Z")), {
    body: campForm({ athlete: { id: team.athlete.id }, ...form }),
  });
  const sessionOn = async (day: string, source: "lift" | "sport" | "bout" | "weigh-in" = "sport") => {
    const [row] = await db
      .select()
      .from(sessions)
      .where(and(eq(sessions.campId, campId), eq(sessions.day, day), eq(sessions.source, source)));
    if (!row) throw new Error(`no ${source} on ${day}`);
    return row;
  };
  const lifts = async () =>
    db
      .select()
      .from(sessions)
      .where(and(eq(sessions.campId, campId), eq(sessions.source, "lift")))
      .orderBy(sessions.startsAt);
  /** The newest lifting session that is past at `NOW`. */
  const lastLift = async () => {
    const row = (await lifts()).filter((lift) => lift.startsAt < NOW).at(-1);
    if (!row) throw new Error("no lift yet");
    return row;
  };
  return { ...team, campId, sessionOn, lifts, lastLift };
}
export type DayScene = Awaited<ReturnType<typeof dayScene>>;

/** A session as done, invented numbers. */
export const done = (over: Partial<SessionLog> = {}): SessionLog => ({
  state: "done",
  effort: 6,
  minutes: 55,
  hardRounds: null,
  knock: false,
  painPlace: "",
  pain: null,
  note: "",
  sets: [],
  ...over,
});

export const keep = (
  ctx: TeamContext,
  campId: string,
  sid: string,
  log: SessionLog,
  over: Partial<SaveLog> = {},
) => saveLog(ctx, { params: { id: campId, sid }, body: { key: randomUUID(), baseVersion: 0, log, ...over } });

/** The refusal of a promise; fails the test where it was not refused. */
export const refusal = async (promise: Promise<unknown>): Promise<AppError> => {
  const error: unknown = await promise.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof AppError)) throw new Error(`not refused: ${String(error)}`);
  return error;
};
