"use client";

import { useEffect, useMemo, useState, useSyncExternalStore } from "react";
import { overlay } from "@/lib/offline/overlay";
import { createDayStore } from "@/lib/query/day-store";
import { queueOf } from "@/lib/offline/queue-store";
import type { TodayView } from "@/lib/schemas/today";
import { presentDate } from "./days";
import { useFlushing } from "./use-flushing";
import { useKeptView } from "./use-kept-view";

const subscribeNet = (listener: () => void): (() => void) => {
  window.addEventListener("online", listener);
  window.addEventListener("offline", listener);
  return () => {
    window.removeEventListener("online", listener);
    window.removeEventListener("offline", listener);
  };
};

/** Half a minute: midnight passes while the page is open. */
const TICK_MS = 30_000;

function usePresentDate(view: TodayView): string {
  // Server and first render agree on the view's own day.
  const [now, setNow] = useState<Date | null>(null);
  useEffect(() => {
    const tick = (): void => setNow(new Date());
    const first = setTimeout(tick, 0);
    const timer = setInterval(tick, TICK_MS);
    return () => {
      clearTimeout(first);
      clearInterval(timer);
    };
  }, []);
  return now ? presentDate(view, now) : view.today;
}

/** The athlete's day: what the server said, what waits on this phone laid over it, and how the two stand. */
export function useToday(initial: TodayView, userId: string) {
  const [day] = useState(() => createDayStore(initial));
  const { data, opens, signedOut } = useKeptView(day, userId);
  const store = useMemo(() => queueOf(userId), [userId]);
  const queue = useSyncExternalStore(store.subscribe, store.read, store.readEmpty);
  const round = useFlushing(store, queue, day);
  const net = useSyncExternalStore(
    subscribeNet,
    () => navigator.onLine,
    () => true,
  );
  const view = useMemo(() => overlay(data, queue), [data, queue]);
  return {
    /** As the server has it. */
    base: data,
    /** As the athlete sees it. */
    view,
    today: usePresentDate(data),
    store,
    queue,
    online: net && round !== "unreachable",
    opens,
    signedOut: signedOut || round === "signed-out",
  };
}
