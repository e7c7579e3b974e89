import type { AthleteDay, DaySession, SessionLog, TodayView } from "@/lib/schemas/today";
import type { Entry, Work } from "./entry";
import type { Queue } from "./queue";

/** A session that nobody has written about. */
export const EMPTY_LOG: SessionLog = {
  state: "open",
  effort: null,
  minutes: null,
  hardRounds: null,
  knock: false,
  painPlace: "",
  pain: null,
  note: "",
  sets: [],
};

function sessionWith(session: DaySession, { key, madeAt, work }: Entry): DaySession {
  if (!("sessionId" in work) || work.sessionId !== session.id || work.campId !== session.campId)
    return session;
  switch (work.kind) {
    case "log": {
      const { loggedAt = madeAt } = session.log ?? {};
      return {
        ...session,
        log: { ...work.log, version: work.baseVersion, loggedAt, changedAt: madeAt },
      };
    }
    case "request":
      return { ...session, request: { id: key, reason: work.reason, state: "asked", answer: "" } };
    case "withdraw":
      return session.request?.id === work.requestId
        ? { ...session, request: { ...session.request, state: "withdrawn" } }
        : session;
  }
}

function dayWith(day: AthleteDay, entry: Entry): AthleteDay {
  const { work } = entry;
  if (work.kind === "check-in") return work.date === day.date ? { ...day, checkIn: work.answers } : day;
  if (work.kind === "weight") return work.date === day.date ? { ...day, kg: work.kg } : day;
  return { ...day, sessions: day.sessions.map((session) => sessionWith(session, entry)) };
}

/** What the athlete sees: the server's word with what waits on this phone laid over it. */
export const overlay = (view: TodayView, queue: Queue): TodayView =>
  queue.reduce<TodayView>(
    (seen, entry) => ({ ...seen, days: seen.days.map((day) => dayWith(day, entry)) }),
    view,
  );

/** What the server has once it took `entry`: the same, with the version it gave. */
export function settled(view: TodayView, entry: Entry, version: number | null): TodayView {
  const work: Work =
    entry.work.kind === "log" && version !== null ? { ...entry.work, baseVersion: version } : entry.work;
  return overlay(view, [{ ...entry, work }]);
}
