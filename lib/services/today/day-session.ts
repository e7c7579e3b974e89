import type { LogWithSets } from "@/db/queries/logs";
import type { RequestRow } from "@/db/queries/requests";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { PrescribedLift } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { DaySession, LastTime, RequestView } from "@/lib/schemas/today";
import type { LoadedCamp } from "@/lib/services/camps/load";
import { logView } from "@/lib/services/logs/log-view";

export type SessionRow = LoadedCamp["sessions"][number];
type TopSet = {
  readonly exerciseId: string;
  readonly day: string;
  readonly kg: number | null;
  readonly reps: number;
};

export const requestView = ({ id, reason, state, answer }: RequestRow): RequestView => ({
  id,
  reason,
  state,
  answer,
});

/** Exercises that a prescription names. */
export const exercisesIn = (lift: PrescribedLift | null): string[] =>
  lift ? [...lift.warmUp, ...lift.lines].map((line) => line.exercise) : [];

/** What was done of each exercise the last time before a day. `sets` are newest first. */
function lastTimes(
  lift: PrescribedLift | null,
  before: string,
  sets: readonly TopSet[],
): Record<string, LastTime> {
  const last: Record<string, LastTime> = {};
  for (const exercise of exercisesIn(lift)) {
    const set = sets.find((one) => one.exerciseId === exercise && one.day < before);
    if (set) last[exercise] = { date: set.day, kg: set.kg, reps: set.reps };
  }
  return last;
}

/** Last date on which the athlete may edit the log of a session on `day`: the day after. */
export const editableUntil = (day: string): string => isoFromDay((dayFromIso(day) + 1) as Day);

export function daySessionOf(
  row: SessionRow,
  given: {
    readonly prescription: PrescribedLift | null;
    readonly log: LogWithSets | null;
    readonly request: RequestRow | null;
    readonly topSets: readonly TopSet[];
  },
): DaySession {
  // What was asked for when it was first logged stands: planned against done must not change under it.
  const prescription = given.log ? given.log.log.prescribed : given.prescription;
  return {
    campId: row.campId,
    id: row.id,
    source: row.source,
    kind: row.kind,
    title: row.title,
    place: row.place,
    date: row.day,
    start: row.start,
    minutes: row.minutes,
    effort: row.effort,
    item: row.lift?.item ?? null,
    sets: row.lift?.sets ?? null,
    prescription,
    lastTime: lastTimes(prescription, row.day, given.topSets),
    log: given.log && logView(given.log),
    request: given.request && requestView(given.request),
    editableUntil: editableUntil(row.day),
  };
}
