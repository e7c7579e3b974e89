"use client";

import { useEffect, useMemo, useRef, type RefObject } from "react";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Day, Minute } from "@/lib/engine/types";
import type { Hand } from "../desk-state";
import { moveChange, type Place } from "../move-change";
import { isPastAt } from "../picture";
import type { Desk } from "../use-desk";
import { freezeRows, thawRows } from "./freeze";

/** Carrying a session, by pointer or by keys: one way for both. */
export interface Carry {
  /** True where the session can be picked up. */
  readonly pickUp: (id: string, by: Hand["by"]) => boolean;
  /** Holds it over a place. False where it cannot be put there. */
  readonly over: (to: Place) => boolean;
  readonly drop: () => void;
  readonly letGo: () => void;
  /** Where the session in the hand is now. */
  readonly held: () => Hand | null;
}

const placeOf = (desk: Desk, id: string): Place | null =>
  desk.shown.plan.lifts.find((lift) => lift.id === id) ??
  desk.shown.sport.find((session) => session.id === id) ??
  null;

const samePlace = (a: Place, b: Place): boolean => a.day === b.day && a.start === b.start;

/** Inside the camp and still ahead. */
function canStand({ shown, now }: Desk, to: Place): boolean {
  const first = shown.plan.weeks.reduce((least, week) => Math.min(least, week.from), Infinity);
  const last = dayFromIso(shown.book.bout.date);
  return (
    to.day >= first && to.day <= last && to.start >= 0 && to.start < 1440 && !isPastAt(shown.zone, to, now)
  );
}

export function useCarry(desk: Desk, root: RefObject<HTMLElement | null>): Carry {
  // FullCalendar and key handlers outlive a rendering: they always meet the newest state here.
  const latest = useRef(desk);
  const hand = useRef<Hand | null>(null);
  useEffect(() => {
    latest.current = desk;
  });

  return useMemo(() => {
    const hold = (next: Hand): void => {
      const { standing, dispatch } = latest.current;
      hand.current = next;
      const moved = !samePlace(next.from, next.at);
      const change = moved ? moveChange(standing, next.before?.change ?? null, next.id, next.at) : null;
      dispatch({ type: "hold", hand: next, change, key: crypto.randomUUID() });
    };
    const release = (): boolean => {
      if (hand.current?.by === "pointer" && root.current) thawRows(root.current);
      const held = hand.current !== null;
      hand.current = null;
      return held;
    };
    return {
      pickUp(id, by) {
        const from = placeOf(latest.current, id);
        if (!from || isPastAt(latest.current.shown.zone, from, latest.current.now)) return false;
        const place = { day: from.day, start: from.start };
        if (by === "pointer" && root.current) freezeRows(root.current);
        hold({ by, id, from: place, at: place, before: latest.current.state.pending });
        return true;
      },
      over(to) {
        if (!hand.current || !canStand(latest.current, to)) return false;
        if (!samePlace(hand.current.at, to)) hold({ ...hand.current, at: to });
        return true;
      },
      drop() {
        if (!release()) return;
        latest.current.dispatch({ type: "drop" });
      },
      letGo() {
        if (!release()) return;
        latest.current.dispatch({ type: "let-go" });
      },
      held: () => hand.current,
    };
  }, [root]);
}

/** A place some days and minutes from another. */
export const shifted = (at: Place, days: number, minutes: number): Place => ({
  day: (at.day + days) as Day,
  start: (at.start + minutes) as Minute,
});
