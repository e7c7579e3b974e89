"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { Controller, FormProvider, useForm, useWatch } from "react-hook-form";
import { SPORT_LOOKS } from "@/components/session/kinds";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { campSpan } from "@/lib/book/camp-span";
import { findOccurrence, type Occurrence } from "@/lib/book/sport-edits";
import { hhmm, isoFromDay } from "@/lib/engine/geometry";
import { type SportValues } from "@/lib/schemas/change";
import { DEFAULT_EFFORT } from "@/lib/schemas/plan";
import { ScopeChoice } from "../rail/scope-choice";
import type { Desk } from "../use-desk";
import { SportFields } from "./sport-fields";
import { editedValues, repeatsOf, sportFormSchema, valuesOfForm, type SportForm } from "./sport-form";

interface SportDialogProps {
  readonly desk: Desk;
  readonly target:
    { readonly kind: "add"; readonly date: string } | { readonly kind: "edit"; readonly id: string };
  readonly onClose: () => void;
}

const valuesOf = ({ entry, session }: Occurrence): SportValues => ({
  kind: session.kind,
  title: session.title,
  date: isoFromDay(session.day),
  start: hhmm(session.start),
  minutes: session.minutes,
  effort: session.effort,
  place: entry.place,
  rrule: entry.rrule,
});

const freshForm = (date: string, boutDate: string): SportForm => ({
  kind: "skill",
  title: SPORT_LOOKS.skill.label,
  date,
  start: "18:00",
  minutes: 60,
  effort: DEFAULT_EFFORT.skill,
  place: "",
  scope: "this",
  ...repeatsOf(null, date, boutDate),
});

function useSportForm({ desk, target, onClose }: SportDialogProps) {
  const { book } = desk.standing;
  const { from, to } = campSpan(book);
  const found = target.kind === "edit" ? findOccurrence(book, target.id, from, to) : null;
  const before = found ? valuesOf(found) : null;
  const form = useForm<SportForm>({
    resolver: zodResolver(sportFormSchema),
    defaultValues: before
      ? { ...before, scope: "this", ...repeatsOf(before.rrule, before.date, book.bout.date) }
      : freshForm(target.kind === "add" ? target.date : book.bout.date, book.bout.date),
  });
  const show = form.handleSubmit((values) => {
    if (target.kind === "add") {
      desk.tryChange({
        kind: "sport.add",
        entryId: crypto.randomUUID(),
        values: valuesOfForm(values, book.bout.date, null),
      });
    } else if (found && before) {
      const changed = editedValues(values, before, found.entry, book.bout.date);
      if (Object.keys(changed).length > 0) {
        desk.tryChange({ kind: "sport.edit", sportId: target.id, scope: values.scope, values: changed });
      }
    }
    onClose();
  });
  return { form, show, found };
}

/** Adds a sport session or edits one, single or recurring. Nothing is saved here: the change goes to the knock-on rail. */
export function SportDialog(props: SportDialogProps) {
  const { target, onClose } = props;
  const { form, show, found } = useSportForm(props);
  const scope = useWatch({ control: form.control, name: "scope" });
  const recurring = found !== null && found.entry.rrule !== null;
  const own = recurring && form.formState.defaultValues?.repeats === "own";
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title={target.kind === "add" ? "Add a session" : "Edit the session"}
      description="You see what it does to the camp before anything is saved."
    >
      <FormProvider {...form}>
        <form noValidate onSubmit={(event) => void show(event)}>
          {recurring ? (
            <div className="mb-3.5">
              <Controller
                control={form.control}
                name="scope"
                render={({ field }) => <ScopeChoice value={field.value} onChange={field.onChange} />}
              />
            </div>
          ) : null}
          <SportFields fresh={target.kind === "add"} repeats={!recurring || scope !== "this"} own={own} />
          <Actions>
            <Button type="submit" variant="primary">
              Show what it knocks on
            </Button>
            <Button onClick={onClose}>Close</Button>
          </Actions>
        </form>
      </FormProvider>
    </Dialog>
  );
}
