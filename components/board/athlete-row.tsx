"use client";

import Link from "next/link";
import { daysOutText } from "@/components/camp/bout-line";
import { PHASE_LOOKS } from "@/components/session/kinds";
import { RequestCard } from "@/components/suggestions/request-card";
import { classNames } from "@/components/ui/class-names";
import { dayFromIso } from "@/lib/engine/geometry";
import { longDayText } from "@/lib/format/civil";
import type { BoardRow } from "@/lib/schemas/board";
import { DayStrip } from "./day-strip";
import { FlagList } from "./flag-list";
import { TodayList } from "./today-list";
import { useNear } from "./use-near";

/** Rows that are drawn in full before anything is known of the window. */
const DRAWN_FIRST = 12;

function Who({ row }: { readonly row: BoardRow }) {
  const { bout, phase, fightWeek } = row;
  return (
    <div className="min-w-0">
      <h2 className="leading-tight font-semibold">
        <Link href={`/camps/${row.campId}`} data-board-row="" className="rounded hover:underline">
          {row.athlete.name}
        </Link>
        {bout.opponent ? <span className="font-normal text-ink-2"> v {bout.opponent}</span> : null}
      </h2>
      <p className="text-sm text-ink-2">
        {longDayText(dayFromIso(bout.date))}
        {bout.place ? `, ${bout.place}` : ""}
      </p>
      <p className="flex items-center gap-1.5 text-sm text-ink-2">
        {phase ? (
          <>
            <span className={classNames("h-2.5 w-2.5", fightWeek ? "bg-red" : PHASE_LOOKS[phase].bar)} />
            {fightWeek ? "Fight week" : PHASE_LOOKS[phase].label}
          </>
        ) : (
          "Camp not begun"
        )}
      </p>
    </div>
  );
}

/** One athlete in camp: days out, who, fourteen days, today, flags, and what waits for an answer. */
export function AthleteRow({ row, index }: { readonly row: BoardRow; readonly index: number }) {
  const { near, ref } = useNear<HTMLLIElement>(index < DRAWN_FIRST);
  const { count, words } = daysOutText(dayFromIso(row.bout.date), dayFromIso(row.today));
  return (
    <li
      ref={ref}
      className="grid gap-x-5 gap-y-2 rounded-md border border-line bg-paper px-4 py-3 [contain-intrinsic-size:auto_116px] [content-visibility:auto] lg:grid-cols-[92px_minmax(0,210px)_minmax(0,1fr)_minmax(0,200px)_minmax(0,250px)] lg:items-center"
    >
      <p className="flex items-end gap-1.5">
        <span className="font-display text-[52px] leading-[0.82]">{count}</span>
        <span className="font-display text-lg leading-none text-ink-2 uppercase">
          {words[0]}
          <br />
          {words[1]}
        </span>
      </p>
      <Who row={row} />
      {near ? <DayStrip row={row} /> : <div className="min-h-14" />}
      <TodayList row={row} />
      <FlagList row={row} />
      {row.requests.map((request) => (
        <div key={request.id} className="lg:col-span-full">
          <RequestCard
            request={request}
            athlete={row.athlete.name}
            look={
              <Link
                href={`/camps/${row.campId}?session=${encodeURIComponent(request.sessionId)}&try=drop#waiting`}
                className="rounded font-semibold underline underline-offset-4"
              >
                See what it does
              </Link>
            }
          />
        </div>
      ))}
    </li>
  );
}
