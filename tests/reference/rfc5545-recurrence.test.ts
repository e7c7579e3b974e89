import { describe, expect, it } from "vitest";
import { occurrenceDays } from "@/lib/calendar/recurrence";
import { dayFromIso, isoFromDay } from "@/lib/engine";

// Source: RFC 5545, section 3.8.5.3, examples and their answers; all start at 09:00 America/New_York. Where the RFC gives UNTIL
// in UTC the last occurrence is the same on the wall clock. Open ends are cut at the last day given.

const dates = (timed: Parameters<typeof occurrenceDays>[0], from: string, to: string): string[] =>
  occurrenceDays(timed, dayFromIso(from), dayFromIso(to)).map(isoFromDay);

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
    expect(dates({ start, rrule, exdate: [] }, start.slice(0, 10), to)).toEqual(rfcDates(answer));
  });
});
