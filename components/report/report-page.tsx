"use client";

import { useState } from "react";
import { PageHead } from "@/components/shell/page-head";
import { Button } from "@/components/ui/button";
import { buttonLook } from "@/components/ui/button-look";
import { EmptyState } from "@/components/ui/empty-state";
import { LinkButton } from "@/components/ui/link-button";
import { Panel } from "@/components/ui/panel";
import { dayFromIso } from "@/lib/engine/geometry";
import { longDayText } from "@/lib/format/civil";
import { formatInstant } from "@/lib/format/dates";
import { useReport } from "@/lib/query/report";
import type { ReportView } from "@/lib/schemas/report";
import { AttendanceTable, WeekTable } from "./planned-done";
import { ResultDialog } from "./result-dialog";
import { ResultPanel } from "./result-panel";
import { WeightPath } from "./weight-path";

const dateText = (date: string): string => longDayText(dayFromIso(date));

function Tests({ tests }: { readonly tests: NonNullable<ReportView["tests"]> }) {
  if (tests.length === 0)
    return (
      <p className="text-ink-2">No test was done on two days of this camp, so nothing can be compared.</p>
    );
  return (
    <dl className="grid gap-3">
      {tests.map(({ key, title, verdict, errorText }) => (
        <div key={key}>
          <dt className="font-semibold">
            {title}, {dateText(verdict.first)} to {dateText(verdict.last)}
          </dt>
          <dd>{verdict.sentence}</dd>
          <dd className="text-xs text-ink-2">{errorText}</dd>
        </div>
      ))}
    </dl>
  );
}

function Changes({ report }: { readonly report: ReportView }) {
  const changes = [...(report.changes ?? [])].sort((a, b) => a.number - b.number);
  return (
    <ol className="grid gap-1.5">
      {changes.map(({ number, at, by, summary }) => (
        <li key={number} className="grid gap-x-4 sm:grid-cols-[10.5rem_minmax(0,1fr)]">
          <span className="text-sm text-ink-2 tabular-nums">{formatInstant(new Date(at), report.zone)}</span>
          <span className="min-w-0 break-words">
            {summary} <span className="text-ink-2">{by}</span>
          </span>
        </li>
      ))}
    </ol>
  );
}

/** After the bout: what was planned, what was done, and how it ended. Prints as it stands. */
export function ReportPage({ initial }: { readonly initial: ReportView }) {
  const { data: report } = useReport(initial);
  const [recording, setRecording] = useState(false);
  const { bout, athlete } = report;
  const opponent = bout.opponent === "" ? "" : ` v ${bout.opponent}`;
  return (
    <div className="grid gap-4">
      <PageHead
        title={`Report: ${athlete.name}${opponent}`}
        lead={`${[bout.ruleset, bout.place, dateText(bout.date)].filter((part) => part !== "").join(", ")}. A camp of ${report.weeks} ${report.weeks === 1 ? "week" : "weeks"}.`}
        actions={
          <span className="flex flex-wrap gap-2 print:hidden">
            <LinkButton href={`/camps/${report.campId}`}>To the camp</LinkButton>
            {report.attendance ? (
              // A file of the API, not a page: the browser saves it.
              <a href={`/api/camps/${report.campId}/report/csv`} className={buttonLook({})}>
                CSV
              </a>
            ) : null}
            <Button onClick={() => window.print()}>Print</Button>
          </span>
        }
      />
      {report.over ? (
        <ResultPanel report={report} onRecord={report.may.record ? () => setRecording(true) : null} />
      ) : (
        <EmptyState title="The bout has not been yet">
          This is what the camp did so far. How the bout ended can be written down once it is over.
        </EmptyState>
      )}
      {report.attendance ? (
        <Panel title="Planned and done">
          <AttendanceTable rows={report.attendance} hardRounds={report.hardRounds} />
        </Panel>
      ) : null}
      {report.byWeek ? (
        <Panel title="By week">
          <WeekTable weeks={report.byWeek} />
        </Panel>
      ) : null}
      {report.tests ? (
        <Panel title="Tests, first to last">
          <Tests tests={report.tests} />
        </Panel>
      ) : null}
      {report.weight ? (
        <Panel title="Weight">
          <WeightPath weight={report.weight} unit={report.unit} />
        </Panel>
      ) : null}
      {report.changes ? (
        <Panel title="Changes made">
          <Changes report={report} />
        </Panel>
      ) : null}
      {recording ? <ResultDialog report={report} onClose={() => setRecording(false)} /> : null}
    </div>
  );
}
