import { describe, expect, it } from "vitest";
import {
  applyEdit,
  baseOf,
  inverseOf,
  isPreview,
  planBook,
  previewChange,
  previewEdit,
  type Preview,
  type StandingCamp,
} from "@/lib/book";
import { dayFromIso, isoFromDay } from "@/lib/engine";
import type { Instant } from "@/lib/engine/types";
import type { CampBook } from "@/lib/schemas/camp-book";
import type { Change } from "@/lib/schemas/change";
import { campBook } from "../factories/camp-book";

const at = (iso: string): Instant => (Date.parse(iso) / 60_000) as Instant;
const NOW = at("2026-11-26T12:00:00Z");
const standing = (book: CampBook = campBook(), now = NOW): StandingCamp => ({
  book,
  plan: planBook(book, now).plan,
});

const preview = (camp: StandingCamp, change: Exclude<Change, { kind: "put-back" }>, now = NOW): Preview => {
  const result = previewChange(camp, change, now);
  if (!isPreview(result)) throw new Error(JSON.stringify(result.problems));
  return result;
};
const problems = (camp: StandingCamp, change: Exclude<Change, { kind: "put-back" }>) => {
  const result = previewChange(camp, change, NOW);
  return isPreview(result) ? [] : result.problems;
};
const sportDates = ({ input }: Preview, series: string) =>
  input.sport
    .filter((session) => session.id.startsWith(`${series}@`))
    .map((session) => isoFromDay(session.day));

describe("moving a sparring day", () => {
  const moved = preview(standing(), {
    kind: "sport.edit",
    sportId: "sat@2026-12-05",
    scope: "this",
    values: { date: "2026-12-03", start: "18:00" },
  });

  it("moves that one and keeps its identity", () => {
    expect(moved.knockOn.sport).toMatchObject([
      {
        id: "sat@2026-12-05",
        kind: "moved",
        from: { day: dayFromIso("2026-12-05") },
        to: { day: dayFromIso("2026-12-03") },
      },
    ]);
  });

  it("knocks on to the lifting around it, in that week alone or the next", () => {
    expect(moved.knockOn.lifts.length).toBeGreaterThan(0);
    for (const effect of moved.knockOn.lifts) expect(effect.because.length).toBeGreaterThan(0);
  });

  it("moving it back, measured against the same plan, shows nothing", () => {
    const camp = standing();
    const back = preview(
      { book: moved.book, plan: moved.plan },
      {
        kind: "sport.edit",
        sportId: "sat@2026-12-05",
        scope: "this",
        values: { date: "2026-12-05", start: "11:00" },
      },
    );
    const again = previewEdit({ book: back.book, plan: camp.plan }, {}, NOW);
    if (!isPreview(again)) throw new Error("not planned");
    expect(again.knockOn).toEqual({ lifts: [], sport: [], weeks: [], violations: [], bout: null });
  });

  it("leaves the camp that was given untouched", () => {
    const camp = standing();
    const before = structuredClone(camp);
    preview(camp, { kind: "sport.drop", sportId: "tue@2026-12-08", scope: "following" });
    expect(camp).toEqual(before);
  });
});

describe("which of a recurring session", () => {
  it("this and following: the earlier ones stay, the later ones move, all under their own names", () => {
    const result = preview(standing(), {
      kind: "sport.edit",
      sportId: "tue@2026-12-08",
      scope: "following",
      values: { date: "2026-12-09", start: "19:00" },
    });
    const days = result.input.sport
      .filter((session) => session.id.startsWith("tue@"))
      .map((s) => [s.id, isoFromDay(s.day)]);
    expect(days).toEqual([
      ["tue@2026-11-17", "2026-11-17"],
      ["tue@2026-11-24", "2026-11-24"],
      ["tue@2026-12-01", "2026-12-01"],
      ["tue@2026-12-08", "2026-12-09"],
      ["tue@2026-12-15", "2026-12-16"],
      ["tue@2026-12-22", "2026-12-23"],
      ["tue@2026-12-29", "2026-12-30"],
    ]);
  });

  it("all of them: what is past stays", () => {
    const result = preview(standing(), {
      kind: "sport.edit",
      sportId: "tue@2026-12-08",
      scope: "all",
      values: { start: "19:00" },
    });
    const times = result.input.sport
      .filter((session) => session.id.startsWith("tue@"))
      .map((session) => session.start);
    expect(times).toEqual([1080, 1080, 1140, 1140, 1140, 1140, 1140]);
  });

  it("one of several weekdays moves without the others", () => {
    const book = campBook({
      sport: [
        {
          ...campBook().sport[0],
          id: "pair",
          series: "pair",
          idShift: 0,
          kind: "skill",
          title: "Drills",
          minutes: 60,
          effort: 4,
          place: "",
          exdate: [],
          start: "2026-11-17T18:00",
          rrule: "FREQ=WEEKLY;BYDAY=TU,TH",
        },
      ],
    });
    const result = preview(standing(book), {
      kind: "sport.edit",
      sportId: "pair@2026-12-08",
      scope: "following",
      values: { date: "2026-12-09", start: "18:00" },
    });
    const weekdays = new Set(
      sportDates(result, "pair")
        .filter((date) => date >= "2026-12-08")
        .map((date) => new Date(`${date}T00:00Z`).getUTCDay()),
    );
    expect(weekdays).toEqual(new Set([3, 4]));
  });

  it("taking one out leaves the others", () => {
    const result = preview(standing(), { kind: "sport.drop", sportId: "tue@2026-12-08", scope: "this" });
    expect(sportDates(result, "tue")).not.toContain("2026-12-08");
    expect(sportDates(result, "tue")).toContain("2026-12-15");
  });
});

describe("what is past", () => {
  it.each<[string, Exclude<Change, { kind: "put-back" }>]>([
    [
      "a past sparring day is not moved",
      { kind: "sport.edit", sportId: "tue@2026-11-24", scope: "this", values: { date: "2026-12-03" } },
    ],
    [
      "nothing is moved into the past",
      { kind: "sport.edit", sportId: "tue@2026-12-01", scope: "this", values: { date: "2026-11-25" } },
    ],
    [
      "nothing is added in the past",
      {
        kind: "sport.add",
        entryId: "8a6e0804-2bd0-4672-b79d-d97027f9071a",
        values: {
          kind: "skill",
          title: "Pads",
          date: "2026-11-20",
          start: "18:00",
          minutes: 60,
          effort: 4,
          place: "",
          rrule: null,
        },
      },
    ],
  ])("%s", (_, change) => {
    expect(problems(standing(), change)).toMatchObject([{ message: expect.stringContaining("past") }]);
  });

  it("a camp called off keeps what was done and plans nothing more", () => {
    const result = preview(standing(campBook(), at("2026-11-14T12:00:00Z")), { kind: "bout.off" });
    expect(result.plan.lifts.every((lift) => lift.past)).toBe(true);
    expect(result.plan.lifts.length).toBeGreaterThan(0);
    expect(
      result.input.sport.map((session) => isoFromDay(session.day)).every((date) => date <= "2026-11-26"),
    ).toBe(true);
  });
});

describe("pins", () => {
  it("a lift dropped on a day stands there, also against a must rule, which is then reported", () => {
    const camp = standing();
    const lift = camp.plan.lifts.find((candidate) => candidate.heavyLower && !candidate.past);
    if (!lift) throw new Error("no lift");
    const monday = dayFromIso("2026-12-07");
    const result = preview(camp, {
      kind: "lift.move",
      liftId: lift.id,
      item: lift.item,
      week: lift.week,
      date: isoFromDay(monday),
      start: "19:30",
    });
    expect(result.plan.lifts.find((candidate) => candidate.id === lift.id)).toMatchObject({
      day: monday,
      start: 1170,
      pinned: true,
    });
    expect(result.plan.violations.map((violation) => violation.rule)).toContain("heavy-before-hard");
  });
});

describe("edits", () => {
  it("the inverse of an edit takes the book back", () => {
    const camp = standing();
    const result = preview(camp, {
      kind: "sport.edit",
      sportId: "tue@2026-12-08",
      scope: "following",
      values: { title: "Hard rounds", minutes: 75 },
    });
    const back = applyEdit(result.book, inverseOf(camp.book, result.edit));
    const byId = (book: CampBook) => [...book.sport].sort((a, b) => a.id.localeCompare(b.id));
    expect(byId(back)).toEqual(byId(camp.book));
  });

  it("planning a saved camp again, later, moves nothing", () => {
    const camp = standing();
    const later = at("2026-12-03T09:00:00Z");
    const again = planBook(camp.book, later, baseOf(camp.plan)).plan;
    const place = (plan: typeof again) =>
      plan.lifts.map(({ id, day, start, sets }) => ({ id, day, start, sets }));
    expect(place(again)).toEqual(place(camp.plan));
  });

  it("a hold stops contact and lifting, and the days after it keep theirs", () => {
    const book = campBook({ holds: [{ from: "2026-11-30", to: "2026-12-06" }] });
    const held = planBook(book, NOW);
    const inHold = (day: number) => day >= dayFromIso("2026-11-30") && day <= dayFromIso("2026-12-06");
    expect(held.plan.lifts.filter((lift) => inHold(lift.day))).toEqual([]);
    expect(held.input.sport.filter((session) => inHold(session.day)).map((session) => session.kind)).toEqual([
      "skill",
    ]);
  });
});
