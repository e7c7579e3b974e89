"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { Line } from "@/lib/engine/prescription/types";
import { fromKg, toKg, type MassUnit } from "@/lib/format/load";
import type { LoggedSet } from "@/lib/schemas/today";
import { Stepper } from "./stepper";

interface SetEditorProps {
  readonly line: Line;
  readonly unit: MassUnit;
  /** What the steppers start from. */
  readonly start: LoggedSet;
  /** The set is already ticked: every press is kept at once. */
  readonly ticked: boolean;
  readonly onChange: (set: LoggedSet) => void;
  readonly onTick: (set: LoggedSet) => void;
  readonly onAsWritten: () => void;
  readonly onRemove: () => void;
}

/** Steps of a press: what most gyms can put on. Common practice, no published source; anything else is typed. */
const STEP = { kg: 2.5, lb: 5 } as const;

/** One set under the thumb: load, repetitions, reserve. */
export function SetEditor(props: SetEditorProps) {
  const { line, unit, start, ticked, onChange, onTick, onAsWritten, onRemove } = props;
  const [set, setSet] = useState(start);
  const change = (part: Partial<LoggedSet>): void => {
    const next = { ...set, ...part };
    setSet(next);
    if (ticked) onChange(next);
  };
  const seconds = line.aim === "hold";
  return (
    <div className="border-l-4 border-ink py-1 pl-3">
      {line.load.of === "none" ? null : (
        <Stepper
          label="Load"
          unit={unit}
          value={set.kg === null ? null : fromKg(set.kg, unit)}
          onChange={(value) => change({ kg: value === null ? null : toKg(value, unit) })}
          step={STEP[unit]}
          start={STEP[unit]}
          max={Math.floor(fromKg(500, unit))}
          optional
        />
      )}
      <Stepper
        label={seconds ? "Seconds" : line.sides === "each" ? "Reps each side" : "Reps"}
        value={set.reps}
        onChange={(reps) => change({ reps: reps ?? 0 })}
        step={seconds ? 5 : 1}
        max={600}
        whole
      />
      {seconds || line.load.of === "none" ? null : (
        <Stepper
          label="In reserve"
          value={set.reserve}
          onChange={(reserve) => change({ reserve })}
          step={1}
          max={10}
          start={2}
          whole
          optional
        />
      )}
      <div className="mt-1.5 grid grid-cols-2 gap-2">
        {ticked ? (
          <Button className="min-h-12" onClick={onRemove}>
            Not done
          </Button>
        ) : (
          <>
            <Button variant="primary" className="min-h-12" onClick={() => onTick(set)}>
              Set {set.number} done
            </Button>
            <Button className="min-h-12" onClick={onAsWritten}>
              As written
            </Button>
          </>
        )}
      </div>
    </div>
  );
}
