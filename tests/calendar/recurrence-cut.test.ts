import { describe, expect, it } from "vitest";
import {
  RecurrenceError,
  endBefore,
  expandEntries,
  occurrenceDays,
  startFrom,
} from "@/lib/calendar/recurrence";
import { dayFromIso, hhmm, isoFromDay } from "@/lib/engine";
import type { SportEntry } from "@/lib/schemas/camp-book";
import { weekly } from "../factories/camp-book";

const entry = (start: string, rrule: string | null, over: Partial<SportEntry> = {}): SportEntry =>
  weekly("pads", start, { rrule, ...over });

const dates = (timed: SportEntry, from: string, to: string): string[] =>
  occurrenceDays(timed, dayFromIso(from), dayFromIso(to)).map(isoFromDay);

const list = (entries: readonly SportEntry[], from: string, to: string): string[] =>
  expandEntries(entries, dayFromIso(from), dayFromIso(to)).map(
    (s) => `${s.id} ${isoFromDay(s.day)} ${hhmm(s.start)}`,
  );

describe("cutting a series", () => {
  const rules = [
    "FREQ=WEEKLY",
    "FREQ=WEEKLY;BYDAY=TU,TH,SA",
    "FREQ=WEEKLY;INTERVAL=2;BYDAY=TU,SA;WKST=SU",
    "FREQ=WEEKLY;INTERVAL=2;BYDAY=TU,SU",
    "FREQ=WEEKLY;BYDAY=TU,SA;COUNT=9",
    "FREQ=DAILY;INTERVAL=3;COUNT=12",
    "FREQ=DAILY;UNTIL=20261215T120000Z",
    "FREQ=MONTHLY;BYDAY=3TU",
    "FREQ=WEEKLY;UNTIL=20261229",
  ];
  const [from, to] = ["2026-11-01", "2027-02-28"];

  it.each(rules)("before a day and from it on leaves every occurrence where it was: %s", (rrule) => {
    const whole = entry("2026-11-17T18:00", rrule, { exdate: ["2026-11-24T18:00", "2026-12-15T18:00"] });
    const all = list([whole], from, to);
    for (const cut of dates({ ...whole, exdate: [] }, "2026-11-18", to)) {
      const pieces = [endBefore(whole, cut), startFrom(whole, cut, "rest")];
      expect(list(pieces, from, to), cut).toEqual(all);
      expect(dates(pieces[0] ?? whole, cut, to)).toEqual([]);
      expect(pieces[1]).toMatchObject({ id: "rest", series: "pads", start: `${cut}T18:00` });
    }
  });

  it("keeps the exceptions with the part they belong to", () => {
    const whole = entry("2026-11-17T18:00", "FREQ=WEEKLY", {
      exdate: ["2026-11-24T18:00", "2026-12-15T18:00"],
    });
    expect(endBefore(whole, "2026-12-01").exdate).toEqual(["2026-11-24T18:00"]);
    expect(startFrom(whole, "2026-12-01", "rest").exdate).toEqual(["2026-12-15T18:00"]);
  });

  it("turns COUNT into what remains, and into an UNTIL before the cut", () => {
    const whole = entry("2026-11-17T18:00", "FREQ=WEEKLY;COUNT=5");
    expect(endBefore(whole, "2026-12-01").rrule).toBe("FREQ=WEEKLY;UNTIL=20261130T235959");
    expect(startFrom(whole, "2026-12-01", "rest").rrule).toBe("FREQ=WEEKLY;COUNT=3");
  });

  it("never makes a series longer than it was", () => {
    expect(endBefore(entry("2026-11-17T18:00", "FREQ=WEEKLY;COUNT=2"), "2027-03-01").rrule).toBe(
      "FREQ=WEEKLY;COUNT=2",
    );
    expect(
      endBefore(entry("2026-11-17T18:00", "FREQ=WEEKLY;UNTIL=20261201T000000"), "2027-03-01").rrule,
    ).toBe("FREQ=WEEKLY;UNTIL=20261201T000000");
  });

  it("starts the rest at its first occurrence where the day named has none", () => {
    expect(startFrom(entry("2026-11-17T18:00", "FREQ=WEEKLY"), "2026-12-03", "rest").start).toBe(
      "2026-12-08T18:00",
    );
  });

  it("says so where nothing remains", () => {
    expect(() => startFrom(entry("2026-11-17T18:00", "FREQ=WEEKLY;COUNT=2"), "2026-12-20", "rest")).toThrow(
      RecurrenceError,
    );
  });

  it("leaves a single session alone", () => {
    const one = entry("2026-11-17T18:00", null);
    expect(endBefore(one, "2026-11-20")).toBe(one);
    expect(startFrom(one, "2026-11-17", "rest")).toEqual({ ...one, id: "rest" });
  });
});
