import { describe, expect, it } from "vitest";
import {
  applyEdit,
  changeOfSuggestion,
  changeWords,
  inverseOf,
  isPreview,
  planBook,
  previewChange,
  previewEdit,
  putBackBase,
  putBackProblem,
  type Preview,
  type SavedChange,
  type StandingCamp,
} from "@/lib/book";
import { dayFromIso, isoFromDay, type Suggestion } from "@/lib/engine";
import type { Instant } from "@/lib/engine/types";
import { CHANGE_ACTION } from "@/lib/policy";
import type { CampBook } from "@/lib/schemas/camp-book";
import { changeSchema, type Change } from "@/lib/schemas/change";
import { campBook } from "../factories/camp-book";

type Saved = Exclude<Change, { kind: "put-back" }>;

const NOW = (Date.parse("2026-11-26T12:00:00Z") / 60_000) as Instant;
const standing = (book: CampBook = campBook()): StandingCamp => ({ book, plan: planBook(book, NOW).plan });
const preview = (camp: StandingCamp, change: Saved): Preview => {
  const result = previewChange(camp, change, NOW);
  if (!isPreview(result)) throw new Error(JSON.stringify(result.problems));
  return result;
};
const problems = (camp: StandingCamp, change: Saved) => {
  const result = previewChange(camp, change, NOW);
  return isPreview(result) ? [] : result.problems;
};
const add = (over: Partial<Extract<Change, { kind: "response.add" }>> = {}): Saved => ({
  kind: "response.add",
  id: "first",
  from: "2026-11-30",
  to: "2026-12-06",
  factor: 0.7,
  because: "Felt harder than planned, twice running",
  ...over,
});
const savedOf = (camp: StandingCamp, made: Preview): SavedChange => ({
  edit: made.edit,
  inverse: inverseOf(camp.book, made.edit),
  knockOn: made.knockOn,
  liftsBefore: camp.plan.lifts.filter((lift) => made.knockOn.lifts.some((effect) => effect.id === lift.id)),
});

describe("accepting a suggestion", () => {
  const camp = standing();
  const made = preview(camp, add());

  it("lowers sets in its days, moves nothing, and says why", () => {
    expect(made.knockOn.lifts.length).toBeGreaterThan(0);
    for (const effect of made.knockOn.lifts) {
      expect(effect.kind).toBe("dose");
      expect(effect.setsAfter).toBeLessThan(effect.setsBefore ?? 0);
      expect(effect.because.map((reason) => reason.rule)).toContain("response");
      const date = isoFromDay(effect.to?.day ?? dayFromIso("1970-01-01"));
      expect(date >= "2026-11-30" && date <= "2026-12-06").toBe(true);
    }
  });

  it("put back, the plan and the book that stood before are there again, to the byte", () => {
    const saved = savedOf(camp, made);
    expect(putBackProblem(made.book, saved)).toBeNull();
    const back = previewEdit({ book: made.book, plan: made.plan }, saved.inverse, NOW, {
      base: putBackBase(made.plan, saved),
    });
    if (!isPreview(back)) throw new Error("not planned");
    expect(JSON.stringify(back.plan.lifts)).toBe(JSON.stringify(camp.plan.lifts));
    expect(JSON.stringify(back.book)).toBe(JSON.stringify(camp.book));
  });

  it("taken back by its id, then put back, it is in force again where it stood among the others", () => {
    const both = preview({ book: made.book, plan: made.plan }, add({ id: "second", from: "2026-12-01" }));
    const before: StandingCamp = { book: both.book, plan: both.plan };
    const dropped = preview(before, { kind: "response.drop", id: "first" });
    expect(dropped.book.responses.map((response) => response.id)).toEqual(["second"]);
    const saved = savedOf(before, dropped);
    const back = applyEdit(dropped.book, saved.inverse);
    expect(JSON.stringify(back)).toBe(JSON.stringify(both.book));
  });

  it("sent twice under one id it stands once", () => {
    const again = preview({ book: made.book, plan: made.plan }, add());
    expect(again.book).toEqual(made.book);
    expect(again.knockOn).toEqual({ lifts: [], sport: [], weeks: [], violations: [], bout: null });
  });

  it("that a later change replaced is not put back over it", () => {
    const later = preview({ book: made.book, plan: made.plan }, add({ factor: 0.9 }));
    expect(putBackProblem(later.book, savedOf(camp, made))).toMatchObject({ pointer: "/change/revision" });
  });

  it("reads without its reason in the list of changes, which more people see than check-ins", () => {
    const words = changeWords(add(), camp, made.knockOn);
    expect(words).toBe("Accepted a suggestion: sets × 0.7, Mon 30 Nov to Sun 6 Dec");
    const after: StandingCamp = { book: made.book, plan: made.plan };
    const drop: Saved = { kind: "response.drop", id: "first" };
    expect(changeWords(drop, after, preview(after, drop).knockOn)).toBe(
      "Took back an accepted suggestion: sets × 0.7, Mon 30 Nov to Sun 6 Dec",
    );
    expect(JSON.stringify(made.knockOn)).not.toContain("twice running");
  });
});

describe("what is refused", () => {
  it.each<[string, Saved, string]>([
    ["days that are over", add({ from: "2026-11-16", to: "2026-11-20" }), "/change/to"],
    ["days before the camp", add({ from: "2026-11-01" }), "/change/from"],
    ["days after the bout", add({ to: "2027-02-01" }), "/change/from"],
    ["taking back what is not in force", { kind: "response.drop", id: "nobody" }, "/change/id"],
  ])("%s", (_, change, pointer) => {
    expect(problems(standing(), change)).toMatchObject([{ pointer }]);
  });

  it("one more than a hundred", () => {
    const responses = Array.from({ length: 100 }, (_, index) => ({
      id: `r${index}`,
      from: "2026-12-01",
      to: "2026-12-01",
      factor: 1,
      because: "",
    }));
    expect(problems(standing(campBook({ responses })), add())).toMatchObject([{ pointer: "/change" }]);
  });

  it.each<[string, Record<string, unknown>]>([
    ["a factor that raises sets", { factor: 1.2 }],
    ["a factor below a half", { factor: 0.4 }],
    ["days the wrong way round", { from: "2026-12-07", to: "2026-12-06" }],
    ["a reason longer than 300 characters", { because: "x".repeat(301) }],
    ["no id", { id: "" }],
  ])("%s, before it reaches a camp", (_, over) => {
    expect(changeSchema.safeParse({ ...add(), ...over }).success).toBe(false);
    expect(changeSchema.safeParse(add()).success).toBe(true);
  });

  it("to who may not write lifting: the right is that of the coach's own factor", () => {
    expect(CHANGE_ACTION["response.add"]).toBe(CHANGE_ACTION["lift.factor"]);
    expect(CHANGE_ACTION["response.drop"]).toBe(CHANGE_ACTION["lift.factor"]);
  });
});

describe("a suggestion of the engine", () => {
  const suggested: Suggestion = {
    key: "effort:tue@2026-12-08",
    kind: "effort",
    title: "Lifting felt harder than planned, twice running",
    numbers: [],
    text: "",
    source: "common practice, no published source",
    change: { kind: "response", from: dayFromIso("2026-11-30"), to: dayFromIso("2026-12-06"), factor: 0.8 },
  };

  it("becomes the change that accepts it, under its own key, and can be previewed as it is", () => {
    const change = changeOfSuggestion(suggested);
    expect(change).toEqual(
      add({ id: suggested.key, factor: 0.8, because: "Lifting felt harder than planned, twice running" }),
    );
    expect(changeSchema.safeParse(change).success).toBe(true);
    expect(change && preview(standing(), change).book.responses).toHaveLength(1);
  });

  it("for one lift becomes the coach's own factor; a talk becomes no change", () => {
    const lift = changeOfSuggestion({
      ...suggested,
      change: { kind: "factor", liftId: "power-a.2", factor: 0.72 },
    });
    expect(lift).toEqual({ kind: "lift.factor", liftId: "power-a.2", factor: 0.72 });
    expect(changeOfSuggestion({ ...suggested, change: null })).toBeNull();
  });
});
