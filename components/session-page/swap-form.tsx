"use client";

import { useState } from "react";
import { ITEM_LOOKS } from "@/components/session/kinds";
import { Button } from "@/components/ui/button";
import { Actions } from "@/components/ui/dialog";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import type { Item } from "@/lib/engine/types";
import type { LineView } from "@/lib/schemas/prescription";

interface SwapFormProps {
  readonly line: LineView;
  readonly item: Item;
  readonly names: Readonly<Record<string, string>>;
  readonly busy: boolean;
  readonly onSwap: (to: string, name: string) => void;
  readonly onClose: () => void;
}

/** Another exercise of the same quality, for all sessions of this item in the camp. */
export function SwapForm({ line, item, names, busy, onSwap, onClose }: SwapFormProps) {
  const [to, setTo] = useState(line.swaps[0] ?? "");
  const all = `all ${ITEM_LOOKS[item].label} of this camp`;
  const from = line.swappedFrom?.name ?? line.name;
  return (
    <form
      aria-label={`Swap ${line.name}`}
      onSubmit={(event) => {
        event.preventDefault();
        onSwap(to, names[to] ?? to);
        onClose();
      }}
      className="mt-3 border-t border-line-soft pt-3"
    >
      <Field
        label={`Instead of ${from}`}
        hint={`Holds for ${all} that are not logged yet. Sets, repetitions and load follow the new exercise.`}
      >
        <Select
          value={to}
          onChange={(event) => setTo(event.target.value)}
          choices={line.swaps.map((id) => ({ value: id, label: names[id] ?? id }))}
        />
      </Field>
      <Actions className="mt-3!">
        <Button type="submit" variant="primary" size="small" busy={busy} className="whitespace-normal!">
          Swap for {all}
        </Button>
        <Button size="small" variant="quiet" onClick={onClose}>
          Leave it
        </Button>
      </Actions>
    </form>
  );
}
