"use client";

import type { ComponentProps, ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { TextInput } from "@/components/ui/text-input";
import type { FormState } from "./use-form";

interface AccountFormProps {
  readonly form: FormState;
  readonly children: ReactNode;
  /** The act, as the button says it. */
  readonly act: string;
}

/** A short form with one button. `post`: were it sent before the script runs, nothing of it would stand in an address. */
export function AccountForm({ form, children, act }: AccountFormProps) {
  return (
    <form method="post" noValidate onSubmit={form.onSubmit} className="grid gap-3.5">
      {children}
      {form.problem ? <Notice tone="error" role="alert" title={form.problem} /> : null}
      <Button type="submit" variant="primary" wide busy={form.busy} className="mt-1">
        {act}
      </Button>
    </form>
  );
}

type TextFieldProps = ComponentProps<typeof TextInput> & {
  readonly state: FormState;
  readonly name: string;
  readonly label: string;
  readonly hint?: string;
};

export function TextField({ state, name, label, hint, ...rest }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} error={state.error(name)} required>
      <TextInput name={name} {...rest} />
    </Field>
  );
}
