"use client";

import { useController, useFormContext, useWatch } from "react-hook-form";
import { BASE_CHOICES } from "@/components/start/words";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { NumberInput } from "@/components/ui/text-input";
import type { AthleteForm } from "@/lib/schemas/athlete";

/** Of two bases, about a third for the second: where a form starts. */
const FRESH_SHARE = 0.3;

function ShareField() {
  const {
    field: { ref, value, onBlur, onChange },
    fieldState,
  } = useController<AthleteForm, "secondShare">({ name: "secondShare" });
  const shown = value === null || Number.isNaN(value) ? "" : String(Math.round(value * 100));
  return (
    <Field
      label="Share of the second base"
      hint="10 to 90 %; the first has the rest."
      error={fieldState.error?.message}
    >
      <NumberInput
        ref={ref}
        unit="%"
        min={10}
        max={90}
        value={shown}
        onBlur={onBlur}
        onChange={({ target }) => onChange(target.value === "" ? Number.NaN : Number(target.value) / 100)}
      />
    </Field>
  );
}

/** The striking base, or two of them: trunk and accessory work follow it. */
export function StyleFields() {
  const { control, register, formState, getValues, setValue } = useFormContext<AthleteForm>();
  const { errors } = formState;
  const [first, second] = useWatch({ control, name: ["strikingBase", "secondBase"] });
  return (
    <>
      <Field label="Striking base" error={errors.strikingBase?.message}>
        <Select choices={BASE_CHOICES} {...register("strikingBase")} />
      </Field>
      <Field label="Second base" hint="For a style that mixes two" error={errors.secondBase?.message}>
        <Select
          {...register("secondBase", {
            setValueAs: (value: string | null) => value || null,
            onChange: ({ target }: { target: { value: string } }) =>
              setValue("secondShare", target.value === "" ? null : (getValues("secondShare") ?? FRESH_SHARE)),
          })}
        >
          <option value="">None</option>
          {BASE_CHOICES.filter(({ value }) => value !== first || value === second).map(({ value, label }) => (
            <option key={value} value={value}>
              {label}
            </option>
          ))}
        </Select>
      </Field>
      {second ? <ShareField /> : null}
    </>
  );
}
