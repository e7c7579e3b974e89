import { describe, expect, it } from "vitest";
import { civilNow, dateOf, instantOf, isTimeZone, offsetSteps } from "@/lib/calendar/zones";
import { dayFromIso, instantAt, isoFromDay, minuteFromHhmm } from "@/lib/engine";
import type { Day, OffsetStep } from "@/lib/engine/types";

const day = dayFromIso;
const plus = (from: Day, days: number): Day => (from + days) as Day;

const stepsOf = (zone: string, from: string, to: string): OffsetStep[] =>
  offsetSteps({ homeZone: zone, venueZone: zone, from: day(from), to: day(to), venueFrom: day(to) });

const utc = (steps: readonly OffsetStep[], local: string): string =>
  dateOf(instantAt(steps, day(local.slice(0, 10)), minuteFromHhmm(local.slice(11))))
    .toISOString()
    .slice(0, 16);

/** The wall clock of a zone as the runtime writes it: a reading that does not pass through the code under test. */
function wall(zone: string, date: Date): string {
  const parts = new Intl.DateTimeFormat("en-GB", {
    timeZone: zone,
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
    hour: "2-digit",
    minute: "2-digit",
    hourCycle: "h23",
  }).formatToParts(date);
  const part = (type: string) => parts.find((candidate) => candidate.type === type)?.value ?? "";
  return `${part("year")}-${part("month")}-${part("day")}T${part("hour")}:${part("minute")}`;
}

describe("a zone's transitions", () => {
  // Source of the instants: IANA time zone database, files europe, northamerica, australasia and asia.
  const table: [zone: string, local: string, instant: string, what: string][] = [
    ["Europe/Zagreb", "2026-10-24T18:00", "2026-10-24T16:00", "summer time before the change"],
    ["Europe/Zagreb", "2026-10-25T01:59", "2026-10-24T23:59", "the last minute before the overlap"],
    ["Europe/Zagreb", "2026-10-25T02:30", "2026-10-25T00:30", "in the overlap: the first of two readings"],
    ["Europe/Zagreb", "2026-10-25T03:00", "2026-10-25T02:00", "the first minute after the overlap"],
    ["Europe/Zagreb", "2027-03-28T01:59", "2027-03-28T00:59", "the last minute before the gap"],
    ["Europe/Zagreb", "2027-03-28T02:30", "2027-03-28T01:30", "in the gap: forward by the gap, to 03:30"],
    ["Europe/Zagreb", "2027-03-28T03:00", "2027-03-28T01:00", "the first minute after the gap"],
    ["America/New_York", "2026-11-01T01:30", "2026-11-01T05:30", "in the overlap: the first of two readings"],
    ["America/New_York", "2026-11-01T02:00", "2026-11-01T07:00", "after the overlap"],
    ["America/New_York", "2027-03-14T02:15", "2027-03-14T07:15", "in the gap: forward by the gap, to 03:15"],
    ["Australia/Lord_Howe", "2026-10-04T02:10", "2026-10-03T15:40", "in a gap of 30 minutes, to 02:40"],
    ["Australia/Lord_Howe", "2026-10-04T02:30", "2026-10-03T15:30", "after a gap of 30 minutes"],
    ["Australia/Lord_Howe", "2027-04-04T01:45", "2027-04-03T14:45", "in an overlap of 30 minutes"],
    ["Australia/Lord_Howe", "2027-04-04T02:00", "2027-04-03T15:30", "after an overlap of 30 minutes"],
    ["Pacific/Apia", "2011-12-29T18:00", "2011-12-30T04:00", "the evening before the day that was left out"],
    [
      "Pacific/Apia",
      "2011-12-30T18:00",
      "2011-12-31T04:00",
      "on the day that was left out: forward by a day",
    ],
    ["Pacific/Apia", "2011-12-31T18:00", "2011-12-31T04:00", "after the day that was left out"],
    [
      "Pacific/Apia",
      "2026-12-31T18:00",
      "2026-12-31T05:00",
      "13 hours ahead, without summer time since 2021",
    ],
    ["Asia/Kolkata", "2027-01-09T20:30", "2027-01-09T15:00", "half an hour off the full ones"],
  ];
  it.each(table)("%s %s is %s UTC: %s", (zone, local, instant) => {
    const middle = day(local.slice(0, 10));
    const steps = stepsOf(zone, isoFromDay(plus(middle, -60)), isoFromDay(plus(middle, 60)));
    expect(utc(steps, local)).toBe(instant);
  });

  const zones = [
    "Europe/Zagreb",
    "America/New_York",
    "Australia/Lord_Howe",
    "Pacific/Apia",
    "Asia/Kolkata",
    "Africa/Casablanca",
    "Pacific/Chatham",
    "America/St_Johns",
    "UTC",
  ];
  it.each(zones)("%s: each wall time of two years reads back from its instant, or lies in a gap", (zone) => {
    const [from, to] = [day("2026-01-01"), day("2027-12-31")];
    const steps = offsetSteps({ homeZone: zone, venueZone: zone, from, to, venueFrom: from });
    let inGaps = 0;
    for (let at = from; at <= to; at = plus(at, 1)) {
      for (const time of ["00:00", "01:00", "01:45", "02:00", "02:20", "02:45", "03:00", "12:00", "23:59"]) {
        const local = `${isoFromDay(at)}T${time}`;
        const read = wall(zone, dateOf(instantAt(steps, at, minuteFromHhmm(time))));
        if (read === local) continue;
        const forward = Date.parse(`${read}Z`) - Date.parse(`${local}Z`);
        // Only at a transition, and forward by no more than an hour.
        expect(forward, local).toBeGreaterThan(0);
        expect(forward, local).toBeLessThanOrEqual(3_600_000);
        inGaps++;
      }
    }
    expect(inGaps).toBeLessThanOrEqual(2 * 9);
  });

  it("are steps in order, the first of which holds for all before it", () => {
    const steps = stepsOf("Europe/Zagreb", "2026-09-01", "2027-06-01");
    expect(steps.map((step) => step.offset)).toEqual([120, 60, 120]);
    expect(steps.map((step) => step.from)).toEqual(steps.map((step) => step.from).toSorted((a, b) => a - b));
  });
});

describe("travel to a bout in another zone", () => {
  const camp = (venueFrom: string, homeZone = "Europe/Lisbon", venueZone = "America/New_York") =>
    offsetSteps({
      homeZone,
      venueZone,
      from: day("2026-09-20"),
      to: day("2026-11-20"),
      venueFrom: day(venueFrom),
    });

  it("changes zones at the midnight that begins the first day at the venue", () => {
    const steps = camp("2026-11-10");
    expect(utc(steps, "2026-11-09T23:59")).toBe("2026-11-09T23:59");
    expect(utc(steps, "2026-11-10T00:00")).toBe("2026-11-10T05:00");
  });

  it("keeps a change of the home zone before the journey and leaves out the venue's", () => {
    const steps = camp("2026-11-10");
    expect(utc(steps, "2026-10-24T18:00")).toBe("2026-10-24T17:00");
    expect(utc(steps, "2026-10-26T18:00")).toBe("2026-10-26T18:00");
    expect(steps).toHaveLength(3);
  });

  it("takes the venue's change after the journey and none of the home zone's", () => {
    const steps = camp("2026-10-20");
    expect(utc(steps, "2026-10-19T18:00")).toBe("2026-10-19T17:00");
    expect(utc(steps, "2026-10-26T18:00")).toBe("2026-10-26T22:00");
    expect(utc(steps, "2026-11-02T18:00")).toBe("2026-11-02T23:00");
  });

  it.each(["2026-10-24", "2026-10-25", "2026-10-26", "2026-10-31", "2026-11-01", "2026-11-02"])(
    "holds on the wall clock of the place where the athlete is, also with the journey on %s, next to a change",
    (venueFrom) => {
      const steps = camp(venueFrom);
      for (let at = day("2026-10-20"); at <= day("2026-11-05"); at = plus(at, 1)) {
        const zone = at < day(venueFrom) ? "Europe/Lisbon" : "America/New_York";
        for (const time of ["00:00", "00:30", "03:30", "12:00", "23:30"]) {
          const local = `${isoFromDay(at)}T${time}`;
          expect(wall(zone, dateOf(instantAt(steps, at, minuteFromHhmm(time)))), local).toBe(local);
        }
      }
    },
  );

  it("is at the venue from the first day on where the journey lies before the camp, and at home to the end where it lies after", () => {
    expect(utc(camp("2026-01-01"), "2026-09-20T12:00")).toBe("2026-09-20T16:00");
    expect(utc(camp("2027-01-01"), "2026-11-20T12:00")).toBe("2026-11-20T12:00");
  });
});

describe("now", () => {
  it("is read off the wall of the zone, on either side of the date line", () => {
    const now = new Date("2026-12-31T10:30:59Z");
    const read = (zone: string) => {
      const { day: today, minute } = civilNow(zone, now);
      return `${isoFromDay(today)} ${minute}`;
    };
    expect(read("UTC")).toBe("2026-12-31 630");
    expect(read("Pacific/Apia")).toBe(`2026-12-31 ${23 * 60 + 30}`);
    expect(read("Pacific/Kiritimati")).toBe("2027-01-01 30");
    expect(read("America/St_Johns")).toBe("2026-12-31 420");
  });

  it("is a whole minute, the begun one counted as not yet over", () => {
    expect(instantOf(new Date("1970-01-01T00:01:59.999Z"))).toBe(1);
    expect(instantOf(new Date("1969-12-31T23:59:59.999Z"))).toBe(-1);
    expect(dateOf(instantOf(new Date("2026-12-31T10:30:00Z"))).toISOString()).toBe(
      "2026-12-31T10:30:00.000Z",
    );
  });
});

it("knows the zones of the database and refuses other names", () => {
  for (const zone of ["Europe/Zagreb", "Asia/Kolkata", "UTC"]) expect(isTimeZone(zone)).toBe(true);
  for (const zone of ["", "Europe/Nowhere", "Zagreb", "Europe/Zagreb ", "../etc/localtime"])
    expect(isTimeZone(zone), zone).toBe(false);
  const nowhere = {
    homeZone: "Europe/Nowhere",
    venueZone: "UTC",
    from: day("2026-01-01"),
    to: day("2026-01-02"),
    venueFrom: day("2026-01-02"),
  };
  expect(() => offsetSteps(nowhere)).toThrow(RangeError);
});
