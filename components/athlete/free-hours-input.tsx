"use client";

import { WEEKDAY_TOGGLES } from "@/components/start/words";
import { Button } from "@/components/ui/button";
import { Field, FieldGroup } from "@/components/ui/field";
import { Cross } from "@/components/ui/icons";
import { Select } from "@/components/ui/select";
import { TextInput, TimeInput } from "@/components/ui/text-input";
import { useFieldArray, useFormContext } from "react-hook-form";
import type { AthleteForm } from "@/lib/schemas/athlete";

const WEEKDAYS = WEEKDAY_TOGGLES.map(({ value, spoken }) => ({ value, label: spoken }));

/** The hours of each weekday in which an athlete can lift. */
export function FreeHoursInput() {
  const { control, register, formState } = useFormContext<AthleteForm>();
  const { fields, append, remove } = useFieldArray({ control, name: "freeHours" });
  const errors = formState.errors.freeHours;
  return (
    <FieldGroup
      label="Hours in which the athlete can lift"
      hint={fields.length === 0 ? "None: no lifting can be placed." : "24:00 is the end of the day."}
      error={errors?.message}
      className="sm:col-span-2"
    >
      <ul className="grid gap-1.5">
        {fields.map((field, index) => (
          <li
            key={field.id}
            className="grid grid-cols-[minmax(0,1fr)_8.25rem_4.75rem_auto] items-start gap-1.5"
          >
            <Field label={`Weekday, line ${index + 1}`} hideLabel>
              <Select
                choices={WEEKDAYS}
                {...register(`freeHours.${index}.weekday`, { setValueAs: Number })}
              />
            </Field>
            <Field label={`From, line ${index + 1}`} hideLabel error={errors?.[index]?.from?.message}>
              <TimeInput {...register(`freeHours.${index}.from`)} />
            </Field>
            <Field label={`To, line ${index + 1}`} hideLabel error={errors?.[index]?.to?.message}>
              {/* Not a time field: it could not say 24:00. */}
              <TextInput inputMode="numeric" maxLength={5} {...register(`freeHours.${index}.to`)} />
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
        onClick={() => append({ weekday: ((fields.length % 7) + 1) as number, from: "10:00", to: "20:00" })}
      >
        Add hours
      </Button>
    </FieldGroup>
  );
}
