"use client";

import { Field } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/text-input";
import type { Range } from "@/lib/engine/prescription/exercise";

interface EndErrors {
  readonly low?: { readonly message?: string };
  readonly high?: { readonly message?: string };
}

interface RangeInputProps {
  /** "Heavy, sets": the two fields say "from" and "to" behind it. */
  readonly label: string;
  /** The same as it is shown before the fields: "Sets". */
  readonly shown: string;
  readonly value: Range;
  readonly onChange: (value: Range) => void;
  readonly errors?: EndErrors;
}

/** An empty field is no number; the form says so when it is sent. */
const asText = (value: number): string => (Number.isNaN(value) ? "" : String(value));
const asNumber = (text: string): number => (text.trim() === "" ? Number.NaN : Number(text));

/** A from and a to, whole numbers. */
export function RangeInput({ label, shown, value, onChange, errors }: RangeInputProps) {
  return (
    <div className="grid grid-cols-[6.5rem_minmax(0,1fr)_auto_minmax(0,1fr)] items-start gap-2">
      <span aria-hidden="true" className="py-2 text-sm">
        {shown}
      </span>
      <Field label={`${label}, from`} hideLabel error={errors?.low?.message}>
        <NumberInput
          value={asText(value.low)}
          onChange={(event) => onChange({ ...value, low: asNumber(event.target.value) })}
        />
      </Field>
      <span aria-hidden="true" className="py-2 text-sm text-ink-2">
        to
      </span>
      <Field label={`${label}, to`} hideLabel error={errors?.high?.message}>
        <NumberInput
          value={asText(value.high)}
          onChange={(event) => onChange({ ...value, high: asNumber(event.target.value) })}
        />
      </Field>
    </div>
  );
}
