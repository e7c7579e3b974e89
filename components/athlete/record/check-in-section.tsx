import { Chart, LegendItem } from "@/components/charts/chart";
import { CsvLink } from "@/components/charts/csv-link";
import { BandMark, DotMarks, LevelMark, LineMark } from "@/components/charts/marks";
import { plotOf } from "@/components/charts/plot";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { dayFromIso } from "@/lib/engine/geometry";
import type { CheckInPart, CheckInRecord } from "@/lib/schemas/athlete-record";
import { dateText } from "../words";
import { Section } from "./section";

const PARTS: readonly (readonly [CheckInPart, string])[] = [
  ["sleep", "Sleep"],
  ["fatigue", "Fatigue"],
  ["soreness", "Soreness"],
  ["stress", "Stress"],
];

const SCALE = { low: 7.3, high: 0.7, ticks: [1, 4, 7] } as const;

function PartChart({
  record,
  part,
  title,
}: {
  readonly record: CheckInRecord;
  readonly part: CheckInPart;
  readonly title: string;
}) {
  const points = record.days.map((day) => ({ day: dayFromIso(day.date), value: day[part] }));
  const own = record.own[part];
  const plot = plotOf({
    days: [dayFromIso(record.from), dayFromIso(record.to)],
    values: [],
    height: 96,
    // Very good is up.
    fixed: SCALE,
  });
  const spread = own?.sd ?? null;
  const words = own
    ? `own mean ${own.mean.toFixed(1)}${spread === null ? "" : `, spread ${spread.toFixed(1)} (SD)`}`
    : "no answers";
  return (
    <Chart
      title={title}
      unit="1 very good to 7 very poor"
      plot={plot}
      alternative={`${title} over 28 days: ${points.length} answers, ${words}. The table has every number.`}
      legend={<span>{words}</span>}
    >
      {own && spread !== null ? (
        <BandMark
          plot={plot}
          low={Math.min(7, own.mean + spread)}
          high={Math.max(1, own.mean - spread)}
          className="fill-line-soft"
        />
      ) : null}
      {own ? <LevelMark plot={plot} value={own.mean} className="stroke-ink-3" /> : null}
      <LineMark plot={plot} points={points} className="stroke-ink" />
      <DotMarks plot={plot} points={points} size={5} className="stroke-ink" />
    </Chart>
  );
}

function CheckInTable({ record }: { readonly record: CheckInRecord }) {
  return (
    <Table caption="Check-ins of 28 days, 1 very good to 7 very poor">
      <thead>
        <tr>
          <HeadCell>Date</HeadCell>
          {PARTS.map(([part, title]) => (
            <HeadCell key={part}>{title}</HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {record.days.toReversed().map((day) => (
          <tr key={day.date}>
            <HeadCell scope="row">{dateText(day.date)}</HeadCell>
            {PARTS.map(([part]) => (
              <Cell key={part}>{day[part]}</Cell>
            ))}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** Four answers over 28 days, each against the athlete's own mean and spread. */
export function CheckInSection({
  athleteId,
  record,
}: {
  readonly athleteId: string;
  readonly record: CheckInRecord;
}) {
  const empty = record.days.length === 0;
  return (
    <Section
      id="check-ins"
      title="Check-ins"
      actions={empty ? null : <CsvLink athleteId={athleteId} what="check-ins" />}
    >
      {empty ? (
        <p className="text-ink-2">None in the last 28 days.</p>
      ) : (
        <>
          <div className="grid gap-5 md:grid-cols-2">
            {PARTS.map(([part, title]) => (
              <PartChart key={part} record={record} part={part} title={title} />
            ))}
          </div>
          <p className="mt-3 flex flex-wrap gap-x-4 text-xs text-ink-2">
            <LegendItem shape="line" className="border-ink-3">
              Own mean of these days
            </LegendItem>
            <LegendItem shape="field" className="bg-line-soft">
              One SD to either side
            </LegendItem>
          </p>
          <details className="mt-2">
            <summary className="inline-flex min-h-control-small items-center text-sm underline underline-offset-4">
              Check-ins: table
            </summary>
            <div className="mt-2">
              <CheckInTable record={record} />
            </div>
          </details>
        </>
      )}
    </Section>
  );
}
