"use client";

import { useCallback, useEffect, type KeyboardEvent, type RefObject } from "react";
import type { Desk } from "../use-desk";
import type { CalendarEntry } from "./entry";
import type { EntryStore } from "./entry-store";
import { focusSession, sessionOf } from "./focus";
import { shifted, type Carry } from "./use-carry";

/** Days and minutes that a key moves what is carried by. */
const STEPS: Record<string, readonly [days: number, minutes: number]> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [-7, 0],
  ArrowDown: [7, 0],
  PageUp: [0, -30],
  PageDown: [0, 30],
};

interface Keys {
  readonly root: RefObject<HTMLElement | null>;
  readonly store: EntryStore;
  readonly carry: Carry;
  readonly dispatch: Desk["dispatch"];
  /** Says something to screen readers. */
  readonly say: (text: string) => void;
  /** A session was dropped by keys: the rail is next. */
  readonly onDropped: () => void;
}

type Pressed = Pick<KeyboardEvent, "key" | "ctrlKey" | "metaKey" | "altKey" | "preventDefault">;

const hasModifier = ({ ctrlKey, metaKey, altKey }: Pressed): boolean => ctrlKey || metaKey || altKey;

/** The session that an arrow leads to: the next in time, or the nearest one a week away. */
function neighbour(store: EntryStore, id: string, key: string): CalendarEntry | undefined {
  const sessions = store.all().filter((entry) => !entry.state.ghost);
  const at = sessions.findIndex((entry) => entry.sessionId === id);
  const here = sessions[at];
  if (!here) return undefined;
  if (key === "ArrowLeft") return sessions[at - 1];
  if (key === "ArrowRight") return sessions[at + 1];
  if (key === "Home") return sessions[0];
  if (key === "End") return sessions.at(-1);
  const wanted = here.day + (key === "ArrowUp" ? -7 : 7);
  const inRow = sessions.filter((entry) => (key === "ArrowUp" ? entry.day < here.day : entry.day > here.day));
  return inRow.reduce<CalendarEntry | undefined>(
    (best, entry) => (!best || Math.abs(entry.day - wanted) < Math.abs(best.day - wanted) ? entry : best),
    undefined,
  );
}

/** Arrows lead from session to session; M or Space picks one up, arrows carry it, Enter drops it, Escape lets it go. */
export function useCalendarKeys({ root, store, carry, dispatch, say, onDropped }: Keys) {
  /** What a key does to the session that keys carry; false where they carry none. */
  const carryBy = useCallback(
    (event: Pressed): boolean => {
      const held = carry.held();
      if (held?.by !== "keys") return false;
      const step = STEPS[event.key];
      if (step) {
        const to = shifted(held.at, ...step);
        if (!carry.over(to)) say("It cannot stand there: that is past, or outside the camp.");
      } else if (event.key === "Enter" || event.key === " " || event.key === "m") {
        carry.drop();
        onDropped();
      } else if (event.key === "Escape") {
        carry.letGo();
        say("Back where it was.");
      } else return true;
      event.preventDefault();
      return true;
    },
    [carry, say, onDropped],
  );

  useEffect(() => {
    // A chip that is drawn again is without the focus for a moment: keys that are pressed then still move what is carried.
    const meanwhile = (event: Pressed & Event): void => {
      const around = event.target instanceof Node && root.current && event.target.contains(root.current);
      if (around && !hasModifier(event)) carryBy(event);
    };
    document.addEventListener("keydown", meanwhile);
    return () => document.removeEventListener("keydown", meanwhile);
  }, [root, carryBy]);

  return useCallback(
    (event: KeyboardEvent): void => {
      const id = sessionOf(event.target);
      if (!id || hasModifier(event)) return;
      if (carryBy(event)) return;

      if (event.key === "m" || event.key === " ") {
        const entry = store.read(id);
        if (!entry?.movable)
          say(entry?.state.past ? "That is past, and what is past stays." : "You cannot move this session.");
        else if (carry.pickUp(id, "keys")) {
          say(
            "Picked up. Arrows move it by day and week, Page Up and Page Down by half an hour. Enter drops it, Escape lets it go.",
          );
        }
        event.preventDefault();
        return;
      }
      if (event.key === "Escape") {
        dispatch({ type: "clear" });
        return;
      }
      if (event.key.startsWith("Arrow") || event.key === "Home" || event.key === "End") {
        const next = neighbour(store, id, event.key);
        if (next && root.current) focusSession(root.current, next.sessionId);
        event.preventDefault();
      }
    },
    [root, store, carry, dispatch, say, carryBy],
  );
}
