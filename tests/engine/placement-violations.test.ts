import { describe, expect, it } from "vitest";
import { PLACEMENT_RULES, RULE_KEYS, type PlanInput } from "@/lib/engine";
import { placeLifts, type FixedLift } from "@/lib/engine/placement";
import { emptyCamp, pinnedLift, request, session } from "../factories/placement-request";
import { day } from "../factories/plan-input";

describe("violations", () => {
  const input = emptyCamp({
    sport: [
      session("hard-sparring", "2026-12-01 19:00", { title: "Hard rounds" }),
      session("skill", "2026-11-30 18:00", { title: "Pads" }),
    ],
  });

  it("say what is broken, by how much, and what the rule asks", () => {
    const lift = pinnedLift(input, { item: "strength-a", at: "2026-11-30 19:20" });
    expect(placeLifts(request(input, { fixed: [lift] })).violations).toEqual([
      {
        rule: "clash",
        ids: ["strength-a.5", "skill 2026-11-30 18:00"],
        day: day("2026-11-30"),
        text: "Strength A starts 20 min after Pads; house rule asks 45 min.",
      },
      {
        rule: "heavy-before-hard",
        ids: ["strength-a.5", "hard-sparring 2026-12-01 19:00"],
        day: day("2026-11-30"),
        text: "Strength A ends 22.6 h before Hard rounds; house rule asks 24 h.",
      },
    ]);
  });

  it("of two pins that break a rule with one another are told once, with both", () => {
    const pins = [
      pinnedLift(input, { item: "strength-a", at: "2026-12-03 08:00" }),
      pinnedLift(input, { item: "strength-b", at: "2026-12-03 20:00" }),
    ];
    expect(placeLifts(request(input, { fixed: pins })).violations).toEqual([
      {
        rule: "one-lift",
        ids: ["strength-a.5", "strength-b.5"],
        day: day("2026-12-03"),
        text: "Strength A and Strength B are on one day; there is one lift a day.",
      },
    ]);
  });

  it("of a lift that is past are told only where the other session can still be moved", () => {
    const past: FixedLift = {
      ...pinnedLift(input, { item: "strength-a", at: "2026-11-30 19:20" }),
      pinned: false,
      past: true,
    };
    const now = (day("2026-12-01") * 1440) as PlanInput["now"];
    const { violations } = placeLifts(request({ ...input, now }, { fixed: [past] }));
    expect(violations.map(({ rule }) => rule)).toEqual(["heavy-before-hard"]);
  });
});

it("every rule has a name of its own, a title, and keys that are house rules", () => {
  expect(new Set(PLACEMENT_RULES.map(({ id }) => id)).size).toBe(PLACEMENT_RULES.length);
  for (const { title, keys } of PLACEMENT_RULES) {
    expect(title).toMatch(/^[A-Z]/);
    for (const key of keys) expect(RULE_KEYS).toContain(key);
  }
});
