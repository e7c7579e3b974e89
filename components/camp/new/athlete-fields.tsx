"use client";

import { useFieldArray, useFormContext, useWatch } from "react-hook-form";
import { AGE_CHOICES, BASE_CHOICES, LIFT_CHOICES, WEEKDAY_TOGGLES } from "@/components/start/words";
import { Button } from "@/components/ui/button";
import { Field, FieldGroup } from "@/components/ui/field";
import { Cross } from "@/components/ui/icons";
import { Select } from "@/components/ui/select";
import { TextInput, TimeInput } from "@/components/ui/text-input";
import type { AthleteFacts } from "@/lib/schemas/camp-book";
import { numberOrNull, useProblem } from "../dialogs/fields";
import type { Draft } from "./draft";

/** An athlete of the team, with what is known for planning. */
export interface AthleteChoice {
  readonly id: string;
  readonly name: string;
  readonly facts: AthleteFacts;
}

const WEEKDAYS = WEEKDAY_TOGGLES.map(({ value, spoken }) => ({ value, label: spoken }));

function FreeHours() {
  const { control, register } = useFormContext<Draft>();
  const problem = useProblem<Draft>();
  const { fields, append, remove } = useFieldArray({ control, name: "facts.freeHours" });
  return (
    <FieldGroup label="Hours in which the athlete can lift" className="sm:col-span-2">
      <ul className="grid gap-1.5">
        {fields.map((field, index) => (
          <li key={field.id} className="grid grid-cols-[minmax(0,1fr)_auto_auto_auto] items-start gap-1.5">
            <Field label={`Weekday ${index + 1}`} hideLabel>
              <Select
                choices={WEEKDAYS}
                {...register(`facts.freeHours.${index}.weekday`, { setValueAs: Number })}
              />
            </Field>
            <Field
              label={`From, line ${index + 1}`}
              hideLabel
              error={problem(`facts.freeHours.${index}.from`)}
            >
              <TimeInput {...register(`facts.freeHours.${index}.from`)} />
            </Field>
            <Field label={`To, line ${index + 1}`} hideLabel error={problem(`facts.freeHours.${index}.to`)}>
              <TimeInput {...register(`facts.freeHours.${index}.to`)} />
            </Field>
            <Button variant="quiet" aria-label={`Take line ${index + 1} out`} onClick={() => remove(index)}>
              <Cross />
            </Button>
          </li>
        ))}
      </ul>
      <Button
        size="small"
        className="mt-2"
        onClick={() => append({ weekday: 1, from: "10:00", to: "20:00" })}
      >
        Add hours
      </Button>
    </FieldGroup>
  );
}

/** Who fights: someone of the team, with what is known of them, or someone new. */
export function AthleteFields({ athletes }: { readonly athletes: readonly AthleteChoice[] }) {
  const { register, control, setValue } = useFormContext<Draft>();
  const problem = useProblem<Draft>();
  const athleteId = useWatch({ control, name: "athleteId" });
  const takeFacts = (id: string): void => {
    const facts = athletes.find((athlete) => athlete.id === id)?.facts;
    if (facts) setValue("facts", { ...facts, freeHours: [...facts.freeHours] }, { shouldDirty: true });
  };
  return (
    <div className="grid gap-3.5">
      <Field label="Athlete">
        <Select
          {...register("athleteId", {
            onChange: (event: { target: { value: string } }) => takeFacts(event.target.value),
          })}
        >
          <option value="">Someone new</option>
          {athletes.map((athlete) => (
            <option key={athlete.id} value={athlete.id}>
              {athlete.name}
            </option>
          ))}
        </Select>
      </Field>
      {athleteId === "" ? (
        <Field label="Name" error={problem("athleteName")} required>
          <TextInput autoComplete="off" {...register("athleteName")} />
        </Field>
      ) : null}
    </div>
  );
}

/** What the planner has to know of the athlete, as of this camp. */
export function LiftingFields() {
  const { register } = useFormContext<Draft>();
  const problem = useProblem<Draft>();
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <Field label="Striking base" error={problem("facts.strikingBase")} className="sm:col-span-2">
        <Select choices={BASE_CHOICES} {...register("facts.strikingBase")} />
      </Field>
      <Field label="Has been lifting for" error={problem("facts.trainingAge")}>
        <Select choices={AGE_CHOICES} {...register("facts.trainingAge")} />
      </Field>
      <Field label="Lifts a week" error={problem("facts.liftsPerWeek")}>
        <Select choices={LIFT_CHOICES} {...register("facts.liftsPerWeek", { setValueAs: numberOrNull })} />
      </Field>
      <FreeHours />
    </div>
  );
}
