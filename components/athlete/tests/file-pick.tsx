"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { classNames } from "@/components/ui/class-names";
import { Field } from "@/components/ui/field";
import type { MassUnit } from "@/lib/format/load";
import { useFieldWiring } from "@/components/ui/field-wiring";
import { templateText } from "./read-file";

interface FilePickProps {
  /** Of the file that was chosen. */
  readonly name: string | null;
  readonly unit: MassUnit;
  readonly onPick: (file: File) => void;
}

function saveTemplate(unit: MassUnit): void {
  const url = URL.createObjectURL(
    new Blob([templateText(unit, new Date().toISOString().slice(0, 10))], { type: "text/csv;charset=utf-8" }),
  );
  const link = document.createElement("a");
  link.href = url;
  link.download = "trials-template.csv";
  link.click();
  URL.revokeObjectURL(url);
}

function FileInput({ onPick }: Pick<FilePickProps, "onPick">) {
  const wiring = useFieldWiring({});
  return (
    <input
      {...wiring}
      type="file"
      accept=".csv,.txt,.tsv,text/csv,text/plain"
      className="block min-h-control w-full text-sm"
      // The same file, mended, can be chosen again.
      onClick={(event) => {
        event.currentTarget.value = "";
      }}
      onChange={(event) => {
        const [file] = event.target.files ?? [];
        if (file) onPick(file);
      }}
    />
  );
}

/** Where a file is chosen or dropped. */
export function FilePick({ name, unit, onPick }: FilePickProps) {
  const [over, setOver] = useState(false);
  return (
    <div
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={(event) => {
        event.preventDefault();
        setOver(false);
        const [file] = event.dataTransfer.files;
        if (file) onPick(file);
      }}
      className={classNames(
        "grid gap-3 rounded border border-dashed px-4 py-3 sm:grid-cols-[1fr_auto] sm:items-end",
        over ? "border-ink bg-line-soft" : "border-edge",
      )}
    >
      <Field label="File" hint={name ? `Chosen: ${name}` : "Choose it, or drop it here."}>
        <FileInput onPick={onPick} />
      </Field>
      <Button size="small" onClick={() => saveTemplate(unit)}>
        Template to fill in
      </Button>
    </div>
  );
}
