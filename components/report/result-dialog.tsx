"use client";

import { zodResolver } from "@hookform/resolvers/zod";
import { useForm } from "react-hook-form";
import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Notice } from "@/components/ui/notice";
import { Select } from "@/components/ui/select";
import { TextArea } from "@/components/ui/text-area";
import { NumberInput, TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { useSaving } from "@/components/ui/use-saving";
import { useRecordResult } from "@/lib/query/report";
import type { ReportView } from "@/lib/schemas/report";
import { RESULTS, boutResultSchema } from "@/lib/schemas/result";
import { RESULT_WORDS } from "./words";

const formSchema = boutResultSchema.omit({ recordedOn: true });
type Form = ReturnType<typeof formSchema.parse>;

const CHOICES = RESULTS.map((value) => ({ value, label: RESULT_WORDS[value] }));

function withoutDate(result: ReportView["result"]): Form | null {
  if (!result) return null;
  const { recordedOn: _, ...form } = result;
  return form;
}

interface ResultDialogProps {
  readonly report: ReportView;
  readonly onClose: () => void;
}

/** Writes down how the bout ended. */
export function ResultDialog({ report, onClose }: ResultDialogProps) {
  const { campId } = report;
  const result = withoutDate(report.result);
  const record = useRecordResult(campId);
  const form = useForm<Form>({
    resolver: zodResolver(formSchema),
    defaultValues: result ?? { result: "won", how: "", stopped: false, standDownDays: null, note: "" },
  });
  const { errors } = form.formState;
  const { submit, problem } = useSaving(form, async (values) => {
    await record.mutateAsync({ result: values });
    showToast("Saved.", { action: { label: "Put back", run: () => record.mutate({ result }) } });
    onClose();
  });
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title="How the bout ended">
      <form noValidate onSubmit={submit} className="grid gap-3.5 sm:grid-cols-2">
        <Field label="Result" error={errors.result?.message} required>
          <Select choices={CHOICES} {...form.register("result")} />
        </Field>
        <Field label="How" hint="Decision, stoppage, submission, round" error={errors.how?.message}>
          <TextInput {...form.register("how")} />
        </Field>
        <Checkbox
          label="Ended by blows to the head, or the referee stopped it"
          className="sm:col-span-2"
          {...form.register("stopped")}
        />
        <Field
          label="Stand-down, days"
          hint="As the commission or the ringside physician ordered. Empty: none was ordered."
          error={errors.standDownDays?.message}
          className="sm:col-span-2"
        >
          <NumberInput
            {...form.register("standDownDays", {
              setValueAs: (value: string | number | null) =>
                value === "" || value === null ? null : Number(value),
            })}
          />
        </Field>
        <Field label="Note" error={errors.note?.message} className="sm:col-span-2">
          <TextArea rows={3} {...form.register("note")} />
        </Field>
        <Notice tone="caution" title="This is no medical clearance." className="sm:col-span-2">
          A stand-down becomes a hold from the day after the bout: nothing is planned on its days, and only a
          medic lifts it.
        </Notice>
        {problem ? <Notice tone="error" role="alert" title={problem} className="sm:col-span-2" /> : null}
        <Actions className="mt-1! sm:col-span-2">
          <Button type="submit" variant="primary" busy={record.isPending}>
            Save
          </Button>
          <Button onClick={onClose}>Close</Button>
        </Actions>
      </form>
    </Dialog>
  );
}
