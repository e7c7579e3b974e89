import { describe, expect, it } from "vitest";
import { planBook } from "@/lib/book";
import { startCampForm, startInput } from "@/lib/book/start-camp";
import { dayFromIso, plan, weekdayOf } from "@/lib/engine";
import type { Instant } from "@/lib/engine/types";
import { campFormSchema } from "@/lib/schemas/camp";
import { START_DEFAULTS, type StartParams } from "@/lib/schemas/start-params";

const params = (change: Partial<StartParams> = {}): StartParams => ({
  ...START_DEFAULTS,
  date: "2027-01-09",
  ...change,
});

/** 1 November 2026, 08:00 UTC: before the camp. */
const NOW = (Date.UTC(2026, 10, 1, 8) / 60_000) as Instant;

const sportOf = (change: Partial<StartParams>) => startInput(params(change), "Europe/Zagreb", NOW).sport;

const bookOf = (change: Partial<StartParams>) => {
  const form = campFormSchema.parse(startCampForm(params(change), "Europe/Zagreb", "A"));
  return {
    status: "on" as const,
    homeZone: form.homeZone,
    bout: form.bout,
    weeks: form.weeks,
    weighIn: form.weighIn,
    athlete: form.facts,
    sport: form.sport.map((entry, index) => ({ ...entry, id: `s${index}`, series: `s${index}`, idShift: 0 })),
    pins: [],
    coachFactors: {},
    responses: [],
    holds: [],
    rules: {},
  };
};

describe("the start page's camp", () => {
  it("spars hard on the chosen weekdays from the first day of the camp to the last allowed one", () => {
    const hard = sportOf({ hard: [2, 6], hardUntil: 10 }).filter(
      (session) => session.kind === "hard-sparring",
    );
    expect(hard.map((session) => weekdayOf(session.day)).every((day) => day === 2 || day === 6)).toBe(true);
    expect(hard[0]?.day).toBe(dayFromIso("2026-11-17"));
    // 7 Jan would be 2 days out, 2 Jan 7, 29 Dec 11.
    expect(hard.at(-1)?.day).toBe(dayFromIso("2026-12-29"));
    expect(hard).toHaveLength(13);
  });

  it("puts other sessions on days without hard sparring only, as many as there are", () => {
    const other = sportOf({ hard: [1, 2, 3, 4, 5], other: 7, weeks: 2 }).filter((s) => s.kind === "skill");
    expect(new Set(other.map((session) => weekdayOf(session.day)))).toEqual(new Set([6, 7]));
    expect(sportOf({ hard: [], other: 0 })).toEqual([]);
  });

  it.each([
    ["as the page opens", {}],
    ["with a weigh-in the day before", { weighIn: "day-before" as const }],
    ["on short notice", { weeks: 2 }],
    ["over twenty weeks and a change of the clocks", { weeks: 20 }],
    ["without any sport", { hard: [], other: 0 }],
    ["sparring every day", { hard: [1, 2, 3, 4, 5, 6, 7] as const }],
    ["sparring up to the bout", { hardUntil: 0 }],
  ] satisfies [string, Partial<StartParams>][])("is the same camp once it is kept, %s", (_, change) => {
    const seen = plan(startInput(params(change), "Europe/Zagreb", NOW));
    const kept = planBook(bookOf(change), NOW).plan;
    expect(kept.lifts).toEqual(seen.lifts);
    expect(kept.weeks).toEqual(seen.weeks);
    expect(kept.unplaced).toEqual(seen.unplaced);
  });

  it.each(["", "2027-02-30", "0000-00-00"])(
    "is refused by the form's schema for the date %j, not by a crash",
    (date) => {
      const form = startCampForm(params({ date, weighIn: "day-before" }), "UTC", "A");
      expect(campFormSchema.safeParse(form).success).toBe(false);
    },
  );
});
