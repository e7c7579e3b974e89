"use client";

import type { ComponentProps } from "react";
import { classNames } from "./class-names";
import { CONTROL_LOOK } from "./control-look";
import { useFieldWiring } from "./field-wiring";
import { ChevronDown } from "./icons";

export interface Choice<T extends string | number = string> {
  readonly value: T;
  readonly label: string;
}

type SelectProps = ComponentProps<"select"> & {
  /** Leave out to write `option` elements as children. */
  readonly choices?: readonly Choice<string | number>[];
};

/** The browser's own select, drawn like the other fields. */
export function Select({ choices, children, className, required, ...rest }: SelectProps) {
  const wiring = useFieldWiring({ required, ...rest });
  return (
    <span className="relative block">
      <select
        {...rest}
        {...wiring}
        className={classNames(CONTROL_LOOK, "appearance-none pr-7 pl-2.5", className)}
      >
        {choices
          ? choices.map((choice) => (
              <option key={choice.value} value={choice.value}>
                {choice.label}
              </option>
            ))
          : children}
      </select>
      <ChevronDown className="pointer-events-none absolute top-1/2 right-2.5 -translate-y-1/2" />
    </span>
  );
}
