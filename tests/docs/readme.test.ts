import { readFileSync, writeFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { HOUSE_RULES, RULE_KEYS } from "@/lib/engine";
import { POLICY, ROLES, ROLE_TITLES, type Role } from "@/lib/policy";

const README = "README.md";

const policyTable = (): string => {
  const rows = Object.entries<{ description: string; roles: readonly Role[]; own?: readonly Role[] }>(
    POLICY,
  ).map(
    ([, row]) =>
      `| ${row.description} | ${ROLES.map((role) => (row.roles.includes(role) ? "yes" : row.own?.includes(role) ? "own" : "")).join(" | ")} |`,
  );
  return [
    `| | ${ROLES.map((role) => ROLE_TITLES[role]).join(" | ")} |`,
    `|---|${"---|".repeat(ROLES.length)}`,
    ...rows,
  ].join("\n");
};

const rulesTable = (): string => {
  const rows = RULE_KEYS.map((key) => {
    const rule = HOUSE_RULES[key];
    return `| \`${key}\` | ${rule.title} | ${rule.value} ${rule.unit} | ${rule.min} to ${rule.max} | ${rule.reason} | ${rule.source} |`;
  });
  return ["| key | rule | default | range | reason | source |", "|---|---|---|---|---|---|", ...rows].join(
    "\n",
  );
};

const within = (text: string, name: string, body?: string): string => {
  const pattern = new RegExp(`(<!-- ${name}:begin -->\\n)([\\s\\S]*?)(<!-- ${name}:end -->)`);
  if (body === undefined) return pattern.exec(text)?.[2] ?? "";
  return text.replace(pattern, (_, begin: string, __: string, end: string) => `${begin}\n${body}\n\n${end}`);
};

if (process.env.UPDATE_DOCS === "1") {
  writeFileSync(
    README,
    within(within(readFileSync(README, "utf8"), "policy", policyTable()), "rules", rulesTable()),
  );
}

describe("the README", () => {
  const text = readFileSync(README, "utf8");
  it("shows the policy table as the code has it", () =>
    expect(within(text, "policy").trim()).toBe(policyTable()));
  it("shows every house rule with unit, range, reason and source", () =>
    expect(within(text, "rules").trim()).toBe(rulesTable()));
});
