"use client";

import { useState } from "react";
import { replannedText } from "@/components/athlete/words";
import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { HOUSE_RULES, RULE_KEYS, type RuleGroup } from "@/lib/engine/rules/house-rules";
import { useHouseRules, useSaveRules } from "@/lib/query/house-rules";
import type { HouseRulesView } from "@/lib/schemas/house-rules";
import { RuleRow } from "./rule-row";
import { ruleProblem, useRulesForm } from "./use-rules-form";

const GROUPS: readonly { readonly group: RuleGroup; readonly title: string; readonly lead: string }[] = [
  {
    group: "must",
    title: "Placement: must",
    lead: "Never broken by the planner; a pin that breaks one is listed.",
  },
  { group: "should", title: "Placement: should, at a price", lead: "Weighed against each other in points." },
  { group: "camp", title: "The shape of the camp", lead: "Phases, their length, start times." },
  { group: "dose", title: "The dose", lead: "What a session’s sets are multiplied by, and the weekly cap." },
  { group: "load", title: "Load", lead: "How a week’s load is called." },
  {
    group: "response",
    title: "Suggestions",
    lead: "When what was logged asks for a word or for fewer sets; nothing changes until somebody accepts.",
  },
  {
    group: "weight",
    title: "Weight",
    lead: "The way down to the limit; a team may be stricter than what is published.",
  },
  {
    group: "form",
    title: "The form illustration",
    lead: "An illustration of training theory, not a forecast.",
  },
];

/** All house rules, by group; saving plans every open camp again. */
export function RulesForm({ initial }: { readonly initial: HouseRulesView }) {
  const { data } = useHouseRules(initial);
  const save = useSaveRules();
  const form = useRulesForm(data.overrides);
  const [tried, setTried] = useState(false);
  const count = form.changed.length;

  const submit = (): void => {
    setTried(true);
    if (form.wrong.length > 0) return;
    save.mutate(
      { overrides: form.values() },
      {
        onSuccess: ({ replanned }) => {
          form.forget();
          setTried(false);
          showToast(`The house rules are saved. ${replannedText(replanned)}`);
        },
      },
    );
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
      className="grid gap-4"
    >
      {GROUPS.map(({ group, title, lead }) => (
        <Panel key={group} title={title}>
          <p className="mb-1 text-sm text-ink-2">{lead}</p>
          <ul>
            {RULE_KEYS.filter((rule) => HOUSE_RULES[rule].group === group).map((rule) => (
              <RuleRow
                key={rule}
                rule={rule}
                text={form.textOf(rule)}
                error={ruleProblem(rule, form.textOf(rule))}
                onChange={(text) => form.type(rule, text)}
              />
            ))}
          </ul>
        </Panel>
      ))}
      <div className="sticky bottom-0 flex flex-wrap items-center gap-2 border-t border-line bg-canvas py-3">
        <Button type="submit" variant="primary" busy={save.isPending} disabled={count === 0}>
          {count === 0
            ? "Nothing changed"
            : `Save ${count === 1 ? "one rule" : `${count} rules`} and plan open camps again`}
        </Button>
        {count > 0 ? <Button onClick={form.forget}>Leave them as they were</Button> : null}
        <Button variant="quiet" onClick={form.allDefaults}>
          All to their defaults
        </Button>
        {tried && form.wrong.length > 0 ? (
          <Notice tone="error" role="alert" title="Some values are outside their range." className="w-full" />
        ) : null}
        {save.error ? (
          <Notice tone="error" role="alert" title={save.error.message} className="w-full" />
        ) : null}
      </div>
    </form>
  );
}
