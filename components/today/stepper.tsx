"use client";

import { useId, useState } from "react";
import { readNumber } from "@/lib/format/load";

interface StepperProps {
  readonly label: string;
  /** Null while nothing is given. */
  readonly value: number | null;
  readonly onChange: (value: number | null) => void;
  readonly step: number;
  readonly min?: number;
  readonly max: number;
  /** From where the first press starts when nothing is given. */
  readonly start?: number;
  readonly unit?: string;
  /** Whole numbers only. */
  readonly whole?: boolean;
  /** May be emptied. */
  readonly optional?: boolean;
  readonly error?: string | null;
}

const BUTTON =
  "flex size-12 shrink-0 items-center justify-center rounded border border-edge bg-field text-2xl leading-none hover:bg-line-soft disabled:opacity-40";

/** A number to set with a thumb: minus, the number itself to type over, plus. */
export function Stepper(props: StepperProps) {
  const {
    label,
    value,
    onChange,
    step,
    min = 0,
    max,
    start = min,
    unit,
    whole = false,
    optional,
    error,
  } = props;
  const id = useId();
  // What is being typed; null shows the value.
  const [typed, setTyped] = useState<string | null>(null);
  const shown = value === null ? "" : String(Math.round(value * 100) / 100);
  const take = (next: number | null): void => {
    setTyped(null);
    if (next === null) return optional ? onChange(null) : undefined;
    const bounded = Math.min(max, Math.max(min, whole ? Math.round(next) : next));
    if (bounded !== value) onChange(bounded);
  };
  const press = (way: 1 | -1): void => {
    if (value === null) return take(start);
    // On the grid of steps: 102 goes to 102.5, not to 104.5.
    const places = way > 0 ? Math.floor(value / step + 1e-9) : Math.ceil(value / step - 1e-9);
    take((places + way) * step);
  };
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-2 py-1">
      <label htmlFor={id} className="text-sm font-semibold">
        {label}
        {unit ? <span className="font-normal text-ink-2"> {unit}</span> : null}
      </label>
      <div className="flex items-center gap-1.5">
        <button type="button" aria-label={`${label}, less`} className={BUTTON} onClick={() => press(-1)}>
          <span aria-hidden="true">−</span>
        </button>
        <input
          id={id}
          inputMode={whole ? "numeric" : "decimal"}
          autoComplete="off"
          value={typed ?? shown}
          placeholder="–"
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          onFocus={(event) => event.target.select()}
          onChange={(event) => setTyped(event.target.value)}
          onBlur={() => {
            if (typed === null) return;
            take(typed.trim() === "" ? null : (readNumber(typed) ?? value));
          }}
          onKeyDown={(event) => {
            if (event.key === "Enter") event.currentTarget.blur();
          }}
          className="h-12 w-[76px] rounded border border-edge bg-field text-center text-lg font-semibold aria-invalid:border-red-text"
        />
        <button type="button" aria-label={`${label}, more`} className={BUTTON} onClick={() => press(1)}>
          <span aria-hidden="true">+</span>
        </button>
      </div>
      {error ? (
        <p id={`${id}-error`} className="col-span-2 text-xs font-semibold text-red-text">
          {error}
        </p>
      ) : null}
    </div>
  );
}
