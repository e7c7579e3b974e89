"use client";

import { useId } from "react";
import { classNames } from "@/components/ui/class-names";

interface ScaleProps {
  readonly label: string;
  /** Lowest and highest number of the scale. */
  readonly from: number;
  readonly to: number;
  readonly value: number | null;
  readonly onChange: (value: number) => void;
  /** Fills the squares up to the value, or the chosen one only. */
  readonly fill?: "upto" | "one";
  /** What a screen reader says of a number: "7, very hard". */
  readonly spoken?: (value: number) => string;
  /** Said at the right of the label: the number, its word. */
  readonly said?: string;
  readonly columns: string;
  readonly error?: string | null;
  readonly disabled?: boolean;
}

/** A row of numbered squares of which one is chosen: a radio group, so arrows work by themselves. */
export function Scale(props: ScaleProps) {
  const { label, from, to, value, onChange, fill = "one", spoken, said, columns, error, disabled } = props;
  const name = useId();
  const numbers = Array.from({ length: to - from + 1 }, (_, index) => from + index);
  const isOn = (number: number): boolean =>
    value !== null && (fill === "upto" ? number <= value : number === value);
  return (
    <fieldset
      className="py-1.5"
      disabled={disabled}
      aria-describedby={error ? `${name}-error` : undefined}
      data-invalid={error ? true : undefined}
    >
      <legend className="flex w-full items-baseline justify-between gap-2 pb-1 text-sm">
        <span className="font-semibold">{label}</span>
        <span aria-hidden="true" className="text-ink-2">
          {said}
        </span>
      </legend>
      <div className={classNames("grid gap-1", columns)}>
        {numbers.map((number) => (
          <label
            key={number}
            className={classNames(
              "relative flex min-h-11 items-center justify-center rounded border text-sm",
              "has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink",
              isOn(number)
                ? "border-blue bg-blue font-semibold text-ink-on"
                : "border-edge bg-field text-ink-2",
            )}
          >
            <input
              type="radio"
              name={name}
              value={number}
              checked={value === number}
              onChange={() => onChange(number)}
              aria-label={spoken?.(number) ?? String(number)}
              className="absolute inset-0 cursor-pointer opacity-0"
            />
            <span aria-hidden="true">{number}</span>
          </label>
        ))}
      </div>
      {error ? (
        <p id={`${name}-error`} className="mt-1 text-xs font-semibold text-red-text">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
