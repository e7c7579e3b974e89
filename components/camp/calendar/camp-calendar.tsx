"use client";

import type { CalendarOptions, EventContentArg, EventMountArg } from "@fullcalendar/core";
import dayGridPlugin from "@fullcalendar/daygrid";
import interactionPlugin from "@fullcalendar/interaction";
import FullCalendar from "@fullcalendar/react";
import { memo, useEffect, useMemo, useRef, useState, type RefObject } from "react";
import { dayFromIso, isoFromDay, weekdayOf } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import "./calendar.css";
import { DayHead } from "./day-head";
import type { EntryStore } from "./entry-store";
import { eventInput } from "./reconcile";
import { SessionButton } from "./session-button";
import type { Carry } from "./use-carry";
import { WeekGutter } from "./week-gutter";

/** How long a finger rests on a session before it picks it up, milliseconds; shorter would catch scrolling. */
const LONG_PRESS_MS = 350;

const PLUGINS = [dayGridPlugin, interactionPlugin];

export interface CampGridProps {
  readonly calendar: RefObject<FullCalendar | null>;
  readonly firstDay: Day;
  readonly weeks: number;
  readonly today: Day;
  readonly store: EntryStore;
  readonly carry: Carry;
  readonly onOpen: (sessionId: string) => void;
  /** An empty part of a day was pressed; absent where nothing may be added. */
  readonly onDay: ((day: Day) => void) | null;
}

/** FullCalendar's dates are midnights in UTC. */
const civil = (date: Date): Day => Math.floor(date.getTime() / 86_400_000) as Day;

const cellClass = (day: Day, today: Day, boutDay: Day): string =>
  day === boutDay ? "camp-bout" : day < today ? "camp-past" : "";

const dayOf = (text: string): Day => dayFromIso(text.slice(0, 10));

/** Dragging by mouse and finger, as FullCalendar tells of it. */
function dragOptions(carry: Carry): CalendarOptions {
  const placeOf = (startStr: string) => {
    const held = carry.held();
    return held ? { day: dayOf(startStr), start: held.from.start } : null;
  };
  let dropped = false;
  return {
    editable: false,
    eventDurationEditable: false,
    eventDragMinDistance: 4,
    longPressDelay: LONG_PRESS_MS,
    dragRevertDuration: 150,
    eventDragStart: ({ event }) => {
      dropped = false;
      carry.pickUp(event.id, "pointer");
    },
    // Asked for every cell that is dragged over: the one place that tells where the session is before it is dropped.
    eventAllow: (span) => {
      const place = placeOf(span.startStr);
      return place !== null && carry.over(place);
    },
    eventDrop: ({ event }) => {
      dropped = true;
      const place = placeOf(event.startStr);
      if (place) carry.over(place);
      carry.drop();
    },
    eventDragStop: () => {
      // A drop, if there is one, is told right after this.
      queueMicrotask(() => {
        if (!dropped) carry.letGo();
      });
    },
  };
}

/**
 * The camp as rows of camp weeks: the bout is the last cell of the last row. FullCalendar draws cells and drags; what
 * stands in them comes from the entry store and is put there by `reconcile`.
 */
export const CampGrid = memo(function CampGrid(props: CampGridProps) {
  const { calendar, firstDay, weeks, today, store, carry, onOpen, onDay } = props;
  const [initialEvents] = useState(() => store.all().map(eventInput));
  const drag = useMemo(() => dragOptions(carry), [carry]);
  const open = useRef(onOpen);
  useEffect(() => {
    open.current = onOpen;
  });

  const content = useMemo(
    () => ({
      eventContent: (arg: EventContentArg) => (
        <SessionButton
          store={store}
          id={arg.event.id}
          mirror={arg.isMirror}
          onOpen={(id) => open.current(id)}
        />
      ),
      eventDidMount: ({ el, event, isMirror }: EventMountArg) => {
        if (!isMirror) el.dataset.entry = event.id;
      },
    }),
    [store],
  );
  const views = useMemo(() => ({ camp: { type: "dayGrid", duration: { weeks } } }), [weeks]);

  return (
    <FullCalendar
      ref={calendar}
      plugins={PLUGINS}
      initialView="camp"
      views={views}
      initialDate={isoFromDay(firstDay)}
      // FullCalendar counts from Sunday 0, ISO from Monday 1.
      firstDay={weekdayOf(firstDay) % 7}
      // Civil days and times carry no zone: in UTC no day has 23 or 25 hours.
      timeZone="UTC"
      now={isoFromDay(today)}
      locale="en-GB"
      headerToolbar={false}
      height="auto"
      initialEvents={initialEvents}
      eventDisplay="block"
      eventInteractive={false}
      eventOrder="start,allDay,title"
      // A session that ends after midnight stands on the day it starts.
      nextDayThreshold="12:00:00"
      defaultTimedEventDuration="00:30"
      weekNumbers
      weekNumberContent={({ date }) => <WeekGutter firstDay={civil(date)} />}
      dayHeaderFormat={{ weekday: "short" }}
      dayCellContent={({ date }) => <DayHead day={civil(date)} />}
      dayCellClassNames={({ date }) => cellClass(civil(date), today, (firstDay + 7 * weeks - 1) as Day)}
      dateClick={({ dateStr, jsEvent }) => {
        const onChip = jsEvent.target instanceof Element && jsEvent.target.closest(".fc-event");
        if (!onChip) onDay?.(dayFromIso(dateStr.slice(0, 10)));
      }}
      {...drag}
      {...content}
    />
  );
});
