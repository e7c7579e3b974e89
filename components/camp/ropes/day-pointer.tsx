"use client";

import { useSyncExternalStore, type PointerEvent } from "react";
import type { Day } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import type { DayMark } from "../day-mark";
import type { Picture } from "../picture";
import { dayPercent, type RopeDays } from "./geometry";

interface DayPointerProps {
  readonly mark: DayMark;
  readonly days: RopeDays;
  readonly today: Day;
  readonly picture: Picture;
  readonly detail: boolean;
}

function readout(day: Day, picture: Picture, detail: boolean): string {
  const sport = picture.sport.filter((session) => session.day === day);
  const lifts = picture.plan.lifts.filter((lift) => lift.day === day);
  const load = sport.reduce((sum, session) => sum + session.effort * session.minutes, 0);
  const sets = lifts.reduce((sum, lift) => sum + lift.sets, 0);
  if (!detail) return `${dayText(day)}: ${sport.length + lifts.length} sessions`;
  return `${dayText(day)}: ${Math.round(load)} AU sport, ${sets} sets`;
}

/** Today's line over all ropes, and the day that is pointed at. Pointing here marks the day in the calendar too. */
export function DayPointer({ mark, days, today, picture, detail }: DayPointerProps) {
  const pointed = useSyncExternalStore(mark.subscribe, mark.read, () => null);
  const last = days.from + days.count - 1;
  const dayUnder = (event: PointerEvent<HTMLDivElement>): Day => {
    const box = event.currentTarget.getBoundingClientRect();
    const share = (event.clientX - box.left) / box.width;
    return (days.from + Math.min(days.count - 1, Math.max(0, Math.floor(share * days.count)))) as Day;
  };
  return (
    <div
      className="absolute inset-y-0 right-0 left-0 md:left-24"
      onPointerMove={(event) => mark.set(dayUnder(event))}
      onPointerLeave={() => mark.set(null)}
    >
      {pointed !== null && pointed >= days.from && pointed <= last ? (
        <>
          <span
            className="absolute inset-y-0 border-x border-edge bg-ink/5"
            style={{ left: `${dayPercent(days, pointed)}%`, width: `${100 / days.count}%` }}
          />
          <span
            className="absolute -top-1 z-10 rounded bg-bar px-1.5 py-0.5 text-2xs whitespace-nowrap text-bar-text"
            style={
              pointed - days.from < days.count / 2
                ? { left: `${dayPercent(days, pointed + 1)}%` }
                : { right: `${100 - dayPercent(days, pointed)}%` }
            }
          >
            {readout(pointed, picture, detail)}
          </span>
        </>
      ) : null}
      {today >= days.from && today <= last ? (
        <span
          className="absolute -top-1 bottom-0 border-l-[1.5px] border-ink"
          style={{ left: `${dayPercent(days, today)}%` }}
        />
      ) : null}
    </div>
  );
}
