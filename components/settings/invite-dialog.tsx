"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { FormProvider, useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useInvite } from "@/lib/query/people";
import { inviteSchema, type InviteForm } from "@/lib/schemas/account";
import type { FollowedAthlete } from "./feed-words";
import { RoleFields } from "./role-fields";

interface InviteDialogProps {
  readonly athletes: readonly FollowedAthlete[];
  readonly onClose: () => void;
}

/** Asks whom to invite, as what. */
export function InviteDialog({ athletes, onClose }: InviteDialogProps) {
  const invite = useInvite();
  const form = useForm<InviteForm>({
    resolver: zodResolver(inviteSchema),
    defaultValues: { email: "", role: "strength", athleteId: null },
  });
  const { submit, problem } = useSaving(form, async (values) => {
    await invite.mutateAsync(values);
    showToast(`An invitation is on its way to ${values.email}.`);
    onClose();
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Invite someone"
      description="They get a mail with a link that works once, for 7 days."
    >
      <FormProvider {...form}>
        <form noValidate onSubmit={submit} className="grid gap-3.5">
          <Field label="E-mail" error={form.formState.errors.email?.message} required>
            <TextInput type="email" autoComplete="off" {...form.register("email")} />
          </Field>
          <RoleFields athletes={athletes} />
          {problem ? <Notice tone="error" role="alert" title={problem} /> : null}
          <Actions className="mt-1!">
            <Button type="submit" variant="primary" busy={invite.isPending}>
              Send the invitation
            </Button>
            <Button onClick={onClose}>Close</Button>
          </Actions>
        </form>
      </FormProvider>
    </Dialog>
  );
}
