"use client";

import { Checkbox } from "@/components/ui/checkbox";
import { Field, FieldGroup } from "@/components/ui/field";
import { Select } from "@/components/ui/select";
import { TextInput } from "@/components/ui/text-input";
import { SORTS, type BoardFilters, type Sort } from "./filters";

const SORT_WORDS: Readonly<Record<Sort, string>> = {
  "days-out": "Days out",
  name: "Name",
  flags: "Most flags first",
};

interface BoardFilterBarProps {
  readonly filters: BoardFilters;
  readonly onChange: (filters: BoardFilters) => void;
  /** Down from the search field leads to the rows. */
  readonly onDown: () => void;
}

/** What the board is narrowed by, and its order. */
export function BoardFilterBar({ filters, onChange, onDown }: BoardFilterBarProps) {
  const set = (part: Partial<BoardFilters>): void => onChange({ ...filters, ...part });
  return (
    <search className="grid items-end gap-x-5 gap-y-2 sm:grid-cols-[minmax(0,260px)_minmax(0,190px)_minmax(0,1fr)]">
      <Field label="Find">
        <TextInput
          type="search"
          autoComplete="off"
          enterKeyHint="search"
          value={filters.search}
          onChange={(event) => set({ search: event.target.value })}
          onKeyDown={(event) => {
            if (event.key !== "ArrowDown") return;
            event.preventDefault();
            onDown();
          }}
        />
      </Field>
      <Field label="Order">
        <Select
          value={filters.sort}
          onChange={(event) => set({ sort: SORTS.find((sort) => sort === event.target.value) ?? "days-out" })}
          choices={SORTS.map((sort) => ({ value: sort, label: SORT_WORDS[sort] }))}
        />
      </Field>
      <FieldGroup label="Show only" hideLabel>
        <div className="flex flex-wrap gap-x-5">
          <Checkbox
            label="Flagged"
            checked={filters.flagged}
            onChange={(event) => set({ flagged: event.target.checked })}
          />
          <Checkbox
            label="In fight week"
            checked={filters.fightWeek}
            onChange={(event) => set({ fightWeek: event.target.checked })}
          />
          <Checkbox
            label="On a hold"
            checked={filters.onHold}
            onChange={(event) => set({ onHold: event.target.checked })}
          />
        </div>
      </FieldGroup>
    </search>
  );
}
