"use client";

import { useController, useFormContext, useWatch } from "react-hook-form";
import { Checkbox } from "@/components/ui/checkbox";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select, type Choice } from "@/components/ui/select";
import type { ExerciseForm } from "@/lib/schemas/exercise";
import { ExerciseSelect } from "./exercise-select";
import { RangeInput } from "./range-input";
import { INTENT_WORDS, LOAD_WORDS, ORDER_WORDS, SIDES_WORDS, STRETCH_WORDS } from "./words";

const choicesOf = (words: Readonly<Record<string, string>>): Choice[] =>
  Object.entries(words).map(([value, label]) => ({ value, label }));

/** Loads of most power of explosive lifts lie between these in Soriano et al. 2015; a form starts there. */
const FRESH_ZONE = { low: 30, high: 70 };

function PowerZone() {
  const { formState } = useFormContext<ExerciseForm>();
  const { field } = useController<ExerciseForm, "powerZone">({ name: "powerZone" });
  const zone = field.value;
  const error = formState.errors.powerZone;
  return (
    <FieldGroup label="Most power" error={error?.message} className="sm:col-span-2">
      <Checkbox
        label="At a known percent of best"
        checked={zone !== null}
        onChange={(event) => field.onChange(event.target.checked ? FRESH_ZONE : null)}
      />
      {zone ? (
        <RangeInput
          label="Most power"
          shown="Percent"
          value={zone}
          onChange={field.onChange}
          errors={error}
        />
      ) : null}
    </FieldGroup>
  );
}

/** How it is loaded and moved, and where it stands in a session. */
export function LoadFields({ id }: { readonly id: string | null }) {
  const { control, register, formState, setValue } = useFormContext<ExerciseForm>();
  const { errors } = formState;
  const [load, qualities] = useWatch({ control, name: ["load", "qualities"] });
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <Field label="Load" error={errors.load?.message}>
        <Select
          choices={choicesOf(LOAD_WORDS)}
          {...register("load", {
            // A power zone is a percent of a best: it goes with it.
            onChange: (event: { target: { value: string } }) => {
              if (event.target.value !== "best") setValue("powerZone", null);
            },
          })}
        />
      </Field>
      {load === "best" ? (
        <>
          <ExerciseSelect
            name="bestOf"
            label="Whose best"
            none="Its own"
            id={id}
            offers={(other) => other.load === "best"}
          />
          <PowerZone />
        </>
      ) : null}
      <Field label="Moved" error={errors.intent?.message}>
        <Select choices={choicesOf(INTENT_WORDS)} {...register("intent")} />
      </Field>
      <Field label="Sides" error={errors.sides?.message}>
        <Select choices={choicesOf(SIDES_WORDS)} {...register("sides")} />
      </Field>
      <Field label="Place" error={errors.order?.message}>
        <Select choices={choicesOf(ORDER_WORDS)} {...register("order")} />
      </Field>
      {qualities.includes("mobility") ? (
        <Field label="Stretch" error={errors.stretch?.message}>
          <Select
            choices={[{ value: "", label: "None" }, ...choicesOf(STRETCH_WORDS)]}
            {...register("stretch", { setValueAs: (value: string | null) => value || null })}
          />
        </Field>
      ) : null}
      <FieldGroup label="Main lift" error={errors.main?.message} className="sm:col-span-2">
        <Checkbox label="May be the main lift of a strength session" {...register("main")} />
      </FieldGroup>
    </div>
  );
}
