"use client";

import { useState, type FormEvent } from "react";
import { ProblemError } from "@/lib/query/send";

/** Text of each named field. Passwords keep their spaces. */
export type FormTexts = Readonly<Record<string, string>>;

export interface FormState {
  readonly busy: boolean;
  /** What is wrong with a field, by its name. */
  readonly error: (name: string) => string | null;
  /** What is wrong with the whole. */
  readonly problem: string | null;
  readonly onSubmit: (event: FormEvent<HTMLFormElement>) => void;
}

const textsOf = (form: HTMLFormElement): FormTexts =>
  Object.fromEntries(
    [...new FormData(form)].flatMap(([name, value]) => (typeof value === "string" ? [[name, value]] : [])),
  );

const focusFirst = (form: HTMLFormElement): void =>
  void requestAnimationFrame(() => form.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());

/**
 * A short form that the server checks: what it says about a field stands beside that field. No validator runs in the
 * browser, so that the page stays light.
 */
export function useForm(send: (texts: FormTexts) => Promise<void>): FormState {
  const [busy, setBusy] = useState(false);
  const [errors, setErrors] = useState<FormTexts>({});
  const [problem, setProblem] = useState<string | null>(null);

  const run = async (form: HTMLFormElement): Promise<void> => {
    setBusy(true);
    setErrors({});
    setProblem(null);
    try {
      await send(textsOf(form));
    } catch (error) {
      const fields = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
      const byName = Object.fromEntries(fields.map(({ pointer, message }) => [pointer.slice(1), message]));
      const shown = Object.keys(byName).some((name) => form.elements.namedItem(name) !== null);
      setErrors(byName);
      if (!shown) setProblem(error instanceof ProblemError ? error.message : "That did not work. Try again.");
      if (shown) focusFirst(form);
    } finally {
      setBusy(false);
    }
  };

  return {
    busy,
    error: (name) => errors[name] ?? null,
    problem,
    onSubmit: (event) => {
      event.preventDefault();
      if (!busy) void run(event.currentTarget);
    },
  };
}
