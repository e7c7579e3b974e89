import { Button } from "@/components/ui/button";
import { Cell, HeadCell, Table } from "@/components/ui/table";
import { POWER_REGRESSIONS, type PowerMethod } from "@/lib/engine/measures/jump-power";
import { TEST_SPECS } from "@/lib/engine/measures/test-kinds";
import { massText, type MassUnit } from "@/lib/format/load";
import { measureText } from "@/lib/format/measure";
import type { TestDay, TestSeries, TrialView } from "@/lib/schemas/test-trial";
import { dateText } from "../words";

interface SeriesTableProps {
  readonly series: TestSeries;
  readonly title: string;
  readonly unit: MassUnit;
  readonly power: PowerMethod;
  /** Left out where the reader may not remove. */
  readonly onRemove?: (trial: TrialView) => void;
}

/** What beside the measure follows from the best trial of a day, each with the name of its method. */
function derived({ kind }: TestSeries, day: TestDay, power: PowerMethod): string[] {
  const watts = day.powers.find((one) => one.method === power)?.watts;
  return [
    kind !== "jump-height" && day.heightCm !== null
      ? `jump height ${day.heightCm.toFixed(1)} cm, by flight`
      : null,
    watts === undefined
      ? null
      : `${Math.round(watts)} W ${POWER_REGRESSIONS[power].of}, ${POWER_REGRESSIONS[power].title}`,
    ...day.reactive.map(
      ({ title, value, unit }) =>
        `${value.toFixed(2)}${unit === "ratio" ? "" : ` ${unit}`}, ${title.toLowerCase()}`,
    ),
  ].filter((text) => text !== null);
}

function TrialText({
  series,
  trial,
  unit,
}: {
  readonly series: TestSeries;
  readonly trial: TrialView;
  readonly unit: MassUnit;
}) {
  const { value, second } = TEST_SPECS[series.kind];
  const more =
    trial.second === null || second === null || series.at !== null
      ? ""
      : `, ${second.title.toLowerCase()} ${second.unit === "kg" ? massText(trial.second, unit) : `${trial.second} ${second.unit}`}`;
  return (
    <>
      {measureText(trial.value, value.unit)}
      {more}
      {trial.note ? <span className="text-ink-2"> {trial.note}</span> : null}
    </>
  );
}

/** Every trial of a test by day, newest first. */
export function SeriesTable({ series, title, unit, power, onRemove }: SeriesTableProps) {
  return (
    <Table caption={`${title}, trials`}>
      <thead>
        <tr>
          <HeadCell>Date</HeadCell>
          <HeadCell>Trials</HeadCell>
          <HeadCell>Best</HeadCell>
          <HeadCell>Mean</HeadCell>
          <HeadCell>Body mass</HeadCell>
          <HeadCell>Of the best trial</HeadCell>
        </tr>
      </thead>
      <tbody>
        {[...series.days].reverse().map((day) => (
          <tr key={day.day} className="align-top">
            <HeadCell scope="row" className="whitespace-nowrap">
              {dateText(day.day)}
            </HeadCell>
            <Cell>
              <ul>
                {day.trials.map((trial) => (
                  <li key={trial.id} className="flex items-center justify-between gap-2">
                    <span>
                      <TrialText series={series} trial={trial} unit={unit} />
                    </span>
                    {onRemove ? (
                      <Button
                        size="small"
                        variant="quiet"
                        aria-label={`Remove the trial of ${measureText(trial.measure, series.unit)} on ${dateText(day.day)}`}
                        onClick={() => onRemove(trial)}
                      >
                        Remove
                      </Button>
                    ) : null}
                  </li>
                ))}
              </ul>
            </Cell>
            <Cell className="whitespace-nowrap">{measureText(day.best, series.unit)}</Cell>
            <Cell className="whitespace-nowrap">{measureText(day.mean, series.unit)}</Cell>
            <Cell className="whitespace-nowrap">
              {day.massKg === null ? "not known" : massText(day.massKg, unit)}
            </Cell>
            <Cell>
              {derived(series, day, power).map((text) => (
                <span key={text} className="block">
                  {text}
                </span>
              ))}
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
