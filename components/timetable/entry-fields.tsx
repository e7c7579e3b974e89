"use client";

import type { ChangeEvent } from "react";
import { Controller, useFormContext, useWatch } from "react-hook-form";
import { SPORT_LOOKS } from "@/components/session/kinds";
import { WEEKDAY_TOGGLES } from "@/components/start/words";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { DateInput, NumberInput, TextInput, TimeInput } from "@/components/ui/text-input";
import { ToggleGroup } from "@/components/ui/toggle-group";
import { SPORT_KINDS, type Weekday } from "@/lib/engine/types";
import { DEFAULT_EFFORT } from "@/lib/schemas/plan";
import type { EntryForm } from "./entry-form";

const KIND_CHOICES = SPORT_KINDS.map((kind) => ({ value: kind, label: SPORT_LOOKS[kind].label }));

/** Left empty is no number, and the check says so beside the field. */
const asNumber = (value: unknown): number => (value === "" || value === null ? Number.NaN : Number(value));

function Repeats({ own }: { readonly own: boolean }) {
  const { control, register, formState } = useFormContext<EntryForm>();
  const repeats = useWatch({ control, name: "repeats" });
  return (
    <>
      <Field label="Repeats" className="sm:col-span-2">
        <Select {...register("repeats")}>
          <option value="weekly">Every week</option>
          <option value="once">Once</option>
          {own ? <option value="own">By the rule it has</option> : null}
        </Select>
      </Field>
      {repeats === "weekly" ? (
        <>
          <FieldGroup label="On" hint="The first day’s weekday always counts." className="sm:col-span-2">
            <Controller
              control={control}
              name="weekdays"
              render={({ field }) => (
                <ToggleGroup
                  toggles={WEEKDAY_TOGGLES}
                  value={field.value as Weekday[]}
                  onChange={field.onChange}
                />
              )}
            />
          </FieldGroup>
          <Field
            label="Last day"
            hint="Empty: it goes on"
            error={formState.errors.until?.message}
            className="sm:col-span-2"
          >
            <DateInput {...register("until")} />
          </Field>
        </>
      ) : null}
    </>
  );
}

interface EntryFieldsProps {
  readonly fresh: boolean;
  /** The session has a rule that says more than this form can. */
  readonly own: boolean;
}

/** Kind, name, when, how long, how hard, where, how often. */
export function EntryFields({ fresh, own }: EntryFieldsProps) {
  const { register, setValue, getFieldState, formState } = useFormContext<EntryForm>();
  const { errors } = formState;
  // Name and effort follow the kind until someone has given their own.
  const followKind = (kind: EntryForm["kind"]): void => {
    if (!fresh) return;
    if (!getFieldState("title").isDirty) setValue("title", SPORT_LOOKS[kind].label);
    if (!getFieldState("effort").isDirty) setValue("effort", DEFAULT_EFFORT[kind]);
  };
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <Field label="Kind" error={errors.kind?.message}>
        <Select
          choices={KIND_CHOICES}
          {...register("kind", {
            onChange: (event: ChangeEvent<HTMLSelectElement>) =>
              followKind(event.target.value as EntryForm["kind"]),
          })}
        />
      </Field>
      <Field label="Name" error={errors.title?.message} required>
        <TextInput autoComplete="off" {...register("title")} />
      </Field>
      <Field label="First day" error={errors.date?.message} required>
        <DateInput {...register("date")} />
      </Field>
      <Field label="Time" error={errors.time?.message} required>
        <TimeInput {...register("time")} />
      </Field>
      <Field label="Length" error={errors.minutes?.message} required>
        <NumberInput unit="min" min={1} max={1440} {...register("minutes", { setValueAs: asNumber })} />
      </Field>
      <Field
        label="Expected effort"
        hint="CR-10: 0 nothing, 5 hard, 10 the most there is"
        error={errors.effort?.message}
        required
      >
        <NumberInput
          step="any"
          min={0}
          max={10}
          inputMode="decimal"
          {...register("effort", { setValueAs: asNumber })}
        />
      </Field>
      <Field label="Place" error={errors.place?.message} className="sm:col-span-2">
        <TextInput autoComplete="off" {...register("place")} />
      </Field>
      <Repeats own={own} />
    </div>
  );
}
