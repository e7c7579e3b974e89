import { Chart, LegendItem } from "@/components/charts/chart";
import { CsvLink } from "@/components/charts/csv-link";
import { DotMarks, LevelMark, LineMark } from "@/components/charts/marks";
import { plotOf } from "@/components/charts/plot";
import { Notice } from "@/components/ui/notice";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { CEILING_BASIS, CEILING_SOURCE } from "@/lib/engine/weight/ceilings";
import { WEIGHT_CAUTION } from "@/lib/engine/weight/descent";
import { dayFromIso } from "@/lib/engine/geometry";
import { fromKg, massText, type MassUnit } from "@/lib/format/load";
import type { WeightPoint, WeightRecord } from "@/lib/schemas/athlete-record";
import { dateText } from "../words";
import { Section } from "./section";

type Way = Extract<WeightRecord, { off: null }>["to"];

interface WeightChartProps {
  readonly weights: readonly WeightPoint[];
  readonly to: Way;
  readonly today: string;
  readonly unit: MassUnit;
}

function WeightTable({ weights, to, unit }: Omit<WeightChartProps, "today">) {
  const line = new Map(to?.line.map(({ date, kg }) => [date, kg]));
  return (
    <Table caption={`Weights, ${unit}`}>
      <thead>
        <tr>
          <HeadCell>Date</HeadCell>
          <HeadCell>Weight</HeadCell>
          <HeadCell>Line</HeadCell>
        </tr>
      </thead>
      <tbody>
        {weights.toReversed().map(({ date, kg }) => {
          const should = line.get(date);
          return (
            <tr key={date}>
              <HeadCell scope="row">{dateText(date)}</HeadCell>
              <Cell>{massText(kg, unit)}</Cell>
              <Cell>{should === undefined ? "none" : massText(should, unit)}</Cell>
            </tr>
          );
        })}
      </tbody>
    </Table>
  );
}

function CeilingTable({ to, unit }: { readonly to: NonNullable<Way>; readonly unit: MassUnit }) {
  return (
    <div className="grid gap-1">
      <Table caption={`Ceilings before the weigh-in on ${dateText(to.weighIn)}`}>
        <thead>
          <tr>
            <HeadCell>Before the weigh-in</HeadCell>
            <HeadCell>From</HeadCell>
            <HeadCell>At most</HeadCell>
          </tr>
        </thead>
        <tbody>
          {to.ceilings.map(({ hours, date, kg }) => (
            <tr key={hours}>
              <HeadCell scope="row">{hours} h</HeadCell>
              <Cell>{dateText(date)}</Cell>
              <Cell>{massText(kg, unit)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="text-xs text-ink-2">
        {CEILING_BASIS} {CEILING_SOURCE}.
      </p>
    </div>
  );
}

function WeightChart({ weights, to, today, unit }: WeightChartProps) {
  const points = (all: readonly WeightPoint[]) =>
    all.map(({ date, kg }) => ({ day: dayFromIso(date), value: fromKg(kg, unit) }));
  const [own, line] = [points(weights), points(to?.line ?? [])];
  const end = dayFromIso(to?.weighIn ?? today);
  const ceilings = (to?.ceilings ?? []).map(({ date, kg }, index, all) => ({
    from: dayFromIso(date),
    to: all[index + 1] ? dayFromIso(all[index + 1]?.date ?? date) - 1 : end,
    value: fromKg(kg, unit),
  }));
  const limit = to ? fromKg(to.limitKg, unit) : null;
  const plot = plotOf({
    days: [Math.min(own[0]?.day ?? end, line[0]?.day ?? end), Math.max(end, dayFromIso(today))],
    values: [...own, ...line, ...ceilings].map(({ value }) => value).concat(limit ?? []),
  });
  const newest = weights.at(-1);
  return (
    <Chart
      title="Weight"
      unit={unit}
      plot={plot}
      alternative={`${weights.length} weights${newest ? `, the newest ${massText(newest.kg, unit)} on ${dateText(newest.date)}` : ""}${to ? `; limit ${massText(to.limitKg, unit)} at the weigh-in on ${dateText(to.weighIn)}` : ""}. The table has every number.`}
      legend={
        <>
          <LegendItem shape="dot" className="bg-ink">
            Weight
          </LegendItem>
          {line.length > 0 ? (
            <LegendItem shape="dashed" className="border-blue">
              Line to the limit
            </LegendItem>
          ) : null}
          {to ? (
            <LegendItem shape="line" className="border-blue">
              Limit
            </LegendItem>
          ) : null}
          {to ? (
            <LegendItem shape="line" className="border-ink-3">
              Ceilings, last three days
            </LegendItem>
          ) : null}
        </>
      }
      table={<WeightTable weights={weights} to={to} unit={unit} />}
    >
      {limit === null ? null : <LevelMark plot={plot} value={limit} className="stroke-blue" />}
      {ceilings.map((ceiling) => (
        <LevelMark key={ceiling.from} plot={plot} {...ceiling} className="stroke-ink-3" />
      ))}
      <LineMark plot={plot} points={line} dashed className="stroke-blue" />
      <LineMark plot={plot} points={own} className="stroke-ink-3" />
      <DotMarks plot={plot} points={own} className="stroke-ink" />
    </Chart>
  );
}

interface WeightSectionProps {
  readonly athleteId: string;
  readonly weight: WeightRecord;
  readonly today: string;
  readonly unit: MassUnit;
}

/** Weights against the line and the ceilings of the camp that runs. */
export function WeightSection({ athleteId, weight, today, unit }: WeightSectionProps) {
  if (weight.off !== null)
    return (
      <Section id="weight" title="Weight">
        <Notice tone="caution" title="Switched off">
          {weight.reason}
        </Notice>
      </Section>
    );
  const { weights, to } = weight;
  return (
    <Section
      id="weight"
      title="Weight"
      actions={weights.length > 0 ? <CsvLink athleteId={athleteId} what="weights" /> : null}
    >
      <div className="grid gap-4">
        <Notice tone="caution">{WEIGHT_CAUTION}</Notice>
        {to?.remarks.map(({ text, source }) => (
          <p key={text}>
            {text} <span className="text-sm text-ink-2">({source})</span>
          </p>
        ))}
        {to?.pace ? <p className="text-sm text-ink-2">{to.pace}</p> : null}
        {weights.length === 0 && !to ? <p className="text-ink-2">No weights yet.</p> : null}
        {weights.length > 0 ? <WeightChart weights={weights} to={to} today={today} unit={unit} /> : null}
        {weights.length === 0 && to ? (
          <p className="text-ink-2">
            No weights yet: the line to {massText(to.limitKg, unit)} starts at the first.
          </p>
        ) : null}
        {to ? <CeilingTable to={to} unit={unit} /> : null}
      </div>
    </Section>
  );
}
