import { describe, expect, it } from "vitest";
import { nextDigest } from "@/lib/mail/digest-time";

describe("the daily mail", () => {
  it.each([
    ["before six: today", "2026-12-01T05:59:00Z", "UTC", "2026-12-01T06:00:00.000Z"],
    ["at six sharp: tomorrow", "2026-12-01T06:00:00Z", "UTC", "2026-12-02T06:00:00.000Z"],
    ["after six: tomorrow", "2026-12-01T06:00:01Z", "UTC", "2026-12-02T06:00:00.000Z"],
    [
      "in the reader's zone, half hours too",
      "2026-12-01T00:00:00Z",
      "Asia/Kolkata",
      "2026-12-01T00:30:00.000Z",
    ],
    [
      "in the reader's zone, a day ahead of UTC",
      "2026-12-01T17:00:00Z",
      "Pacific/Apia",
      "2026-12-02T17:00:00.000Z",
    ],
    [
      "over the night when clocks go forward",
      "2026-03-28T12:00:00Z",
      "Europe/Lisbon",
      "2026-03-29T05:00:00.000Z",
    ],
    [
      "over the night when clocks go back",
      "2026-10-24T12:00:00Z",
      "Europe/Lisbon",
      "2026-10-25T06:00:00.000Z",
    ],
    ["over the end of a year", "2026-12-31T20:00:00Z", "Europe/Lisbon", "2027-01-01T06:00:00.000Z"],
  ])("comes at 06:00: %s", (_name, now, zone, expected) => {
    expect(nextDigest(new Date(now), zone).toISOString()).toBe(expected);
  });
});
