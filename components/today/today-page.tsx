"use client";

import { lazy, Suspense, type TouchEvent, useCallback, useEffect, useRef, useState } from "react";
import { Notice } from "@/components/ui/notice";
import { dayFromIso } from "@/lib/engine/geometry";
import { dayText } from "@/lib/format/civil";
import type { TodayView } from "@/lib/schemas/today";
import { CheckInCard } from "./check-in";
import { dayTitle } from "./days";
import { Hero } from "./hero";
import { RestTimer } from "./rest-timer";
import { SessionCard } from "./session-card";
import { StateLine } from "./state-line";
import { Strip } from "./strip";
import { swipeOf, type Point } from "./swipe";
import { useActs } from "./use-acts";
import { useToday } from "./use-today";
import { WeightCard } from "./weight";

// Fetched when the server has refused something, which takes a net: most days never need it.
const StuckPanel = lazy(async () => ({ default: (await import("./stuck-panel")).StuckPanel }));

interface TodayPageProps {
  /** What the server rendered. */
  readonly initial: TodayView;
  readonly userId: string;
}

const TYPING = "input, textarea, select, [contenteditable], [role='radiogroup'], details summary";

/** Arrow keys go from day to day wherever nothing else wants them. */
function useDayKeys(step: (way: number) => void): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent): void => {
      const way = event.key === "ArrowLeft" ? -1 : event.key === "ArrowRight" ? 1 : 0;
      if (way === 0 || event.altKey || event.ctrlKey || event.metaKey || event.defaultPrevented) return;
      if (event.target instanceof Element && event.target.closest(TYPING)) return;
      step(way);
    };
    document.addEventListener("keydown", onKey);
    return () => document.removeEventListener("keydown", onKey);
  }, [step]);
}

const pointOf = (event: TouchEvent): Point | null => {
  const touch = event.changedTouches[0];
  return touch ? { x: touch.clientX, y: touch.clientY } : null;
};

/** One finger across the page goes a day on or back; a second finger is a pinch. */
function useSwipe(step: (way: number) => void) {
  const from = useRef<Point | null>(null);
  return {
    onTouchStart: (event: TouchEvent) => {
      const typing = event.target instanceof Element && event.target.closest("input, textarea") !== null;
      from.current = event.touches.length === 1 && !typing ? pointOf(event) : null;
    },
    onTouchEnd: (event: TouchEvent) => {
      const to = pointOf(event);
      const way = from.current && to ? swipeOf(from.current, to) : 0;
      from.current = null;
      if (way !== 0) step(way);
    },
    onTouchCancel: () => {
      from.current = null;
    },
  };
}

const onHold = (hold: TodayView["hold"], date: string): boolean =>
  hold !== null && hold.from <= date && (hold.to === null || date <= hold.to);

/** The athlete's phone: one day at a time, with everything there is to do and to say about it. */
export function TodayPage({ initial, userId }: TodayPageProps) {
  const { base, view, today, store, queue, online, opens, signedOut } = useToday(initial, userId);
  const acts = useActs(store, base);
  // Null follows today, also past midnight.
  const [picked, setPicked] = useState<string | null>(null);
  const dates = view.days.map(({ date }) => date);
  const chosen = picked !== null && dates.includes(picked) ? picked : today;
  const index = dates.indexOf(chosen);
  const day = view.days[index] ?? view.days[0];
  const before = dates[index - 1];
  const after = dates[index + 1];
  const choose = useCallback((date: string) => setPicked(date === today ? null : date), [today]);
  const step = useCallback(
    (way: number) => {
      const next = way < 0 ? before : after;
      if (next !== undefined) choose(next);
    },
    [before, after, choose],
  );
  useDayKeys(step);
  const swipe = useSwipe(step);
  if (!day) return null;
  const isToday = day.date === today;
  const { hold, unit } = view;
  return (
    <div className="mx-auto max-w-[560px]">
      <div className="on-bar bg-bar pt-4 text-bar-text">
        <Hero view={view} date={day.date} />
        <Strip days={view.days} chosen={day.date} today={today} onChoose={choose} />
      </div>
      <StateLine
        queue={queue}
        online={online}
        signedOut={signedOut}
        opens={opens}
        durable={store.isDurable()}
      />
      {queue.some(({ stuck }) => stuck !== null) ? (
        <Suspense>
          <StuckPanel queue={queue} unit={unit} acts={acts} />
        </Suspense>
      ) : null}
      <div {...swipe} className="min-h-[40dvh]" key={day.date}>
        <h2 className="border-b border-line bg-paper px-4.5 pt-3 pb-2 text-sm font-semibold text-ink-2">
          {dayTitle(day.date, today)}
        </h2>
        {hold && onHold(hold, day.date) ? (
          <Notice tone="caution" title={`On a hold since ${dayText(dayFromIso(hold.from))}`}>
            No sparring and no lifting is planned{" "}
            {hold.to === null ? "until the medic lifts it" : `up to ${dayText(dayFromIso(hold.to))}`}. Only
            the medic lifts a hold. This is no medical clearance.
          </Notice>
        ) : null}
        {day.sessions.map((session) => (
          <SessionCard
            key={`${session.campId}/${session.id}`}
            session={session}
            today={today}
            unit={unit}
            queue={queue}
            acts={acts}
          />
        ))}
        {day.sessions.length === 0 ? (
          <p className="border-b border-line bg-paper px-4.5 py-4 text-ink-2">
            Nothing is planned. Rest is work too.
          </p>
        ) : null}
        <CheckInCard day={day} editable={isToday} queue={queue} acts={acts} />
        {day.date <= today ? (
          <WeightCard
            day={day}
            weight={view.weight}
            unit={unit}
            editable={isToday}
            queue={queue}
            acts={acts}
          />
        ) : null}
      </div>
      <RestTimer />
    </div>
  );
}
