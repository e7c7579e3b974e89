import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { STRIKING_BASES, TRAINING_AGES, type Weekday } from "@/lib/engine/types";
import {
  HARD_UNTIL_DAYS,
  START_DEFAULTS,
  WEIGH_IN_DAYS,
  readStartParams,
  writeStartParams,
  type StartParams,
} from "@/lib/schemas/start-params";

const DEFAULTS: StartParams = { ...START_DEFAULTS, date: "2027-01-09" };

const two = (n: number): string => String(n).padStart(2, "0");
const time = fc
  .tuple(fc.integer({ min: 0, max: 23 }), fc.integer({ min: 0, max: 59 }))
  .map(([h, m]) => `${two(h)}:${two(m)}`);

const anyParams: fc.Arbitrary<StartParams> = fc.record({
  date: fc
    .date({ min: new Date("2000-01-01"), max: new Date("2100-01-01"), noInvalidDate: true })
    .map((date) => date.toISOString().slice(0, 10)),
  time,
  zone: fc.constantFrom(null, "Europe/Zagreb", "America/Argentina/Buenos_Aires", "Pacific/Apia", "UTC"),
  weeks: fc.integer({ min: 1, max: 20 }),
  hard: fc.subarray<Weekday>([1, 2, 3, 4, 5, 6, 7]),
  hardTime: time,
  hardUntil: fc.constantFrom(...HARD_UNTIL_DAYS),
  lifts: fc.integer({ min: 1, max: 4 }),
  base: fc.constantFrom(...STRIKING_BASES),
  age: fc.constantFrom(...TRAINING_AGES),
  weighIn: fc.constantFrom(...WEIGH_IN_DAYS),
  weighInTime: time,
  from: time,
  to: fc.oneof(time, fc.constant("24:00")),
  other: fc.integer({ min: 0, max: 7 }),
});

describe("the start page's address", () => {
  it("gives back every input that was written to it", () => {
    fc.assert(
      fc.property(anyParams, (params) => {
        const read = readStartParams(new URLSearchParams(writeStartParams(params)), DEFAULTS);
        // The time of a weigh-in that is not known is not kept.
        const kept = params.weighIn === "unknown" ? { ...params, weighInTime: DEFAULTS.weighInTime } : params;
        expect(read).toEqual(kept);
      }),
      { seed: 20270109, numRuns: 500 },
    );
  });

  it("never gives a value out of range, whatever it is handed", () => {
    const word = fc.oneof(
      fc.string(),
      fc.integer().map(String),
      fc.constantFrom("2027-01-09", "26", "NaN", "1e3"),
    );
    const keys = [
      ...new URLSearchParams(writeStartParams({ ...DEFAULTS, zone: "UTC", weighIn: "same-day" })).keys(),
    ];
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.constantFrom(...keys), word)), (pairs) => {
        const read = readStartParams(new URLSearchParams(pairs), DEFAULTS);
        expect(read.weeks).toBeGreaterThanOrEqual(1);
        expect(read.weeks).toBeLessThanOrEqual(20);
        expect(read.lifts).toBeGreaterThanOrEqual(1);
        expect(read.lifts).toBeLessThanOrEqual(4);
        expect(read.other).toBeLessThanOrEqual(7);
        expect(STRIKING_BASES).toContain(read.base);
        expect(HARD_UNTIL_DAYS).toContain(read.hardUntil);
        expect(read.time).toMatch(/^\d{2}:\d{2}$/);
        expect(read.date).toMatch(/^\d{4}-\d{2}-\d{2}$/);
        expect([1, 2, 3, 4, 5, 6, 7]).toEqual(expect.arrayContaining([...read.hard]));
      }),
      { seed: 20270109, numRuns: 500 },
    );
  });

  it.each([
    ["nothing at all", "", {}],
    ["weekdays one by one, as a form sends them", "hard=2&hard=6", { hard: [2, 6] }],
    ["weekdays in one word, in any order", "hard=62", { hard: [2, 6] }],
    ["no hard sparring", "hard=0", { hard: [] }],
    ["a day that does not exist", "bout=2027-02-30", {}],
    ["a zone that does not exist", "zone=Europe/Atlantis", { zone: null }],
    ["a length out of range", "weeks=21", { weeks: 8 }],
    ["a length that is no whole number", "weeks=3.5", { weeks: 8 }],
    ["a time that does not exist", "at=24:00", { time: "20:00" }],
    ["the end of the day as the end of free hours", "to=24:00", { to: "24:00" }],
  ] satisfies [string, string, Partial<StartParams>][])("reads %s", (_, query, expected) => {
    expect(readStartParams(new URLSearchParams(query), DEFAULTS)).toEqual({ ...DEFAULTS, ...expected });
  });
});
