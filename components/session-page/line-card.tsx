"use client";

import { useState } from "react";
import { ITEM_LOOKS } from "@/components/session/kinds";
import { Button } from "@/components/ui/button";
import { dayFromIso } from "@/lib/engine/geometry";
import { bestText } from "@/lib/format/best";
import { loadText, restText, workText, type MassUnit } from "@/lib/format/load";
import type { LiftView, LineView } from "@/lib/schemas/prescription";
import type { LastTime } from "@/lib/schemas/today";
import { withLine } from "./edit-value";
import { LineEditForm } from "./line-edit-form";
import { SwapForm } from "./swap-form";
import type { SessionActs } from "./use-session-acts";
import { editText, lastTimeText, percentOfText } from "./words";

export interface LineContext {
  readonly lift: LiftView;
  readonly unit: MassUnit;
  readonly lastTime: Readonly<Record<string, LastTime>>;
  readonly acts: SessionActs;
  readonly mayEdit: boolean;
  readonly maySwap: boolean;
}

interface LineCardProps extends LineContext {
  readonly line: LineView;
  readonly number: number;
}

/** Where a load of a best comes from: "84 to 86 % of 125 kg, estimated by Epley from 110 kg × 4 on Tue 3 Nov". */
function BestSource({ line, lift, unit }: Pick<LineCardProps, "line" | "lift" | "unit">) {
  if (line.load.of !== "best") return null;
  const { best } = line.load;
  const record = lift.bests.find(
    (one) => one.exerciseId === best.exercise && dayFromIso(one.date) === best.day && one.kg === best.kg,
  );
  const lifted = record ? { kg: record.liftedKg, reps: record.reps } : null;
  return (
    <p className="text-sm text-ink-2">
      {percentOfText(line)} {bestText(best, lifted, unit)}
    </p>
  );
}

function Reasons({ line }: { readonly line: LineView }) {
  // Percent and best stand above, in the reader's own unit.
  const shown = line.reasons.filter(({ rule }) => rule !== "percent");
  return (
    <details className="mt-2 text-sm">
      <summary className="py-3 font-semibold">How, and why this</summary>
      <ul className="list-disc space-y-0.5 pl-5">
        {line.cues.map((cue) => (
          <li key={cue}>{cue}</li>
        ))}
      </ul>
      {shown.length > 0 ? (
        <ul className="mt-2 space-y-0.5 text-ink-2">
          {shown.map(({ rule, text }) => (
            <li key={`${rule} ${text}`}>{text}</li>
          ))}
        </ul>
      ) : null}
    </details>
  );
}

function Changes({ line, lift, unit, acts, mayEdit, maySwap }: LineCardProps) {
  const edit = editText(line, unit);
  const edited = line.edited.length > 0;
  return (
    <>
      {edited ? (
        <div className="mt-2 flex flex-wrap items-center justify-between gap-2 border-l-4 border-ink pl-3 text-sm">
          <div>
            {edit ? <p className="font-semibold">{edit}</p> : null}
            {line.note ? <p>Coach’s note: {line.note}</p> : null}
          </div>
          {mayEdit ? (
            <Button
              size="small"
              busy={acts.busy}
              onClick={() => void acts.saveEdit(withLine(lift.edit?.edit ?? null, line.slot, null))}
            >
              Put this line back
            </Button>
          ) : null}
        </div>
      ) : null}
      {line.swappedFrom ? (
        <div className="mt-2 flex flex-wrap items-center justify-between gap-2 border-l-4 border-ink-3 pl-3 text-sm">
          <p>
            Instead of {line.swappedFrom.name} in all {ITEM_LOOKS[lift.lift.item].label} of this camp.
          </p>
          {maySwap ? (
            <Button size="small" busy={acts.busy} onClick={() => acts.putSwapBack(line)}>
              Put {line.swappedFrom.name} back
            </Button>
          ) : null}
        </div>
      ) : null}
    </>
  );
}

/** One exercise of a session, and what its reader may do with it. */
export function LineCard(props: LineCardProps) {
  const { line, number, lift, unit, lastTime, acts, mayEdit, maySwap } = props;
  const [open, setOpen] = useState<"edit" | "swap" | null>(null);
  const close = (): void => setOpen(null);
  const last = lastTime[line.exercise];
  const load = loadText(line.load, unit);
  return (
    <li className="border-t border-line-soft py-3 first:border-t-0">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h3 className="text-lg font-semibold">
          <span className="mr-2 font-normal text-ink-3">{number}</span>
          {line.name}
        </h3>
        <p className="text-lg font-semibold">
          {workText(line)}
          {load ? ` · ${load}` : ""}
        </p>
      </div>
      <BestSource line={line} lift={lift} unit={unit} />
      <p className="text-sm text-ink-2">
        {line.purpose}. {line.tempo}. Rest {restText(line.rest)}.
      </p>
      {last ? <p className="text-sm">{lastTimeText(last, line.aim === "hold", unit)}.</p> : null}
      <Changes {...props} />
      <Reasons line={line} />
      {open === null ? (
        <div className="flex flex-wrap gap-2">
          {mayEdit ? (
            <Button size="small" aria-label={`Edit ${line.name}`} onClick={() => setOpen("edit")}>
              Edit
            </Button>
          ) : null}
          {maySwap && line.swaps.length > 0 ? (
            <Button size="small" aria-label={`Swap ${line.name}`} onClick={() => setOpen("swap")}>
              Swap
            </Button>
          ) : null}
        </div>
      ) : null}
      {open === "edit" ? (
        <LineEditForm
          line={line}
          lift={lift}
          unit={unit}
          busy={acts.busy}
          onSave={(edit) => acts.saveEdit(withLine(lift.edit?.edit ?? null, line.slot, edit))}
          onClose={close}
        />
      ) : null}
      {open === "swap" ? (
        <SwapForm
          line={line}
          item={lift.lift.item}
          names={lift.names}
          busy={acts.busy}
          onSwap={(to, name) => acts.swapFor(line, to, name)}
          onClose={close}
        />
      ) : null}
    </li>
  );
}
