"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { TextArea } from "@/components/ui/text-area";
import type { DaySession, SessionLog } from "@/lib/schemas/today";
import type { Acts } from "./use-acts";
import { effortText, EFFORT_WORDS } from "./effort-words";
import { PainFields } from "./pain-fields";
import { Scale } from "./scale";
import { isSparring } from "./looks";
import { Stepper } from "./stepper";

interface FinishFormProps {
  readonly session: DaySession;
  readonly log: SessionLog;
  readonly acts: Acts;
  readonly onDone: () => void;
}

const WORDS = EFFORT_WORDS.flatMap((word, effort) => (word ? [`${effort} ${word}`] : [])).join(" · ");

/** How hard and how long it was; each answer is kept as it is given, the button only closes the session. */
export function FinishForm({ session, log, acts, onDone }: FinishFormProps) {
  const [asked, setAsked] = useState(false);
  // Held here while it is written: a keystroke is no answer.
  const [note, setNote] = useState(log.note);
  const change = (part: Partial<SessionLog>): void => acts.log(session, () => part);
  const finish = (): void => {
    setAsked(true);
    if (log.effort === null || log.minutes === null) return;
    change({ state: "done", note: note.trim() });
    onDone();
  };
  return (
    <div className="mt-2 border-t border-line pt-2">
      <Scale
        label="How hard was the session?"
        from={0}
        to={10}
        value={log.effort}
        onChange={(effort) => change({ effort })}
        spoken={effortText}
        said={log.effort === null ? "0 rest, 10 maximal" : effortText(log.effort)}
        columns="grid-cols-6"
        error={asked && log.effort === null ? "Say how hard it was, 0 to 10." : null}
      />
      <p className="pb-1 text-xs text-ink-2">{WORDS}</p>
      <Stepper
        label="Minutes"
        value={log.minutes}
        onChange={(minutes) => change({ minutes })}
        step={5}
        min={1}
        max={600}
        start={session.minutes}
        whole
        optional
        error={asked && log.minutes === null ? "Say how long it took." : null}
      />
      {isSparring(session) ? (
        <Stepper
          label="Hard rounds"
          value={log.hardRounds}
          onChange={(hardRounds) => change({ hardRounds })}
          step={1}
          max={30}
          start={1}
          whole
          optional
        />
      ) : null}
      <PainFields pain={log.pain} place={log.painPlace} onChange={change} />
      <Field label="Note for your coach" className="mt-1">
        <TextArea
          rows={2}
          maxLength={1000}
          value={note}
          onChange={(event) => setNote(event.target.value)}
          onBlur={() => note.trim() !== log.note && change({ note: note.trim() })}
        />
      </Field>
      <Button variant="primary" wide className="mt-3 min-h-12" onClick={finish}>
        {log.state === "done" ? "Save" : "Finish and save"}
      </Button>
    </div>
  );
}
