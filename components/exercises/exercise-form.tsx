"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { FormProvider, useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Actions } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { useSaving } from "@/components/ui/use-saving";
import { exerciseFormSchema, MOST_CUES, type ExerciseForm as Form } from "@/lib/schemas/exercise";
import { DoseFields } from "./dose-fields";
import { LinkFields } from "./link-fields";
import { LoadFields } from "./load-fields";
import { NeedFields } from "./need-fields";
import { WhatFields } from "./what-fields";

interface ExerciseFormProps {
  /** Null for a new one. */
  readonly id: string | null;
  readonly start: Form;
  /** The act, as the button says it. */
  readonly act: string;
  readonly save: (form: Form) => Promise<void>;
  readonly onClose: () => void;
}

/** A line for each cue there may be; empty ones are left out on saving. */
const withCueLines = (form: Form): Form => ({
  ...form,
  cues: Array.from({ length: MOST_CUES }, (_, index) => form.cues[index] ?? ""),
});

/** The form of an exercise, new or old. */
export function ExerciseForm({ id, start, act, save, onClose }: ExerciseFormProps) {
  const form = useForm<Form>({
    resolver: zodResolver(exerciseFormSchema),
    defaultValues: withCueLines(start),
  });
  const { submit, problem } = useSaving(form, save);
  return (
    <FormProvider {...form}>
      <form noValidate onSubmit={submit} className="grid gap-5">
        <WhatFields />
        <DoseFields />
        <LoadFields id={id} />
        <NeedFields />
        <LinkFields id={id} />
        {problem ? <Notice tone="error" role="alert" title={problem} /> : null}
        <Actions className="mt-0!">
          <Button type="submit" variant="primary" busy={form.formState.isSubmitting}>
            {act}
          </Button>
          <Button onClick={onClose}>Close without saving</Button>
        </Actions>
      </form>
    </FormProvider>
  );
}
