"use client";

import { classNames } from "@/components/ui/class-names";
import { weekLook, weekTitle } from "@/components/session/kinds";
import type { Day } from "@/lib/engine/types";
import { useShown } from "../shown-context";

/** The head of a calendar row: weeks out, phase, working sets. */
export function WeekGutter({ firstDay }: { readonly firstDay: Day }) {
  const { shown, standing, detail } = useShown();
  const week = shown.plan.weeks.find((candidate) => candidate.from <= firstDay && firstDay <= candidate.to);
  if (!week) return null;
  const look = weekLook(week.phase, week.weeksOut, week.deload);
  const before = standing.plan.weeks.find(
    (candidate) => candidate.weeksOut === week.weeksOut && candidate.from === week.from,
  );
  const changed = before !== undefined && before.sets !== week.sets;
  return (
    <span className="camp-gutter">
      <span aria-hidden="true" className={classNames("camp-gutter-bar", look.bar)} />
      <span className="block font-display text-week whitespace-nowrap">{weekTitle(week.weeksOut)}</span>
      <span className="block text-ink-2">{look.label}</span>
      {detail ? (
        <span className="block font-semibold">
          {changed ? `${before.sets} → ${week.sets} sets` : `${week.sets} sets`}
        </span>
      ) : null}
    </span>
  );
}
