"use client";

import { useController, useFormContext } from "react-hook-form";
import { Checkbox } from "@/components/ui/checkbox";
import { Field, FieldGroup } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/text-input";
import { AIMS, type Aim } from "@/lib/engine/prescription/exercise";
import type { ExerciseForm } from "@/lib/schemas/exercise";
import { FRESH_DOSES } from "./fresh-doses";
import { RangeInput } from "./range-input";
import { AIM_WORDS } from "./words";

const HINTS: Record<Aim, string> = {
  heavy: "Few repetitions near the best",
  volume: "More repetitions, some in reserve",
  fast: "At full speed, far from failure",
  hold: "Held still, for seconds",
};

/** What the exercise is for, and how much of it. */
export function DoseFields() {
  const { register, formState } = useFormContext<ExerciseForm>();
  const { field, fieldState } = useController<ExerciseForm, "doses">({ name: "doses" });
  const errors = formState.errors.doses;
  const doses = field.value;
  return (
    <>
      <FieldGroup
        label="What it is for"
        hint="Working sets and the repetitions of each; a side each where it is done a side at a time."
        error={errors?.root?.message ?? fieldState.error?.message}
      >
        {AIMS.map((aim) => {
          const dose = doses[aim];
          return (
            <div key={aim} className="border-t border-line-soft py-1 first:border-0">
              <Checkbox
                label={AIM_WORDS[aim]}
                hint={HINTS[aim]}
                checked={dose !== null}
                onChange={(event) =>
                  field.onChange({ ...doses, [aim]: event.target.checked ? FRESH_DOSES[aim] : null })
                }
              />
              {dose ? (
                <div className="grid gap-1.5 pb-2 pl-7">
                  <RangeInput
                    label={`${AIM_WORDS[aim]}, sets`}
                    shown="Sets"
                    value={dose.sets}
                    onChange={(sets) => field.onChange({ ...doses, [aim]: { ...dose, sets } })}
                    errors={errors?.[aim]?.sets}
                  />
                  <RangeInput
                    label={`${AIM_WORDS[aim]}, ${aim === "hold" ? "seconds" : "repetitions"}`}
                    shown={aim === "hold" ? "Seconds" : "Repetitions"}
                    value={dose.reps}
                    onChange={(reps) => field.onChange({ ...doses, [aim]: { ...dose, reps } })}
                    errors={errors?.[aim]?.reps}
                  />
                </div>
              ) : null}
            </div>
          );
        })}
      </FieldGroup>
      <Field label="Rest between sets" error={formState.errors.rest?.message}>
        <NumberInput unit="s" min={0} max={600} {...register("rest", { valueAsNumber: true })} />
      </Field>
    </>
  );
}
