"use client";

import { Fragment, useId, useMemo, useState } from "react";
import { isoFromDay } from "@/lib/engine/geometry";
import type { Day, Minute, Plan, SportSession } from "@/lib/engine/types";
import { weekRows } from "./camp-days";
import { CampWeek } from "./camp-week";
import { SessionWhy } from "./session-why";

interface CampGridProps {
  readonly plan: Plan;
  readonly sport: readonly SportSession[];
  readonly weighIn: { readonly day: Day; readonly start: Minute } | null;
  readonly today: Day;
}

const weekday = new Intl.DateTimeFormat("en-GB", { weekday: "short", timeZone: "UTC" });
const weekdayText = (day: Day): string => weekday.format(new Date(`${isoFromDay(day)}T00:00:00Z`));

/**
 * A whole camp at a glance, one row a camp week, the bout bottom right. Pressing a session opens a row under its week
 * that says why it stands there. For reading only; what moves sessions is the calendar of the camp page.
 */
export function CampGrid({ plan, sport, weighIn, today }: CampGridProps) {
  const [open, setOpen] = useState<string | null>(null);
  const whyId = useId();
  const rows = useMemo(() => weekRows({ plan, sport, weighIn }), [plan, sport, weighIn]);
  const first = rows[0];
  if (!first) return null;
  return (
    <div
      role="table"
      aria-label="The camp, week by week"
      className="overflow-hidden rounded-md border border-line bg-paper"
    >
      <div role="row" className="grid grid-cols-7 sm:grid-cols-[118px_repeat(7,minmax(0,1fr))]">
        <div role="columnheader" className="sr-only sm:not-sr-only">
          <span className="sr-only">Week</span>
        </div>
        {first.days.map(({ day }) => (
          <div
            role="columnheader"
            key={day}
            className="px-1.5 py-1.5 text-xs font-semibold text-ink-3 max-sm:text-center"
          >
            {weekdayText(day)}
          </div>
        ))}
      </div>
      {rows.map((row) => {
        const shown = row.days.flatMap(({ entries }) => entries).find((entry) => entry.id === open);
        return (
          <Fragment key={row.week.weeksOut}>
            <CampWeek
              row={row}
              bout={plan.bout}
              today={today}
              open={open}
              whyId={whyId}
              onOpen={(id) => setOpen(id === open ? null : id)}
            />
            {shown ? (
              <div role="row" className="border-t border-line">
                <div role="cell" aria-colspan={8} id={whyId}>
                  <SessionWhy entry={shown} onClose={() => setOpen(null)} />
                </div>
              </div>
            ) : null}
          </Fragment>
        );
      })}
    </div>
  );
}
