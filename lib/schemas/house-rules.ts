import { z } from "zod";
import { HOUSE_RULES, RULE_KEYS } from "@/lib/engine/rules/house-rules";

/** A team's own values by key: each a known rule within its range. */
export const ruleOverridesSchema = z.record(z.string(), z.number()).superRefine((values, context) => {
  for (const [key, value] of Object.entries(values)) {
    const known = RULE_KEYS.find((rule) => rule === key);
    const rule = known && HOUSE_RULES[known];
    if (!rule) {
      context.addIssue({ code: "custom", path: [key], message: "There is no house rule of that name." });
    } else if (value < rule.min || value > rule.max) {
      context.addIssue({ code: "custom", path: [key], message: `${rule.min} to ${rule.max} ${rule.unit}.` });
    }
  }
});

export const houseRulesSchema = z.object({ overrides: ruleOverridesSchema });
export type HouseRulesForm = z.infer<typeof houseRulesSchema>;

export interface HouseRulesView {
  readonly overrides: Readonly<Record<string, number>>;
}

/** Answer to saving: how many open camps were planned again. */
export interface HouseRulesSaved extends HouseRulesView {
  readonly replanned: number;
}
