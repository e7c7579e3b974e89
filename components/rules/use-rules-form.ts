"use client";

import { useState } from "react";
import { HOUSE_RULES, RULE_KEYS, withOverrides, type RuleKey } from "@/lib/engine/rules/house-rules";

type Texts = Readonly<Partial<Record<RuleKey, string>>>;

/** What is wrong with a value as typed, in the words of the server's own check. */
export function ruleProblem(rule: RuleKey, text: string): string | null {
  const { min, max, unit } = HOUSE_RULES[rule];
  const value = Number(text);
  return text.trim() === "" || Number.isNaN(value) || value < min || value > max
    ? `${min} to ${max} ${unit}.`
    : null;
}

/** The values of all rules while they are edited; only what was typed is kept apart from what is saved. */
export function useRulesForm(overrides: Readonly<Record<string, number>>) {
  const [typed, setTyped] = useState<Texts>({});
  const saved = withOverrides(overrides);
  const textOf = (rule: RuleKey): string => typed[rule] ?? String(saved[rule]);
  const changed = RULE_KEYS.filter((rule) => textOf(rule) !== String(saved[rule]));
  const wrong = changed.filter((rule) => ruleProblem(rule, textOf(rule)) !== null);
  return {
    textOf,
    changed,
    wrong,
    type: (rule: RuleKey, text: string) => setTyped((before) => ({ ...before, [rule]: text })),
    allDefaults: () =>
      setTyped(Object.fromEntries(RULE_KEYS.map((rule) => [rule, String(HOUSE_RULES[rule].value)]))),
    forget: () => setTyped({}),
    /** All values, as numbers; ask `wrong` first. */
    values: (): Record<string, number> =>
      Object.fromEntries(RULE_KEYS.map((rule) => [rule, Number(textOf(rule))])),
  };
}
