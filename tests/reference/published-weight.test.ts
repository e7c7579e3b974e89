import { describe, expect, it } from "vitest";
import { ceilings, descentLine, lineKg, weeklyRate, weeksNeeded } from "@/lib/engine/weight";
import { DEFAULT_RULES } from "@/lib/engine/rules/house-rules";
import type { Day, Kg } from "@/lib/engine/types";

const kg = (value: number): Kg => value as Kg;
const day = (value: number): Day => value as Day;

describe("weeks needed, n = ln(target / now) / ln(1 - r)", () => {
  it("85 to 80 kg: 8.630 weeks at 0.7 % (Garthe et al. 2011, Int J Sport Nutr Exerc Metab 21:97-104)", () => {
    expect(weeksNeeded(85, 80, 0.007)).toBeCloseTo(8.63, 3);
  });
  it("85 to 80 kg: 4.011 weeks at 1.5 % (NCAA and NFHS descent rule)", () => {
    expect(weeksNeeded(85, 80, 0.015)).toBeCloseTo(4.011, 3);
  });
  it("none for a weight at or under the target", () => {
    expect(weeksNeeded(80, 80, 0.007)).toBe(0);
    expect(weeksNeeded(79, 80, 0.007)).toBe(0);
  });
});

describe("the line of descent", () => {
  it("from 85 kg at 0.7 % a week runs 84.405, 83.814, 83.227, 82.645, 82.066, 81.492, 80.921, 80.355 (Garthe et al. 2011)", () => {
    const limitKg = kg(85 * 0.993 ** 8);
    const line = descentLine({ day: day(100), kg: kg(85) }, limitKg, day(156), DEFAULT_RULES);
    if (!line) throw new Error("no line");
    expect(line).toMatchObject({ pace: "recommended", shortKg: 0, rate: expect.closeTo(0.007, 10) });
    const weeks = [1, 2, 3, 4, 5, 6, 7, 8].map((week) =>
      Number(lineKg(line, day(100 + 7 * week)).toFixed(3)),
    );
    expect(weeks).toEqual([84.405, 83.814, 83.227, 82.645, 82.066, 81.492, 80.921, 80.355]);
  });

  it("keeps 1.5 % a week where the limit asks for more, and says by how much it misses (NCAA and NFHS)", () => {
    const line = descentLine({ day: day(0), kg: kg(85) }, kg(80), day(14), DEFAULT_RULES);
    if (!line) throw new Error("no line");
    expect(line).toMatchObject({ pace: "beyond-fastest", rate: 0.015 });
    expect(lineKg(line, day(14))).toBeCloseTo(85 * 0.985 ** 2, 9);
    expect(line.shortKg).toBeCloseTo(85 * 0.985 ** 2 - 80, 9);
  });

  it("the rate of two weights is what takes one to the other", () => {
    expect(weeklyRate(85, 85 * 0.985, 7)).toBeCloseTo(0.015, 12);
    expect(weeklyRate(85, 85 * 0.993 ** 2, 14)).toBeCloseTo(0.007, 12);
  });
});

describe("ceilings (Ricci et al. 2025, J Int Soc Sports Nutr 22(1):2467909; percent of current mass)", () => {
  it("170 lb class, 77.1107 kg: 82.648, 81.772 and 80.660 kg at 72, 48 and 24 h", () => {
    const limitKg = kg(170 * 0.45359237);
    const made = ceilings(limitKg, day(50), DEFAULT_RULES);
    expect(made.map((ceiling) => [ceiling.hours, ceiling.day, Number(ceiling.kg.toFixed(3))])).toEqual([
      [72, 47, 82.648],
      [48, 48, 81.772],
      [24, 49, 80.66],
    ]);
  });

  it("80.0 kg at 72 h may still have 5.36 kg to go, to 74.64 kg", () => {
    const [first] = ceilings(kg(74.64), day(50), DEFAULT_RULES);
    expect(first?.kg).toBeCloseTo(80, 9);
    expect((first?.share ?? 0) * 80).toBeCloseTo(5.36, 9);
  });
});
