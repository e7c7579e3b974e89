"use client";

import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/text-input";
import { HOUSE_RULES, type RuleKey } from "@/lib/engine/rules/house-rules";

interface RuleRowProps {
  readonly rule: RuleKey;
  /** As typed; empty while it is being typed. */
  readonly text: string;
  readonly error: string | null;
  readonly onChange: (text: string) => void;
}

/** One house rule: what it is, its value and range, why, and on whose word. */
export function RuleRow({ rule, text, error, onChange }: RuleRowProps) {
  const { title, unit, value, min, max, step, reason, source } = HOUSE_RULES[rule];
  const own = text !== String(value);
  return (
    <li className="grid gap-x-6 gap-y-2 border-t border-line-soft py-3 first:border-0 md:grid-cols-[minmax(0,1fr)_14rem]">
      <div className="min-w-0">
        <p className="font-semibold">{title}</p>
        <p className="max-w-prose text-sm text-ink-2">{reason}</p>
        <p className="max-w-prose text-xs text-ink-2">Source: {source}</p>
      </div>
      <div>
        <Field
          label={title}
          hideLabel
          hint={`${min} to ${max} ${unit}${own ? `; default ${value}` : "; this is the default"}`}
          error={error}
        >
          <NumberInput
            unit={unit}
            min={min}
            max={max}
            step={step}
            inputMode="decimal"
            className={unit.length > 5 ? "pr-20!" : undefined}
            value={text}
            onChange={(event) => onChange(event.target.value)}
          />
        </Field>
        {own ? (
          <Button
            variant="quiet"
            size="small"
            className="mt-1 px-0!"
            aria-label={`Back to the default: ${title}`}
            onClick={() => onChange(String(value))}
          >
            Back to the default
          </Button>
        ) : null}
      </div>
    </li>
  );
}
