"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { TextArea } from "@/components/ui/text-area";
import { DateInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useSetHold } from "@/lib/query/athletes";
import { holdFormSchema, type HoldForm } from "@/lib/schemas/athlete";
import { replannedText } from "./words";

interface HoldDialogProps {
  readonly athleteId: string;
  readonly name: string;
  /** YYYY-MM-DD. */
  readonly today: string;
  readonly onClose: () => void;
}

/** Sets a hold. */
export function HoldDialog({ athleteId, name, today, onClose }: HoldDialogProps) {
  const set = useSetHold(athleteId);
  const form = useForm<HoldForm>({
    resolver: zodResolver(holdFormSchema),
    defaultValues: { from: today, to: null, reason: "" },
  });
  const { errors } = form.formState;
  const { submit, problem } = useSaving(form, async (values) => {
    const { replanned } = await set.mutateAsync(values);
    showToast(`${name} is on a hold. ${replannedText(replanned)}`);
    onClose();
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={`Put ${name} on a hold`}
      description="Nothing is planned on its days: no lifting, no contact. Only a medic lifts it."
    >
      <form noValidate onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="From" error={errors.from?.message} required>
          <DateInput {...form.register("from")} />
        </Field>
        <Field label="Last day" hint="Empty: until a medic lifts it" error={errors.to?.message}>
          <DateInput {...form.register("to", { setValueAs: (value: string | null) => value || null })} />
        </Field>
        <Field
          label="Reason"
          hint="A medical note: medics and the athlete see it, coaches do not."
          error={errors.reason?.message}
          className="sm:col-span-2"
          required
        >
          <TextArea rows={4} {...form.register("reason")} />
        </Field>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <Actions className="mt-1! sm:col-span-2">
          <Button type="submit" variant="primary" busy={set.isPending}>
            Set the hold
          </Button>
          <Button onClick={onClose}>Close</Button>
        </Actions>
      </form>
    </Dialog>
  );
}
