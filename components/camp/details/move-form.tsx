"use client";

import type { FormEvent } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { DateInput, TimeInput } from "@/components/ui/text-input";
import { dayFromIso, hhmm, isoFromDay, minuteFromHhmm } from "@/lib/engine/geometry";
import type { Day } from "@/lib/engine/types";
import type { Place } from "../move-change";

interface MoveFormProps {
  readonly at: Place;
  /** First and last day it may stand on. */
  readonly from: Day;
  readonly to: Day;
  readonly onMove: (to: Place) => void;
}

/** Moves a session by date and time: what a drag does, without dragging. */
export function MoveForm({ at, from, to, onMove }: MoveFormProps) {
  const submit = (event: FormEvent<HTMLFormElement>): void => {
    event.preventDefault();
    const fields = new FormData(event.currentTarget);
    const [date, start] = [String(fields.get("date")), String(fields.get("start"))];
    if (date && start) onMove({ day: dayFromIso(date), start: minuteFromHhmm(start) });
  };
  return (
    <form key={`${at.day} ${at.start}`} onSubmit={submit} className="flex flex-wrap items-end gap-2">
      <Field label="Day" className="min-w-36 flex-1">
        <DateInput
          name="date"
          required
          defaultValue={isoFromDay(at.day)}
          min={isoFromDay(from)}
          max={isoFromDay(to)}
        />
      </Field>
      <Field label="Time" className="w-36">
        <TimeInput name="start" required defaultValue={hhmm(at.start)} />
      </Field>
      <Button type="submit">Try it</Button>
    </form>
  );
}
