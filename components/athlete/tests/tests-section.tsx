"use client";

import dynamic from "next/dynamic";
import { useState } from "react";
import { CsvLink } from "@/components/charts/csv-link";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { showToast } from "@/components/ui/toasts";
import { POWER_METHODS, POWER_REGRESSIONS, type PowerMethod } from "@/lib/engine/measures/jump-power";
import type { MassUnit } from "@/lib/format/load";
import { measureText } from "@/lib/format/measure";
import { useRemoveTrial, useRestoreTrial, useTakeBackUpload, useTests } from "@/lib/query/record";
import type { TestSeries, TestsView, TrialView } from "@/lib/schemas/test-trial";
import { Section } from "../record/section";
import { SeriesChart } from "./series-chart";
import { SeriesTable } from "./series-table";
import { SideDifferences } from "./side-differences";
import { TrialDialog } from "./trial-dialog";
import { seriesTitle } from "./words";

// Reading files needs a parser that nothing else on the page needs.
const UploadDialog = dynamic(() => import("./upload-dialog").then((loaded) => loaded.UploadDialog));

interface TestsSectionProps {
  readonly athleteId: string;
  readonly initial: TestsView;
  readonly today: string;
  readonly unit: MassUnit;
  readonly writes: boolean;
}

const POWER_CHOICES = POWER_METHODS.map((method) => ({
  value: method,
  label: `${POWER_REGRESSIONS[method].title} (${POWER_REGRESSIONS[method].of})`,
}));

function PowerChoice({
  power,
  onChange,
}: {
  readonly power: PowerMethod;
  readonly onChange: (power: PowerMethod) => void;
}) {
  const { jump, standardError, source } = POWER_REGRESSIONS[power];
  return (
    <Field
      label="Jump power by"
      hint={`Made from the ${jump}${standardError === null ? "" : `, standard error ${standardError} W`}. ${source}. Two regressions are never compared.`}
      className="max-w-md"
    >
      <Select
        choices={POWER_CHOICES}
        value={power}
        onChange={(event) => {
          const chosen = POWER_METHODS.find((method) => method === event.target.value);
          if (chosen) onChange(chosen);
        }}
      />
    </Field>
  );
}

interface OneSeriesProps {
  readonly series: TestSeries;
  readonly unit: MassUnit;
  readonly power: PowerMethod;
  readonly onRemove?: (trial: TrialView) => void;
}

function OneSeries({ series, unit, power, onRemove }: OneSeriesProps) {
  const title = seriesTitle(series, unit, series.side);
  const table = <SeriesTable series={series} title={title} unit={unit} power={power} onRemove={onRemove} />;
  return (
    <article aria-label={title} className="grid gap-2 border-t border-line-soft pt-4">
      {series.days.length > 1 ? (
        <SeriesChart series={series} title={title} table={table} />
      ) : (
        <>
          <p className="text-sm">
            <b className="font-semibold">{title}</b> <span className="text-ink-2">{series.measure}</span>
          </p>
          {table}
        </>
      )}
      <p className="font-semibold">{series.verdict?.sentence ?? "One day so far: nothing to compare."}</p>
      <p className="text-xs text-ink-2">
        {series.error.text} {series.worthwhileText}
      </p>
    </article>
  );
}

/** Tests: each with its chart, its table, and what of a change can be believed. */
export function TestsSection({ athleteId, initial, today, unit, writes }: TestsSectionProps) {
  const { data } = useTests(athleteId, initial);
  const [shown, setShown] = useState<"trial" | "upload" | null>(null);
  const [power, setPower] = useState<PowerMethod>("sayers-countermovement");
  const remove = useRemoveTrial(athleteId);
  const restore = useRestoreTrial(athleteId);
  const takeBack = useTakeBackUpload(athleteId);
  const failed = (error: Error): void => showToast(error.message, { tone: "error" });
  const putBack = (id: string): void =>
    restore.mutate(id, { onError: failed, onSuccess: () => showToast("The trial is back.") });
  const removeOf = (series: TestSeries) => (trial: TrialView) =>
    remove.mutate(trial.id, {
      onError: failed,
      onSuccess: () =>
        showToast(`The trial of ${measureText(trial.measure, series.unit)} is removed.`, {
          action: { label: "Put back", run: () => putBack(trial.id) },
        }),
    });
  // Here, not in the dialog: it is closed by then, and nobody would say how it went.
  const takeBackFile = (uploadId: string): void =>
    takeBack.mutate(uploadId, {
      onError: failed,
      onSuccess: ({ count }) => showToast(`${count} trials are taken back.`),
    });
  const imported = ({ uploadId, count }: { uploadId: string; count: number }): void => {
    showToast(`${count} trials are imported.`, {
      action: { label: "Take back", run: () => takeBackFile(uploadId) },
    });
    setShown(null);
  };
  const hasPower = data.series.some(({ days }) => days.some(({ powers }) => powers.length > 0));
  const close = (): void => setShown(null);
  return (
    <Section
      id="tests"
      title="Tests"
      actions={
        <>
          {writes ? (
            <>
              <Button size="small" onClick={() => setShown("trial")}>
                Add a trial
              </Button>
              <Button size="small" onClick={() => setShown("upload")}>
                Import a file
              </Button>
            </>
          ) : null}
          {data.series.length > 0 ? <CsvLink athleteId={athleteId} what="tests" /> : null}
        </>
      }
    >
      {data.series.length === 0 ? (
        <p className="text-ink-2">No tests yet.</p>
      ) : (
        <div className="grid gap-5">
          {hasPower ? <PowerChoice power={power} onChange={setPower} /> : null}
          {data.series.map((series) => (
            <OneSeries
              key={series.key}
              series={series}
              unit={unit}
              power={power}
              {...(writes && { onRemove: removeOf(series) })}
            />
          ))}
          <SideDifferences differences={data.differences} unit={unit} />
        </div>
      )}
      {shown === "trial" ? (
        <TrialDialog athleteId={athleteId} today={today} unit={unit} onClose={close} />
      ) : null}
      {shown === "upload" ? (
        <UploadDialog athleteId={athleteId} known={data} unit={unit} onDone={imported} onClose={close} />
      ) : null}
    </Section>
  );
}
