import { Notice } from "@/components/ui/notice";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { dayFromIso } from "@/lib/engine/geometry";
import { dayText } from "@/lib/format/civil";
import { massText, type MassUnit } from "@/lib/format/load";
import type { ReportView } from "@/lib/schemas/report";

interface WeightPathProps {
  readonly weight: NonNullable<ReportView["weight"]>;
  readonly unit: MassUnit;
}

/** First, least and last weight of the camp beside the limit, and every weight in a table. */
export function WeightPath({ weight, unit }: WeightPathProps) {
  if ("off" in weight) return <Notice tone="caution" title={weight.off} />;
  const { points, limitKg } = weight;
  const [first, last] = [points[0], points.at(-1)];
  if (!first || !last) return <p className="text-ink-2">No weight was given in this camp.</p>;
  const change = last.kg - first.kg;
  const sign = change > 0 ? "+" : change < 0 ? "−" : "";
  return (
    <>
      <p>
        {massText(first.kg, unit)} on {dayText(dayFromIso(first.date))} to {massText(last.kg, unit)} on{" "}
        {dayText(dayFromIso(last.date))} ({sign}
        {massText(Math.abs(change), unit)}
        {limitKg === null ? "" : `; the limit was ${massText(limitKg, unit)}`}).
      </p>
      <details className="mt-3">
        <summary className="cursor-pointer text-sm font-semibold">Every weight</summary>
        <div className="mt-2 max-w-sm">
          <Table caption="Weights of the camp">
            <thead>
              <tr>
                <HeadCell>Day</HeadCell>
                <HeadCell className="text-right">Weight</HeadCell>
              </tr>
            </thead>
            <tbody>
              {points.map(({ date, kg }) => (
                <tr key={date}>
                  <HeadCell scope="row">{dayText(dayFromIso(date))}</HeadCell>
                  <Cell className="text-right tabular-nums">{massText(kg, unit)}</Cell>
                </tr>
              ))}
            </tbody>
          </Table>
        </div>
      </details>
    </>
  );
}
