"use client";

import { useMemo, useState } from "react";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Select } from "@/components/ui/select";
import type { MassUnit } from "@/lib/format/load";
import { useUploadTrials } from "@/lib/query/record";
import { ProblemError } from "@/lib/query/send";
import { MOST_ROWS, type TestsView, type TrialForm } from "@/lib/schemas/test-trial";
import {
  COLUMN_WORDS,
  TRIAL_COLUMNS,
  guessColumns,
  readRows,
  tableOf,
  textOf,
  type ColumnMap,
  type FileHabits,
  type FileTable,
  type ReadRow,
  type TrialColumn,
} from "./read-file";
import { FilePick } from "./file-pick";
import { PreviewTable } from "./preview-table";

interface UploadDialogProps {
  readonly athleteId: string;
  /** What stands already, to say where a file repeats it. */
  readonly known: TestsView;
  readonly unit: MassUnit;
  readonly onDone: (saved: { readonly uploadId: string; readonly count: number }) => void;
  readonly onClose: () => void;
}

interface Chosen {
  readonly name: string;
  /** Of this choice of a file: sent twice, it is kept once. */
  readonly uploadId: string;
  readonly table: FileTable;
  readonly map: ColumnMap;
}

/** Bytes that the server reads at most. */
const MOST_BYTES = 256 * 1024;
/** A larger file is no list of trials: reading it would only freeze the page. Bytes. */
const MOST_FILE_BYTES = 2 * 1024 * 1024;

const sameAs = (trial: TrialForm): string =>
  [trial.kind, trial.side, trial.day, trial.value, trial.second].join(" ");

const knownKeys = ({ series }: TestsView): ReadonlySet<string> =>
  new Set(
    series.flatMap(({ kind, side, days }) =>
      days.flatMap(({ day, trials }) =>
        trials.map(({ value, second }) => [kind, side, day, value, second].join(" ")),
      ),
    ),
  );

/** Rows with what the server refused of them put beside their cells. */
function withRefusals(rows: readonly ReadRow[], error: unknown): readonly ReadRow[] {
  if (!(error instanceof ProblemError)) return rows;
  const refused = new Map<number, Partial<Record<TrialColumn, string>>>();
  for (const { pointer, message } of error.problem.errors ?? []) {
    const [, index, field] = /^\/rows\/(\d+)\/(\w+)$/.exec(pointer) ?? [];
    const column = TRIAL_COLUMNS.find((known) => known === field);
    if (column) refused.set(Number(index), { ...refused.get(Number(index)), [column]: message });
  }
  return rows.map((row, index) => ({ ...row, errors: { ...row.errors, ...refused.get(index) } }));
}

function MapFields({ chosen, onMap }: { readonly chosen: Chosen; readonly onMap: (map: ColumnMap) => void }) {
  const choices = [
    { value: "", label: "Not in the file" },
    ...chosen.table.head.map((cell, index) => ({ value: index, label: cell || `Column ${index + 1}` })),
  ];
  return (
    <div className="grid gap-3 sm:grid-cols-3">
      {TRIAL_COLUMNS.map((column) => (
        <Field key={column} label={COLUMN_WORDS[column]}>
          <Select
            choices={choices}
            value={chosen.map[column] ?? ""}
            onChange={({ target: { value } }) =>
              onMap({ ...chosen.map, [column]: value === "" ? null : Number(value) })
            }
          />
        </Field>
      ))}
    </div>
  );
}

function HabitFields({
  habits,
  onChange,
}: {
  readonly habits: FileHabits;
  readonly onChange: (habits: FileHabits) => void;
}) {
  return (
    <div className="grid gap-3 sm:grid-cols-3">
      <Field label="Dates are written">
        <Select
          value={habits.dates}
          onChange={({ target }) =>
            onChange({ ...habits, dates: target.value === "day-first" ? "day-first" : "iso" })
          }
          choices={[
            { value: "iso", label: "2026-04-03" },
            { value: "day-first", label: "3/4/2026, day first" },
          ]}
        />
      </Field>
      <Field label="Loads and masses are in">
        <Select
          value={habits.masses}
          onChange={({ target }) => onChange({ ...habits, masses: target.value === "lb" ? "lb" : "kg" })}
          choices={[
            { value: "kg", label: "kg" },
            { value: "lb", label: "lb" },
          ]}
        />
      </Field>
    </div>
  );
}

/** Trials from a CSV file: columns, preview, and all rows or none. */
export function UploadDialog({ athleteId, known, unit, onDone, onClose }: UploadDialogProps) {
  const [chosen, setChosen] = useState<Chosen | null>(null);
  const [habits, setHabits] = useState<FileHabits>({ dates: "iso", masses: unit });
  const [refused, setRefused] = useState(false);
  const upload = useUploadTrials(athleteId);
  const read = useMemo(() => (chosen ? readRows(chosen.table, chosen.map, habits) : []), [chosen, habits]);
  const rows = withRefusals(read, upload.error);
  const trials = read.flatMap(({ trial }) => trial ?? []);
  const wrong = rows.filter(({ errors }) => Object.keys(errors).length > 0).length;
  const keys = knownKeys(known);
  const repeated = trials.filter((trial) => keys.has(sameAs(trial))).length;
  const body = chosen ? { uploadId: chosen.uploadId, rows: trials } : null;
  const tooLarge = trials.length > MOST_ROWS || JSON.stringify(body).length > MOST_BYTES;

  const pick = async (file: File): Promise<void> => {
    upload.reset();
    setRefused(file.size > MOST_FILE_BYTES);
    if (file.size > MOST_FILE_BYTES) return setChosen(null);
    const table = tableOf(textOf(await file.arrayBuffer()));
    setChosen({ name: file.name, uploadId: crypto.randomUUID(), table, map: guessColumns(table.head) });
  };
  const changed = (next: () => void): void => {
    upload.reset();
    next();
  };
  const send = (): void => {
    if (!body || wrong > 0 || tooLarge || trials.length === 0) return;
    upload.mutate(body, { onSuccess: onDone });
  };
  return (
    <Dialog
      open
      width="wide"
      onOpenChange={(open) => !open && onClose()}
      title="Import trials"
      description="A CSV file with one trial a row. All rows are kept, or none."
    >
      <div className="grid gap-4">
        <FilePick name={chosen?.name ?? null} unit={unit} onPick={(file) => void pick(file)} />
        {refused ? (
          <Notice tone="error" role="alert" title="That file is above 2 MiB: this is no list of trials." />
        ) : null}
        {chosen && read.length === 0 ? (
          <Notice tone="error" role="alert" title="The file has no rows under its head." />
        ) : null}
        {chosen && read.length > 0 ? (
          <>
            <MapFields chosen={chosen} onMap={(map) => changed(() => setChosen({ ...chosen, map }))} />
            <HabitFields habits={habits} onChange={(next) => changed(() => setHabits(next))} />
            <PreviewTable rows={rows} wrong={wrong} />
            {repeated > 0 ? (
              <Notice tone="caution" title={`${repeated} rows are the same as trials that are here already.`}>
                They would be counted twice.
              </Notice>
            ) : null}
            {tooLarge ? (
              <Notice tone="error" title={`Too much at once: at most ${MOST_ROWS} rows and 256 KiB.`}>
                Split the file.
              </Notice>
            ) : null}
          </>
        ) : null}
        {upload.error ? <Notice tone="error" role="alert" title={upload.error.message} /> : null}
        <Actions className="mt-0!">
          <Button
            variant="primary"
            busy={upload.isPending}
            disabled={trials.length === 0 || wrong > 0 || tooLarge}
            onClick={send}
          >
            {trials.length > 0 && wrong === 0 ? `Import ${trials.length} trials` : "Import"}
          </Button>
          <Button onClick={onClose}>Close</Button>
        </Actions>
      </div>
    </Dialog>
  );
}
