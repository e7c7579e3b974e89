"use client";

import { Checkbox } from "@/components/ui/checkbox";
import { Field } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { EQUIPMENT, LIMITATIONS, QUALITIES, type Quality } from "@/lib/engine/prescription/exercise";
import type { Filters } from "./filters";
import { PickList } from "./pick-list";
import { EQUIPMENT_WORDS, LIMITATION_WORDS, QUALITY_WORDS } from "./words";

interface FilterBarProps {
  readonly filters: Filters;
  readonly onChange: (filters: Filters) => void;
}

/** What the list is narrowed by. */
export function FilterBar({ filters, onChange }: FilterBarProps) {
  const set = (part: Partial<Filters>): void => onChange({ ...filters, ...part });
  const { search, quality, equipment, limitations, own, shelved } = filters;
  return (
    <search className="grid gap-3 sm:grid-cols-2">
      <Field label="Find" hint="By name or by what it trains">
        <TextInput
          type="search"
          autoComplete="off"
          enterKeyHint="search"
          value={search}
          onChange={(event) => set({ search: event.target.value })}
        />
      </Field>
      <Field label="Trains">
        <Select
          value={quality ?? ""}
          onChange={(event) => set({ quality: (event.target.value || null) as Quality | null })}
        >
          <option value="">Anything</option>
          {QUALITIES.map((one) => (
            <option key={one} value={one}>
              {QUALITY_WORDS[one]}
            </option>
          ))}
        </Select>
      </Field>
      <PickList
        label="Equipment that is there"
        summary={equipment === null ? "Any equipment" : `${equipment.length} of ${EQUIPMENT.length} there`}
        all={EQUIPMENT}
        words={EQUIPMENT_WORDS}
        picked={equipment ?? EQUIPMENT}
        onChange={(picked) => set({ equipment: picked.length === EQUIPMENT.length ? null : picked })}
      />
      <PickList
        label="Leave out what a limitation rules out"
        summary={
          limitations.length === 0
            ? "No limitation"
            : limitations.map((one) => LIMITATION_WORDS[one]).join("; ")
        }
        all={LIMITATIONS}
        words={LIMITATION_WORDS}
        picked={limitations}
        onChange={(picked) => set({ limitations: picked })}
      />
      <div className="flex flex-wrap gap-x-6 sm:col-span-2">
        <Checkbox
          label="Only what the team added or changed"
          checked={own}
          onChange={(event) => set({ own: event.target.checked })}
        />
        <Checkbox
          label="Shelved ones too"
          checked={shelved}
          onChange={(event) => set({ shelved: event.target.checked })}
        />
      </div>
    </search>
  );
}
