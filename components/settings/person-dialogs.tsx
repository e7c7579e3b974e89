"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { FormProvider, useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useChangeRole, useRemovePerson } from "@/lib/query/people";
import { roleChangeSchema, type PersonView, type RoleChange } from "@/lib/schemas/account";
import type { FollowedAthlete } from "./feed-words";
import { RoleFields } from "./role-fields";

interface PersonDialogProps {
  readonly person: PersonView;
  readonly onClose: () => void;
}

/** Gives a person another role. */
export function RoleDialog({
  person,
  athletes,
  onClose,
}: PersonDialogProps & { readonly athletes: readonly FollowedAthlete[] }) {
  const change = useChangeRole(person.id);
  const form = useForm<RoleChange>({
    resolver: zodResolver(roleChangeSchema),
    defaultValues: { role: person.role, athleteId: person.athleteId },
  });
  const { submit, problem } = useSaving(form, async (values) => {
    await change.mutateAsync(values);
    showToast(`${person.name} has the new role from now on.`);
    onClose();
  });
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title={`Role of ${person.name}`}>
      <FormProvider {...form}>
        <form noValidate onSubmit={submit} className="grid gap-3.5">
          <RoleFields athletes={athletes} />
          {problem ? <Notice tone="error" role="alert" title={problem} /> : null}
          <Actions className="mt-1!">
            <Button type="submit" variant="primary" busy={change.isPending}>
              Change the role
            </Button>
            <Button onClick={onClose}>Close</Button>
          </Actions>
        </form>
      </FormProvider>
    </Dialog>
  );
}

/** Asks before a person is taken out of the team. */
export function RemoveDialog({ person, onClose }: PersonDialogProps) {
  const remove = useRemovePerson();
  const run = (): void =>
    remove.mutate(person.id, {
      onSuccess: () => {
        showToast(`${person.name} is no longer in the team.`);
        onClose();
      },
    });
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title={`Take ${person.name} out of the team?`}>
      <p>They are signed out at once, and their calendars of this team end. What they saved stays.</p>
      {remove.error ? (
        <Notice tone="error" role="alert" title={remove.error.message} className="mt-3" />
      ) : null}
      <Actions>
        <Button variant="danger" busy={remove.isPending} onClick={run}>
          Take {person.name} out
        </Button>
        <Button onClick={onClose}>Keep</Button>
      </Actions>
    </Dialog>
  );
}
