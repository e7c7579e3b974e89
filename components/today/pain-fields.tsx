"use client";

import { useState } from "react";
import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/text-input";
import type { SessionLog } from "@/lib/schemas/today";
import { Scale } from "./scale";

interface PainFieldsProps {
  readonly pain: number | null;
  readonly place: string;
  readonly onChange: (part: Pick<SessionLog, "pain" | "painPlace">) => void;
}

/** "Something hurts": where, and how much. A number without a place is not kept, the place is asked for first. */
export function PainFields({ pain, place, onChange }: PainFieldsProps) {
  const [open, setOpen] = useState(pain !== null);
  const [where, setWhere] = useState(place);
  const [degree, setDegree] = useState(pain);
  const tidy = where.trim();
  const keep = (nextPlace: string, nextPain: number | null): void => {
    if (nextPain === null || (nextPain > 0 && nextPlace === "")) return;
    if (nextPlace !== place || nextPain !== pain) onChange({ pain: nextPain, painPlace: nextPlace });
  };
  return (
    <>
      <Checkbox
        label="Something hurts"
        checked={open}
        onChange={({ target: { checked } }) => {
          setOpen(checked);
          if (checked) return;
          setDegree(null);
          setWhere("");
          if (pain !== null || place !== "") onChange({ pain: null, painPlace: "" });
        }}
      />
      {open ? (
        <div className="border-l-4 border-ink-3 pl-3">
          <Field
            label="Where does it hurt?"
            error={degree !== null && degree > 0 && tidy === "" ? "Say where it hurts." : null}
          >
            <TextInput
              value={where}
              maxLength={100}
              onChange={(event) => setWhere(event.target.value)}
              onBlur={() => keep(tidy, degree)}
            />
          </Field>
          <Scale
            label="How much?"
            from={0}
            to={10}
            value={degree}
            onChange={(next) => {
              setDegree(next);
              keep(tidy, next);
            }}
            said="0 none, 10 the worst there is"
            columns="grid-cols-6"
          />
        </div>
      ) : null}
    </>
  );
}
