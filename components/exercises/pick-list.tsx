"use client";

import { Button } from "@/components/ui/button";
import { Checkbox } from "@/components/ui/checkbox";
import { ChevronDown } from "@/components/ui/icons";

interface PickListProps<T extends string> {
  readonly label: string;
  /** What is picked, in words, while the list is folded. */
  readonly summary: string;
  readonly all: readonly T[];
  readonly words: Readonly<Record<T, string>>;
  readonly picked: readonly T[];
  readonly onChange: (picked: T[]) => void;
}

/** A folded list of checkboxes, for a filter of which several may hold. Picks keep the order of `all`. */
export function PickList<T extends string>({
  label,
  summary,
  all,
  words,
  picked,
  onChange,
}: PickListProps<T>) {
  return (
    <details className="group min-w-0 self-start rounded border border-edge bg-field">
      <summary className="flex min-h-control cursor-pointer list-none items-center gap-2 px-3 py-1.5 [&::-webkit-details-marker]:hidden">
        <span className="min-w-0 flex-1">
          <span className="block text-xs font-semibold text-ink-2">{label}</span>
          <span className="block truncate">{summary}</span>
        </span>
        <ChevronDown className="shrink-0 group-open:rotate-180" />
      </summary>
      <fieldset className="border-t border-line-soft px-3 py-2">
        <legend className="sr-only">{label}</legend>
        <div className="grid gap-x-4 sm:grid-cols-2">
          {all.map((one) => (
            <Checkbox
              key={one}
              label={words[one]}
              checked={picked.includes(one)}
              onChange={(event) =>
                onChange(
                  all.filter((other) => (other === one ? event.target.checked : picked.includes(other))),
                )
              }
            />
          ))}
        </div>
        <div className="mt-1 flex gap-2">
          <Button size="small" onClick={() => onChange([...all])}>
            All
          </Button>
          <Button size="small" onClick={() => onChange([])}>
            None
          </Button>
        </div>
      </fieldset>
    </details>
  );
}
