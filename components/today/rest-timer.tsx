"use client";

import { useEffect, useState, useSyncExternalStore } from "react";
import { LiveRegion } from "@/components/ui/live-region";
import { clockText, restAt } from "@/lib/offline/rest";
import { restStore } from "./rest-store";

const TICK_MS = 250;
/** Two short buzzes, milliseconds. */
const BUZZ = [200, 120, 200];

const BUTTON =
  "flex min-h-11 min-w-11 items-center justify-center rounded border border-bar-line px-3 text-sm font-semibold";

/** What is left of the rest, at the foot of the screen; then how long it has been over. Said aloud once, at its end. */
export function RestTimer() {
  const rest = useSyncExternalStore(restStore.subscribe, restStore.read, () => null);
  const [now, setNow] = useState(0);
  const ends = rest?.endsAt;
  useEffect(() => {
    if (ends === undefined) return;
    const tick = (): void => setNow(Date.now());
    const first = setTimeout(tick, 0);
    const timer = setInterval(tick, TICK_MS);
    document.addEventListener("visibilitychange", tick);
    return () => {
      clearTimeout(first);
      clearInterval(timer);
      document.removeEventListener("visibilitychange", tick);
    };
  }, [ends]);
  const state = rest && now > 0 ? restAt(rest, now) : null;
  const over = state?.over ?? false;
  const told = rest?.told ?? true;
  useEffect(() => {
    if (!over || told) return;
    if ("vibrate" in navigator) navigator.vibrate(BUZZ);
    restStore.told();
  }, [over, told]);
  return (
    <>
      <LiveRegion>{over && rest ? `Rest is over. Next: ${rest.next}.` : ""}</LiveRegion>
      {rest && state ? (
        <div
          role="group"
          aria-label="Rest"
          className="on-bar sticky bottom-0 z-10 flex items-center gap-3 border-t border-bar-line bg-bar px-4.5 pt-2.5 pb-[max(0.625rem,env(safe-area-inset-bottom))] text-bar-text"
        >
          <p role="timer" aria-live="off" className="min-w-20 text-2xl font-semibold">
            {state.over ? "+" : ""}
            {clockText(state.seconds)}
          </p>
          <p className="min-w-0 flex-1 text-sm leading-tight text-bar-quiet">
            {state.over ? "Rest is over." : "Rest."} Next: {rest.next}
          </p>
          <button type="button" className={BUTTON} onClick={() => restStore.stretch(30)}>
            +30 s
          </button>
          <button type="button" className={BUTTON} onClick={restStore.stop}>
            End
          </button>
        </div>
      ) : null}
    </>
  );
}
