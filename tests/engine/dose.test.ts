import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  capShare,
  doseOf,
  ramp,
  roundHalfUp,
  sessionMinutes,
  sparringGaps,
  type DoseParts,
} from "@/lib/engine/dose";
import { DEFAULT_RULES } from "@/lib/engine/rules/house-rules";
import type { Factor, FactorName, Instant } from "@/lib/engine/types";

const factor = (name: FactorName, value: number): Factor => ({ name, value, text: name });
const parts = (
  over: Partial<Record<FactorName, number>> &
    Partial<Pick<DoseParts, "sparringFar" | "share" | "nearSide">> = {},
): DoseParts => ({
  baseSets: 16,
  floorSets: 5,
  wave: factor("wave", over.wave ?? 1),
  taper: factor("taper", over.taper ?? 1),
  before: factor("before", over.before ?? 1),
  after: factor("after", over.after ?? 1),
  response: factor("response", over.response ?? 1),
  coach: factor("coach", over.coach ?? 1),
  sparringFar: over.sparringFar ?? null,
  nearSide: over.nearSide ?? "before",
  share: over.share ?? 1,
  capText: "held",
});
const product = (factors: readonly Factor[], base: number): number =>
  factors.reduce((value, { value: by }) => value * by, base);

describe("sets", () => {
  it("round half up, also where binary fractions fall just short of the half", () => {
    expect([12.5, 12.49, 0.5, 5 * 1.1 * 1, 2.4999999999].map(roundHalfUp)).toEqual([13, 12, 1, 6, 3]);
  });

  it("take 12 minutes and 3.2 a set, rounded up to five", () => {
    expect([0, 5, 11, 16, 24].map((sets) => sessionMinutes(sets, DEFAULT_RULES))).toEqual([
      15, 30, 50, 65, 90,
    ]);
  });

  it("all factors are kept, in the order they are multiplied", () => {
    expect(doseOf(parts()).factors.map(({ name }) => name)).toEqual([
      ...["wave", "taper", "before", "after", "cap", "response", "coach"],
    ]);
  });

  it("never fall below the item's floor", () => {
    expect(doseOf(parts({ taper: 0.1 })).sets).toBe(5);
  });

  it("what a session already gives up counts towards the cap", () => {
    expect(doseOf(parts({ share: 0.75 })).sets).toBe(12);
    expect(doseOf(parts({ share: 0.75, before: 0.7 })).sets).toBe(11);
    expect(doseOf(parts({ share: 0.5, before: 0.7 })).sets).toBe(8);
  });

  it("a lift within a day of hard sparring gives up at least one set, and the factor shows it", () => {
    const dose = doseOf(parts({ after: 0.98, sparringFar: 1, nearSide: "after" }));
    expect(dose.sets).toBe(15);
    expect(dose.factors.find(({ name }) => name === "after")?.text).toMatch(/at least/);
  });

  it("are what the factors multiply to, or the floor", () => {
    const share = fc.integer({ min: 500, max: 1000 }).map((value) => value / 1000);
    fc.assert(
      fc.property(
        fc.record({
          wave: share,
          taper: share,
          before: share,
          after: share,
          response: share,
          coach: share,
          share,
        }),
        fc.boolean(),
        (values, near) => {
          const made = parts({ ...values, sparringFar: near ? 1 : null });
          const { sets, factors } = doseOf(made);
          expect(sets).toBe(Math.max(made.floorSets, roundHalfUp(product(factors, made.baseSets))));
        },
      ),
      { numRuns: 500, seed: 31 },
    );
  });
});

describe("hard sparring around a lift", () => {
  it("before: 0.70 at 24 h or less, rising to 1 at 48 h", () => {
    expect([0, 24, 30, 36, 48, Infinity].map((hours) => Number(ramp(hours, 0.7, 24, 48).toFixed(3)))).toEqual(
      [...[0.7, 0.7, 0.775, 0.85, 1, 1]],
    );
  });

  it("a ramp without a slope is a step", () => {
    expect([11, 12, 13].map((hours) => ramp(hours, 0.5, 12, 12))).toEqual([0.5, 0.5, 1]);
  });

  const hour = 60;
  const at = (start: number, end: number) => ({
    startsAt: (start * hour) as Instant,
    endsAt: (end * hour) as Instant,
  });

  it("gaps run from the lift's end to the next start and from the last end to the lift's start", () => {
    const gaps = sparringGaps(at(100, 101), [at(60, 62), at(70, 71), at(131, 132)], DEFAULT_RULES);
    expect(gaps).toMatchObject({ before: 30, after: 29, nearBefore: false, nearAfter: false });
  });

  it("the one that ended last counts, not the one that began last", () => {
    expect(sparringGaps(at(100, 101), [at(60, 80), at(65, 66)], DEFAULT_RULES).after).toBe(20);
  });

  it("an overlap is no gap", () => {
    expect(sparringGaps(at(100, 102), [at(101, 103)], DEFAULT_RULES)).toMatchObject({
      before: 0,
      nearBefore: true,
    });
    expect(sparringGaps(at(100, 102), [at(99, 101)], DEFAULT_RULES)).toMatchObject({
      after: 0,
      nearAfter: true,
    });
  });

  it("more hard sparring never widens a gap", () => {
    const session = fc
      .tuple(fc.integer({ min: 0, max: 300 }), fc.integer({ min: 1, max: 24 }))
      .map(([start, length]) => at(start, start + length));
    const sorted = (list: ReturnType<typeof at>[]) => [...list].sort((a, b) => a.startsAt - b.startsAt);
    fc.assert(
      fc.property(
        fc.array(session, { maxLength: 8 }),
        session,
        fc.integer({ min: 0, max: 300 }),
        (list, extra, start) => {
          const lift = at(start, start + 1);
          const few = sparringGaps(lift, sorted(list), DEFAULT_RULES);
          const more = sparringGaps(lift, sorted([...list, extra]), DEFAULT_RULES);
          expect(ramp(more.before, 0.7, 24, 48)).toBeLessThanOrEqual(ramp(few.before, 0.7, 24, 48));
          expect(ramp(more.after, 0.75, 6, 36)).toBeLessThanOrEqual(ramp(few.after, 0.75, 6, 36));
        },
      ),
      { numRuns: 500, seed: 32 },
    );
  });
});

describe("weekly cap", () => {
  it("takes the largest share whose load stays under the room", () => {
    const share = capShare(750, 0.5, (value) => 1000 * value);
    expect(share).toBeLessThanOrEqual(0.75);
    expect(share).toBeGreaterThan(0.7499);
  });

  it("cuts nothing where there is room, and never below its floor", () => {
    expect(capShare(1000, 0.5, (value) => 1000 * value)).toBe(1);
    expect(capShare(-200, 0.5, (value) => 1000 * value)).toBeCloseTo(0.5, 6);
  });
});
