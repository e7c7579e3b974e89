"use client";

import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Select } from "@/components/ui/select";
import { DateInput, TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { MOST_REPS_FOR_ESTIMATE } from "@/lib/engine/prescription/rep-max";
import { REP_MAX_FORMULAS, type RepMaxFormula } from "@/lib/engine/prescription/types";
import { FROM_WORDS } from "@/lib/engine/prescription/wording";
import { massText, readNumber, toKg } from "@/lib/format/load";
import { useAddBest } from "@/lib/query/record";
import type { BestsView } from "@/lib/schemas/prescription";

interface BestDialogProps {
  readonly athleteId: string;
  readonly view: BestsView;
  readonly today: string;
  readonly onClose: () => void;
}

/** As typed. */
interface Typed {
  exerciseId: string;
  day: string;
  kg: string;
  reps: string;
  formula: RepMaxFormula;
}

const FORMULAS = REP_MAX_FORMULAS.map((formula) => ({ value: formula, label: FROM_WORDS[formula] }));

/** Adds a best: one repetition is measured, more are estimated by the formula that is named. */
export function BestDialog({ athleteId, view, today, onClose }: BestDialogProps) {
  const add = useAddBest(athleteId);
  const form = useForm<Typed>({
    defaultValues: { exerciseId: view.lifts[0]?.id ?? "", day: today, kg: "", reps: "1", formula: "epley" },
  });
  const { errors } = form.formState;
  const { submit, problem } = useSaving(form, async ({ exerciseId, day, kg, reps, formula }) => {
    const count = readNumber(reps) ?? Number.NaN;
    // What is no number is sent as such: the server says so beside the field.
    const lifted = toKg(readNumber(kg) ?? Number.NaN, view.unit);
    const best = await add.mutateAsync({
      exerciseId,
      day,
      kg: lifted,
      reps: count,
      formula: count === 1 ? null : formula,
    });
    showToast(
      `${best.name}: ${massText(best.kg, view.unit)}, ${best.formula ? `estimated by ${FROM_WORDS[best.formula]}` : "measured"}. Sessions from that day on follow it.`,
    );
    onClose();
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Add a best"
      description={`What was lifted, at most ${MOST_REPS_FOR_ESTIMATE} repetitions to failure.`}
    >
      <form noValidate onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="Lift" error={errors.exerciseId?.message} className="sm:col-span-2" required>
          <Select
            choices={view.lifts.map(({ id, name }) => ({ value: id, label: name }))}
            {...form.register("exerciseId")}
          />
        </Field>
        <Field label={`Lifted, ${view.unit}`} error={errors.kg?.message} required>
          <TextInput inputMode="decimal" autoComplete="off" {...form.register("kg")} />
        </Field>
        <Field label="Repetitions" error={errors.reps?.message} required>
          <TextInput inputMode="numeric" autoComplete="off" {...form.register("reps")} />
        </Field>
        <Field label="Formula" hint="Not used for one repetition" error={errors.formula?.message}>
          <Select choices={FORMULAS} {...form.register("formula")} />
        </Field>
        <Field label="Day" error={errors.day?.message} required>
          <DateInput max={today} {...form.register("day")} />
        </Field>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <Actions className="mt-1! sm:col-span-2">
          <Button type="submit" variant="primary" busy={add.isPending}>
            Add the best
          </Button>
          <Button onClick={onClose}>Close</Button>
        </Actions>
      </form>
    </Dialog>
  );
}
