import { describe, expect, it } from "vitest";
import { buildFeed, type Feed } from "@/lib/calendar/feed";
import { feedEvent } from "../factories/feed";

const feed = (over: Partial<Feed> = {}): string =>
  buildFeed({
    name: "Camp",
    discreet: false,
    events: [feedEvent()],
    refreshedAt: new Date("2026-11-20T08:15:30Z"),
    ...over,
  });

const lines = (text: string): string[] => text.replace(/\r\n[ \t]/g, "").split("\r\n");

describe("a feed", () => {
  it("names itself, says how often to look, and has no METHOD, which would make it an iTIP message", () => {
    const all = lines(feed({ name: "Quayside, Striking; Club" }));
    const head = all.slice(0, all.indexOf("BEGIN:VEVENT"));
    expect(head.slice(0, 3)).toEqual(["BEGIN:VCALENDAR", "VERSION:2.0", "CALSCALE:GREGORIAN"]);
    for (const line of [
      "PRODID:-//Bellward//Camp calendar//EN",
      "NAME:Quayside\\, Striking\\; Club",
      "X-WR-CALNAME:Quayside\\, Striking\\; Club",
      "REFRESH-INTERVAL;VALUE=DURATION:PT1H",
      "X-PUBLISHED-TTL:PT1H",
      "LAST-MODIFIED:20261120T081530Z",
    ]) {
      expect(
        head.filter((candidate) => candidate === line),
        line,
      ).toHaveLength(1);
    }
    expect(feed()).not.toContain("METHOD");
  });

  it("gives an event in UTC with the time of its revision", () => {
    const event = lines(
      feed({
        events: [feedEvent({ sequence: 3, place: "Hall 2, upstairs", description: "Bring\nshin pads" })],
      }),
    );
    const from = event.indexOf("BEGIN:VEVENT");
    expect(event.slice(from, event.indexOf("END:VEVENT") + 1)).toEqual([
      "BEGIN:VEVENT",
      "UID:6f0d4d0e-0000-4000-8000-000000000001",
      "SUMMARY:Pads",
      "DTSTAMP:20261120T081530Z",
      "DTSTART:20261205T180000Z",
      "DTEND:20261205T190000Z",
      "SEQUENCE:3",
      "DESCRIPTION:Bring\\nshin pads",
      "LOCATION:Hall 2\\, upstairs",
      "STATUS:CONFIRMED",
      "TRANSP:OPAQUE",
      "LAST-MODIFIED:20261120T081530Z",
      "END:VEVENT",
    ]);
  });

  it("shows a dropped session as cancelled, and neither it nor a rest day takes up time", () => {
    expect(feed({ events: [feedEvent({ cancelled: true })] })).toMatch(
      /STATUS:CANCELLED\r\nTRANSP:TRANSPARENT\r\n/,
    );
    expect(feed({ events: [feedEvent({ busy: false })] })).toMatch(
      /STATUS:CONFIRMED\r\nTRANSP:TRANSPARENT\r\n/,
    );
  });

  it("is the same bytes for the same sessions, whichever were written before", () => {
    const events = [
      feedEvent(),
      feedEvent({ uid: "6f0d4d0e-0000-4000-8000-000000000002", title: "Intervals" }),
    ];
    const first = feed({ events });
    feed({ events: [feedEvent({ title: "Another" })] });
    expect(feed({ events: structuredClone(events) })).toBe(first);
  });

  it("ends each line with CRLF and keeps it at 75 octets, whatever is in it", () => {
    const long = feed({
      name: "ž".repeat(120),
      events: [feedEvent({ title: "é".repeat(300), place: "漢".repeat(200), description: "š".repeat(500) })],
    });
    expect(long.endsWith("END:VCALENDAR\r\n")).toBe(true);
    expect(long.replaceAll("\r\n", "")).not.toMatch(/[\r\n]/);
    expect(Math.max(...long.split("\r\n").map((line) => Buffer.byteLength(line)))).toBeLessThanOrEqual(75);
  });

  it("holds at least one component, also without sessions", () => {
    const empty = lines(feed({ events: [], refreshedAt: null }));
    expect(empty.filter((line) => line.startsWith("BEGIN:"))).toEqual([
      "BEGIN:VCALENDAR",
      "BEGIN:VTIMEZONE",
      "BEGIN:STANDARD",
    ]);
    expect(empty.at(-2)).toBe("END:VCALENDAR");
    expect(empty.join()).not.toContain("LAST-MODIFIED");
  });
});

describe("a discreet feed", () => {
  it("says what kind of appointment it is and nothing more", () => {
    const events = (["lift", "sport", "bout", "weigh-in"] as const).map((source, n) =>
      feedEvent({
        uid: `u${n}`,
        source,
        title: "Secret title",
        description: "Secret text",
        place: "Secret place",
      }),
    );
    const text = feed({ name: "Calendar", discreet: true, events });
    expect(text).not.toContain("Secret");
    expect(text).not.toMatch(/LOCATION|DESCRIPTION/);
    expect(text.match(/SUMMARY:.*/g)).toEqual([
      "SUMMARY:Training",
      "SUMMARY:Sport",
      "SUMMARY:Bout",
      "SUMMARY:Appointment",
    ]);
  });

  it("and one with full titles do not get in each other's way", () => {
    expect(feed({ discreet: true })).toContain("SUMMARY:Sport");
    expect(feed()).toContain("SUMMARY:Pads");
  });
});
