"use client";

import type FullCalendar from "@fullcalendar/react";
import { useEffect, useRef, type RefObject } from "react";
import type { Hand } from "../desk-state";
import type { CalendarEntry } from "./entry";
import { focusSession, sessionOf, setTabStop } from "./focus";
import { reconcile } from "./reconcile";
import { chipPlaces, slideFrom } from "./slide";

interface Sync {
  readonly root: RefObject<HTMLElement | null>;
  readonly calendar: RefObject<FullCalendar | null>;
  readonly entries: readonly CalendarEntry[];
  readonly hand: Hand | null;
}

/** Chips that are drawn again in quick succession appear a few frames later. */
const FRAMES = 5;

/** Puts the chips where they belong, lets them slide there, and gives the focus back to the one that had it. */
export function useSync({ root, calendar, entries, hand }: Sync): void {
  const dragged = hand?.by === "pointer" ? hand.id : null;
  const carried = hand?.by === "keys" ? hand.id : null;
  // What keys carry, or have just let go of, is what has the focus, also while its chip is not there to have it.
  const lastCarried = useRef<string | null>(null);
  useEffect(() => {
    let current = true;
    const own = carried ?? lastCarried.current;
    lastCarried.current = carried;
    // Not inside the effect itself: FullCalendar draws its chips at once, and React refuses that while it is rendering.
    queueMicrotask(() => {
      const [area, api] = [root.current, calendar.current?.getApi()];
      if (!current || !area || !api) return;
      const focused = sessionOf(document.activeElement) ?? own;
      const before = chipPlaces(area);
      const moved = reconcile(api, entries, dragged);
      slideFrom(area, before, moved);
      const next = entries.find((entry) => entry.movable)?.sessionId ?? null;
      // Lost with its chip, the focus is on something around the calendar; one that has gone on to the rail stays there.
      const isLost = (): boolean => document.activeElement?.contains(area) ?? true;
      const settle = (frames: number): void => {
        setTabStop(area, focused, next);
        if (focused && isLost()) focusSession(area, focused);
        if (frames > 0 && (frames === FRAMES || (focused && isLost())))
          requestAnimationFrame(() => settle(frames - 1));
      };
      settle(FRAMES);
    });
    return () => {
      current = false;
    };
  }, [root, calendar, entries, dragged, carried]);
}
