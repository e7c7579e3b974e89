import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { splitSets, type Claim } from "@/lib/engine/prescription/sets";

const claim = (low: number, high: number, over: Partial<Claim> = {}): Claim => ({
  share: 3,
  low,
  high,
  least: Math.min(2, low),
  most: Infinity,
  kept: false,
  ...over,
});

const setsOf = (total: number, claims: readonly Claim[]): readonly number[] => splitSets(total, claims).sets;

describe("sets of a session over its slots", () => {
  it("a full session opens every slot within its range", () => {
    const claims = [claim(3, 5, { share: 5 }), claim(3, 4, { share: 4 }), claim(3, 4), claim(3, 4)];
    expect(setsOf(16, claims)).toEqual([5, 4, 4, 3]);
  });

  it("fewer sets close slots from the end, and leave the others worth doing", () => {
    const claims = [claim(3, 5, { share: 5 }), claim(3, 4), claim(3, 4), claim(3, 4)];
    expect(setsOf(10, claims)).toEqual([4, 3, 3, 0]);
    expect(setsOf(4, claims)).toEqual([4, 0, 0, 0]);
  });

  it("a slot too big for what is left gives its turn to a smaller one", () => {
    expect(setsOf(5, [claim(3, 5), claim(3, 5), claim(2, 4)])).toEqual([3, 0, 2]);
  });

  it("rather a second exercise with two sets than five of one that wants at most four", () => {
    expect(setsOf(5, [claim(3, 4), claim(3, 4)])).toEqual([3, 2]);
  });

  it("the most important slot opens even where the sets are fewer than it wants", () => {
    expect(setsOf(3, [claim(4, 5), claim(2, 4)])).toEqual([3, 0]);
    expect(setsOf(1, [claim(4, 5), claim(2, 4)])).toEqual([1, 0]);
  });

  it("what a coach wrote on opens before the others", () => {
    expect(setsOf(6, [claim(3, 5), claim(3, 4), claim(3, 4, { kept: true })])).toEqual([3, 0, 3]);
  });

  it("sets beyond all ranges go where the table has no end, and are counted as above", () => {
    const split = splitSets(16, [claim(3, 5, { most: 6 }), claim(3, 4)]);
    expect(split).toEqual({ sets: [6, 10], above: 7, left: 0 });
  });

  it("sets that no slot may take are left, not forced", () => {
    expect(splitSets(16, [claim(3, 5, { most: 10 })])).toEqual({ sets: [10], above: 11, left: 6 });
    expect(splitSets(8, [])).toEqual({ sets: [], above: 8, left: 8 });
  });

  it("sets and what is left always add up, no slot passes its end, and none opens under what it is worth while another has room (2,000 sessions)", () => {
    const arbClaim = fc
      .record({
        share: fc.integer({ min: 1, max: 6 }),
        low: fc.integer({ min: 1, max: 5 }),
        room: fc.integer({ min: 0, max: 4 }),
        beyond: fc.option(fc.integer({ min: 0, max: 5 }), { nil: Infinity }),
        kept: fc.boolean(),
      })
      .map(({ share, low, room, beyond, kept }) =>
        claim(low, low + room, { share, most: low + room + beyond, kept: kept && room === 0 }),
      );
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 40 }),
        fc.array(arbClaim, { minLength: 1, maxLength: 7 }),
        (total, claims) => {
          const { sets, left, above } = splitSets(total, claims);
          expect(sets.reduce((sum, value) => sum + value, 0) + left).toBe(total);
          claims.forEach(({ most, high, least, kept }, index) => {
            const has = sets[index] ?? 0;
            expect(has).toBeLessThanOrEqual(most);
            if (above === 0) expect(has).toBeLessThanOrEqual(high);
            // The first may take fewer when there are fewer; the coach's own open at one.
            if (has > 0 && index > 0 && !kept) expect(has).toBeGreaterThanOrEqual(least);
          });
          if (left > 0) claims.forEach(({ most }, index) => expect(sets[index]).toBe(sets[index] ? most : 0));
        },
      ),
      { numRuns: 2000, seed: 311 },
    );
  });
});
