"use client";

import { useId } from "react";
import { classNames } from "./class-names";

interface Toggle<T extends string | number> {
  readonly value: T;
  /** What the button shows: "Tue". */
  readonly label: string;
  /** What a screen reader says where that is more: "Tuesday". */
  readonly spoken?: string;
}

interface ToggleGroupProps<T extends string | number> {
  readonly toggles: readonly Toggle<T>[];
  readonly value: readonly T[];
  readonly onChange: (value: T[]) => void;
  /** `one`: picking one lets go of the others. */
  readonly pick?: "many" | "one";
  /** Colour of what is on: red only for hard contact. */
  readonly tone?: "ink" | "red";
  readonly name?: string;
}

const ON = {
  ink: "has-checked:bg-ink has-checked:border-ink has-checked:text-ink-on",
  red: "has-checked:bg-red-fill has-checked:border-red-fill has-checked:text-red-on",
} as const;

/** A row of toggles of equal width, such as weekdays; put it into a `FieldGroup`. Values keep the order of `toggles`. */
export function ToggleGroup<T extends string | number>(props: ToggleGroupProps<T>) {
  const { toggles, value, onChange, pick = "many", tone = "ink" } = props;
  const ownName = useId();
  const flip = (toggled: T, on: boolean): void => {
    if (pick === "one") onChange([toggled]);
    else onChange(toggles.map((t) => t.value).filter((v) => (v === toggled ? on : value.includes(v))));
  };
  return (
    <div className="grid auto-cols-fr grid-flow-col gap-1">
      {toggles.map((toggle) => (
        <label
          key={toggle.value}
          className={classNames(
            "relative flex min-h-control items-center justify-center rounded border border-edge bg-field px-1 text-sm",
            "has-checked:font-semibold has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink",
            ON[tone],
          )}
        >
          <input
            type={pick === "one" ? "radio" : "checkbox"}
            name={props.name ?? ownName}
            value={toggle.value}
            checked={value.includes(toggle.value)}
            onChange={(event) => flip(toggle.value, event.target.checked)}
            aria-label={toggle.spoken}
            className="absolute -inset-px cursor-pointer opacity-0"
          />
          <span aria-hidden={toggle.spoken ? true : undefined}>{toggle.label}</span>
        </label>
      ))}
    </div>
  );
}
