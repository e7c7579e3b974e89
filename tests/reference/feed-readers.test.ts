import { describe, expect, it } from "vitest";
import { sessionsOf } from "@/db/mappers/sessions";
import { planBook } from "@/lib/book";
import { buildFeed, type FeedEvent } from "@/lib/calendar/feed";
import { instantOf } from "@/lib/calendar/zones";
import type { CampBook } from "@/lib/schemas/camp-book";
import { eventsOf } from "@/lib/services/feeds/events";
import { campBook, hardSparring, weekly } from "../factories/camp-book";
import { feedEvent } from "../factories/feed";
import { readWithIcalJs, readWithPython, type ReadEvent } from "./calendar-readers";

const READERS = [
  ["ical.js", readWithIcalJs],
  ["python3-icalendar", readWithPython],
] as const;

const CHANGED = new Date("2026-09-20T08:15:30Z");
const instant = (date: Date): string => date.toISOString().replace(".000Z", "Z");

/** The clock on the wall of a zone, as the runtime writes it. */
function wall(zone: string, at: string): string {
  const text = new Intl.DateTimeFormat("sv-SE", {
    timeZone: zone,
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
    hour: "2-digit",
    minute: "2-digit",
  }).format(new Date(at));
  return text.replace(" ", "T");
}

/** The calendar of a planned camp as its athlete gets it, and the rows behind it by UID. */
function campFeed(book: CampBook) {
  const { input, plan } = planBook(book, instantOf(new Date("2026-08-01T12:00:00Z")));
  const planned = sessionsOf(book, input, plan);
  const athleteId = "0b9a52c4-0000-4000-8000-000000000000";
  const rows = planned.map((session, n) => ({
    ...session,
    uid: `0b9a52c4-0000-4000-8000-${String(n).padStart(12, "0")}`,
    status: "confirmed" as const,
    sequence: n % 4,
    changedAt: CHANGED,
    athleteId,
    athleteName: "Tamsin Velloso",
    boutZone: book.bout.timeZone,
  }));
  const events = eventsOf(rows, { role: "athlete", athleteId }, "athlete");
  const text = buildFeed({
    name: "Tamsin Velloso, Quayside Striking Club",
    discreet: false,
    events,
    refreshedAt: CHANGED,
  });
  return { text, events, planned: new Map(rows.map((session) => [session.uid, session])) };
}

const expected = (event: FeedEvent): Omit<ReadEvent, "properties"> => ({
  uid: event.uid,
  title: event.title,
  description: event.description,
  place: event.place,
  start: instant(event.startsAt),
  end: instant(event.endsAt),
  stamp: instant(event.changedAt),
  sequence: event.sequence,
  status: event.cancelled ? "CANCELLED" : "CONFIRMED",
  transp: event.busy && !event.cancelled ? "OPAQUE" : "TRANSPARENT",
});

const withoutNames = ({ properties: _, ...event }: ReadEvent) => event;

// Eight weeks in Zagreb to 14 November 2026: clocks go back on 25 October.
const acrossDst = campBook({
  homeZone: "Europe/Zagreb",
  bout: { ...campBook().bout, date: "2026-11-14", timeZone: "Europe/Zagreb" },
  weighIn: { date: "2026-11-13", time: "11:00" },
  sport: [
    hardSparring("tue", "2026-09-22T18:00", { place: "Gym, hall 2" }),
    weekly("sun", "2026-09-20T02:30", { title: "Roadwork, before dawn", kind: "conditioning" }),
  ],
});

// Eight weeks in Lisbon; on 8 November the athlete travels to New York, where clocks went back on 1 November.
const abroad = campBook({
  bout: { ...campBook().bout, date: "2026-11-14", timeZone: "America/New_York", place: "Pier Nine Arena" },
  weighIn: { date: "2026-11-13", time: "12:00" },
  sport: [
    hardSparring("tue", "2026-09-22T18:00", { rrule: "FREQ=WEEKLY;UNTIL=20261103" }),
    weekly("wed", "2026-09-23T18:00"),
    weekly("journey", "2026-11-08T09:00", {
      kind: "travel",
      title: "Flight",
      minutes: 600,
      effort: 0,
      rrule: null,
    }),
  ],
});

describe.each(READERS)("%s reads", (_, read) => {
  it.each([
    ["a camp that crosses a daylight-saving change", acrossDst, () => "Europe/Zagreb"],
    [
      "a camp whose bout is in another zone",
      abroad,
      (day: string) => (day > "2026-11-08" ? "America/New_York" : "Europe/Lisbon"),
    ],
  ])(
    "%s as it was planned: every session whole, at its time on the wall of the place where it is",
    (__, book, zoneOn) => {
      const { text, events, planned } = campFeed(book);
      const calendar = read(text);
      expect(calendar.events.map(withoutNames)).toEqual(events.map(expected));
      expect(calendar.events.length).toBeGreaterThan(30);
      for (const event of calendar.events) {
        const session = planned.get(event.uid);
        expect(wall(zoneOn(session?.day ?? ""), event.start), event.title).toBe(
          `${session?.day}T${session?.start}`,
        );
        expect((Date.parse(event.end) - Date.parse(event.start)) / 60_000).toBe(session?.minutes);
      }
    },
  );

  it("sessions at one o'clock of the wall on both sides of a change an hour apart in UTC", () => {
    const starts = read(campFeed(acrossDst).text)
      .events.filter((event) => event.title === "Hard sparring")
      .map((event) => event.start);
    expect(starts).toContain("2026-10-20T16:00:00Z");
    expect(starts).toContain("2026-10-27T17:00:00Z");
    // 25 October has 02:30 twice: the first.
    expect(read(campFeed(acrossDst).text).events.map((event) => event.start)).toContain(
      "2026-10-25T00:30:00Z",
    );
  });

  it("the bout abroad at the venue's time, and says what that is there", () => {
    const bout = read(campFeed(abroad).text).events.at(-1);
    expect(bout).toMatchObject({
      title: "Bout v Petra Holm-Aziz",
      start: "2026-11-15T01:30:00Z",
      place: "Pier Nine Arena",
    });
    expect(bout?.description).toBe("Sat 14 Nov 20:30 on the clock there (America/New_York)");
  });

  const TITLES: [what: string, title: string, read: string][] = [
    [
      "a line break that would end the event",
      "Pads\r\nEND:VEVENT\r\nEND:VCALENDAR\r\nATTENDEE:mailto:x@y.example",
      "Pads\nEND:VEVENT\nEND:VCALENDAR\nATTENDEE:mailto:x@y.example",
    ],
    ["a lone carriage return", "Pads\rX-INJECTED:1", "Pads\nX-INJECTED:1"],
    ["a lone line feed", "Pads\nX-INJECTED:1", "Pads\nX-INJECTED:1"],
    ["a line break that looks like a fold", "Pads\r\n X-INJECTED:1", "Pads\n X-INJECTED:1"],
    ["Unicode's own line breaks", "Pads\u2028X-INJECTED:1\u0085END:VEVENT", "Pads\nX-INJECTED:1\nEND:VEVENT"],
    ["commas, semicolons and backslashes", "Squat; 3x5, 85% \\ note", "Squat; 3x5, 85% \\ note"],
    ["quotes, colons and equals signs", 'Pads: "hard"; A=B:C', 'Pads: "hard"; A=B:C'],
    [
      "emoji of several code points",
      "Pads \u{1F94A}\u{1F469}\u{1F3FD}\u200D\u{1F680}",
      "Pads \u{1F94A}\u{1F469}\u{1F3FD}\u200D\u{1F680}",
    ],
    ["300 letters of two octets", "é".repeat(300), "é".repeat(300)],
    ["300 emoji", "\u{1F94A}".repeat(300), "\u{1F94A}".repeat(300)],
    ["300 characters with something to escape at each fold", "a,;".repeat(100), "a,;".repeat(100)],
    ["control characters", "Pa\u0000d\u0007s\u001b[31m", "Pads[31m"],
    ["letters of many scripts", "Boks 拳 бокс ملاكمة čćžšđ", "Boks 拳 бокс ملاكمة čćžšđ"],
  ];
  it.each(TITLES)("%s as text that stays whole and injects nothing", (__, title, expectedTitle) => {
    const events = [
      feedEvent({ uid: "before" }),
      feedEvent({ uid: "it", title, place: title, description: title }),
      feedEvent({ uid: "after" }),
    ];
    const calendar = read(buildFeed({ name: title, discreet: false, events, refreshedAt: CHANGED }));
    if (calendar.name !== null) expect(calendar.name).toBe(expectedTitle);
    expect(calendar.components).toEqual(["VEVENT", "VEVENT", "VEVENT"]);
    expect(calendar.properties).toEqual([
      "CALSCALE",
      "LAST-MODIFIED",
      "NAME",
      "PRODID",
      "REFRESH-INTERVAL",
      "VERSION",
      "X-PUBLISHED-TTL",
      "X-WR-CALNAME",
    ]);
    expect(calendar.events.map((event) => event.uid)).toEqual(["before", "it", "after"]);
    expect(calendar.events[1]).toMatchObject({
      title: expectedTitle,
      place: expectedTitle,
      description: expectedTitle,
    });
    expect(calendar.events[1]?.properties).toEqual([
      "DESCRIPTION",
      "DTEND",
      "DTSTAMP",
      "DTSTART",
      "LAST-MODIFIED",
      "LOCATION",
      "SEQUENCE",
      "STATUS",
      "SUMMARY",
      "TRANSP",
      "UID",
    ]);
  });

  it("a cancelled session as cancelled, and a camp without sessions as an empty calendar", () => {
    const dropped = read(
      buildFeed({
        name: "Camp",
        discreet: false,
        events: [feedEvent({ cancelled: true, sequence: 2 })],
        refreshedAt: null,
      }),
    );
    expect(dropped.events[0]).toMatchObject({ status: "CANCELLED", sequence: 2, transp: "TRANSPARENT" });
    expect(read(buildFeed({ name: "Camp", discreet: false, events: [], refreshedAt: null })).events).toEqual(
      [],
    );
  });
});

it.each(["C:\\new \\N", "two \\\\ of them", "\\, and \\; as they are"])(
  "%j is told from what it would be unescaped",
  (title) => {
    // Read by ical.js alone: python3-icalendar 4.0.3 unescapes in several passes, and what one leaves the next takes.
    const text = buildFeed({
      name: "Camp",
      discreet: false,
      events: [feedEvent({ title })],
      refreshedAt: null,
    });
    expect(readWithIcalJs(text).events[0]?.title).toBe(title);
  },
);
