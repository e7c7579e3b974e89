"use client";

import { useFormContext } from "react-hook-form";
import { Checkbox } from "@/components/ui/checkbox";
import { FieldGroup } from "@/components/ui/field";
import { EQUIPMENT, LIMITATIONS } from "@/lib/engine/prescription/exercise";
import type { ExerciseForm } from "@/lib/schemas/exercise";
import { EQUIPMENT_WORDS, LIMITATION_WORDS } from "./words";

/** What it needs, and what rules it out. */
export function NeedFields() {
  const { register, formState } = useFormContext<ExerciseForm>();
  const { errors } = formState;
  return (
    <>
      <FieldGroup
        label="Needs"
        hint="All of it; the floor is always there."
        error={errors.equipment?.message}
      >
        <div className="grid grid-cols-2 gap-x-4">
          {EQUIPMENT.map((piece) => (
            <Checkbox key={piece} label={EQUIPMENT_WORDS[piece]} value={piece} {...register("equipment")} />
          ))}
        </div>
      </FieldGroup>
      <FieldGroup
        label="Ruled out by"
        hint="An athlete with any of these never gets it."
        error={errors.ruledOutBy?.message}
      >
        <div className="grid gap-x-4 sm:grid-cols-2">
          {LIMITATIONS.map((one) => (
            <Checkbox key={one} label={LIMITATION_WORDS[one]} value={one} {...register("ruledOutBy")} />
          ))}
        </div>
      </FieldGroup>
    </>
  );
}
