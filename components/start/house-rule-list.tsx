import { Cell, HeadCell, Table } from "@/components/ui/table";
import { HOUSE_RULES, RULE_KEYS, type RuleGroup } from "@/lib/engine/rules/house-rules";

const GROUP_WORDS: Record<RuleGroup, string> = {
  must: "Placement: must",
  should: "Placement: should, at a price",
  camp: "The shape of the camp",
  dose: "The dose",
  load: "Load",
  response: "Suggestions",
  weight: "Weight",
  form: "The form illustration",
};

const GROUPS = Object.keys(GROUP_WORDS) as RuleGroup[];

/** A ratio or a switch has no unit worth writing. */
const BARE_UNITS = new Set(["ratio", "share", "0 or 1"]);

function valueText(value: number, unit: string): string {
  if (unit === "×") return `× ${value}`;
  return BARE_UNITS.has(unit) ? String(value) : `${value} ${unit}`;
}

/** All house rules with their default, reason and source, folded by group. */
export function HouseRuleList() {
  return (
    <div className="grid gap-2">
      {GROUPS.map((group) => (
        <details key={group} className="rounded-md border border-line bg-paper px-4">
          <summary className="flex min-h-control items-center py-2 font-semibold">
            {GROUP_WORDS[group]}
          </summary>
          <div className="pb-4">
            <Table caption={GROUP_WORDS[group]}>
              <thead>
                <tr>
                  <HeadCell>Rule</HeadCell>
                  <HeadCell>Default</HeadCell>
                  <HeadCell>Reason</HeadCell>
                  <HeadCell>Source</HeadCell>
                </tr>
              </thead>
              <tbody>
                {RULE_KEYS.filter((key) => HOUSE_RULES[key].group === group).map((key) => {
                  const rule = HOUSE_RULES[key];
                  return (
                    <tr key={key} className="align-top">
                      <HeadCell scope="row" className="min-w-48">
                        {rule.title}
                      </HeadCell>
                      <Cell className="whitespace-nowrap">{valueText(rule.value, rule.unit)}</Cell>
                      <Cell className="min-w-60">{rule.reason}</Cell>
                      <Cell className="min-w-48 text-ink-2">{rule.source}</Cell>
                    </tr>
                  );
                })}
              </tbody>
            </Table>
          </div>
        </details>
      ))}
    </div>
  );
}
