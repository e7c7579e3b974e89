"use client";

import { useController, useFormContext } from "react-hook-form";
import { Checkbox } from "@/components/ui/checkbox";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { QUALITIES, type Quality } from "@/lib/engine/prescription/exercise";
import { CUE_LENGTH, MOST_CUES, type ExerciseForm } from "@/lib/schemas/exercise";
import { QUALITY_WORDS } from "./words";

function QualityFields() {
  const {
    field: { ref, value, onBlur, onChange },
    fieldState,
  } = useController<ExerciseForm, "qualities">({ name: "qualities" });
  const [first, ...others] = value;
  const put = (main: Quality | undefined, rest: readonly Quality[]): void =>
    onChange(main === undefined ? [...rest] : [main, ...rest.filter((one) => one !== main)]);
  return (
    <>
      <Field label="Trains first of all" error={fieldState.error?.message} required>
        <Select
          ref={ref}
          value={first ?? ""}
          onBlur={onBlur}
          onChange={(event) => put(event.target.value as Quality, others)}
        >
          {first === undefined ? <option value="">Pick one</option> : null}
          {QUALITIES.map((quality) => (
            <option key={quality} value={quality}>
              {QUALITY_WORDS[quality]}
            </option>
          ))}
        </Select>
      </Field>
      {first === undefined ? null : (
        <FieldGroup label="And also">
          <div className="grid grid-cols-2 gap-x-4">
            {QUALITIES.filter((quality) => quality !== first).map((quality) => (
              <Checkbox
                key={quality}
                label={QUALITY_WORDS[quality]}
                checked={others.includes(quality)}
                onChange={(event) =>
                  put(
                    first,
                    QUALITIES.filter((one) =>
                      one === quality ? event.target.checked : others.includes(one),
                    ),
                  )
                }
              />
            ))}
          </div>
        </FieldGroup>
      )}
    </>
  );
}

/** Name, qualities and cues. */
export function WhatFields() {
  const { register, formState } = useFormContext<ExerciseForm>();
  const { errors } = formState;
  return (
    <>
      <Field label="Name" error={errors.name?.message} required>
        <TextInput autoComplete="off" {...register("name")} />
      </Field>
      <QualityFields />
      <FieldGroup
        label="Cues"
        hint={`Two to four, each at most ${CUE_LENGTH} characters: what to think of while moving.`}
        error={errors.cues?.root?.message ?? errors.cues?.message}
      >
        <div className="grid gap-1.5">
          {Array.from({ length: MOST_CUES }, (_, index) => (
            <Field key={index} label={`Cue ${index + 1}`} hideLabel error={errors.cues?.[index]?.message}>
              <TextInput autoComplete="off" {...register(`cues.${index}`)} />
            </Field>
          ))}
        </div>
      </FieldGroup>
    </>
  );
}
