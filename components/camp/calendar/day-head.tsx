"use client";

import { dayFromIso, isoFromDay } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import { dayText, longDayText } from "@/lib/format/civil";
import type { CampBook } from "@/lib/schemas/camp-book";
import { useShown } from "../shown-context";

const isHeld = ({ holds }: CampBook, date: string): boolean =>
  holds.some((hold) => hold.from <= date && (hold.to === null || date <= hold.to));

/** "Nov 22" where a month or the camp begins, else "23". */
function shortText(day: Day, first: boolean): string {
  const [, dayOfMonth, month] = dayText(day).split(" ");
  return first || dayOfMonth === "1" ? `${month} ${dayOfMonth}` : (dayOfMonth ?? "");
}

function BoutHead({ book, day }: { readonly book: CampBook; readonly day: Day }) {
  return (
    <span className="flex h-full flex-col justify-between gap-1 text-left">
      <span className="text-2xs">{dayText(day)}</span>
      {book.status === "off" ? (
        <span className="font-display text-week">BOUT OFF</span>
      ) : (
        <span className="camp-bout-word font-display">
          BOUT
          <br />
          {book.bout.time}
        </span>
      )}
    </span>
  );
}

/** The head of a calendar cell: its date, and what holds all day. */
export function DayHead({ day }: { readonly day: Day }) {
  const { shown, today } = useShown();
  const { book } = shown;
  if (day === dayFromIso(book.bout.date)) return <BoutHead book={book} day={day} />;
  const first = shown.plan.weeks.some((week) => week.weeksOut === book.weeks - 1 && week.from === day);
  return (
    <>
      <span aria-hidden="true">{shortText(day, first)}</span>
      <span className="sr-only">{longDayText(day)}</span>
      {day === today ? <span className="camp-tag bg-ink text-ink-on">Today</span> : null}
      {isHeld(book, isoFromDay(day)) ? <span className="camp-tag border border-ink">Hold</span> : null}
    </>
  );
}
