import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { createElement } from "react";
import { renderToStaticMarkup } from "react-dom/server";
import { describe, expect, it } from "vitest";
import { AthleteRecordPage } from "@/components/athlete/record/athlete-record";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { AthleteRecord } from "@/lib/schemas/athlete-record";
import { summarise, type SummaryTrial } from "@/lib/services/tests/summary";

const TODAY = "2026-12-01";
const before = (days: number): string => isoFromDay((dayFromIso(TODAY) - days) as Day);

const trials = [38, 39.5, 39, 41, 42, 41.5, 43.5, 44].map((value, index): SummaryTrial => ({
  id: `t${index}`,
  kind: "jump-height",
  side: "both",
  day: before(60 - 20 * Math.floor(index / 3)),
  value,
  second: null,
  massKg: 80,
  note: "",
}));
const sides = (
  [
    ["left", 21],
    ["right", 24],
  ] as const
).map(([side, value]): SummaryTrial => ({
  id: side,
  kind: "jump-height",
  side,
  day: before(20),
  value,
  second: null,
  massKg: null,
  note: "",
}));

const record: AthleteRecord = {
  unit: "kg",
  today: TODAY,
  weight: {
    off: null,
    weights: Array.from({ length: 12 }, (_, index) => ({
      date: before(24 - 2 * index),
      kg: 64 - 0.12 * index,
    })),
    to: {
      campId: "c",
      limitKg: 60,
      weighIn: "2027-01-08",
      line: Array.from({ length: 63 }, (_, index) => ({ date: before(24 - index), kg: 64 - 0.0645 * index })),
      pace: "The line falls faster than recommended.",
      ceilings: [
        { date: "2027-01-05", hours: 72, kg: 64.3 },
        { date: "2027-01-06", hours: 48, kg: 63.6 },
        { date: "2027-01-07", hours: 24, kg: 62.8 },
      ],
      remarks: [{ text: "On the line.", source: "common practice, no published source" }],
    },
  },
  load: {
    days: Array.from({ length: 56 }, (_, index) => ({
      date: before(55 - index),
      plannedSport: index % 7 === 6 ? 0 : 300,
      plannedLifting: index % 2 ? 250 : 0,
      doneSport: index % 7 === 6 ? 0 : 240 + 10 * (index % 5),
      doneLifting: index % 2 ? 200 : 0,
    })),
    weeks: [{ from: before(6), to: TODAY, planned: 2600, done: 2400, monotony: 1.37, strain: 3282 }],
  },
  checkIns: {
    from: before(27),
    to: TODAY,
    days: Array.from({ length: 20 }, (_, index) => ({
      date: before(26 - index),
      sleep: 2 + (index % 3),
      fatigue: 3,
      soreness: 1 + (index % 5),
      stress: 4,
    })),
    own: {
      sleep: { mean: 3, sd: 0.8 },
      fatigue: { mean: 3, sd: 0 },
      soreness: { mean: 3, sd: 1.4 },
      stress: { mean: 4, sd: 0 },
    },
  },
  camps: [
    {
      id: "c",
      on: true,
      bout: "2027-01-09",
      place: "Ellery Hall",
      opponent: "Petra Holm-Aziz",
      weeks: 8,
      result: null,
    },
  ],
};

const rendered = (over: Partial<AthleteRecord> = {}, seesTests = true): string =>
  renderToStaticMarkup(
    createElement(
      QueryClientProvider,
      { client: new QueryClient() },
      createElement(AthleteRecordPage, {
        athleteId: "a",
        record: { ...record, ...over },
        tests: seesTests ? summarise([...trials, ...sides], [], new Map()) : null,
        bests: seesTests
          ? {
              unit: "kg",
              mayWrite: true,
              lifts: [{ id: "x", name: "Back squat" }],
              bests: [
                {
                  id: "b",
                  exerciseId: "x",
                  name: "Back squat",
                  date: before(10),
                  liftedKg: 110,
                  reps: 4,
                  formula: "epley",
                  kg: 124.67,
                },
              ],
            }
          : null,
        writesTests: true,
        profile: createElement("h2", null, "Profile"),
      }),
    ),
  );

const HEADINGS = /<h2 id="([a-z-]+)"/g;
const links = (html: string): string[] => [...html.matchAll(/href="#([a-z-]+)"/g)].map(([, id]) => id ?? "");

describe("an athlete's page", () => {
  const html = rendered();

  it("has a heading for every link of the list, in the same order", () => {
    expect(links(html)).toEqual(["profile", "bests", "tests", "weight", "load", "check-ins", "camps"]);
    expect([...html.matchAll(HEADINGS)].map(([, id]) => id)).toEqual(links(html).slice(1));
  });

  it("every drawing has words for those who do not see it, and every section with drawings its table and its file", () => {
    const drawings = html.match(/<svg role="img"[^>]*>/g) ?? [];
    // A test of several days, weight, load and four answers; the tests of one day have their table alone.
    expect(drawings).toHaveLength(1 + 1 + 1 + 4);
    for (const drawing of drawings) expect(drawing).toMatch(/aria-label="[^"]{20,}"/);
    for (const kind of ["tests", "weights", "load", "check-ins", "bests"])
      expect(html).toContain(`href="/api/athletes/a/csv/${kind}"`);
    expect(html.match(/<details/g)?.length).toBe(4);
  });

  it("no drawing has a number that is none", () => {
    expect(html).not.toMatch(/NaN|Infinity|undefined/);
  });

  it("says of a change what can be believed, names the formulas, and shows the cautions", () => {
    expect(html).toContain("beyond the noise of this test");
    expect(html).toContain("Sayers, countermovement jump");
    expect(html).toContain("No published threshold foretells an injury");
    expect(html).toContain("Rapid weight loss can injure or kill");
    expect(html).toContain("110 kg × 4, Epley");
  });

  it("what the reader may not see is not on the page, nor in its list", () => {
    const less = rendered({ weight: null, checkIns: null, load: null }, false);
    expect(links(less)).toEqual(["profile", "camps"]);
    expect(less).not.toMatch(/Rapid weight|64 kg|Sleep|Monotony|Epley/);
  });

  it("of a minor says why there is no weight, and no figure", () => {
    const minor = rendered({ weight: { off: "minor", reason: "Off under 18." } });
    expect(minor).toContain("Off under 18.");
    expect(minor).not.toMatch(/Ceilings|csv\/weights/);
  });

  it("with nothing yet has no empty drawing", () => {
    const empty = rendered({
      weight: { off: null, weights: [], to: null },
      load: {
        days:
          record.load?.days.map((day) => ({
            ...day,
            plannedSport: 0,
            plannedLifting: 0,
            doneSport: 0,
            doneLifting: 0,
          })) ?? [],
        weeks: [],
      },
      checkIns: {
        from: before(27),
        to: TODAY,
        days: [],
        own: { sleep: null, fatigue: null, soreness: null, stress: null },
      },
      camps: [],
    });
    expect(empty.match(/<svg role="img"/g)).toHaveLength(1);
    expect(empty).toContain("No weights yet.");
    expect(empty).toContain("None in the last 28 days.");
  });
});
