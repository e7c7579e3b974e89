"use client";

import { useId, useMemo, type ReactNode } from "react";
import { classNames } from "./class-names";
import { FieldContext } from "./field-wiring";

interface FieldProps {
  readonly label: ReactNode;
  readonly children: ReactNode;
  /** Said under the control whether or not something is wrong. */
  readonly hint?: ReactNode;
  /** What is wrong and what to do, in one sentence. */
  readonly error?: string | null;
  readonly required?: boolean;
  /** Keeps the label for screen readers only. */
  readonly hideLabel?: boolean;
  readonly className?: string;
}

function Remarks({ id, hint, error }: { readonly id: string } & Pick<FieldProps, "hint" | "error">) {
  return (
    <>
      {hint ? (
        <p id={`${id}-hint`} className="mt-1 text-xs text-ink-2">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={`${id}-error`} className="mt-1 text-xs font-semibold text-red-text">
          {error}
        </p>
      ) : null}
    </>
  );
}

const describedBy = (id: string, { hint, error }: Pick<FieldProps, "hint" | "error">): string | undefined =>
  [hint ? `${id}-hint` : null, error ? `${id}-error` : null].filter(Boolean).join(" ") || undefined;

/** Label, hint and error of one control; the control inside is tied to them by itself. */
export function Field({ label, children, hint, error, required = false, hideLabel, className }: FieldProps) {
  const id = useId();
  const described = describedBy(id, { hint, error });
  const wiring = useMemo(
    () => ({ id, describedBy: described, invalid: Boolean(error), required }),
    [id, described, error, required],
  );
  return (
    <div className={classNames("min-w-0", className)}>
      <label htmlFor={id} className={hideLabel ? "sr-only" : "mb-1 block text-sm font-semibold"}>
        {label}
      </label>
      <FieldContext value={wiring}>{children}</FieldContext>
      <Remarks id={id} hint={hint} error={error} />
    </div>
  );
}

/** The same for several controls under one legend: checkboxes, toggles, a from and a to. */
export function FieldGroup({ label, children, hint, error, hideLabel, className }: FieldProps) {
  const id = useId();
  return (
    <fieldset
      className={classNames("min-w-0", className)}
      aria-describedby={describedBy(id, { hint, error })}
      data-invalid={error ? true : undefined}
    >
      <legend className={hideLabel ? "sr-only" : "mb-1 block text-sm font-semibold"}>{label}</legend>
      {children}
      <Remarks id={id} hint={hint} error={error} />
    </fieldset>
  );
}
