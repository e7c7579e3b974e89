import { describe, expect, it } from "vitest";
import { RecurrenceError, expandEntries, occurrenceDays } from "@/lib/calendar/recurrence";
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

describe("expanding a timetable", () => {
  it("keeps the wall clock across daylight-saving changes", () => {
    // Clocks go back in Europe on 25 October 2026 and forward on 28 March 2027.
    expect(list([entry("2026-10-20T18:00", "FREQ=WEEKLY")], "2026-10-20", "2026-11-03")).toEqual([
      "pads@2026-10-20 2026-10-20 18:00",
      "pads@2026-10-27 2026-10-27 18:00",
      "pads@2026-11-03 2026-11-03 18:00",
    ]);
    expect(list([entry("2027-03-28T02:30", "FREQ=DAILY;COUNT=1")], "2027-03-01", "2027-04-01")).toEqual([
      "pads@2027-03-28 2027-03-28 02:30",
    ]);
  });

  it("bounds a recurrence without an end by the window, both ends inclusive", () => {
    expect(dates(entry("2026-11-17T18:00", "FREQ=WEEKLY"), "2026-11-24", "2026-12-08")).toEqual([
      "2026-11-24",
      "2026-12-01",
      "2026-12-08",
    ]);
    expect(dates(entry("2026-11-17T18:00", "FREQ=WEEKLY"), "2026-01-01", "2026-11-16")).toEqual([]);
  });

  it("gives the same days for a series of long standing as for a fresh one", () => {
    expect(
      dates(
        entry("1950-01-03T18:00", "FREQ=WEEKLY;INTERVAL=3;BYDAY=MO,SU;WKST=SU"),
        "2026-11-01",
        "2026-12-31",
      ),
    ).toEqual(
      dates(
        entry("1950-01-03T18:00", "FREQ=WEEKLY;INTERVAL=3;BYDAY=MO,SU;WKST=SU;UNTIL=20261231"),
        "1950-01-01",
        "2026-12-31",
      ).filter((date) => date >= "2026-11-01"),
    );
    expect(dates(entry("1950-01-01T18:00", "FREQ=DAILY;INTERVAL=11"), "2026-11-01", "2026-11-30")).toEqual(
      dates(entry("1950-01-01T18:00", "FREQ=DAILY;INTERVAL=11"), "1950-01-01", "2026-11-30").filter(
        (date) => date >= "2026-11-01",
      ),
    );
  });

  it("gives a single session its own id and an occurrence that of its series and day, less the shift", () => {
    const moved = entry("2026-11-18T18:00", "FREQ=WEEKLY;COUNT=2", {
      id: "other",
      series: "tue",
      idShift: 1,
    });
    expect(
      list(
        [moved, entry("2026-11-19T07:00", null, { id: "run", series: "run" })],
        "2026-11-01",
        "2026-11-30",
      ),
    ).toEqual(["tue@2026-11-17 2026-11-18 18:00", "run 2026-11-19 07:00", "tue@2026-11-24 2026-11-25 18:00"]);
  });

  it("leaves out exceptions, by day and time", () => {
    const open = entry("2026-11-17T18:00", "FREQ=WEEKLY", {
      exdate: ["2026-11-24T18:00", "2026-12-01T19:00"],
    });
    expect(dates(open, "2026-11-17", "2026-12-01")).toEqual(["2026-11-17", "2026-12-01"]);
    expect(
      dates(entry("2026-11-17T18:00", null, { exdate: ["2026-11-17T18:00"] }), "2026-11-01", "2026-11-30"),
    ).toEqual([]);
  });

  it("orders by day, start and id, whatever the order of entries", () => {
    const one = entry("2026-11-17T18:00", null, { id: "b" });
    const two = entry("2026-11-17T18:00", null, { id: "a" });
    const three = entry("2026-11-17T07:00", null, { id: "c" });
    const ids = (entries: SportEntry[]) =>
      expandEntries(entries, dayFromIso("2026-11-17"), dayFromIso("2026-11-17")).map((s) => s.id);
    expect(ids([one, two, three])).toEqual(["c", "a", "b"]);
    expect(ids([three, two, one])).toEqual(["c", "a", "b"]);
  });

  it("takes a date as UNTIL for the whole of that day", () => {
    expect(dates(entry("2026-11-17T18:00", "FREQ=DAILY;UNTIL=20261119"), "2026-11-01", "2026-11-30")).toEqual(
      ["2026-11-17", "2026-11-18", "2026-11-19"],
    );
    expect(
      dates(entry("2026-11-17T18:00", "FREQ=DAILY;UNTIL=20261119T175900"), "2026-11-01", "2026-11-30"),
    ).toEqual(["2026-11-17", "2026-11-18"]);
    expect(
      dates(entry("2026-11-17T18:00", "FREQ=DAILY;UNTIL=20261119T180000"), "2026-11-01", "2026-11-30"),
    ).toHaveLength(3);
  });
});

describe("a recurrence that cannot be expanded", () => {
  const refusal = (
    entries: readonly SportEntry[],
    from = "2026-11-15",
    to = "2027-01-09",
  ): RecurrenceError => {
    try {
      expandEntries(entries, dayFromIso(from), dayFromIso(to));
    } catch (error) {
      if (error instanceof RecurrenceError) return error;
      throw error;
    }
    throw new Error("It was expanded.");
  };
  const fine = entry("2026-11-17T18:00", "FREQ=WEEKLY");

  it.each([
    "",
    "weekly",
    "FREQ=",
    "FREQ=FORTNIGHTLY",
    "INTERVAL=2",
    "FREQ=DAILY;FREQ=WEEKLY",
    "FREQ=DAILY;",
    "FREQ=DAILY;INTERVAL=0",
    "FREQ=DAILY;INTERVAL=-1",
    "FREQ=DAILY;COUNT=0",
    "FREQ=DAILY;COUNT=x",
    "FREQ=DAILY;COUNT=3;UNTIL=20261224",
    "FREQ=DAILY;UNTIL=tomorrow",
    "FREQ=DAILY;UNTIL=20260229",
    "FREQ=WEEKLY;BYDAY=XX",
    "FREQ=WEEKLY;BYDAY=",
    "FREQ=WEEKLY;BYDAY=1MO",
    "FREQ=WEEKLY;BYMONTHDAY=3",
    "FREQ=MONTHLY;BYWEEKNO=3",
    "FREQ=DAILY;BYYEARDAY=3",
    "FREQ=YEARLY;BYMONTH=13",
    "FREQ=MONTHLY;BYMONTHDAY=32",
    "FREQ=MONTHLY;BYMONTHDAY=0",
    "FREQ=DAILY;BYSETPOS=1",
    "FREQ=DAILY;WKST=1",
    "FREQ=DAILY;BYEASTER=0",
    "FREQ=DAILY\r\nRRULE:FREQ=WEEKLY",
    "DTSTART=20260101T000000Z;FREQ=DAILY",
    "RRULE:FREQ=DAILY",
    "FREQ=DAILY;__PROTO__=1",
    "FREQ=DAILY;CONSTRUCTOR=1",
    "FREQ=DAILY=1",
  ])("is refused with its place: %j", (rrule) => {
    const error = refusal([fine, entry("2026-11-17T18:00", rrule)]);
    expect(error).toMatchObject({ entryIndex: 1, pointerField: "rrule" });
    expect(error.message).toMatch(/\.$/);
  });

  it.each([
    "FREQ=HOURLY",
    "FREQ=MINUTELY;COUNT=3",
    "FREQ=SECONDLY",
    "FREQ=DAILY;BYHOUR=9,18",
    "FREQ=WEEKLY;BYMINUTE=0,30",
  ])("may not be finer than daily: %s", (rrule) => {
    expect(refusal([entry("2026-11-17T18:00", rrule)]).message).toMatch(/daily at most/);
  });

  it("says at most 2,000 occurrences, by its count or by the whole timetable within the camp", () => {
    expect(refusal([entry("2026-11-17T18:00", "FREQ=DAILY;COUNT=2001")])).toMatchObject({
      entryIndex: 0,
      pointerField: "rrule",
      message: expect.stringContaining("2,000"),
    });
    expect(
      dates(entry("2026-11-17T18:00", "FREQ=DAILY;COUNT=2000"), "2026-11-17", "2040-01-01"),
    ).toHaveLength(2000);
    const daily = Array.from({ length: 40 }, (_, n) =>
      entry("2026-11-15T18:00", "FREQ=DAILY", { id: `d${n}`, series: `d${n}` }),
    );
    // 56 days: 35 daily series are 1,960 sessions, 36 are 2,016.
    expect(refusal(daily)).toMatchObject({ entryIndex: 35, message: expect.stringContaining("2,000") });
    expect(
      expandEntries(daily.slice(0, 35), dayFromIso("2026-11-15"), dayFromIso("2027-01-09")),
    ).toHaveLength(1960);
  });

  it.each([
    "FREQ=DAILY;BYMONTH=2;BYMONTHDAY=30",
    "FREQ=MONTHLY;BYMONTH=4;BYMONTHDAY=31",
    "FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=30",
    "FREQ=DAILY;INTERVAL=7;BYDAY=MO",
    "FREQ=YEARLY;BYWEEKNO=2;BYMONTH=7",
    "FREQ=WEEKLY;BYDAY=TU;BYSETPOS=2",
    "FREQ=DAILY;BYMONTH=2;BYMONTHDAY=30;COUNT=5",
  ])("is refused where it never falls on a day, without searching to the end of time: %s", (rrule) =>
    expect(refusal([entry("2026-11-17T18:00", rrule)])).toMatchObject({
      pointerField: "rrule",
      message: expect.stringContaining("never"),
    }),
  );

  it("is not one that falls outside the window, on 29 February only, or that has ended", () => {
    for (const rrule of [
      "FREQ=YEARLY;BYMONTH=2;BYMONTHDAY=29",
      "FREQ=DAILY;UNTIL=20261118",
      "FREQ=DAILY;COUNT=2",
    ]) {
      expect(dates(entry("2026-11-17T18:00", rrule), "2026-12-01", "2027-01-09")).toEqual([]);
    }
  });

  it("bounds the work of a whole timetable, however far back its series begin", () => {
    const ancient = Array.from({ length: 500 }, (_, n) =>
      entry("0001-01-01T18:00", "FREQ=MONTHLY", { id: `a${n}`, series: `a${n}` }),
    );
    expect(refusal(ancient)).toMatchObject({ pointerField: "start" });
  });

  it("names a start or an exception that is no date", () => {
    expect(refusal([entry("2026-02-30T18:00", "FREQ=WEEKLY")])).toMatchObject({ pointerField: "start" });
    expect(refusal([fine, entry("2026-11-17T18:00", null, { exdate: ["next week"] })])).toMatchObject({
      entryIndex: 1,
      pointerField: "exdate",
    });
  });
});
