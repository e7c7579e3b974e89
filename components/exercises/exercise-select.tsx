"use client";

import { useFormContext } from "react-hook-form";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import type { Exercise } from "@/lib/engine/prescription/exercise";
import { useKnownExercises } from "@/lib/query/exercises";
import type { ExerciseForm } from "@/lib/schemas/exercise";

interface ExerciseSelectProps {
  readonly name: "bestOf" | "easier" | "harder";
  readonly label: string;
  /** What leaving it open says. */
  readonly none: string;
  /** The exercise that is edited, which is not offered; null for a new one. */
  readonly id: string | null;
  readonly offers: (other: Exercise) => boolean;
}

/** Another exercise, by name. */
export function ExerciseSelect({ name, label, none, id, offers }: ExerciseSelectProps) {
  const { register, formState, getValues } = useFormContext<ExerciseForm>();
  const picked = getValues(name);
  const others = useKnownExercises()
    .map(({ exercise }) => exercise)
    // What is picked stays to be seen, also where it would no longer be offered.
    .filter((other) => other.id === picked || (other.id !== id && offers(other)))
    .toSorted((a, b) => a.name.localeCompare(b.name, "en"));
  return (
    <Field label={label} error={formState.errors[name]?.message}>
      <Select {...register(name, { setValueAs: (value: string | null) => value || null })}>
        <option value="">{none}</option>
        {others.map((other) => (
          <option key={other.id} value={other.id}>
            {other.name}
          </option>
        ))}
      </Select>
    </Field>
  );
}
