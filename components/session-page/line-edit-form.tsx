"use client";

import { useState, type FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Actions } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { TextArea } from "@/components/ui/text-area";
import { NumberInput } from "@/components/ui/text-input";
import type { LineEdit } from "@/lib/engine/prescription/types";
import { fromKg, type MassUnit } from "@/lib/format/load";
import type { LiftView, LineView } from "@/lib/schemas/prescription";
import { lineEditOf, textsOf } from "./edit-value";

interface LineEditFormProps {
  readonly line: LineView;
  readonly lift: LiftView;
  readonly unit: MassUnit;
  readonly busy: boolean;
  /** Gives back what is wrong by field; null where it was saved. */
  readonly onSave: (edit: LineEdit) => Promise<Readonly<Record<string, string>> | null>;
  readonly onClose: () => void;
}

function ExerciseField({ line, lift, value }: Pick<LineEditFormProps, "line" | "lift"> & { value: string }) {
  const { names, choices } = lift;
  const planned = line.planned?.name ?? line.name;
  const near = line.alternatives.filter((id) => choices.some((choice) => choice.id === id));
  const rest = choices.filter(({ id }) => !near.includes(id));
  // A choice that the athlete may not do any more stays in the list as long as it stands.
  const gone = value !== "" && !choices.some(({ id }) => id === value);
  return (
    <Select name="exercise" defaultValue={value}>
      <option value="">{value === "" ? `As planned: ${planned}` : "As planned"}</option>
      {gone ? <option value={value}>{names[value] ?? value}</option> : null}
      <optgroup label="For the same place">
        {near.map((id) => (
          <option key={id} value={id}>
            {names[id] ?? id}
          </option>
        ))}
      </optgroup>
      <optgroup label="Any other">
        {rest.map(({ id, name }) => (
          <option key={id} value={id}>
            {name}
          </option>
        ))}
      </optgroup>
    </Select>
  );
}

/** A coach writes over one line: what is left empty stays as planned. */
export function LineEditForm({ line, lift, unit, busy, onSave, onClose }: LineEditFormProps) {
  const [errors, setErrors] = useState<Readonly<Record<string, string>>>({});
  const before = lift.edit?.edit.lines[line.slot];
  const start = textsOf(before, unit);
  const plan = line.planned ?? line;
  const kg = plan.load.of === "percent" ? null : plan.load.kg;
  const submit = async (event: FormEvent<HTMLFormElement>): Promise<void> => {
    event.preventDefault();
    const fields = new FormData(event.currentTarget);
    const said = (name: string): string => String(fields.get(name) ?? "");
    const typed = {
      exercise: said("exercise"),
      sets: said("sets"),
      low: said("low"),
      high: said("high"),
      load: said("load"),
      note: said("note"),
    };
    const wrong = await onSave(lineEditOf(typed, before, unit));
    if (wrong === null) onClose();
    else setErrors(wrong);
  };
  const reps = line.aim === "hold" ? "Seconds" : "Repetitions";
  return (
    <form
      aria-label={`Edit ${line.name}`}
      onSubmit={(event) => void submit(event)}
      className="mt-3 border-t border-line-soft pt-3"
    >
      <Field label="Exercise" error={errors.exercise ?? errors[line.slot]}>
        <ExerciseField line={line} lift={lift} value={start.exercise} />
      </Field>
      <div className="mt-3 grid grid-cols-2 gap-3 sm:grid-cols-4">
        <Field label="Sets" error={errors.sets}>
          <NumberInput name="sets" min={1} max={10} defaultValue={start.sets} placeholder={`${plan.sets}`} />
        </Field>
        <Field label={`${reps}, from`} error={errors.reps ?? errors.low}>
          <NumberInput
            name="low"
            min={1}
            max={100}
            defaultValue={start.low}
            placeholder={`${plan.reps.low}`}
          />
        </Field>
        <Field label={`${reps}, to`} error={errors.high}>
          <NumberInput
            name="high"
            min={1}
            max={100}
            defaultValue={start.high}
            placeholder={`${plan.reps.high}`}
          />
        </Field>
        <Field label="Load" error={errors.kg}>
          <NumberInput
            name="load"
            unit={unit}
            min={0}
            step="any"
            inputMode="decimal"
            defaultValue={start.load}
            placeholder={kg === null ? "" : `${fromKg(kg, unit)}`}
          />
        </Field>
      </div>
      <Field label="Note" hint="Up to 300 characters." error={errors.note} className="mt-3">
        <TextArea name="note" rows={2} maxLength={300} defaultValue={start.note} />
      </Field>
      <p className="mt-2 text-xs text-ink-2">What is left empty stays as planned.</p>
      <Actions className="mt-3!">
        <Button type="submit" variant="primary" size="small" busy={busy}>
          Save the line
        </Button>
        <Button size="small" variant="quiet" onClick={onClose}>
          Leave it
        </Button>
      </Actions>
    </form>
  );
}
