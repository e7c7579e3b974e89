"use client";

import type FullCalendar from "@fullcalendar/react";
import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import { KeyHint } from "@/components/ui/key-hint";
import { LiveRegion } from "@/components/ui/live-region";
import { campSpan } from "@/lib/book/camp-span";
import { isPreview } from "@/lib/book/preview-result";
import type { Day } from "@/lib/engine/types";
import type { DayMark } from "../day-mark";
import { ShownContext } from "../shown-context";
import type { Desk } from "../use-desk";
import { carriedText } from "../words";
import { CampGrid } from "./camp-calendar";
import { useCalendarKeys } from "./use-calendar-keys";
import { useCarry } from "./use-carry";
import { useDayMark } from "./use-day-mark";
import { useEntries } from "./use-entries";
import { useSync } from "./use-sync";

interface CalendarAreaProps {
  readonly desk: Desk;
  readonly today: Day;
  readonly mark: DayMark;
  readonly onOpen: (sessionId: string) => void;
  readonly onAdd: (day: Day) => void;
  /** Focus goes to the rail after a drop by keys. */
  readonly onDropped: () => void;
}

/** The calendar with its keys, drags, chips and what it says aloud. */
export function CalendarArea({ desk, today, mark, onOpen, onAdd, onDropped }: CalendarAreaProps) {
  const { shown, standing, preview, state, view } = desk;
  const root = useRef<HTMLDivElement>(null);
  const calendar = useRef<FullCalendar>(null);
  const [said, say] = useState("");
  const { entries, store } = useEntries(desk);
  const carry = useCarry(desk, root);
  const pointing = useDayMark(root, mark);
  const onKeyDown = useCalendarKeys({ root, store, carry, dispatch: desk.dispatch, say, onDropped });
  useSync({ root, calendar, entries, hand: state.hand });

  const { from } = campSpan(shown.book);
  const adds = view.may.includes("sport.write") && shown.book.status === "on";
  const onDay = useCallback((day: Day) => (day >= today ? onAdd(day) : undefined), [today, onAdd]);
  const detail = view.may.includes("lifts.detail");
  const context = useMemo(() => ({ shown, standing, today, detail }), [shown, standing, today, detail]);
  const moves = entries.some((entry) => entry.movable);

  const { hand } = state;
  useEffect(() => {
    if (hand) mark.set(hand.at.day);
  }, [hand, mark]);
  const knockOn = preview && isPreview(preview) ? preview.knockOn : null;
  const title = hand ? (store.read(hand.id)?.title ?? "") : "";
  const carried = hand?.by === "keys" && (hand.at.day !== hand.from.day || hand.at.start !== hand.from.start);

  return (
    <div>
      <div
        ref={root}
        className="camp-grid"
        // FullCalendar draws in the browser only: the space is kept from the start.
        style={{ minHeight: `${32 + 97 * shown.book.weeks}px` }}
        aria-label="Calendar of the camp"
        role="group"
        onKeyDown={onKeyDown}
        // The planner is fetched before it is needed: whoever points at a session may be about to carry it.
        onFocus={desk.wantPlanner}
        onPointerEnter={desk.wantPlanner}
        onTouchStart={desk.wantPlanner}
        onKeyUp={(event) => {
          // Space is a key of the calendar; without this it would also press the session it is on.
          if (event.key === " " && event.target instanceof HTMLButtonElement) event.preventDefault();
        }}
        {...pointing}
      >
        <ShownContext value={context}>
          <CampGrid
            key={`${from} ${shown.book.weeks}`}
            calendar={calendar}
            firstDay={from}
            weeks={shown.book.weeks}
            today={today}
            store={store}
            carry={carry}
            onOpen={onOpen}
            onDay={adds ? onDay : null}
          />
        </ShownContext>
      </div>
      {moves ? (
        <p className="mt-2 text-xs text-ink-2 max-md:hidden">
          Drag a session, or use keys: arrows lead from one to the next, <KeyHint>Enter</KeyHint> opens it,{" "}
          <KeyHint>M</KeyHint> or <KeyHint>Space</KeyHint> picks it up, arrows carry it,{" "}
          <KeyHint>Page Up</KeyHint> <KeyHint>Page Down</KeyHint> by half an hour, <KeyHint>Enter</KeyHint>{" "}
          drops it, <KeyHint>Esc</KeyHint> lets it go.
        </p>
      ) : null}
      <LiveRegion>{carried && hand ? carriedText(title, hand.at, knockOn, hand.id) : said}</LiveRegion>
    </div>
  );
}
