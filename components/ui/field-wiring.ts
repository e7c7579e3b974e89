"use client";

import { createContext, useContext } from "react";

interface FieldWiring {
  readonly id: string;
  readonly describedBy: string | undefined;
  readonly invalid: boolean;
  readonly required: boolean;
}

/** What a `Field` tells the control inside it. */
export const FieldContext = createContext<FieldWiring | null>(null);

interface ControlProps {
  readonly id?: string;
  readonly "aria-describedby"?: string;
  readonly "aria-invalid"?: boolean | "true" | "false" | "grammar" | "spelling";
  readonly required?: boolean;
}

/** Id and aria attributes of a control: its own where given, otherwise from the `Field` around it. */
export function useFieldWiring(own: ControlProps) {
  const field = useContext(FieldContext);
  return {
    id: own.id ?? field?.id,
    "aria-describedby": own["aria-describedby"] ?? field?.describedBy,
    "aria-invalid": own["aria-invalid"] ?? (field?.invalid || undefined),
    "aria-required": (own.required ?? field?.required) || undefined,
  };
}
