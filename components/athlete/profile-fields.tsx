"use client";

import { useFormContext } from "react-hook-form";
import { AGE_CHOICES, BASE_CHOICES, LIFT_CHOICES } from "@/components/start/words";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { TextArea } from "@/components/ui/text-area";
import { DateInput, TextInput } from "@/components/ui/text-input";
import type { AthleteForm } from "@/lib/schemas/athlete";
import { FreeHoursInput } from "./free-hours-input";

/** What is known of an athlete: who, what the planner needs, what hurts. */
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
      <Field label="Striking base" error={errors.strikingBase?.message}>
        <Select choices={BASE_CHOICES} {...register("strikingBase")} />
      </Field>
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
      <Field
        label="Limitations"
        hint="What hurts or is ruled out, in the athlete’s words."
        error={errors.limitations?.message}
        className="sm:col-span-2"
      >
        <TextArea rows={3} {...register("limitations")} />
      </Field>
    </div>
  );
}
