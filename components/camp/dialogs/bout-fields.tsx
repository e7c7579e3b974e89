"use client";

import { Controller, useFormContext, useWatch } from "react-hook-form";
import { ZoneSelect } from "@/components/start/zone-select";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { DateInput, NumberInput, TextInput, TimeInput } from "@/components/ui/text-input";
import { dayFromIso, isoFromDay } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import type { Bout, CampBook } from "@/lib/schemas/camp-book";
import { civilDate } from "@/lib/schemas/civil";
import { numberOrNull, useProblem } from "./fields";

/** The part of a form that is about the bout. */
export interface BoutForm {
  readonly bout: Bout;
  readonly weeks: number;
  readonly weighIn: CampBook["weighIn"];
}

const dayBefore = (date: string): string =>
  civilDate.safeParse(date).success ? isoFromDay((dayFromIso(date) - 1) as Day) : date;

function WeighInFields() {
  const { register, setValue, control } = useFormContext<BoutForm>();
  const problem = useProblem<BoutForm>();
  const [weighIn, boutDate] = useWatch({ control, name: ["weighIn", "bout.date"] });
  return (
    <>
      <Checkbox
        label="There is a weigh-in"
        checked={weighIn !== null}
        onChange={(event) =>
          setValue("weighIn", event.target.checked ? { date: dayBefore(boutDate), time: "11:00" } : null, {
            shouldDirty: true,
            shouldValidate: true,
          })
        }
        className="sm:col-span-2"
      />
      {weighIn === null ? null : (
        <>
          <Field label="Weigh-in on" error={problem("weighIn.date")}>
            <DateInput {...register("weighIn.date")} />
          </Field>
          <Field label="At" error={problem("weighIn.time")} hint="Time at the venue">
            <TimeInput {...register("weighIn.time")} />
          </Field>
        </>
      )}
    </>
  );
}

/** Date, time, place, rules and weight of a bout, and how long the camp is. */
export function BoutFields() {
  const { register, control } = useFormContext<BoutForm>();
  const problem = useProblem<BoutForm>();
  return (
    <div className="grid gap-3.5 sm:grid-cols-2">
      <Field label="Bout date" error={problem("bout.date")} required>
        <DateInput {...register("bout.date")} />
      </Field>
      <Field label="First bell" error={problem("bout.time")} hint="Time at the venue" required>
        <TimeInput {...register("bout.time")} />
      </Field>
      <Field label="Camp length" error={problem("weeks")} required>
        <NumberInput unit="weeks" min={1} max={20} {...register("weeks", { setValueAs: numberOrNull })} />
      </Field>
      <Field label="Time zone of the venue" error={problem("bout.timeZone")}>
        <Controller
          control={control}
          name="bout.timeZone"
          render={({ field }) => (
            <ZoneSelect name={field.name} value={field.value} onChange={field.onChange} />
          )}
        />
      </Field>
      <Field label="Opponent" error={problem("bout.opponent")}>
        <TextInput autoComplete="off" {...register("bout.opponent")} />
      </Field>
      <Field label="Place" error={problem("bout.place")}>
        <TextInput autoComplete="off" {...register("bout.place")} />
      </Field>
      <Field label="Ruleset" error={problem("bout.ruleset")} className="sm:col-span-2">
        <TextInput autoComplete="off" {...register("bout.ruleset")} />
      </Field>
      <Field label="Rounds" error={problem("bout.rounds")}>
        <NumberInput min={1} max={15} {...register("bout.rounds", { setValueAs: numberOrNull })} />
      </Field>
      <Field label="Length of a round" error={problem("bout.roundMinutes")}>
        <NumberInput
          unit="min"
          step="any"
          inputMode="decimal"
          {...register("bout.roundMinutes", { setValueAs: numberOrNull })}
        />
      </Field>
      <Field label="Weight limit" error={problem("bout.limitKg")} className="sm:col-span-2">
        <NumberInput
          unit="kg"
          step="any"
          inputMode="decimal"
          {...register("bout.limitKg", { setValueAs: numberOrNull })}
        />
      </Field>
      <WeighInFields />
    </div>
  );
}
