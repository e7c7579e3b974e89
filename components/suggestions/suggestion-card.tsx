"use client";

import { useState } from "react";
import { EffectList } from "@/components/camp/rail/effect-list";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/text-input";
import type { MassUnit } from "@/lib/format/load";
import type { SuggestionView } from "@/lib/schemas/suggestion";
import { effectText, numberText } from "./words";

interface SuggestionCardProps {
  readonly suggestion: SuggestionView;
  readonly unit: MassUnit;
  readonly busy: boolean;
  readonly onAccept: (note: string) => void;
  readonly onDismiss: (reason: string) => void;
}

function Numbers({ suggestion, unit }: Pick<SuggestionCardProps, "suggestion" | "unit">) {
  return (
    <dl className="mt-1.5 grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 gap-y-0.5">
      {suggestion.numbers.map((number) => (
        <div key={number.label} className="col-span-full grid grid-cols-subgrid">
          <dt className="text-ink-2">{number.label}</dt>
          <dd className="text-right font-semibold">{numberText(number, unit)}</dd>
        </div>
      ))}
    </dl>
  );
}

/** What it would do to the plan, in one line and, unfolded, effect by effect. */
function Effect({ suggestion: { effect, problem } }: Pick<SuggestionCardProps, "suggestion">) {
  if (problem !== null) return <p className="mt-2">Its change cannot be made as things stand: {problem}</p>;
  if (effect === null)
    return <p className="mt-2 text-ink-2">A talk, not a change: the plan stays as it is.</p>;
  return (
    <>
      <p className="mt-2 font-semibold">{effectText(effect)}</p>
      {effect.lifts > 0 ? (
        <details className="mt-1">
          <summary>What it knocks on</summary>
          <div className="-mx-4">
            <EffectList knockOn={effect.knockOn} subject={null} />
          </div>
        </details>
      ) : null}
    </>
  );
}

/** One suggestion: numbers, source, effect, and the decision. Nothing happens by itself. */
export function SuggestionCard({ suggestion, unit, busy, onAccept, onDismiss }: SuggestionCardProps) {
  const [note, setNote] = useState("");
  const [missing, setMissing] = useState(false);
  const { title, text, source, effect, problem } = suggestion;
  const dismiss = (): void => {
    if (note.trim() === "") setMissing(true);
    else onDismiss(note.trim());
  };
  return (
    <li className="border-t border-line-soft px-4 py-3 text-sm first:border-0">
      <h3 className="text-base font-semibold">{title}</h3>
      <Numbers suggestion={suggestion} unit={unit} />
      <p className="mt-1.5 max-w-prose">{text}</p>
      <p className="mt-1 text-xs text-ink-2">Source: {source}</p>
      <Effect suggestion={suggestion} />
      <div className="mt-2.5 grid gap-2">
        <Field
          label="Reason or note"
          hint="Needed to dismiss; kept with the decision."
          error={missing && note.trim() === "" ? "Say why, in a few words." : null}
        >
          <TextInput maxLength={500} value={note} onChange={(event) => setNote(event.target.value)} />
        </Field>
        <div className="flex flex-wrap gap-2">
          {problem === null ? (
            <Button size="small" variant="primary" busy={busy} onClick={() => onAccept(note.trim())}>
              {effect === null ? "Accept as seen" : "Accept"}
            </Button>
          ) : null}
          <Button size="small" busy={busy} onClick={dismiss}>
            Dismiss
          </Button>
        </div>
      </div>
    </li>
  );
}
