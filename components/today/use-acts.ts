"use client";

import { useMemo } from "react";
import { dayFromIso } from "@/lib/engine/geometry";
import { dayText } from "@/lib/format/civil";
import { placeOf, type Entry, type Work } from "@/lib/offline/entry";
import { EMPTY_LOG } from "@/lib/offline/overlay";
import { again, contentOf, drop, enqueue, keepMine, waitingLog } from "@/lib/offline/queue";
import type { QueueStore } from "@/lib/offline/queue-store";
import type { CheckIn, DaySession, SessionLog, TodayView } from "@/lib/schemas/today";

const titleOf = ({ title, date }: Pick<DaySession, "title" | "date">): string =>
  `${title}, ${dayText(dayFromIso(date))}`;

const newEntry = (title: string, work: Work): Entry => ({
  key: crypto.randomUUID(),
  madeAt: new Date().toISOString(),
  title,
  work,
  tried: false,
  stuck: null,
});

/** The log as it stands for this session, on the server, below what waits here. */
const storedLog = (base: TodayView, { campId, id }: DaySession) =>
  base.days.flatMap((day) => day.sessions).find((one) => one.campId === campId && one.id === id)?.log ?? null;

/** Everything an athlete can say. Each goes into the queue at once and is sent from there. */
export function useActs(store: QueueStore, base: TodayView) {
  return useMemo(() => {
    const add = (entry: Entry): void => void store.change((queue) => enqueue(queue, entry));
    const athleteId = base.athlete.id;
    return {
      /** Changes parts of a log; `change` sees the log as it stands, whatever was tapped a moment ago. */
      log: (session: DaySession, change: (log: SessionLog) => Partial<SessionLog>): void => {
        const { campId, id: sessionId } = session;
        const stored = storedLog(base, session);
        const baseVersion = stored?.version ?? 0;
        const entry = newEntry(titleOf(session), {
          kind: "log",
          campId,
          sessionId,
          baseVersion,
          log: EMPTY_LOG,
        });
        void store.change((queue) => {
          const now = waitingLog(queue, campId, sessionId) ?? (stored ? contentOf(stored) : EMPTY_LOG);
          const log = { ...now, ...change(now) };
          return enqueue(queue, { ...entry, work: { kind: "log", campId, sessionId, baseVersion, log } });
        });
      },
      checkIn: (date: string, answers: CheckIn): void =>
        add(
          newEntry(`Check-in, ${dayText(dayFromIso(date))}`, { kind: "check-in", athleteId, date, answers }),
        ),
      weight: (date: string, kg: number): void =>
        add(newEntry(`Weight, ${dayText(dayFromIso(date))}`, { kind: "weight", athleteId, date, kg })),
      ask: (session: DaySession, reason: string): void =>
        add(
          newEntry(`Request, ${titleOf(session)}`, {
            kind: "request",
            campId: session.campId,
            sessionId: session.id,
            reason,
          }),
        ),
      /** Takes a request back: one that has not left this phone is simply dropped. */
      withdraw: (session: DaySession): void => {
        const requestId = session.request?.id;
        if (requestId === undefined) return;
        const { campId, id: sessionId } = session;
        const entry = newEntry(`Request taken back, ${titleOf(session)}`, {
          kind: "withdraw",
          campId,
          sessionId,
          requestId,
        });
        void store.change((queue) => {
          const unsent = queue.find(({ key, tried }) => key === requestId && !tried);
          return unsent ? drop(queue, unsent.key) : enqueue(queue, entry);
        });
      },
      keepMine: (key: string): void => {
        const freshKey = crypto.randomUUID();
        void store.change((queue) => keepMine(queue, key, freshKey));
      },
      again: (key: string): void => {
        const freshKey = crypto.randomUUID();
        void store.change((queue) => again(queue, key, freshKey));
      },
      drop: (key: string): void => void store.change((queue) => drop(queue, key)),
    };
  }, [store, base]);
}

export type Acts = ReturnType<typeof useActs>;

/** Whether something about this place waits here: `log:camp/session`, `check-in:date` and so on. */
export const isWaiting = (entries: readonly Entry[], place: string): boolean =>
  entries.some(({ work }) => placeOf(work) === place);
