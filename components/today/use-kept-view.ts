"use client";

import { useEffect, useState, useSyncExternalStore } from "react";
import { claimDevice, keepView, keptView } from "@/lib/offline/device";
import { openWithoutNet } from "@/lib/offline/register";
import type { DayStore } from "@/lib/query/day-store";

/** A view that was made so long ago is asked for again when the page is looked at, milliseconds. */
const STALE_MS = 5_000;

/** Asks again when the page is looked at, or a net comes back. */
function useRenewing(day: DayStore): void {
  useEffect(() => {
    const renew = (): void => {
      const old = Date.now() - Date.parse(day.read().madeAt) > STALE_MS;
      if (old && navigator.onLine && document.visibilityState === "visible") void day.refresh();
    };
    renew();
    window.addEventListener("online", renew);
    document.addEventListener("visibilitychange", renew);
    return () => {
      window.removeEventListener("online", renew);
      document.removeEventListener("visibilitychange", renew);
    };
  }, [day]);
}

/**
 * What the server says, also without a net: the newer of the page's copy and this phone's, asked again when there is a net,
 * and kept. `opens`: the page itself opens without a net. `signedOut`: the session has ended.
 */
export function useKeptView(day: DayStore, userId: string) {
  const data = useSyncExternalStore(day.subscribe, day.read, day.read);
  const problem = useSyncExternalStore(day.subscribe, day.readProblem, day.readProblem);
  const [looked, setLooked] = useState(false);
  const [opens, setOpens] = useState(false);
  useRenewing(day);

  useEffect(() => {
    void (async () => {
      await claimDevice(userId);
      const kept = await keptView(userId);
      // Of the same instant this phone's copy is the better one: what was sent since is in it. Without a net it always is: the worker
      // may have fetched the page by itself a moment after, and before what was sent.
      if (kept) day.set((shown) => (kept.madeAt >= shown.madeAt || !navigator.onLine ? kept : shown));
      setLooked(true);
      setOpens(await openWithoutNet());
    })();
  }, [day, userId]);

  useEffect(() => {
    if (looked) void keepView(userId, data);
  }, [looked, data, userId]);

  return { data, opens, signedOut: problem?.problem.status === 401 };
}
