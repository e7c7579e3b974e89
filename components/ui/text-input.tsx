"use client";

import type { ComponentProps } from "react";
import { classNames } from "./class-names";
import { CONTROL_LOOK } from "./control-look";
import { useFieldWiring } from "./field-wiring";

type InputProps = ComponentProps<"input">;

function Input({ className, required, ...rest }: InputProps) {
  const wiring = useFieldWiring({ required, ...rest });
  return <input {...rest} {...wiring} className={classNames(CONTROL_LOOK, className)} />;
}

/** One line of text; `type` may be email, password, search or url. */
export function TextInput({ type = "text", ...rest }: InputProps) {
  return <Input type={type} {...rest} />;
}

/** The browser's own date field; its value is `YYYY-MM-DD`. */
export function DateInput(props: Omit<InputProps, "type">) {
  return <Input type="date" {...props} />;
}

/** The browser's own time field; its value is `HH:MM`. */
export function TimeInput(props: Omit<InputProps, "type">) {
  return <Input type="time" {...props} />;
}

type NumberInputProps = Omit<InputProps, "type"> & {
  /** Written behind the number inside the field: "min", "kg". */
  readonly unit?: string;
};

/** A number with its unit. */
export function NumberInput({ unit, className, inputMode = "numeric", ...rest }: NumberInputProps) {
  if (!unit) return <Input type="number" inputMode={inputMode} className={className} {...rest} />;
  return (
    <span className="relative block">
      <Input type="number" inputMode={inputMode} className={classNames("pr-14", className)} {...rest} />
      <span
        aria-hidden="true"
        className="pointer-events-none absolute inset-y-0 right-3 flex items-center text-sm text-ink-2"
      >
        {unit}
      </span>
    </span>
  );
}
