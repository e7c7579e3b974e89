"use client";

import { useCallback, useEffect, useState } from "react";
import { keepView } from "@/lib/offline/device";
import type { Entry } from "@/lib/offline/entry";
import { flush, type Round } from "@/lib/offline/flush";
import { settled } from "@/lib/offline/overlay";
import { contentOf, type Queue } from "@/lib/offline/queue";
import type { QueueStore } from "@/lib/offline/queue-store";
import type { DayStore } from "@/lib/query/day-store";
import { deliver } from "@/lib/query/today";

/** How often is tried while something waits, milliseconds. */
const RETRY_MS = 20_000;
/** Changes in quick succession (a stepper) go out as one, milliseconds. */
const GATHER_MS = 400;

/** Runs `work` in one tab at a time; where another is at it, not at all. */
async function alone(name: string, work: () => Promise<Round>): Promise<Round | null> {
  if (!("locks" in navigator)) return work();
  return navigator.locks.request(name, { ifAvailable: true }, (lock) => (lock ? work() : null));
}

/** Sends what waits whenever there is reason to hope; gives back how the last round ended. */
export function useFlushing(store: QueueStore, queue: Queue, day: DayStore): Round | null {
  const [round, setRound] = useState<Round | null>(null);

  const run = useCallback(async () => {
    // The browser is sure that there is no net: nothing is tried, so nothing is in doubt.
    if (!navigator.onLine) return;
    const { userId } = store;
    let any = false;
    const show = async (entry: Entry, version: number | null): Promise<void> => {
      any = true;
      // A read that began before this write must not undo it on the screen.
      day.cancel();
      await keepView(
        userId,
        day.set((shown) => settled(shown, entry, version)),
      );
    };
    const result = await alone(`bellward-send:${userId}`, () =>
      flush(store, {
        send: deliver,
        onSent: show,
        // Below what waits here stands from now on what the other device said.
        onStale: (entry, theirs) =>
          entry.work.kind === "log"
            ? show({ ...entry, work: { ...entry.work, log: contentOf(theirs) } }, theirs.version)
            : Promise.resolve(),
      }),
    );
    if (result) setRound(result);
    if (any) await day.refresh();
  }, [day, store]);

  // Each new write starts the gathering anew; marks on an entry do not.
  const waiting = queue.flatMap(({ key, stuck }) => (stuck === null ? [key] : [])).join();
  useEffect(() => {
    if (waiting === "") return;
    const soon = setTimeout(() => void run(), GATHER_MS);
    const retry = setInterval(() => void run(), RETRY_MS);
    return () => {
      clearTimeout(soon);
      clearInterval(retry);
    };
  }, [waiting, run]);

  useEffect(() => {
    const hope = (): void => {
      if (document.visibilityState === "visible") void run();
    };
    window.addEventListener("online", hope);
    document.addEventListener("visibilitychange", hope);
    return () => {
      window.removeEventListener("online", hope);
      document.removeEventListener("visibilitychange", hope);
    };
  }, [run]);
  return round;
}
