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

/** `1997: 9/2-11` is 2 to 11 September 1997; the notation of the RFC's own answers. */
function rfcDates(text: string): string[] {
  const answer: string[] = [];
  for (const yearText of text.split("|")) {
    const [year = "", rest = ""] = yearText.trim().split(":");
    for (const monthText of rest.trim().split(" ")) {
      const [month = "", days = ""] = monthText.split("/");
      for (const span of days.split(",")) {
        const [first, last] = span.split("-").map(Number);
        for (let d = first ?? 0; d <= (last ?? first ?? 0); d++)
          answer.push(`${year}-${month.padStart(2, "0")}-${String(d).padStart(2, "0")}`);
      }
    }
  }
  return answer;
}

describe("the examples of RFC 5545, section 3.8.5.3", () => {
  const table: [what: string, start: string, rrule: string, to: string, answer: string][] = [
    ["daily for 10 occurrences", "1997-09-02T09:00", "FREQ=DAILY;COUNT=10", "1999-12-31", "1997: 9/2-11"],
    [
      "daily until 24 December",
      "1997-09-02T09:00",
      "FREQ=DAILY;UNTIL=19971224T000000Z",
      "1999-12-31",
      "1997: 9/2-30 10/1-31 11/1-30 12/1-23",
    ],
    [
      "every other day",
      "1997-09-02T09:00",
      "FREQ=DAILY;INTERVAL=2",
      "1997-09-30",
      "1997: 9/2,4,6,8,10,12,14,16,18,20,22,24,26,28,30",
    ],
    [
      "every 10 days, 5 occurrences",
      "1997-09-02T09:00",
      "FREQ=DAILY;INTERVAL=10;COUNT=5",
      "1999-12-31",
      "1997: 9/2,12,22 10/2,12",
    ],
    [
      "every day in January, for 3 years",
      "1998-01-01T09:00",
      "FREQ=DAILY;UNTIL=20000131T140000Z;BYMONTH=1",
      "2001-12-31",
      "1998: 1/1-31 | 1999: 1/1-31 | 2000: 1/1-31",
    ],
    [
      "every day in January, by year",
      "1998-01-01T09:00",
      "FREQ=YEARLY;UNTIL=20000131T140000Z;BYMONTH=1;BYDAY=SU,MO,TU,WE,TH,FR,SA",
      "2001-12-31",
      "1998: 1/1-31 | 1999: 1/1-31 | 2000: 1/1-31",
    ],
    [
      "weekly for 10 occurrences",
      "1997-09-02T09:00",
      "FREQ=WEEKLY;COUNT=10",
      "1999-12-31",
      "1997: 9/2,9,16,23,30 10/7,14,21,28 11/4",
    ],
    [
      "every other week, weeks from Sunday",
      "1997-09-02T09:00",
      "FREQ=WEEKLY;INTERVAL=2;WKST=SU",
      "1998-01-31",
      "1997: 9/2,16,30 10/14,28 11/11,25 12/9,23 | 1998: 1/6,20",
    ],
    [
      "Tuesday and Thursday for 5 weeks",
      "1997-09-02T09:00",
      "FREQ=WEEKLY;COUNT=10;WKST=SU;BYDAY=TU,TH",
      "1999-12-31",
      "1997: 9/2,4,9,11,16,18,23,25,30 10/2",
    ],
    [
      "every other week on Monday, Wednesday and Friday",
      "1997-09-01T09:00",
      "FREQ=WEEKLY;INTERVAL=2;UNTIL=19971224T000000Z;WKST=SU;BYDAY=MO,WE,FR",
      "1999-12-31",
      "1997: 9/1,3,5,15,17,19,29 10/1,3,13,15,17,27,29,31 11/10,12,14,24,26,28 12/8,10,12,22",
    ],
    [
      "monthly on the first Friday",
      "1997-09-05T09:00",
      "FREQ=MONTHLY;COUNT=10;BYDAY=1FR",
      "1999-12-31",
      "1997: 9/5 10/3 11/7 12/5 | 1998: 1/2 2/6 3/6 4/3 5/1 6/5",
    ],
    [
      "every other month on the first and last Sunday",
      "1997-09-07T09:00",
      "FREQ=MONTHLY;INTERVAL=2;COUNT=10;BYDAY=1SU,-1SU",
      "1999-12-31",
      "1997: 9/7,28 11/2,30 | 1998: 1/4,25 3/1,29 5/3,31",
    ],
    [
      "the second-to-last Monday of the month",
      "1997-09-22T09:00",
      "FREQ=MONTHLY;COUNT=6;BYDAY=-2MO",
      "1999-12-31",
      "1997: 9/22 10/20 11/17 12/22 | 1998: 1/19 2/16",
    ],
    [
      "the third-to-last day of the month",
      "1997-09-28T09:00",
      "FREQ=MONTHLY;BYMONTHDAY=-3",
      "1998-02-28",
      "1997: 9/28 10/29 11/28 12/29 | 1998: 1/29 2/26",
    ],
    [
      "the 2nd and 15th of the month",
      "1997-09-02T09:00",
      "FREQ=MONTHLY;COUNT=10;BYMONTHDAY=2,15",
      "1999-12-31",
      "1997: 9/2,15 10/2,15 11/2,15 12/2,15 | 1998: 1/2,15",
    ],
    [
      "the first and last day of the month",
      "1997-09-30T09:00",
      "FREQ=MONTHLY;COUNT=10;BYMONTHDAY=1,-1",
      "1999-12-31",
      "1997: 9/30 10/1,31 11/1,30 12/1,31 | 1998: 1/1,31 2/1",
    ],
    [
      "every 18 months on the 10th to 15th",
      "1997-09-10T09:00",
      "FREQ=MONTHLY;INTERVAL=18;COUNT=10;BYMONTHDAY=10,11,12,13,14,15",
      "2000-12-31",
      "1997: 9/10-15 | 1999: 3/10-13",
    ],
    [
      "every Tuesday, every other month",
      "1997-09-02T09:00",
      "FREQ=MONTHLY;INTERVAL=2;BYDAY=TU",
      "1998-03-31",
      "1997: 9/2,9,16,23,30 11/4,11,18,25 | 1998: 1/6,13,20,27 3/3,10,17,24,31",
    ],
    [
      "yearly in June and July",
      "1997-06-10T09:00",
      "FREQ=YEARLY;COUNT=10;BYMONTH=6,7",
      "2002-12-31",
      "1997: 6/10 7/10 | 1998: 6/10 7/10 | 1999: 6/10 7/10 | 2000: 6/10 7/10 | 2001: 6/10 7/10",
    ],
    [
      "every third year on days 1, 100 and 200",
      "1997-01-01T09:00",
      "FREQ=YEARLY;INTERVAL=3;COUNT=10;BYYEARDAY=1,100,200",
      "2010-12-31",
      "1997: 1/1 4/10 7/19 | 2000: 1/1 4/9 7/18 | 2003: 1/1 4/10 7/19 | 2006: 1/1",
    ],
    [
      "every 20th Monday of the year",
      "1997-05-19T09:00",
      "FREQ=YEARLY;BYDAY=20MO",
      "1999-12-31",
      "1997: 5/19 | 1998: 5/18 | 1999: 5/17",
    ],
    [
      "Monday of week 20",
      "1997-05-12T09:00",
      "FREQ=YEARLY;BYWEEKNO=20;BYDAY=MO",
      "1999-12-31",
      "1997: 5/12 | 1998: 5/11 | 1999: 5/17",
    ],
    [
      "Friday the 13th",
      "1997-09-02T09:00",
      "FREQ=MONTHLY;BYDAY=FR;BYMONTHDAY=13",
      "2000-12-31",
      "1998: 2/13 3/13 11/13 | 1999: 8/13 | 2000: 10/13",
    ],
    [
      "the third Tuesday to Thursday of the month, 3 times",
      "1997-09-04T09:00",
      "FREQ=MONTHLY;COUNT=3;BYDAY=TU,WE,TH;BYSETPOS=3",
      "1999-12-31",
      "1997: 9/4 10/7 11/6",
    ],
    [
      "the second-to-last weekday of the month",
      "1997-09-29T09:00",
      "FREQ=MONTHLY;BYDAY=MO,TU,WE,TH,FR;BYSETPOS=-2",
      "1998-03-31",
      "1997: 9/29 10/30 11/27 12/30 | 1998: 1/29 2/26 3/30",
    ],
    [
      "every other week with weeks from Monday",
      "1997-08-05T09:00",
      "FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=MO",
      "1997-12-31",
      "1997: 8/5,10,19,24",
    ],
    [
      "every other week with weeks from Sunday",
      "1997-08-05T09:00",
      "FREQ=WEEKLY;INTERVAL=2;COUNT=4;BYDAY=TU,SU;WKST=SU",
      "1997-12-31",
      "1997: 8/5,17,19,31",
    ],
    [
      "days that do not exist are left out",
      "2007-01-15T09:00",
      "FREQ=MONTHLY;BYMONTHDAY=15,30;COUNT=5",
      "2007-12-31",
      "2007: 1/15,30 2/15 3/15,30",
    ],
  ];
  it.each(table)("%s", (_, start, rrule, to, answer) => {
    expect(dates(entry(start, rrule), start.slice(0, 10), to)).toEqual(rfcDates(answer));
  });
});

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
