import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  campStart,
  dayFromIso,
  daysOutOf,
  hhmm,
  instantAt,
  isoFromDay,
  minuteFromHhmm,
  weekSpan,
  weekdayOf,
  weeksOutOf,
} from "@/lib/engine/geometry";
import type { Day, Minute, OffsetStep } from "@/lib/engine/types";

const arbDay = fc.integer({ min: -200_000, max: 200_000 }).map((value) => value as Day);

describe("civil days", () => {
  it("agree with the proleptic Gregorian calendar of the language (ECMA-262, time values) for 1,000 days", () => {
    fc.assert(
      fc.property(arbDay, (day) => {
        const date = new Date(day * 86_400_000);
        expect(isoFromDay(day)).toBe(date.toISOString().slice(0, 10));
        expect(dayFromIso(isoFromDay(day))).toBe(day);
        expect(weekdayOf(day)).toBe(date.getUTCDay() || 7);
      }),
      { numRuns: 1000, seed: 11 },
    );
  });

  it.each([
    { iso: "1970-01-01", day: 0, weekday: 4 },
    { iso: "1969-12-31", day: -1, weekday: 3 },
    { iso: "2000-02-29", day: 11_016, weekday: 2 },
    { iso: "2028-02-29", day: 21_243, weekday: 2 },
    { iso: "2027-01-09", day: 20_827, weekday: 6 },
  ])("$iso is day $day", ({ iso, day, weekday }) => {
    expect(dayFromIso(iso)).toBe(day);
    expect(weekdayOf(day as Day)).toBe(weekday);
  });

  it.each([
    "2027-02-29",
    "2027-13-01",
    "2027-00-10",
    "2027-04-31",
    "27-01-01",
    "2027-1-1",
    "",
    "2027-01-09T10:00",
  ])("refuses %j", (text) => {
    expect(() => dayFromIso(text)).toThrow(RangeError);
  });
});

describe("times of day", () => {
  it("read back as written, 24:00 included", () => {
    for (let minute = 0; minute <= 1440; minute++)
      expect(minuteFromHhmm(hhmm(minute as Minute))).toBe(minute);
  });

  it("an end past midnight reads as the next day's clock", () => {
    expect(hhmm(1530 as Minute)).toBe("01:30");
  });

  it.each(["24:01", "12:60", "7:00", "noon", "", "99:00"])("refuses %j", (text) => {
    expect(() => minuteFromHhmm(text)).toThrow(RangeError);
  });
});

describe("camp weeks", () => {
  const bout = dayFromIso("2027-01-09");

  it("fight week is the seven days that end with the bout", () => {
    expect(weekSpan(bout, 0)).toEqual({ from: dayFromIso("2027-01-03"), to: bout });
    expect(weekSpan(bout, 7)).toEqual({ from: dayFromIso("2026-11-15"), to: dayFromIso("2026-11-21") });
    expect(campStart(bout, 8)).toBe(dayFromIso("2026-11-15"));
  });

  it("every day lies in the span of its own week, before and after the bout", () => {
    fc.assert(
      fc.property(arbDay, fc.integer({ min: -30, max: 200 }), (boutDay, out) => {
        const day = (boutDay - out) as Day;
        expect(daysOutOf(boutDay, day)).toBe(out);
        const { from, to } = weekSpan(boutDay, weeksOutOf(boutDay, day));
        expect(day >= from && day <= to && to - from === 6).toBe(true);
      }),
      { numRuns: 300, seed: 12 },
    );
  });
});

describe("instants", () => {
  const lisbonSpring: readonly OffsetStep[] = [
    { from: 0, offset: 0 },
    { from: dayFromIso("2027-03-28") * 1440 + 120, offset: 60 },
  ];
  const lisbonAutumn: readonly OffsetStep[] = [
    { from: 0, offset: 60 },
    { from: dayFromIso("2026-10-25") * 1440 + 120, offset: 0 },
  ];
  const at = (zone: readonly OffsetStep[], iso: string, time: string): string =>
    new Date(instantAt(zone, dayFromIso(iso), minuteFromHhmm(time)) * 60_000).toISOString();

  it.each([
    // 28 March 2027, 01:00 to 02:00 in Lisbon does not exist.
    { zone: lisbonSpring, iso: "2027-03-28", time: "00:59", utc: "2027-03-28T00:59:00.000Z" },
    { zone: lisbonSpring, iso: "2027-03-28", time: "01:30", utc: "2027-03-28T01:30:00.000Z" },
    { zone: lisbonSpring, iso: "2027-03-28", time: "02:00", utc: "2027-03-28T01:00:00.000Z" },
    // 25 October 2026, 01:00 to 02:00 in Lisbon comes twice: the first.
    { zone: lisbonAutumn, iso: "2026-10-25", time: "01:30", utc: "2026-10-25T00:30:00.000Z" },
    { zone: lisbonAutumn, iso: "2026-10-25", time: "02:00", utc: "2026-10-25T02:00:00.000Z" },
    { zone: [{ from: 0, offset: 330 }], iso: "2026-10-25", time: "01:30", utc: "2026-10-24T20:00:00.000Z" },
    { zone: [], iso: "2026-10-25", time: "01:30", utc: "2026-10-25T01:30:00.000Z" },
  ])("$iso $time", ({ zone, iso, time, utc }) => {
    expect(at(zone, iso, time)).toBe(utc);
  });

  it("a night with a clock change is an hour shorter or longer", () => {
    const night = (zone: readonly OffsetStep[], iso: string): number =>
      instantAt(zone, (dayFromIso(iso) + 1) as Day, 480 as Minute) -
      instantAt(zone, dayFromIso(iso), 1200 as Minute);
    expect(night(lisbonSpring, "2027-03-27")).toBe(11 * 60);
    expect(night(lisbonAutumn, "2026-10-24")).toBe(13 * 60);
    expect(night(lisbonSpring, "2027-03-20")).toBe(12 * 60);
  });
});
