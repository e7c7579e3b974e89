"use client";

import { useState } from "react";
import { KindMark } from "@/components/session/kind-mark";
import { SPORT_LOOKS } from "@/components/session/kinds";
import { WEEKDAY_TOGGLES } from "@/components/start/words";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { Panel } from "@/components/ui/panel";
import { dayFromIso, isoFromDay, weekdayOf } from "@/lib/engine";
import type { Day, Weekday } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { useTimetable } from "@/lib/query/timetable";
import type { TimetableEntry } from "@/lib/schemas/timetable";
import { EntryDialog } from "./entry-dialog";
import { gymWeek } from "./gym-week";
import { weeklyOf } from "./weekly";

interface TimetablePageProps {
  readonly initial: readonly TimetableEntry[];
  /** YYYY-MM-DD, where the team is at home. */
  readonly today: string;
  readonly writes: boolean;
}

type Shown = { readonly entry: TimetableEntry } | { readonly date: string };

const dateText = (date: string): string => dayText(dayFromIso(date));

const spokenDay = (weekday: Weekday): string =>
  WEEKDAY_TOGGLES.find(({ value }) => value === weekday)?.spoken ?? "";

/** The next date on that weekday, from today on. */
function nextDate(today: string, weekday: Weekday): string {
  const day = dayFromIso(today);
  return isoFromDay((day + ((weekday - weekdayOf(day) + 7) % 7)) as Day);
}

function whenText(entry: TimetableEntry, today: string): string | null {
  const weekly = weeklyOf(entry);
  const first = entry.start.slice(0, 10);
  const parts = weekly
    ? [
        first > today ? `from ${dateText(first)}` : null,
        weekly.until ? `until ${dateText(weekly.until)}` : null,
      ]
    : [entry.rrule === null ? dateText(first) : "by a rule of its own"];
  return parts.filter(Boolean).join(", ") || null;
}

interface EntryLineProps {
  readonly entry: TimetableEntry;
  readonly today: string;
  readonly onEdit: (() => void) | null;
}

function EntryLine({ entry, today, onEdit }: EntryLineProps) {
  const look = SPORT_LOOKS[entry.kind];
  const when = whenText(entry, today);
  return (
    <li className="flex items-center justify-between gap-3 py-2">
      <div className="flex min-w-0 items-baseline gap-2.5">
        <span className="w-11 shrink-0 font-semibold">{entry.start.slice(11)}</span>
        <KindMark mark={look.mark} className={`translate-y-px ${look.text}`} />
        <span className="min-w-0">
          <span className="font-semibold break-words">{entry.title}</span>
          {entry.title === look.label ? null : <span className="text-sm text-ink-2">, {look.label}</span>}
          <span className="block text-sm text-ink-2">
            {[`${entry.minutes} min`, `effort ${entry.effort}`, entry.place || null, when]
              .filter(Boolean)
              .join(", ")}
          </span>
        </span>
      </div>
      {onEdit ? (
        <Button size="small" onClick={onEdit} aria-label={`Change ${entry.title}, ${entry.start.slice(11)}`}>
          Change
        </Button>
      ) : null}
    </li>
  );
}

/** The gym's week: what comes again each weekday. New camps take their sport sessions from here. */
export function TimetablePage({ initial, today, writes }: TimetablePageProps) {
  const { data: entries } = useTimetable(initial);
  const [shown, setShown] = useState<Shown | null>(null);
  const { days, others, over } = gymWeek(entries, today);
  const lines = (list: readonly TimetableEntry[]) => (
    <ul className="divide-y divide-line-soft">
      {list.map((entry) => (
        <EntryLine
          key={entry.id}
          entry={entry}
          today={today}
          onEdit={writes ? () => setShown({ entry }) : null}
        />
      ))}
    </ul>
  );
  return (
    <>
      {entries.length === 0 ? (
        <div className="mb-4">
          <EmptyState title="The gym’s week is empty">
            {writes
              ? "Add what comes every week: sparring, pads, drills, roadwork. A new camp then starts from it."
              : "The head coach or a skills coach fills it."}
          </EmptyState>
        </div>
      ) : null}
      <div className="grid items-start gap-4 md:grid-cols-2 xl:grid-cols-3">
        {days.map(({ weekday, entries: list }) => (
          <Panel
            key={weekday}
            title={spokenDay(weekday)}
            actions={
              writes ? (
                <Button
                  size="small"
                  aria-label={`Add a session on ${spokenDay(weekday)}`}
                  onClick={() => setShown({ date: nextDate(today, weekday) })}
                >
                  Add
                </Button>
              ) : null
            }
          >
            {list.length === 0 ? <p className="py-1 text-ink-2">Nothing</p> : lines(list)}
          </Panel>
        ))}
        {others.length > 0 ? <Panel title="Not every week">{lines(others)}</Panel> : null}
      </div>
      {over > 0 ? (
        <p className="mt-3 text-sm text-ink-2">
          {over === 1 ? "One session is over" : `${over} sessions are over`} and not shown.
        </p>
      ) : null}
      {shown ? (
        <EntryDialog
          entry={"entry" in shown ? shown.entry : null}
          date={"date" in shown ? shown.date : today}
          onClose={() => setShown(null)}
        />
      ) : null}
    </>
  );
}
