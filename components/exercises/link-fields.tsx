"use client";

import { useFormContext, useWatch } from "react-hook-form";
import type { Exercise } from "@/lib/engine/prescription/exercise";
import type { ExerciseForm } from "@/lib/schemas/exercise";
import { ExerciseSelect } from "./exercise-select";

/** The easier and the harder form: other exercises of one of the same qualities. */
export function LinkFields({ id }: { readonly id: string | null }) {
  const { control } = useFormContext<ExerciseForm>();
  const qualities = useWatch({ control, name: "qualities" });
  const alike = (other: Exercise): boolean => other.qualities.some((one) => qualities.includes(one));
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <ExerciseSelect name="easier" label="Easier form" none="None" id={id} offers={alike} />
      <ExerciseSelect name="harder" label="Harder form" none="None" id={id} offers={alike} />
    </div>
  );
}
