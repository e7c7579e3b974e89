"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { Controller, useForm } from "react-hook-form";
import { ZoneSelect } from "@/components/start/zone-select";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Field, FieldGroup } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useAccount, useSaveAccount } from "@/lib/query/account";
import { accountSchema, type AccountForm, type AccountView } from "@/lib/schemas/account";

const MAIL_CHOICES: readonly { value: AccountForm["mailChoice"]; label: string; hint: string }[] = [
  { value: "each", label: "When a camp changes", hint: "Changes of two minutes come as one mail." },
  { value: "daily", label: "Once a day", hint: "At 06:00 in your time zone, if something changed." },
  { value: "none", label: "Never", hint: "Invitations and password mails still come." },
];

const UNIT_CHOICES = [
  { value: "kg", label: "Kilograms" },
  { value: "lb", label: "Pounds" },
];

/** Name, units, time zone and how often mail comes. */
export function AccountPanel({ initial }: { readonly initial: AccountView }) {
  const { data: account } = useAccount(initial);
  const save = useSaveAccount();
  const { name, units, timeZone, mailChoice } = account;
  const form = useForm<AccountForm>({
    resolver: zodResolver(accountSchema),
    values: { name, units, timeZone, mailChoice },
    resetOptions: { keepDirtyValues: true },
  });
  const { errors } = form.formState;
  const { submit, problem } = useSaving(form, async (values) => {
    await save.mutateAsync(values);
    showToast("Saved.");
  });
  return (
    <Panel title="Account">
      <form noValidate onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="Name" error={errors.name?.message} required>
          <TextInput autoComplete="name" {...form.register("name")} />
        </Field>
        <Field label="E-mail" hint="This is what you sign in with.">
          <TextInput value={account.email} readOnly />
        </Field>
        <Field label="Weights in" error={errors.units?.message}>
          <Select choices={UNIT_CHOICES} {...form.register("units")} />
        </Field>
        <Field label="Time zone" hint="Mails give times in it." error={errors.timeZone?.message}>
          <Controller
            control={form.control}
            name="timeZone"
            render={({ field }) => (
              <ZoneSelect name={field.name} value={field.value} onChange={field.onChange} />
            )}
          />
        </Field>
        <FieldGroup label="Mail about changes" error={errors.mailChoice?.message} className="sm:col-span-2">
          {MAIL_CHOICES.map(({ value, label, hint }) => (
            <Checkbox
              key={value}
              type="radio"
              value={value}
              label={label}
              hint={hint}
              {...form.register("mailChoice")}
            />
          ))}
        </FieldGroup>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <div className="sm:col-span-2">
          <Button type="submit" variant="primary" busy={save.isPending}>
            Save the account
          </Button>
        </div>
      </form>
    </Panel>
  );
}
