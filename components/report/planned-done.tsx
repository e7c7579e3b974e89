import { PHASE_LOOKS, weekTitle } from "@/components/session/kinds";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Phase } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import type { Attendance, ReportWeek } from "@/lib/schemas/report";

const number = (value: number | null): string =>
  value === null ? "nothing logged" : Math.round(value).toLocaleString("en-GB");

interface AttendanceTableProps {
  readonly rows: readonly Attendance[];
  readonly hardRounds: number | null;
}

/** Sessions by kind of work: planned, done, missed, without an answer. */
export function AttendanceTable({ rows, hardRounds }: AttendanceTableProps) {
  return (
    <>
      <Table caption="Sessions planned and done">
        <thead>
          <tr>
            <HeadCell>Work</HeadCell>
            <HeadCell className="text-right">Planned</HeadCell>
            <HeadCell className="text-right">Done</HeadCell>
            <HeadCell className="text-right">Missed</HeadCell>
            <HeadCell className="text-right">No answer</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ key, title, planned, done, missed, unanswered }) => (
            <tr key={key}>
              <HeadCell scope="row">{title}</HeadCell>
              {[planned, done, missed, unanswered].map((value, index) => (
                <Cell key={index} className="text-right tabular-nums">
                  {value}
                </Cell>
              ))}
            </tr>
          ))}
        </tbody>
      </Table>
      {hardRounds === null ? null : <p className="mt-3">{hardRounds} hard rounds were logged.</p>}
    </>
  );
}

/** Sets of lifting and load of everything, week by week. */
export function WeekTable({ weeks }: { readonly weeks: readonly ReportWeek[] }) {
  return (
    <Table caption="Sets and load by camp week, planned and done; load in AU, effort times minutes">
      <thead>
        <tr>
          <HeadCell>Week</HeadCell>
          <HeadCell>Phase</HeadCell>
          <HeadCell className="text-right">Sets planned</HeadCell>
          <HeadCell className="text-right">Sets done</HeadCell>
          <HeadCell className="text-right">Load planned, AU</HeadCell>
          <HeadCell className="text-right">Load done, AU</HeadCell>
        </tr>
      </thead>
      <tbody>
        {weeks.map((week) => (
          <tr key={week.weeksOut}>
            <HeadCell scope="row">
              {weekTitle(week.weeksOut)}{" "}
              <span className="font-normal text-ink-2">from {dayText(dayFromIso(week.from))}</span>
            </HeadCell>
            <Cell>{PHASE_LOOKS[week.phase as Phase].label}</Cell>
            {[week.setsPlanned, week.setsDone, week.loadPlanned, week.loadDone].map((value, index) => (
              <Cell key={index} className="text-right tabular-nums">
                {number(value)}
              </Cell>
            ))}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
