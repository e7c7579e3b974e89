"use client";

import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { TextArea } from "@/components/ui/text-area";
import { workText } from "@/lib/format/load";
import type { LiftView } from "@/lib/schemas/prescription";
import { withNote } from "./edit-value";
import { LineCard, type LineContext } from "./line-card";

function WarmUp({ lift }: { readonly lift: LiftView }) {
  if (lift.warmUp.length === 0) return null;
  return (
    <div className="border-b border-line-soft pb-3">
      <h3 className="text-sm font-semibold">Warm-up, before the first set</h3>
      <ul className="mt-1 grid gap-1 text-sm">
        {lift.warmUp.map((line) => (
          <li key={line.slot}>
            <b className="font-semibold">{line.name}</b>, {workText(line)}
            <span className="text-ink-2">. {line.tempo}.</span>
          </li>
        ))}
      </ul>
    </div>
  );
}

function SessionNote({ lift, acts, mayEdit }: Pick<LineContext, "lift" | "acts" | "mayEdit">) {
  const [open, setOpen] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const submit = async (event: FormEvent<HTMLFormElement>): Promise<void> => {
    event.preventDefault();
    const note = String(new FormData(event.currentTarget).get("note") ?? "");
    const wrong = await acts.saveEdit(withNote(lift.edit?.edit ?? null, note));
    setProblem(wrong ? (Object.values(wrong)[0] ?? null) : null);
    if (wrong === null) setOpen(false);
  };
  if (open)
    return (
      <form aria-label="Note for the session" onSubmit={(event) => void submit(event)} className="mb-3">
        <Field label="Note for the session" error={problem}>
          <TextArea name="note" rows={2} maxLength={300} defaultValue={lift.note ?? ""} />
        </Field>
        <div className="mt-2 flex gap-2">
          <Button type="submit" size="small" variant="primary" busy={acts.busy}>
            Save the note
          </Button>
          <Button size="small" variant="quiet" onClick={() => setOpen(false)}>
            Leave it
          </Button>
        </div>
      </form>
    );
  return (
    <div className="mb-3 flex flex-wrap items-center justify-between gap-2">
      {lift.note ? <p className="border-l-4 border-ink pl-3 text-sm">Coach’s note: {lift.note}</p> : null}
      {mayEdit ? (
        <Button size="small" onClick={() => setOpen(true)}>
          {lift.note ? "Change the note" : "Add a note for the session"}
        </Button>
      ) : null}
    </div>
  );
}

/** What is asked in a lifting session, line by line. */
export function LiftPart(context: LineContext) {
  const { lift } = context;
  return (
    <Panel title="What is asked">
      {lift.closed ? <Notice className="mb-3">{lift.closed}</Notice> : null}
      <SessionNote {...context} />
      <WarmUp lift={lift} />
      <ol>
        {lift.lines.map((line, index) => (
          <LineCard key={line.slot} {...context} line={line} number={index + 1} />
        ))}
      </ol>
      {lift.empty.map(({ slot, purpose, why }) => (
        <Notice key={slot} tone="caution" className="mt-2" title={`Nothing for: ${purpose}`}>
          {why}
        </Notice>
      ))}
      <p className="mt-3 border-t border-line-soft pt-3 text-sm text-ink-2">
        Loads come from an estimate. A qualified coach watches heavy and ballistic lifts.
      </p>
    </Panel>
  );
}
