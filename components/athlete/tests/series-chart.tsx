import { Chart, LegendItem } from "@/components/charts/chart";
import { BandMark, DotMarks, LevelMark, LineMark } from "@/components/charts/marks";
import { plotOf } from "@/components/charts/plot";
import { dayFromIso } from "@/lib/engine/geometry";
import { measureText } from "@/lib/format/measure";
import type { TestSeries } from "@/lib/schemas/test-trial";

interface SeriesChartProps {
  readonly series: TestSeries;
  readonly title: string;
  readonly table: React.ReactNode;
}

/** Trials and means of the days; the band holds what is not beyond the noise of the test, seen from the first day. */
export function SeriesChart({ series, title, table }: SeriesChartProps) {
  const { days, unit, verdict } = series;
  const trials = days.flatMap(({ day, trials: all }) =>
    all.map(({ measure }) => ({ day: dayFromIso(day), value: measure })),
  );
  const means = days.map(({ day, mean }) => ({ day: dayFromIso(day), value: mean }));
  const first = means[0];
  const last = means.at(-1);
  if (!first || !last) return null;
  const noise = verdict?.leastReal ?? null;
  const band = noise === null ? null : { low: first.value - noise, high: first.value + noise };
  const plot = plotOf({
    days: [first.day, Math.max(last.day, first.day + 6)],
    values: [...trials.map(({ value }) => value), ...(band ? [band.low, band.high] : [])],
    height: 150,
  });
  return (
    <Chart
      title={title}
      unit={`${series.measure}, ${unit}`}
      plot={plot}
      alternative={`${days.length === 1 ? "One day" : `${days.length} days`}, mean ${measureText(first.value, unit)} at first, ${measureText(last.value, unit)} at last. ${verdict?.sentence ?? ""}`}
      legend={
        <>
          <LegendItem shape="line" className="border-brass">
            Mean of the day
          </LegendItem>
          <LegendItem shape="dot" className="bg-ink-3">
            Trials
          </LegendItem>
          {band ? (
            <LegendItem shape="field" className="bg-line-soft">
              Inside: not beyond the noise, seen from the first day
            </LegendItem>
          ) : (
            <span>No band: the error of this test is not known yet.</span>
          )}
        </>
      }
      table={table}
    >
      {band ? <BandMark plot={plot} {...band} className="fill-line-soft" /> : null}
      {band ? <LevelMark plot={plot} value={first.value} className="stroke-line" /> : null}
      <LineMark plot={plot} points={means} className="stroke-brass" />
      <DotMarks plot={plot} points={trials} size={5} className="stroke-ink-3" />
      <DotMarks plot={plot} points={means} size={7} className="stroke-brass" />
    </Chart>
  );
}
