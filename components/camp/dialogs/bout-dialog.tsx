"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { FormProvider, useForm } from "react-hook-form";
import { z } from "zod";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { boutSchema, campWeeks, weighInSchema } from "@/lib/schemas/camp-book";
import type { Desk } from "../use-desk";
import { BoutFields, type BoutForm } from "./bout-fields";

const boutFormSchema = z.object({ bout: boutSchema, weeks: campWeeks, weighIn: weighInSchema.nullable() });

interface BoutDialogProps {
  readonly desk: Desk;
  readonly onClose: () => void;
}

/** Moves the bout, changes its facts, or marks it off. What that does to the camp is shown before it is saved. */
export function BoutDialog({ desk, onClose }: BoutDialogProps) {
  const { book } = desk.standing;
  const trying = desk.state.pending?.change;
  const start = trying?.kind === "bout.change" ? trying : book;
  const form = useForm<BoutForm>({
    resolver: zodResolver(boutFormSchema),
    defaultValues: { bout: start.bout, weeks: start.weeks, weighIn: start.weighIn },
  });
  const show = form.handleSubmit((values) => {
    desk.tryChange({ kind: "bout.change", ...values });
    onClose();
  });
  const markOff = (): void => {
    desk.tryChange({ kind: "bout.off" });
    onClose();
  };
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      width="wide"
      title="Change the bout"
      description="What is past stays. You see what it does to the camp before anything is saved."
    >
      <FormProvider {...form}>
        <form noValidate onSubmit={(event) => void show(event)}>
          <BoutFields />
          <Actions>
            <Button type="submit" variant="primary">
              Show what it knocks on
            </Button>
            {book.status === "on" ? (
              <Button variant="danger" onClick={markOff}>
                The bout is off
              </Button>
            ) : null}
            <Button onClick={onClose}>Close</Button>
          </Actions>
        </form>
      </FormProvider>
    </Dialog>
  );
}
