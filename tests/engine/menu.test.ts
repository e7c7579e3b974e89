import { describe, expect, it } from "vitest";
import { ITEM_TITLES, intensityOf, itemSpec, liftsOfWeek, menuOf } from "@/lib/engine/menu";
import { campWeeks } from "@/lib/engine/phases";
import { dayFromIso } from "@/lib/engine/geometry";
import { DEFAULT_RULES } from "@/lib/engine/rules/house-rules";
import { ITEMS } from "@/lib/engine/types";

const weeks = (length: number) =>
  campWeeks({
    boutDay: dayFromIso("2027-01-09"),
    weeks: length,
    trainingAge: "intermediate",
    rules: DEFAULT_RULES,
  });

describe("what lifting a week holds", () => {
  it.each([
    {
      phase: "foundation",
      weeksOut: 10,
      items: ["strength-a", "strength-b", "trunk-and-kick", "power-touch"],
    },
    { phase: "strength", weeksOut: 6, items: ["strength-a", "strength-b", "trunk-and-kick", "power-touch"] },
    { phase: "power", weeksOut: 3, items: ["power-a", "strength-keep", "power-b", "trunk-and-kick"] },
    { phase: "taper", weeksOut: 1, items: ["power-a", "strength-keep", "trunk-and-kick", "power-touch"] },
    { phase: "taper", weeksOut: 0, items: ["power-short", "primer"] },
  ] as const)("$phase, $weeksOut weeks out", ({ phase, weeksOut, items }) => {
    expect(menuOf({ phase, weeksOut })).toEqual(items);
  });

  it("three days of hard sparring take one lift off, but never the only one", () => {
    expect([2, 3, 5].map((hard) => liftsOfWeek(3, hard, 3))).toEqual([3, 2, 2]);
    expect(liftsOfWeek(1, 6, 3)).toBe(1);
  });

  it("every item has a name, a floor below its sets, and an effort on the CR-10 scale", () => {
    for (const item of ITEMS) {
      const { sets, floor, effort } = itemSpec(item);
      expect(ITEM_TITLES[item]).toMatch(/^[A-Z]/);
      expect(floor).toBeLessThan(sets);
      expect(effort >= 1 && effort <= 10).toBe(true);
    }
    expect(new Set(Object.values(ITEM_TITLES)).size).toBe(ITEMS.length);
  });
});

describe("intensity", () => {
  const of = (item: (typeof ITEMS)[number], index: number, length = 12) => {
    const rows = weeks(length);
    const row = rows[index];
    if (!row) throw new Error("no such week");
    const { low, high } = intensityOf(item, row, rows);
    return [low, high];
  };

  it("strength A climbs over a block, starts over in the lighter week, and is general work in foundation", () => {
    expect([0, 3, 4, 5, 6].map((index) => of("strength-a", index))).toEqual([
      ...[
        [67, 75],
        [80, 85],
        [80, 85],
        [82.5, 87.5],
        [85, 90],
      ],
    ]);
    expect(of("strength-b", 6)).toEqual([80, 85]);
  });

  it("the taper keeps what the last building week had", () => {
    for (const length of [3, 4, 6, 8, 12, 20]) {
      const rows = weeks(length);
      const taper = rows.filter((row) => row.phase === "taper");
      for (const item of ["power-a", "strength-keep", "power-b", "trunk-and-kick"] as const) {
        const last = rows.filter((row) => row.phase === "power" && !row.deload).at(-1);
        if (!last) throw new Error("no power week");
        for (const row of taper) expect(intensityOf(item, row, rows)).toEqual(intensityOf(item, last, rows));
      }
    }
  });

  it("a strength A that a coach pins into the taper keeps the percent of its last week, or the highest without one", () => {
    expect(of("strength-a", 11)).toEqual([85, 90]);
    expect(of("strength-a", 0, 1)).toEqual([85, 90]);
  });
});
