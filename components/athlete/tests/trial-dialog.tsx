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
import { TEST_SPECS, type TestKind, type TestSide } from "@/lib/engine/measures/test-kinds";
import { readNumber, toKg, type MassUnit } from "@/lib/format/load";
import { useAddTrial } from "@/lib/query/record";
import { TRIAL_KINDS } from "@/lib/schemas/test-trial";

interface TrialDialogProps {
  readonly athleteId: string;
  readonly today: string;
  readonly unit: MassUnit;
  readonly onClose: () => void;
}

/** As typed. */
interface Typed {
  kind: TestKind;
  side: TestSide;
  day: string;
  value: string;
  second: string;
  massKg: string;
  note: string;
}

const KIND_CHOICES = TRIAL_KINDS.map((kind) => ({ value: kind, label: TEST_SPECS[kind].title }));
const SIDE_CHOICES = [
  { value: "both", label: "Both" },
  { value: "left", label: "Left" },
  { value: "right", label: "Right" },
];

/** Adds trials one after the other: after each, the number alone is cleared. */
export function TrialDialog({ athleteId, today, unit, onClose }: TrialDialogProps) {
  const add = useAddTrial(athleteId);
  const form = useForm<Typed>({
    defaultValues: {
      kind: "jump-height",
      side: "both",
      day: today,
      value: "",
      second: "",
      massKg: "",
      note: "",
    },
  });
  const { errors } = form.formState;
  // eslint-disable-next-line react-hooks/incompatible-library -- the fields follow the kind that is chosen
  const spec = TEST_SPECS[form.watch("kind")];
  const secondInMass = spec.second?.unit === "kg";
  const { submit, problem } = useSaving(form, async (typed) => {
    const { second: secondSpec } = TEST_SPECS[typed.kind];
    const second = readNumber(typed.second);
    const mass = readNumber(typed.massKg);
    await add.mutateAsync({
      kind: typed.kind,
      side: typed.side,
      day: typed.day,
      // What is no number is sent as such: the server says so beside the field.
      value: readNumber(typed.value) ?? Number.NaN,
      second: !secondSpec || second === null ? null : secondSpec.unit === "kg" ? toKg(second, unit) : second,
      massKg: typed.massKg.trim() === "" ? null : mass === null ? Number.NaN : toKg(mass, unit),
      note: typed.note,
    });
    showToast("The trial is added.");
    form.setValue("value", "");
    form.setFocus("value");
  });
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Add a trial"
      description="Several trials a day show how far the test can be trusted. Rep records go under Bests."
    >
      <form noValidate onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="Test" error={errors.kind?.message} required>
          <Select choices={KIND_CHOICES} {...form.register("kind")} />
        </Field>
        <Field label="Side" error={errors.side?.message} required>
          <Select choices={SIDE_CHOICES} {...form.register("side")} />
        </Field>
        <Field label="Day" error={errors.day?.message} required>
          <DateInput max={today} {...form.register("day")} />
        </Field>
        <Field label={`${spec.value.title}, ${spec.value.unit}`} error={errors.value?.message} required>
          <TextInput inputMode="decimal" autoComplete="off" {...form.register("value")} />
        </Field>
        {spec.second ? (
          <Field
            label={`${spec.second.title}, ${secondInMass ? unit : spec.second.unit}`}
            error={errors.second?.message}
            required
          >
            <TextInput inputMode="decimal" autoComplete="off" {...form.register("second")} />
          </Field>
        ) : null}
        <Field
          label={`Body mass, ${unit}`}
          hint="For jump power. Empty: the weight of that day, where there is one."
          error={errors.massKg?.message}
        >
          <TextInput inputMode="decimal" autoComplete="off" {...form.register("massKg")} />
        </Field>
        <Field label="Note" error={errors.note?.message} className="sm:col-span-2">
          <TextInput {...form.register("note")} />
        </Field>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <Actions className="mt-1! sm:col-span-2">
          <Button type="submit" variant="primary" busy={add.isPending}>
            Add the trial
          </Button>
          <Button onClick={onClose}>Close</Button>
        </Actions>
      </form>
    </Dialog>
  );
}
