import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { KG_PER_LB, loadOnPlates, stepKg, type Exercise, type Intensity, type Kg } from "@/lib/engine";
import {
  bestOn,
  heavyReps,
  loadOf,
  repsOf,
  reserveAt,
  type LoadParts,
} from "@/lib/engine/prescription/loads";
import { liftCountAt } from "@/lib/engine/prescription/loading-tables";
import { day } from "../factories/plan-input";
import { best, exerciseOf } from "../factories/prescription";

const SQUAT = exerciseOf("back-squat");
const strength = (low: number, high: number): Intensity => ({ low, high, of: "best" });
const parts = (over: Partial<LoadParts> = {}): LoadParts => ({
  exercise: SQUAT,
  aim: "heavy",
  reps: { low: 3, high: 3 },
  intensity: strength(80, 85),
  best: best("back-squat", 140),
  plates: { unit: "kg", step: 2.5 },
  ...over,
});
const ballistic = (powerZone: Exercise["powerZone"]): Exercise => {
  const { powerZone: _own, ...rest } = SQUAT;
  return {
    ...rest,
    id: "loaded-jump",
    doses: { fast: { sets: { low: 3, high: 5 }, reps: { low: 3, high: 5 } } },
    ...(powerZone && { powerZone }),
  };
};

describe("kilograms on the athlete's plates", () => {
  it("the step nearest the middle of the range", () => {
    // 82.5 % of 140 kg is 115.5 kg.
    expect(loadOnPlates(140, { low: 80, high: 85 }, { unit: "kg", step: 2.5 })).toBe(115);
    expect(loadOnPlates(140, { low: 80, high: 85 }, { unit: "kg", step: 1 })).toBe(116);
  });

  it("rounds down where the nearest step would pass the high end", () => {
    // In steps of 10 kg 90 kg is nearest to 87.5 %; of a best of 100 kg it is just 90 %, of 99 kg it is more.
    expect(loadOnPlates(100, { low: 85, high: 90 }, { unit: "kg", step: 10 })).toBe(90);
    expect(loadOnPlates(99, { low: 85, high: 90 }, { unit: "kg", step: 10 })).toBe(80);
  });

  it("a pound is 0.45359237 kg exactly, and steps of pounds stay whole pounds", () => {
    expect(stepKg({ unit: "lb", step: 5 })).toBe(5 * 0.45359237);
    // A best of 315 lb: 80 to 85 % is 252 to 267.75 lb.
    const kg = loadOnPlates(315 * KG_PER_LB, { low: 80, high: 85 }, { unit: "lb", step: 5 });
    expect((kg ?? 0) / KG_PER_LB).toBeCloseTo(260, 9);
  });

  it("says nothing rather than an empty bar", () => {
    expect(loadOnPlates(8, { low: 60, high: 70 }, { unit: "kg", step: 10 })).toBeNull();
    expect(loadOnPlates(140, { low: 0, high: 0 }, { unit: "kg", step: 2.5 })).toBeNull();
  });

  it("never asks for less than an empty bar, and for none where the bar alone is above the range", () => {
    const plates = { unit: "kg", step: 2.5 } as const;
    expect(loadOnPlates(120, { low: 0, high: 30 }, plates, { bar: true })).toBe(20);
    expect(loadOnPlates(120, { low: 0, high: 30 }, plates)).toBe(17.5);
    expect(loadOnPlates(60, { low: 0, high: 30 }, plates, { bar: true })).toBeNull();
    const pounds = { unit: "lb", step: 10 } as const;
    expect(loadOnPlates(150, { low: 0, high: 30 }, pounds, { bar: true })).toBeCloseTo(50 * KG_PER_LB, 9);
  });

  it("always a multiple of the step and never above the range; inside it wherever a step is (5,000 loads)", () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 20, max: 700 }).map((half) => half / 2),
        fc.integer({ min: 0, max: 190 }).map((half) => half / 2),
        fc.integer({ min: 0, max: 20 }),
        fc.constantFrom(0.5, 1, 1.25, 2, 2.5, 5, 10),
        fc.constantFrom("kg" as const, "lb" as const),
        (known, low, width, step, unit) => {
          const plates = { unit, step };
          const kg = loadOnPlates(known, { low, high: low + width }, plates);
          if (kg === null) return;
          const size = stepKg(plates);
          expect(Math.abs(kg / size - Math.round(kg / size))).toBeLessThan(1e-9);
          expect(kg).toBeLessThanOrEqual((known * (low + width)) / 100 + 1e-6);
          if (kg < (known * low) / 100 - 1e-6) {
            expect(kg + size).toBeGreaterThan((known * (low + width)) / 100 - 1e-6);
          }
        },
      ),
      { numRuns: 5000, seed: 321 },
    );
  });
});

describe("the load of a line", () => {
  it("heavy work takes the engine's percent of the best", () => {
    expect(loadOf(parts())).toMatchObject({ of: "best", percent: { low: 80, high: 85 }, kg: 115 });
  });

  it("without a best: repetitions and what the wall chart leaves in reserve, four at most", () => {
    // NSCA wall chart: 6 repetitions at 85 %, 8 at 80 %; three of them leave 3 to 5. Hackett et al. 2017: no more than 4.
    expect(loadOf(parts({ best: null }))).toEqual({ of: "reserve", reserve: { low: 3, high: 4 }, kg: null });
    expect(reserveAt({ low: 85, high: 90 }, { low: 3, high: 3 })).toEqual({ low: 1, high: 3 });
  });

  it("volume takes the percent at which its repetitions leave two to three, under the session's own high end", () => {
    const reps = { low: 6, high: 8 };
    // NSCA wall chart: 8 + 3 repetitions at 72.5 %, 6 + 2 at 80 %.
    const volume = loadOf(parts({ aim: "volume", reps }));
    expect(volume).toMatchObject({ of: "best", percent: { low: 72.5, high: 80 } });
    const light = loadOf(parts({ aim: "volume", reps, intensity: strength(67, 75) }));
    expect(light).toMatchObject({ percent: { low: 72.5, high: 75 } });
  });

  it("volume beyond the chart is said in reserve", () => {
    const reps = { low: 15, high: 20 };
    expect(loadOf(parts({ aim: "volume", reps }))).toMatchObject({
      of: "reserve",
      reserve: { low: 2, high: 3 },
    });
  });

  it("a session of reserve gives its own", () => {
    const intensity: Intensity = { low: 1, high: 2, of: "reserve" };
    const reps = { low: 15, high: 20 };
    expect(loadOf(parts({ aim: "volume", reps, intensity }))).toMatchObject({ reserve: { low: 1, high: 2 } });
  });

  // Soriano et al. 2015, Sports Med 45(8):1191-1205: jump squat at most 30 %, clean 70 % or more.
  it("ballistic work takes its zone of most power, whatever the session's percent", () => {
    const exercise = ballistic({ low: 70, high: 90 });
    const load = loadOf(parts({ exercise, aim: "fast", intensity: strength(0, 30) }));
    expect(load).toMatchObject({ of: "best", percent: { low: 70, high: 90 }, kg: 112.5 });
  });

  it("ballistic work without a best is body mass where the zone begins at nothing, and four in reserve where it does not", () => {
    const fast = { aim: "fast", intensity: strength(0, 30), best: null } as const;
    expect(loadOf(parts({ ...fast, exercise: ballistic({ low: 0, high: 30 }) }))).toEqual({
      of: "body",
      kg: null,
    });
    expect(loadOf(parts({ ...fast, exercise: ballistic({ low: 30, high: 70 }) }))).toMatchObject({
      of: "reserve",
      reserve: { low: 4, high: 4 },
    });
  });

  it.each(["body", "throw", "none"] as const)("%s has no percent", (load) => {
    expect(loadOf(parts({ exercise: { ...SQUAT, load } }))).toEqual({ of: load, kg: null });
  });
});

describe("repetitions of heavy work", () => {
  it.each([
    // Prilepin's table: 10 to 20 lifts of 2 to 4 at 80 to 89 %, 15 best.
    { percent: 82.5, sets: 3, reps: 4 },
    { percent: 82.5, sets: 5, reps: 3 },
    { percent: 87.5, sets: 6, reps: 2 },
    // 12 to 24 lifts of 3 to 6 at 70 to 79 %, 18 best.
    { percent: 71, sets: 3, reps: 5 },
    { percent: 71, sets: 6, reps: 3 },
    // 4 to 10 lifts of 1 or 2 from 90 %, 7 best.
    { percent: 92.5, sets: 3, reps: 2 },
    { percent: 92.5, sets: 6, reps: 1 },
  ])("$sets sets at $percent %: $reps", ({ percent, sets, reps }) => {
    const row = liftCountAt(percent);
    if (!row) throw new Error("no row");
    expect(heavyReps(row, sets, { low: 1, high: 5 })).toBe(reps);
  });

  it("a primer has at most 12 fast repetitions of one exercise, whatever its own range", () => {
    const throws = { ...SQUAT, doses: { fast: { sets: { low: 3, high: 5 }, reps: { low: 4, high: 8 } } } };
    expect(repsOf(throws, "fast", 3, strength(85, 90), true)).toEqual({ low: 4, high: 4 });
    expect(repsOf(throws, "fast", 6, strength(85, 90), true)).toEqual({ low: 2, high: 2 });
    expect(repsOf(throws, "fast", 3, strength(0, 30), false)).toEqual({ low: 4, high: 8 });
  });
});

describe("which best counts", () => {
  const at = (iso: string, kg: number, from: "measured" | "epley" = "epley") =>
    best("back-squat", kg, { day: day(iso), from });

  it("the newest on or before the session's day, in any order", () => {
    const bests = [at("2027-01-10", 150), at("2026-06-01", 130), at("2026-12-01", 140)];
    expect(bestOn(bests, SQUAT, day("2026-12-31"))?.kg).toBe(140);
    expect(bestOn([...bests].reverse(), SQUAT, day("2027-01-10"))?.kg).toBe(150);
    expect(bestOn(bests, SQUAT, day("2026-05-31"))).toBeNull();
  });

  it("of one day a measured one goes before an estimate", () => {
    const bests = [at("2026-12-01", 150), at("2026-12-01", 140, "measured")];
    expect(bestOn(bests, SQUAT, day("2026-12-31"))?.from).toBe("measured");
  });

  it("a lift that is loaded by another's best takes that one", () => {
    const jump = { ...ballistic({ low: 0, high: 30 }), bestOf: "back-squat" };
    expect(bestOn([at("2026-12-01", 140 as Kg)], jump, day("2026-12-31"))?.kg).toBe(140);
  });
});
