import { describe, expect, it } from "vitest";
import { remarkLines } from "@/components/start/remark-lines";
import { startInput } from "@/lib/book/start-camp";
import { plan } from "@/lib/engine";
import type { Instant } from "@/lib/engine/types";
import { START_DEFAULTS, type StartParams } from "@/lib/schemas/start-params";

const NOW = (Date.UTC(2026, 11, 1, 8) / 60_000) as Instant;

const linesFor = (change: Partial<StartParams>): string[] =>
  remarkLines(plan(startInput({ ...START_DEFAULTS, date: "2027-02-27", ...change }, "Europe/Zagreb", NOW)));

describe("what the start page says does not fit", () => {
  it("says nothing where everything fits", () => {
    expect(linesFor({})).toEqual([]);
  });

  it("says each kind of thing once, however many weeks it is true of", () => {
    const lines = linesFor({
      hard: [1, 2, 3, 4, 5, 6, 7],
      hardUntil: 0,
      from: "17:00",
      to: "20:00",
      weeks: 12,
    });
    expect(lines.length).toBeGreaterThan(1);
    expect(new Set(lines).size).toBe(lines.length);
    expect(lines.some((line) => /^Strength A, in \d+ weeks: no room\. \S/.test(line))).toBe(true);
  });

  it("does not complain of weeks that are over", () => {
    expect(linesFor({ date: "2026-12-12", weeks: 8 })).toEqual([]);
  });
});
