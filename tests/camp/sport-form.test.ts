import { describe, expect, it } from "vitest";
import { readWeekly, weeklyRule } from "@/components/camp/details/recurrence";
import { editedValues, repeatsOf, type SportForm } from "@/components/camp/dialogs/sport-form";
import { formOfDraft, draftSport, type Draft } from "@/components/camp/new/draft";
import { freshDraft } from "@/components/camp/new/fresh-draft";
import { expandEntries } from "@/lib/calendar/recurrence";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { SportValues } from "@/lib/schemas/change";
import { campFormSchema } from "@/lib/schemas/camp";
import { hardSparring, weekly } from "../factories/camp-book";

const BOUT = "2027-01-09";
const datesOf = (rrule: string, start: string): string[] =>
  expandEntries([weekly("x", start, { rrule })], dayFromIso("2026-11-15"), dayFromIso(BOUT)).map((session) =>
    isoFromDay(session.day),
  );

describe("a weekly recurrence made by the form", () => {
  it("falls on its weekdays, on its first day too, and never on the bout day", () => {
    const rule = weeklyRule({ weekdays: [6], until: null }, "2026-12-15", BOUT);
    expect(datesOf(rule, "2026-12-15T18:00")).toEqual([
      "2026-12-15",
      "2026-12-19",
      "2026-12-22",
      "2026-12-26",
      "2026-12-29",
      "2027-01-02",
      "2027-01-05",
    ]);
  });

  it("includes its last day", () => {
    const rule = weeklyRule({ weekdays: [2], until: "2026-12-29" }, "2026-12-15", BOUT);
    expect(datesOf(rule, "2026-12-15T18:00").at(-1)).toBe("2026-12-29");
  });

  it.each([[{ weekdays: [2, 6], until: "2026-12-22" }], [{ weekdays: [2], until: null }]])(
    "is read back as it was given: %o",
    (given) => {
      expect(readWeekly(weeklyRule(given, "2026-12-15", BOUT), "2026-12-15", BOUT)).toEqual(given);
    },
  );

  it("turns a count into the last day that it reaches", () => {
    expect(readWeekly("FREQ=WEEKLY;BYDAY=TU;COUNT=3", "2026-12-01", BOUT)).toEqual({
      weekdays: [2],
      until: "2026-12-15",
    });
  });

  it.each([
    "FREQ=MONTHLY;BYMONTHDAY=1",
    "FREQ=WEEKLY;INTERVAL=2;BYDAY=TU",
    "FREQ=WEEKLY;BYDAY=TU;BYSETPOS=1",
  ])("leaves a rule alone that says more than weekdays: %s", (rule) =>
    expect(readWeekly(rule, "2026-12-01", BOUT)).toBeNull(),
  );
});

describe("what an edited session sends", () => {
  const entry = hardSparring("tue", "2026-11-17T18:00", { rrule: "FREQ=WEEKLY;UNTIL=20261229T235900Z" });
  const before: SportValues = {
    kind: "hard-sparring",
    title: "Hard sparring",
    date: "2026-12-15",
    start: "18:00",
    minutes: 60,
    effort: 8,
    place: "",
    rrule: entry.rrule,
  };
  const form = (over: Partial<SportForm>): SportForm => ({
    ...before,
    scope: "this",
    ...repeatsOf(entry.rrule, before.date, BOUT),
    ...over,
  });

  it("is only what differs", () => {
    expect(editedValues(form({ start: "19:00" }), before, entry, BOUT)).toEqual({ start: "19:00" });
    expect(editedValues(form({ scope: "all" }), before, entry, BOUT)).toEqual({});
  });

  it("holds the rule only where more than one occurrence changes", () => {
    expect(editedValues(form({ weekdays: [2, 4] }), before, entry, BOUT)).toEqual({});
    expect(editedValues(form({ weekdays: [2, 4], scope: "following" }), before, entry, BOUT).rrule).toContain(
      "BYDAY=TU,TH",
    );
  });
});

describe("the draft of a new camp", () => {
  const draft = (over: Partial<Draft> = {}): Draft => ({
    ...freshDraft({
      link: null,
      athlete: null,
      timetable: [],
      zone: "Europe/Lisbon",
      today: dayFromIso("2026-11-01"),
    }),
    athleteName: "Noor Haddadin",
    ...over,
  });

  it("takes the team's week from the camp's first day to each session's last day out", () => {
    const start = draft();
    const bout = { ...start.bout, date: BOUT };
    const row = draftSport(hardSparring("tue", "2026-01-06T18:00", { rrule: "FREQ=WEEKLY" }), null);
    const form = campFormSchema.parse(formOfDraft({ ...start, bout, sport: [row] }));
    const days = datesOf(form.sport[0]?.rrule ?? "", form.sport[0]?.start ?? "");
    expect(days[0]).toBe("2026-11-17");
    // Ten days out of Saturday 9 January is Wednesday 30 December: the Tuesday before is the last.
    expect(days.at(-1)).toBe("2026-12-29");
  });

  it("leaves out what is not ticked", () => {
    const row = { ...draftSport(weekly("mon", "2026-01-05T18:00"), null), on: false };
    expect(formOfDraft(draft({ sport: [row] })).sport).toEqual([]);
  });

  it("carries the start page's camp over", () => {
    const link = "bout=2027-01-09&at=20:30&weeks=6&hard=2&hard=6&lifts=2&zone=Europe/Lisbon";
    const start = freshDraft({
      link,
      athlete: null,
      timetable: [],
      zone: "UTC",
      today: dayFromIso("2026-11-01"),
    });
    expect(start).toMatchObject({
      weeks: 6,
      homeZone: "Europe/Lisbon",
      bout: { date: BOUT, time: "20:30" },
      facts: { liftsPerWeek: 2 },
    });
    expect(start.sport.find((row) => row.kind === "hard-sparring")).toMatchObject({
      weekdays: [2, 6],
      own: null,
    });
  });
});
