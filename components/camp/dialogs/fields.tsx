"use client";

import { useFormContext, type FieldValues, type Path } from "react-hook-form";

/** What is wrong with one field of the form around, in words. */
export function useProblem<T extends FieldValues>(): (path: Path<T>) => string | undefined {
  const { getFieldState, formState } = useFormContext<T>();
  return (path) => getFieldState(path, formState).error?.message;
}

/** An empty number field is no number at all, not zero. */
export const numberOrNull = (value: unknown): number | null =>
  value === "" || value === null || value === undefined || Number.isNaN(Number(value)) ? null : Number(value);
