"use client";

import type { ChangeEvent } from "react";
import { Controller, useFormContext, useWatch } from "react-hook-form";
import { SPORT_LOOKS } from "@/components/session/kinds";
import { WEEKDAY_TOGGLES } from "@/components/start/words";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { DateInput, NumberInput, TextInput, TimeInput } from "@/components/ui/text-input";
import { ToggleGroup } from "@/components/ui/toggle-group";
import { SPORT_KINDS } from "@/lib/engine/types";
import { DEFAULT_EFFORT } from "@/lib/schemas/plan";
import { numberOrNull, useProblem } from "./fields";
import type { SportForm } from "./sport-form";

const KIND_CHOICES = SPORT_KINDS.map((kind) => ({ value: kind, label: SPORT_LOOKS[kind].label }));

function RepeatFields({ own }: { readonly own: boolean }) {
  const { control, register } = useFormContext<SportForm>();
  const problem = useProblem<SportForm>();
  const repeats = useWatch({ control, name: "repeats" });
  return (
    <>
      <Field label="Repeats" className="sm:col-span-2">
        <Select {...register("repeats")}>
          <option value="once">Once</option>
          <option value="weekly">Every week</option>
          {own ? <option value="own">By the rule it has</option> : null}
        </Select>
      </Field>
      {repeats === "weekly" ? (
        <>
          <FieldGroup label="On" className="sm:col-span-2" hint="The day given above always counts.">
            <Controller
              control={control}
              name="weekdays"
              render={({ field }) => (
                <ToggleGroup
                  toggles={WEEKDAY_TOGGLES}
                  value={field.value as (1 | 2 | 3 | 4 | 5 | 6 | 7)[]}
                  onChange={field.onChange}
                />
              )}
            />
          </FieldGroup>
          <Field
            label="Last day"
            hint="Empty: as long as the camp lasts"
            error={problem("until")}
            className="sm:col-span-2"
          >
            <DateInput {...register("until")} />
          </Field>
        </>
      ) : null}
    </>
  );
}

interface SportFieldsProps {
  /** A session that is being added, not edited. */
  readonly fresh: boolean;
  /** Whether it can be said how often it repeats: not where only one of a series is edited. */
  readonly repeats: boolean;
  /** The session has a rule that says more than this form can. */
  readonly own: boolean;
}

/** Kind, name, when, how long, how hard, where, how often. */
export function SportFields({ fresh, repeats, own }: SportFieldsProps) {
  const { register, setValue, getFieldState } = useFormContext<SportForm>();
  const problem = useProblem<SportForm>();
  // Name and effort follow the kind until someone has given their own.
  const followKind = (kind: SportForm["kind"]): void => {
    if (!fresh) return;
    if (!getFieldState("title").isDirty) setValue("title", SPORT_LOOKS[kind].label);
    if (!getFieldState("effort").isDirty) setValue("effort", DEFAULT_EFFORT[kind]);
  };
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <Field label="Kind" error={problem("kind")}>
        <Select
          choices={KIND_CHOICES}
          {...register("kind", {
            onChange: (event: ChangeEvent<HTMLSelectElement>) =>
              followKind(event.target.value as SportForm["kind"]),
          })}
        />
      </Field>
      <Field label="Name" error={problem("title")} required>
        <TextInput autoComplete="off" {...register("title")} />
      </Field>
      <Field label="Day" error={problem("date")} required>
        <DateInput {...register("date")} />
      </Field>
      <Field label="Time" error={problem("start")} required>
        <TimeInput {...register("start")} />
      </Field>
      <Field label="Length" error={problem("minutes")} required>
        <NumberInput unit="min" min={1} max={1440} {...register("minutes", { setValueAs: numberOrNull })} />
      </Field>
      <Field
        label="Expected effort"
        error={problem("effort")}
        hint="CR-10: 0 nothing, 5 hard, 10 the most there is"
        required
      >
        <NumberInput
          step="any"
          min={0}
          max={10}
          inputMode="decimal"
          {...register("effort", { setValueAs: numberOrNull })}
        />
      </Field>
      <Field label="Place" error={problem("place")} className="sm:col-span-2">
        <TextInput autoComplete="off" {...register("place")} />
      </Field>
      {repeats ? <RepeatFields own={own} /> : null}
    </div>
  );
}
