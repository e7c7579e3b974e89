"use client";

import { useRef, type KeyboardEvent } from "react";
import { KindMark } from "@/components/session/kind-mark";
import { classNames } from "@/components/ui/class-names";
import type { AthleteDay, DaySession } from "@/lib/schemas/today";
import { dayTitle, STRIP, stripDay, stripStart } from "./days";
import { lookOf } from "./looks";

interface StripProps {
  readonly days: readonly AthleteDay[];
  readonly chosen: string;
  readonly today: string;
  readonly onChoose: (date: string) => void;
}

// The bar is dark in both schemes: marks on it take the dark scheme's values of their kind.
const ON_BAR =
  "[--blue:#6f9fe0] [--brass:#cf9a34] [--gauze:#6faf9f] [--ink-3:#93a0a9] [--iron:#8ba1b1] [--red:#e05560]";

function Marks({ sessions }: { readonly sessions: readonly DaySession[] }) {
  const marks = sessions.map((session) => ({ id: session.id, look: lookOf(session) }));
  if (marks.some(({ look }) => look === null))
    return <span className="font-display text-base leading-none tracking-wide">BOUT</span>;
  return marks
    .slice(0, 4)
    .map(({ id, look }) =>
      look ? <KindMark key={id} mark={look.mark} size={8} className={look.text} /> : null,
    );
}

const spokenOf = (day: AthleteDay, today: string): string => {
  const kinds = day.sessions.map((session) => lookOf(session)?.label ?? "Bout");
  return `${dayTitle(day.date, today)}: ${kinds.length > 0 ? kinds.join(", ") : "nothing planned"}`;
};

const STEPS: Readonly<Record<string, number>> = { ArrowLeft: -1, ArrowRight: 1 };

/** Seven days with their kinds of work. One stop of the Tab key; arrows go from day to day. */
export function Strip({ days, chosen, today, onChoose }: StripProps) {
  const list = useRef<HTMLOListElement>(null);
  const index = days.findIndex(({ date }) => date === chosen);
  const start = stripStart(index, days.length);
  const onKeyDown = (event: KeyboardEvent): void => {
    const next = days[index + (STEPS[event.key] ?? 0)];
    if (!(event.key in STEPS) || !next) return;
    event.preventDefault();
    event.stopPropagation();
    onChoose(next.date);
    requestAnimationFrame(() => list.current?.querySelector<HTMLElement>('[aria-current="date"]')?.focus());
  };
  return (
    <nav aria-label="Days" className="mt-4 border-t border-bar-line">
      <ol ref={list} className="grid grid-cols-7" onKeyDown={onKeyDown}>
        {days.slice(start, start + STRIP).map((day) => {
          const { weekday, number } = stripDay(day.date);
          const on = day.date === chosen;
          return (
            <li key={day.date} className="border-l border-bar-line first:border-l-0">
              <button
                type="button"
                aria-current={on ? "date" : undefined}
                aria-label={spokenOf(day, today)}
                tabIndex={on ? 0 : -1}
                onClick={() => onChoose(day.date)}
                className={classNames(
                  "flex min-h-[66px] w-full flex-col items-center pt-2 pb-1.5 text-xs -outline-offset-4",
                  on ? "bg-paper text-ink-2 focus-visible:outline-ink!" : `text-bar-quiet ${ON_BAR}`,
                )}
              >
                <span
                  className={day.date === today ? "font-semibold underline underline-offset-2" : undefined}
                >
                  {weekday}
                </span>
                <b className={classNames("text-base font-semibold", on ? "text-ink" : "text-bar-text")}>
                  {number}
                </b>
                <span className="flex min-h-3 items-center gap-[3px]">
                  <Marks sessions={day.sessions} />
                </span>
              </button>
            </li>
          );
        })}
      </ol>
    </nav>
  );
}
