"use client";

import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { TextInput } from "@/components/ui/text-input";
import { dayFromIso } from "@/lib/engine/geometry";
import { dayText } from "@/lib/format/civil";
import { massNumber, massText, readNumber, toKg, type MassUnit } from "@/lib/format/load";
import type { Queue } from "@/lib/offline/queue";
import type { AthleteDay, WeightView } from "@/lib/schemas/today";
import { Section, StateWord } from "./section";
import { isWaiting, type Acts } from "./use-acts";

interface WeightProps {
  readonly day: AthleteDay;
  readonly weight: WeightView;
  readonly unit: MassUnit;
  readonly editable: boolean;
  readonly queue: Queue;
  readonly acts: Acts;
}

const CAUTION =
  "Rapid weight loss can injure or kill. Work with a licensed physician and a registered dietitian, and follow your commission’s rules.";

/** Kilograms that a scale can show of an athlete, as the server takes them. */
const SPAN = { least: 20, most: 300 } as const;

function WeightInput({ day, unit, acts }: Pick<WeightProps, "day" | "unit" | "acts">) {
  const [typed, setTyped] = useState<string | null>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const save = (event: FormEvent): void => {
    event.preventDefault();
    if (typed === null && day.kg !== null) return;
    const value = readNumber(typed ?? "");
    const kg = value === null ? null : toKg(value, unit);
    if (kg === null || kg < SPAN.least || kg > SPAN.most)
      return setProblem(`${massNumber(SPAN.least, unit)} to ${massNumber(SPAN.most, unit)} ${unit}.`);
    setProblem(null);
    setTyped(null);
    acts.weight(day.date, kg);
  };
  return (
    <form onSubmit={save} noValidate className="mt-2 grid grid-cols-[minmax(0,1fr)_auto] items-start gap-2">
      <Field label={`Weight this morning, ${unit}`} error={problem}>
        <TextInput
          inputMode="decimal"
          autoComplete="off"
          className="min-h-12 text-lg! font-semibold"
          value={typed ?? (day.kg === null ? "" : massNumber(day.kg, unit))}
          onChange={(event) => setTyped(event.target.value)}
        />
      </Field>
      <Button type="submit" variant="primary" className="mt-6 min-h-12">
        Keep
      </Button>
    </form>
  );
}

function lineWords(weight: Extract<WeightView, { off: null }>, day: AthleteDay, unit: MassUnit): string {
  const line = weight.line.find(({ date }) => date === day.date);
  const scale = `${massText(weight.limitKg, unit)} at the scale, ${dayText(dayFromIso(weight.weighIn))}`;
  const here = line ? `The line today is ${massText(line.kg, unit)}, ` : "The line ends at ";
  return day.kg === null ? `${here}${scale}.` : `${massText(day.kg, unit)} this morning. ${here}${scale}.`;
}

/** Weight against the line to the limit, what the engine says of it, and the caution that always stands beside it. */
export function WeightCard({ day, weight, unit, editable, queue, acts }: WeightProps) {
  if (weight.off === "minor")
    return (
      <Section title="Weight">
        <p className="mt-1 text-sm text-ink-2">
          Weight descent is switched off for an athlete under 18: a growing body is not brought down to a
          limit.
        </p>
      </Section>
    );
  if (weight.off === "no-limit") return null;
  if (!editable && day.kg === null && weight.off !== null) return null;
  return (
    <Section
      title="Weight"
      lead={weight.off === null ? lineWords(weight, day, unit) : "No weight yet in this camp."}
    >
      {editable ? <WeightInput day={day} unit={unit} acts={acts} /> : null}
      <StateWord given={day.kg !== null} waiting={isWaiting(queue, `weight:${day.date}`)} />
      {weight.off === null && editable
        ? weight.remarks.map(({ kind, text }) => (
            <Notice key={kind} tone="caution" className="mt-1.5">
              {text}
            </Notice>
          ))
        : null}
      <Notice tone="caution" className="mt-1.5">
        {CAUTION}
      </Notice>
    </Section>
  );
}
