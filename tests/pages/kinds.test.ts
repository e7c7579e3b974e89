import { describe, expect, it } from "vitest";
import { ITEM_LOOKS, SPORT_LOOKS, liftLook } from "@/components/session/kinds";
import { ITEM_TITLES } from "@/lib/engine/menu";
import { ITEMS } from "@/lib/engine/types";

describe("kinds of work on the pages", () => {
  it("calls every lift what the engine calls it", () => {
    expect(Object.fromEntries(ITEMS.map((item) => [item, ITEM_LOOKS[item].label]))).toEqual(ITEM_TITLES);
  });

  it("gives no two colours the same mark, so that nothing depends on colour", () => {
    const looks = [
      ...Object.values(SPORT_LOOKS),
      ...ITEMS.map((item) => ITEM_LOOKS[item]),
      ...ITEMS.map((item) => liftLook(item, "taper")),
    ];
    const coloursOfMark = new Map<string, Set<string>>();
    for (const { mark, fill } of looks)
      coloursOfMark.set(mark, (coloursOfMark.get(mark) ?? new Set()).add(fill));
    for (const colours of coloursOfMark.values()) expect([...colours]).toHaveLength(1);
  });
});
