import { CAMP_SETTINGS } from "./settings-camp";
import { DOSE_SETTINGS } from "./settings-dose";
import { MODEL_SETTINGS } from "./settings-model";
import { MUST_SETTINGS } from "./settings-must";
import { RESPONSE_SETTINGS } from "./settings-response";
import { SHOULD_SETTINGS } from "./settings-should";
import { WEIGHT_SETTINGS } from "./settings-weight";

export type { RuleGroup } from "./setting";

/**
 * The house rules: every threshold of the engine, with unit, range, reason and source. A team may change the value
 * within the range; the engine reads values only from here, through `HouseRules`.
 *
 * `source` names the publication where there is one; "common practice, no published source" where there is none; a
 * published value that nobody on the team has read in its source is marked "from memory".
 */

export const HOUSE_RULES = {
  ...MUST_SETTINGS,
  ...SHOULD_SETTINGS,
  ...CAMP_SETTINGS,
  ...DOSE_SETTINGS,
  ...MODEL_SETTINGS,
  ...RESPONSE_SETTINGS,
  ...WEIGHT_SETTINGS,
};

export type RuleKey = keyof typeof HOUSE_RULES;
export type HouseRules = Readonly<Record<RuleKey, number>>;

export const RULE_KEYS = Object.keys(HOUSE_RULES) as RuleKey[];

/** Default values of all rules. */
export const DEFAULT_RULES: HouseRules = Object.fromEntries(
  RULE_KEYS.map((key) => [key, HOUSE_RULES[key].value]),
) as HouseRules;

/** A team's own values over the defaults; keys that are not house rules are ignored. Does not check ranges. */
export function withOverrides(overrides: Readonly<Partial<Record<string, number>>>): HouseRules {
  const values: Record<RuleKey, number> = { ...DEFAULT_RULES };
  for (const key of RULE_KEYS) values[key] = overrides[key] ?? values[key];
  return values;
}
