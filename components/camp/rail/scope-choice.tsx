"use client";

import { ToggleGroup } from "@/components/ui/toggle-group";
import { FieldGroup } from "@/components/ui/field";
import type { ChangeScope } from "@/lib/schemas/change";

const SCOPES: readonly { value: ChangeScope; label: string; spoken: string }[] = [
  { value: "this", label: "This one", spoken: "This one only" },
  { value: "following", label: "And after", spoken: "This one and those after it" },
  { value: "all", label: "All", spoken: "All that are not past" },
];

interface ScopeChoiceProps {
  readonly value: ChangeScope;
  readonly onChange: (scope: ChangeScope) => void;
}

/** Which occurrences of a recurring session a change is for. */
export function ScopeChoice({ value, onChange }: ScopeChoiceProps) {
  return (
    <FieldGroup label="It repeats: change">
      <ToggleGroup
        pick="one"
        toggles={SCOPES}
        value={[value]}
        onChange={([scope]) => scope && onChange(scope)}
      />
    </FieldGroup>
  );
}
