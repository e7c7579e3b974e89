"use client";

import { useFormContext, useWatch } from "react-hook-form";
import { EQUIPMENT_WORDS, LIMITATION_WORDS } from "@/components/exercises/words";
import { Checkbox } from "@/components/ui/checkbox";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { TextArea } from "@/components/ui/text-area";
import { NumberInput } from "@/components/ui/text-input";
import { EQUIPMENT, LIMITATIONS } from "@/lib/engine/prescription/exercise";
import type { AthleteForm } from "@/lib/schemas/athlete";

const UNITS = [
  { value: "kg", label: "Kilograms" },
  { value: "lb", label: "Pounds" },
];

/** What hurts, in words and from the list that exercises are chosen by. */
export function LimitationFields() {
  const { register, formState } = useFormContext<AthleteForm>();
  const { errors } = formState;
  return (
    <>
      <Field
        label="Limitations"
        hint="What hurts or is ruled out, in the athlete’s words."
        error={errors.limitations?.message}
        className="sm:col-span-2"
      >
        <TextArea rows={3} {...register("limitations")} />
      </Field>
      <FieldGroup
        label="Left out of sessions"
        hint="Exercises that one of these rules out are never prescribed."
        error={errors.limitationCodes?.message}
        className="sm:col-span-2"
      >
        <div className="grid gap-x-4 sm:grid-cols-2">
          {LIMITATIONS.map((one) => (
            <Checkbox key={one} label={LIMITATION_WORDS[one]} value={one} {...register("limitationCodes")} />
          ))}
        </div>
      </FieldGroup>
    </>
  );
}

/** What there is to train with. */
export function EquipmentFields() {
  const { control, register, formState } = useFormContext<AthleteForm>();
  const { errors } = formState;
  const unit = useWatch({ control, name: "plateUnit" });
  return (
    <>
      <FieldGroup
        label="Equipment"
        hint="What the athlete can train with. Nothing else is prescribed; the floor is always there."
        error={errors.equipment?.message}
        className="sm:col-span-2"
      >
        <div className="grid grid-cols-2 gap-x-4 md:grid-cols-3">
          {EQUIPMENT.map((piece) => (
            <Checkbox key={piece} label={EQUIPMENT_WORDS[piece]} value={piece} {...register("equipment")} />
          ))}
        </div>
      </FieldGroup>
      <Field label="Plates in" error={errors.plateUnit?.message}>
        <Select choices={UNITS} {...register("plateUnit")} />
      </Field>
      <Field
        label="Smallest step of load"
        hint="Both sides of a bar together; loads are rounded to it."
        error={errors.plateStep?.message}
      >
        <NumberInput
          unit={unit}
          step="any"
          inputMode="decimal"
          {...register("plateStep", { valueAsNumber: true })}
        />
      </Field>
    </>
  );
}
