"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useState } from "react";
import { FormProvider, useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useDropEntry, useSaveEntry } from "@/lib/query/timetable";
import type { TimetableEntry } from "@/lib/schemas/timetable";
import { EntryFields } from "./entry-fields";
import { entryFormSchema, entryOfForm, formOfEntry, freshEntry, type EntryForm } from "./entry-form";

interface EntryDialogProps {
  /** Null adds one. */
  readonly entry: TimetableEntry | null;
  /** First day of a new one, YYYY-MM-DD. */
  readonly date: string;
  readonly onClose: () => void;
}

function DropButton({ entry, onClose }: { readonly entry: TimetableEntry; readonly onClose: () => void }) {
  const drop = useDropEntry();
  const [sure, setSure] = useState(false);
  const run = (): void =>
    drop.mutate(entry.id, {
      onSuccess: () => {
        showToast(`${entry.title} is no longer in the gym’s week.`);
        onClose();
      },
      onError: (error) => showToast(error.message, { tone: "error" }),
    });
  if (!sure) return <Button onClick={() => setSure(true)}>Delete</Button>;
  return (
    <Button variant="danger" busy={drop.isPending} onClick={run}>
      Delete {entry.title} for good
    </Button>
  );
}

/** Adds a session to the gym's week, or changes or deletes one. */
export function EntryDialog({ entry, date, onClose }: EntryDialogProps) {
  const save = useSaveEntry(entry?.id ?? null);
  const form = useForm<EntryForm>({
    resolver: zodResolver(entryFormSchema),
    defaultValues: entry ? formOfEntry(entry) : freshEntry(date),
  });
  const { submit, problem } = useSaving(form, async (values) => {
    await save.mutateAsync(entryOfForm(values, entry));
    showToast(`${values.title} is in the gym’s week.`);
    onClose();
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={entry ? "Change the session" : "Add a session"}
      description="New camps take it over. Camps that run have their own copy: move it there."
    >
      <FormProvider {...form}>
        <form noValidate onSubmit={submit}>
          <EntryFields fresh={entry === null} own={form.formState.defaultValues?.repeats === "own"} />
          {problem ? <Notice tone="error" role="alert" title={problem} className="mt-3.5" /> : null}
          <Actions>
            <Button type="submit" variant="primary" busy={save.isPending}>
              {entry ? "Save the session" : "Add the session"}
            </Button>
            {entry ? <DropButton entry={entry} onClose={onClose} /> : null}
            <Button onClick={onClose}>Close</Button>
          </Actions>
        </form>
      </FormProvider>
    </Dialog>
  );
}
