"use client";

import { useState } from "react";
import type { FieldValues, Path, UseFormReturn } from "react-hook-form";
import { placeProblem } from "./form-problem";

/** Sends what a form holds; what the server refuses stands beside its fields, and the rest in `problem`. */
export function useSaving<T extends FieldValues>(
  form: UseFormReturn<T>,
  save: (values: T) => Promise<void>,
): { readonly submit: (event?: React.BaseSyntheticEvent) => void; readonly problem: string | null } {
  const [problem, setProblem] = useState<string | null>(null);
  const send = form.handleSubmit(async (values) => {
    setProblem(null);
    try {
      await save(values);
    } catch (error) {
      setProblem(placeProblem(error, form.setError, Object.keys(values) as Path<T>[]));
    }
  });
  return { submit: (event) => void send(event), problem };
}
