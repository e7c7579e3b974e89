"use client";

import { useState } from "react";
import { TimeInput } from "@/components/ui/text-input";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import type { StartParams } from "@/lib/schemas/start-params";
import type { StartFieldsProps } from "./start-form";
import { OTHER_CHOICES, UNTIL_CHOICES, WEIGH_IN_CHOICES } from "./words";

/** The inputs that most readers never need; open by itself where one of them is wrong. */
export function StartMore({ params, problems, onChange }: StartFieldsProps) {
  const wrong = problems.to ?? problems.from ?? problems.hardTime ?? problems.weighInTime ?? problems.weighIn;
  // Once opened by an error it stays open: a field must not vanish under the one who mends it.
  const [open, setOpen] = useState(false);
  return (
    <details
      className="col-span-2 border-t border-line-soft pt-1"
      open={open || wrong !== undefined}
      onToggle={(event) => setOpen(event.currentTarget.open)}
    >
      <summary className="flex min-h-control items-center text-sm font-semibold underline decoration-1 underline-offset-4">
        More: weigh-in, free hours, other sessions
      </summary>
      <div className="grid grid-cols-2 gap-x-3.5 gap-y-3.5 pt-2">
        <Field label="Weigh-in" error={problems.weighIn}>
          <Select
            name="weigh-in"
            choices={WEIGH_IN_CHOICES}
            value={params.weighIn}
            onChange={(e) => onChange({ weighIn: e.target.value as StartParams["weighIn"] })}
          />
        </Field>
        <Field label="Weigh-in at" error={problems.weighInTime}>
          <TimeInput
            name="weigh-in-at"
            value={params.weighInTime}
            disabled={params.weighIn === "unknown"}
            onChange={(e) => onChange({ weighInTime: e.target.value })}
          />
        </Field>
        <Field label="Can lift from" error={problems.from}>
          <TimeInput name="from" value={params.from} onChange={(e) => onChange({ from: e.target.value })} />
        </Field>
        <Field label="Until" error={problems.to}>
          <TimeInput name="to" value={params.to} onChange={(e) => onChange({ to: e.target.value })} />
        </Field>
        <Field label="Hard sparring at" error={problems.hardTime} hint="75 min, effort 8 of 10">
          <TimeInput
            name="hard-at"
            value={params.hardTime}
            onChange={(e) => onChange({ hardTime: e.target.value })}
          />
        </Field>
        <Field label="Last hard sparring">
          <Select
            name="hard-until"
            choices={UNTIL_CHOICES}
            value={params.hardUntil}
            onChange={(e) => onChange({ hardUntil: Number(e.target.value) })}
          />
        </Field>
        <Field
          label="Other sport sessions a week"
          hint="Pads, drills, clinch: at 18:00, 60 min, effort 4, on days without hard sparring"
          className="col-span-2"
        >
          <Select
            name="other"
            choices={OTHER_CHOICES}
            value={params.other}
            onChange={(e) => onChange({ other: Number(e.target.value) })}
          />
        </Field>
      </div>
    </details>
  );
}
