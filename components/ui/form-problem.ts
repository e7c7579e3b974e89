"use client";

import type { FieldValues, Path, UseFormSetError } from "react-hook-form";
import { ProblemError } from "@/lib/query/send";

/**
 * Puts what the server refused beside its fields. Gives back what belongs to no field, for the foot of the form: null
 * where every remark found its place.
 */
export function placeProblem<T extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<T>,
  names: readonly Path<T>[],
): string | null {
  if (!(error instanceof ProblemError)) return "That did not work. Try again.";
  const fields = (error.problem.errors ?? []).flatMap(({ pointer, message }) => {
    const path = pointer.slice(1).replaceAll("/", ".");
    const name = names.find((known) => path === known || path.startsWith(`${known}.`));
    return name === undefined ? [] : [{ name, message }];
  });
  fields.forEach(({ name, message }, index) => setError(name, { message }, { shouldFocus: index === 0 }));
  return fields.length > 0 && fields.length === error.problem.errors?.length ? null : error.message;
}
