"use client";

import type { FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/text-input";

interface CoachFactorProps {
  readonly value: number;
  readonly onFactor: (factor: number) => void;
}

/** The coach's own factor on a session's sets, 0.5 to 1.5. */
export function CoachFactor({ value, onFactor }: CoachFactorProps) {
  const submit = (event: FormEvent<HTMLFormElement>): void => {
    event.preventDefault();
    const factor = Number(new FormData(event.currentTarget).get("factor"));
    if (factor >= 0.5 && factor <= 1.5) onFactor(factor);
  };
  return (
    <form key={value} onSubmit={submit} className="flex items-end gap-2">
      <Field label="Coach’s factor on the sets" hint="0.5 to 1.5; 1 changes nothing" className="flex-1">
        <NumberInput
          name="factor"
          required
          step={0.05}
          min={0.5}
          max={1.5}
          defaultValue={value}
          inputMode="decimal"
        />
      </Field>
      <Button type="submit" className="mb-5">
        Try it
      </Button>
    </form>
  );
}
