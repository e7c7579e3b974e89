import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  TEST_KINDS,
  TEST_SPECS,
  asymmetry,
  beyondOwnSpread,
  changeVerdict,
  ownTypicalError,
  reliability,
  smallestWorthwhile,
  testProblems,
  verdictSentence,
} from "@/lib/engine/measures";

const amount = fc.double({ min: 0, max: 1000, noNaN: true });

describe("asymmetry", () => {
  it("swapping the sides turns the sign and keeps the size (300 pairs)", () => {
    fc.assert(
      fc.property(fc.constantFrom("unilateral", "bilateral"), amount, amount, (formula, left, right) => {
        const [one, other] = [asymmetry(formula, left, right), asymmetry(formula, right, left)];
        expect(one?.size).toBe(other?.size);
        if (left !== right) expect(one?.signed).toBe(-(other?.signed ?? 0));
        if (one) expect(one.size).toBeLessThanOrEqual(100);
      }),
      { numRuns: 300, seed: 301 },
    );
  });

  it("is not worked out from nothing, and is not real inside the spread of one side", () => {
    expect(asymmetry("unilateral", 0, 0)).toBeNull();
    expect(asymmetry("bilateral", -1, 3)).toBeNull();
    const same = asymmetry("unilateral", 30, 30);
    expect(same).toMatchObject({ size: 0, lower: null });
    const eight = asymmetry("unilateral", 23, 25);
    expect(eight && beyondOwnSpread(eight, 4)).toBe(true);
    expect(eight && beyondOwnSpread(eight, 9)).toBe(false);
  });
});

describe("the noise of a test", () => {
  it("is not worked out from one pair, nor a worthwhile change where noise is all there is", () => {
    expect(reliability([[30, 31]])).toBeNull();
    expect(smallestWorthwhile([30], 1)).toBeNull();
    expect(smallestWorthwhile([30, 31, 32], 5)).toBeNull();
  });

  it("an athlete's own comes from repeated trials, pooled within days, and not from too few", () => {
    // Three days of three trials: SD 1, 2 and 1 within them; pooled sqrt((2 + 8 + 2) / 6).
    const days = [
      [30, 31, 32],
      [34, 36, 38],
      [40, 41, 42],
    ];
    expect(ownTypicalError(days)).toEqual({ typicalError: Math.sqrt(2), degrees: 6 });
    expect(ownTypicalError(days.slice(0, 2))).toBeNull();
    expect(ownTypicalError([[30], [31], [32], [33], [34], [35], [36]])).toBeNull();
  });

  it("without an error nothing is called beyond noise, and nothing is called noise", () => {
    const verdict = changeVerdict(30, 40, null);
    expect(verdict).toMatchObject({ beyondNoise: null, worthHaving: null, leastReal: null });
    expect(verdictSentence(verdict)).toBe("Higher, no error of this test is known yet.");
  });

  it("a change for the worse is never worth having, whichever way is better", () => {
    expect(changeVerdict(30, 20, 1, 0.5).worthHaving).toBe(false);
    expect(changeVerdict(200, 180, 1, 0.5, false).worthHaving).toBe(true);
    expect(verdictSentence(changeVerdict(30, 20, 1, 0.5))).toBe(
      "Lower, beyond the noise of this test; a loss that matters.",
    );
  });

  it("a verdict turned round says the same of noise (200 changes)", () => {
    fc.assert(
      fc.property(amount, amount, fc.double({ min: 0.01, max: 50, noNaN: true }), (first, last, error) => {
        expect(changeVerdict(first, last, error).beyondNoise).toBe(
          changeVerdict(last, first, error).beyondNoise,
        );
      }),
      { numRuns: 200, seed: 302 },
    );
  });
});

describe("kinds of tests", () => {
  it.each(TEST_KINDS)("%s takes both ends of its ranges and nothing beyond them", (kind) => {
    const { value, second } = TEST_SPECS[kind];
    const fitting = second?.min ?? null;
    expect(testProblems(kind, { value: value.min, second: fitting })).toEqual([]);
    expect(testProblems(kind, { value: value.max, second: second?.max ?? null })).toEqual([]);
    for (const wrong of [value.min - 0.01, value.max + 0.01, Number.NaN, Infinity]) {
      expect(testProblems(kind, { value: wrong, second: fitting }).map((problem) => problem.field)).toEqual([
        "value",
      ]);
    }
  });

  it("a second number is asked for where it belongs, and refused where it does not", () => {
    expect(testProblems("loaded-jump", { value: 30, second: null })).toMatchObject([{ field: "second" }]);
    expect(testProblems("jump-height", { value: 30, second: 5 })).toMatchObject([{ field: "second" }]);
    expect(testProblems("rep-record", { value: 100, second: 4.5 })).toMatchObject([{ field: "second" }]);
  });

  it("metres typed for centimetres and seconds for milliseconds are caught", () => {
    expect(testProblems("jump-height", { value: 0.42, second: null })).toHaveLength(1);
    expect(testProblems("flight-time", { value: 0.55, second: null })).toHaveLength(1);
  });
});
