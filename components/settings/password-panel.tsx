"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useChangePassword } from "@/lib/query/account";
import { passwordChangeSchema, type PasswordChange } from "@/lib/schemas/account";

const EMPTY: PasswordChange = { current: "", password: "" };

/** Changes the password, and with it ends every other session. */
export function PasswordPanel({ email }: { readonly email: string }) {
  const change = useChangePassword(email);
  const form = useForm<PasswordChange>({
    resolver: zodResolver(passwordChangeSchema),
    defaultValues: EMPTY,
  });
  const { errors } = form.formState;
  const { submit, problem } = useSaving(form, async (values) => {
    await change.mutateAsync(values);
    form.reset(EMPTY);
    showToast("The password is changed. Everywhere else you are signed out.");
  });
  return (
    <Panel title="Password">
      <form noValidate method="post" onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="Present password" error={errors.current?.message} required>
          <TextInput type="password" autoComplete="current-password" {...form.register("current")} />
        </Field>
        <Field label="New password" hint="At least 10 characters." error={errors.password?.message} required>
          <TextInput type="password" autoComplete="new-password" {...form.register("password")} />
        </Field>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <div className="sm:col-span-2">
          <Button type="submit" busy={change.isPending}>
            Change the password
          </Button>
        </div>
      </form>
    </Panel>
  );
}
