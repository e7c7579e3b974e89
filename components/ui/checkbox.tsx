"use client";

import type { ComponentProps, ReactNode } from "react";
import { classNames } from "./class-names";

type CheckboxProps = Omit<ComponentProps<"input">, "type"> & {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  /** "radio" for one of several under the same `name`. */
  readonly type?: "checkbox" | "radio";
};

/** A checkbox (or radio) with its label beside it; the whole line can be pressed. */
export function Checkbox({ label, hint, type = "checkbox", className, ...rest }: CheckboxProps) {
  return (
    <label className={classNames("flex min-h-control items-start gap-2.5 py-2", className)}>
      <input type={type} {...rest} className="mt-0.5 size-[18px] shrink-0 accent-ink" />
      <span>
        <span className="block">{label}</span>
        {hint ? <span className="block text-xs text-ink-2">{hint}</span> : null}
      </span>
    </label>
  );
}
