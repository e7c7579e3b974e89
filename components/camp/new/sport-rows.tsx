"use client";

import { useState } from "react";
import { Controller, useFieldArray, useFormContext, useWatch } from "react-hook-form";
import { KindMark } from "@/components/session/kind-mark";
import { SPORT_LOOKS } from "@/components/session/kinds";
import { UNTIL_CHOICES, WEEKDAY_TOGGLES } from "@/components/start/words";
import { Button } from "@/components/ui/button";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { NumberInput, TextInput, TimeInput } from "@/components/ui/text-input";
import { ToggleGroup } from "@/components/ui/toggle-group";
import { SPORT_KINDS, type Weekday } from "@/lib/engine/types";
import { DEFAULT_EFFORT } from "@/lib/schemas/plan";
import { numberOrNull, useProblem } from "../dialogs/fields";
import { LAST_DAYS_OUT, type Draft, type DraftSport } from "./draft";

const KINDS = SPORT_KINDS.map((kind) => ({ value: kind, label: SPORT_LOOKS[kind].label }));

const freshRow = (): DraftSport => ({
  on: true,
  kind: "skill",
  title: SPORT_LOOKS.skill.label,
  weekdays: [1],
  time: "18:00",
  minutes: 60,
  effort: DEFAULT_EFFORT.skill,
  place: "",
  lastDaysOut: LAST_DAYS_OUT.skill,
  own: null,
});

const daysText = (weekdays: readonly number[]): string =>
  WEEKDAY_TOGGLES.filter(({ value }) => weekdays.includes(value))
    .map(({ label }) => label)
    .join(", ");

const untilChoices = (value: number) =>
  UNTIL_CHOICES.some((choice) => choice.value === value)
    ? UNTIL_CHOICES
    : [...UNTIL_CHOICES, { value, label: `${value} days out` }].sort((a, b) => a.value - b.value);

function RowFields({ index, row }: { readonly index: number; readonly row: DraftSport }) {
  const { register, control } = useFormContext<Draft>();
  const problem = useProblem<Draft>();
  const at = <K extends keyof DraftSport>(name: K) => `sport.${index}.${name}` as const;
  return (
    <div className="grid gap-3 border-t border-line-soft py-3 sm:grid-cols-2">
      <Field label="Kind">
        <Select choices={KINDS} {...register(at("kind"))} />
      </Field>
      <Field label="Name" error={problem(at("title"))}>
        <TextInput {...register(at("title"))} />
      </Field>
      {row.own === null ? (
        <>
          <FieldGroup label="On" error={problem(at("weekdays"))} className="sm:col-span-2">
            <Controller
              control={control}
              name={at("weekdays")}
              render={({ field }) => (
                <ToggleGroup
                  toggles={WEEKDAY_TOGGLES}
                  value={field.value as Weekday[]}
                  onChange={field.onChange}
                />
              )}
            />
          </FieldGroup>
          <Field label="Time" error={problem(at("time"))}>
            <TimeInput {...register(at("time"))} />
          </Field>
          <Field label="Last one">
            <Select
              choices={untilChoices(row.lastDaysOut)}
              {...register(at("lastDaysOut"), { setValueAs: Number })}
            />
          </Field>
        </>
      ) : null}
      <Field label="Length" error={problem(at("minutes"))}>
        <NumberInput
          unit="min"
          min={1}
          max={1440}
          {...register(at("minutes"), { setValueAs: numberOrNull })}
        />
      </Field>
      <Field label="Expected effort" error={problem(at("effort"))} hint="CR-10, 0 to 10">
        <NumberInput
          step="any"
          min={0}
          max={10}
          inputMode="decimal"
          {...register(at("effort"), { setValueAs: numberOrNull })}
        />
      </Field>
    </div>
  );
}

interface RowProps {
  readonly index: number;
  readonly open: boolean;
  readonly onOpen: () => void;
}

function Row({ index, open, onOpen }: RowProps) {
  const { register, control } = useFormContext<Draft>();
  const row = useWatch({ control, name: `sport.${index}` });
  const look = SPORT_LOOKS[row.kind];
  return (
    <li className="border-t border-line-soft first:border-0">
      <div className="flex items-center gap-3">
        <label className="flex min-h-control flex-1 items-center gap-2.5 py-1">
          <input
            type="checkbox"
            {...register(`sport.${index}.on`)}
            className="size-[18px] shrink-0 accent-ink"
          />
          <KindMark mark={look.mark} size={12} className={look.text} />
          <span className="min-w-0 flex-1">
            {row.title || look.label}
            <span className="block text-xs text-ink-2">
              {row.own ? "by a rule of its own" : `${daysText(row.weekdays)} ${row.time}`}, {row.minutes} min,
              effort {row.effort}
            </span>
          </span>
        </label>
        <Button size="small" variant="quiet" aria-expanded={open} onClick={onOpen}>
          {open ? "Done" : "Edit"}
        </Button>
      </div>
      {open ? <RowFields index={index} row={row} /> : null}
    </li>
  );
}

/** The sport's own week in this camp: taken from the team's, and changed where this camp differs. */
export function SportRows() {
  const { control } = useFormContext<Draft>();
  const { fields, append } = useFieldArray({ control, name: "sport" });
  const [open, setOpen] = useState<number | null>(null);
  return (
    <div>
      {fields.length === 0 ? (
        <p className="text-sm text-ink-2">The team’s week is empty. Add what this athlete trains.</p>
      ) : null}
      <ul>
        {fields.map((field, index) => (
          <Row
            key={field.id}
            index={index}
            open={open === index}
            onOpen={() => setOpen(open === index ? null : index)}
          />
        ))}
      </ul>
      <Button
        size="small"
        className="mt-2"
        onClick={() => {
          append(freshRow());
          setOpen(fields.length);
        }}
      >
        Add a session
      </Button>
    </div>
  );
}
