"use client";

import { useFormContext } from "react-hook-form";
import { AGE_CHOICES, LIFT_CHOICES } from "@/components/start/words";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { DateInput, TextInput } from "@/components/ui/text-input";
import type { AthleteForm } from "@/lib/schemas/athlete";
import { FreeHoursInput } from "./free-hours-input";
import { StyleFields } from "./style-fields";
import { EquipmentFields, LimitationFields } from "./training-fields";

/** What is known of an athlete: who, what the planner needs, what hurts, what there is to lift. */
export function ProfileFields({ minor }: { readonly minor: boolean }) {
  const { register, formState } = useFormContext<AthleteForm>();
  const { errors } = formState;
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <Field label="Name" error={errors.name?.message} required>
        <TextInput autoComplete="off" {...register("name")} />
      </Field>
      <Field label="Sport" hint="In your words: Muay Thai, MMA, boxing" error={errors.sport?.message}>
        <TextInput autoComplete="off" {...register("sport")} />
      </Field>
      <Field
        label="Date of birth"
        hint={
          minor ? "Under 18: weight descent is switched off." : "Under 18 weight descent is switched off."
        }
        error={errors.dateOfBirth?.message}
      >
        <DateInput {...register("dateOfBirth", { setValueAs: (value: string | null) => value || null })} />
      </Field>
      <StyleFields />
      <Field
        label="Training age"
        hint="Of lifting: a novice has under a year, the advanced are strong already."
        error={errors.trainingAge?.message}
      >
        <Select choices={AGE_CHOICES} {...register("trainingAge")} />
      </Field>
      <Field label="Lifts a week" error={errors.liftsPerWeek?.message}>
        <Select choices={LIFT_CHOICES} {...register("liftsPerWeek", { setValueAs: Number })} />
      </Field>
      <FreeHoursInput />
      <LimitationFields />
      <EquipmentFields />
    </div>
  );
}
