"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useRouter } from "next/navigation";
import { Controller, useForm } from "react-hook-form";
import { ZoneSelect } from "@/components/start/zone-select";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useSaveTeam } from "@/lib/query/account";
import { teamSchema, type TeamForm, type TeamView } from "@/lib/schemas/account";

/** Name and home zone of the team, for its head coach. */
export function TeamPanel({ initial }: { readonly initial: TeamView }) {
  const router = useRouter();
  const save = useSaveTeam();
  const form = useForm<TeamForm>({
    resolver: zodResolver(teamSchema),
    defaultValues: { name: initial.name, timeZone: initial.timeZone },
  });
  const { errors } = form.formState;
  const { submit, problem } = useSaving(form, async (values) => {
    await save.mutateAsync(values);
    showToast("Saved.");
    // The bar above carries the name.
    router.refresh();
  });
  return (
    <Panel title="Team">
      <form noValidate onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="Name" error={errors.name?.message} required>
          <TextInput autoComplete="organization" {...form.register("name")} />
        </Field>
        <Field
          label="Time zone of the gym"
          hint="For new camps; those that run keep theirs."
          error={errors.timeZone?.message}
        >
          <Controller
            control={form.control}
            name="timeZone"
            render={({ field }) => (
              <ZoneSelect name={field.name} value={field.value} onChange={field.onChange} />
            )}
          />
        </Field>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <div className="sm:col-span-2">
          <Button type="submit" busy={save.isPending}>
            Save the team
          </Button>
        </div>
      </form>
    </Panel>
  );
}
