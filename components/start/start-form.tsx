"use client";

import { DateInput, TimeInput } from "@/components/ui/text-input";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { ToggleGroup } from "@/components/ui/toggle-group";
import type { StartParams } from "@/lib/schemas/start-params";
import { StartMore } from "./start-more";
import type { StartProblems } from "./use-start-plan";
import { AGE_CHOICES, BASE_CHOICES, LIFT_CHOICES, WEEKDAY_TOGGLES, WEEK_CHOICES } from "./words";
import { ZoneSelect } from "./zone-select";

export interface StartFieldsProps {
  readonly params: StartParams;
  readonly problems: StartProblems;
  readonly onChange: (change: Partial<StartParams>) => void;
}

interface StartFormProps extends StartFieldsProps {
  readonly zone: string;
  /** Camp weeks that are over already. */
  readonly weeksGone: number;
}

interface WeeksGoneProps {
  readonly gone: number;
  readonly weeks: number;
  readonly onShorten: (weeks: number) => void;
}

/** Short notice is normal: one press takes the weeks off that nobody can train any more. */
function WeeksGone({ gone, weeks, onShorten }: WeeksGoneProps) {
  const left = weeks - gone;
  return (
    <>
      {gone === 1 ? "The first week is over." : `The first ${gone} weeks are over.`}{" "}
      <button
        type="button"
        className="rounded font-semibold text-ink underline underline-offset-2 max-sm:min-h-control"
        onClick={() => onShorten(left)}
      >
        Make it {left === 1 ? "1 week" : `${left} weeks`}
      </button>
    </>
  );
}

/** The inputs of the start page. Names are those of the address, so that the form also works before any script runs. */
export function StartForm({ params, problems, onChange, zone, weeksGone }: StartFormProps) {
  return (
    <div className="grid grid-cols-2 gap-x-3.5 gap-y-3.5">
      <Field label="Bout date" error={problems.date}>
        <DateInput
          name="bout"
          value={params.date}
          onChange={(e) => onChange({ date: e.target.value })}
          required
        />
      </Field>
      <Field label="First bell" error={problems.time}>
        <TimeInput
          name="at"
          value={params.time}
          onChange={(e) => onChange({ time: e.target.value })}
          required
        />
      </Field>
      <Field
        label="Camp length"
        error={problems.weeks}
        hint={
          weeksGone > 0 ? (
            <WeeksGone gone={weeksGone} weeks={params.weeks} onShorten={(weeks) => onChange({ weeks })} />
          ) : undefined
        }
      >
        <Select
          name="weeks"
          choices={WEEK_CHOICES}
          value={params.weeks}
          onChange={(e) => onChange({ weeks: Number(e.target.value) })}
        />
      </Field>
      <Field label="Time zone" error={problems.zone}>
        <ZoneSelect name="zone" value={zone} onChange={(next) => onChange({ zone: next })} />
      </Field>
      <FieldGroup label="Hard sparring on" className="col-span-2">
        <ToggleGroup
          name="hard"
          toggles={WEEKDAY_TOGGLES}
          value={params.hard}
          onChange={(hard) => onChange({ hard })}
          tone="red"
        />
      </FieldGroup>
      <Field label="Lifts a week" error={problems.lifts}>
        <Select
          name="lifts"
          choices={LIFT_CHOICES}
          value={params.lifts}
          onChange={(e) => onChange({ lifts: Number(e.target.value) })}
        />
      </Field>
      <Field label="Training age">
        <Select
          name="age"
          choices={AGE_CHOICES}
          value={params.age}
          onChange={(e) => onChange({ age: e.target.value as StartParams["age"] })}
        />
      </Field>
      <Field label="Striking base" className="col-span-2">
        <Select
          name="base"
          choices={BASE_CHOICES}
          value={params.base}
          onChange={(e) => onChange({ base: e.target.value as StartParams["base"] })}
        />
      </Field>
      <StartMore params={params} problems={problems} onChange={onChange} />
    </div>
  );
}
