"use client";

import type FullCalendar from "@fullcalendar/react";
import { useEffect, type RefObject } from "react";
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

/** Puts the chips where they belong, lets them slide there, and gives the focus back to the one that had it. */
export function useSync({ root, calendar, entries, hand }: Sync): void {
  const dragged = hand?.by === "pointer" ? hand.id : null;
  useEffect(() => {
    let current = true;
    // Not inside the effect itself: FullCalendar draws its chips at once, and React refuses that while it is rendering.
    queueMicrotask(() => {
      const [area, api] = [root.current, calendar.current?.getApi()];
      if (!current || !area || !api) return;
      const focused = sessionOf(document.activeElement);
      const before = chipPlaces(area);
      const moved = reconcile(api, entries, dragged);
      slideFrom(area, before, moved);
      const next = entries.find((entry) => entry.movable)?.sessionId ?? null;
      const settle = (): void => {
        setTabStop(area, focused, next);
        // Lost with its chip, the focus is on something around the calendar; one that has gone on to the rail stays there.
        if (focused && (document.activeElement?.contains(area) ?? true)) focusSession(area, focused);
      };
      settle();
      // Chips that were drawn again in quick succession appear a moment later.
      requestAnimationFrame(settle);
    });
    return () => {
      current = false;
    };
  }, [root, calendar, entries, dragged]);
}
