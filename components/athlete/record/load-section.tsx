import { Chart, LegendItem } from "@/components/charts/chart";
import { CsvLink } from "@/components/charts/csv-link";
import { BarMark } from "@/components/charts/marks";
import { plotOf } from "@/components/charts/plot";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { dayFromIso } from "@/lib/engine/geometry";
import type { LoadDay, LoadRecord, LoadWeek } from "@/lib/schemas/athlete-record";
import { dateText } from "../words";
import { Section } from "./section";

const au = (value: number): string => String(Math.round(value));

function DayTable({ days }: { readonly days: readonly LoadDay[] }) {
  return (
    <Table caption="Load by day, AU" className="max-h-96 overflow-y-auto">
      <thead>
        <tr>
          <HeadCell>Date</HeadCell>
          <HeadCell>Sport planned</HeadCell>
          <HeadCell>Sport done</HeadCell>
          <HeadCell>Lifting planned</HeadCell>
          <HeadCell>Lifting done</HeadCell>
        </tr>
      </thead>
      <tbody>
        {days.toReversed().map((day) => (
          <tr key={day.date}>
            <HeadCell scope="row">{dateText(day.date)}</HeadCell>
            <Cell>{au(day.plannedSport)}</Cell>
            <Cell>{au(day.doneSport)}</Cell>
            <Cell>{au(day.plannedLifting)}</Cell>
            <Cell>{au(day.doneLifting)}</Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

function WeekTable({ weeks }: { readonly weeks: readonly LoadWeek[] }) {
  return (
    <div className="grid gap-1">
      <Table caption="Load by seven days">
        <thead>
          <tr>
            <HeadCell>Seven days to</HeadCell>
            <HeadCell>Planned, AU</HeadCell>
            <HeadCell>Done, AU</HeadCell>
            <HeadCell>Monotony</HeadCell>
            <HeadCell>Strain, AU</HeadCell>
          </tr>
        </thead>
        <tbody>
          {weeks.toReversed().map((week) => (
            <tr key={week.to}>
              <HeadCell scope="row">{dateText(week.to)}</HeadCell>
              <Cell>{au(week.planned)}</Cell>
              <Cell>{week.done === null ? "none logged" : au(week.done)}</Cell>
              <Cell>{week.monotony === null ? "none" : week.monotony.toFixed(2)}</Cell>
              <Cell>{week.strain === null ? "none" : au(week.strain)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="text-xs text-ink-2">
        Load is effort (CR-10) times minutes. Monotony is mean over sample SD of the seven days, strain is
        load times monotony, both of what was done: Foster 1998, Med Sci Sports Exerc 30:1164-1168. Sessions
        that nobody logged are missing from them.
      </p>
    </div>
  );
}

function LoadChart({ days }: { readonly days: readonly LoadDay[] }) {
  const rows = days.map((one) => ({ ...one, day: dayFromIso(one.date) }));
  const first = rows[0]?.day ?? 0;
  const plot = plotOf({
    days: [first, rows.at(-1)?.day ?? first],
    values: rows.flatMap((row) => [row.plannedSport + row.plannedLifting, row.doneSport + row.doneLifting]),
    fromZero: true,
  });
  return (
    <Chart
      title="Load"
      unit="AU"
      plot={plot}
      alternative={`Load of the last ${days.length} days, planned and done, sport and lifting. The tables have every number.`}
      legend={
        <>
          <LegendItem shape="outline" className="border-edge">
            Planned
          </LegendItem>
          <LegendItem shape="field" className="bg-ink-3/60">
            Sport done
          </LegendItem>
          <LegendItem shape="field" className="bg-iron">
            Lifting done, on top
          </LegendItem>
        </>
      }
      table={<DayTable days={days} />}
    >
      {rows.map((row) => {
        const [planned, done] = [row.plannedSport + row.plannedLifting, row.doneSport + row.doneLifting];
        return (
          <g key={row.date}>
            {row.doneSport > 0 ? (
              <BarMark
                plot={plot}
                day={row.day}
                low={0}
                high={row.doneSport}
                width={0.6}
                className="fill-ink-3/60"
              />
            ) : null}
            {row.doneLifting > 0 ? (
              <BarMark
                plot={plot}
                day={row.day}
                low={row.doneSport}
                high={done}
                width={0.6}
                className="fill-iron"
              />
            ) : null}
            {planned > 0 ? (
              <BarMark
                plot={plot}
                day={row.day}
                low={0}
                high={planned}
                width={0.9}
                outlined
                className="stroke-edge"
              />
            ) : null}
          </g>
        );
      })}
    </Chart>
  );
}

/** Load of the last eight times seven days: planned and done. */
export function LoadSection({ athleteId, load }: { readonly athleteId: string; readonly load: LoadRecord }) {
  const empty = load.days.every(
    (day) => day.plannedSport + day.plannedLifting + day.doneSport + day.doneLifting === 0,
  );
  return (
    <Section id="load" title="Load" actions={empty ? null : <CsvLink athleteId={athleteId} what="load" />}>
      {empty ? (
        <p className="text-ink-2">Nothing was planned or logged in the last eight weeks.</p>
      ) : (
        <div className="grid gap-5">
          <LoadChart days={load.days} />
          <WeekTable weeks={load.weeks} />
        </div>
      )}
    </Section>
  );
}
