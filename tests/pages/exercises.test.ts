import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { filtersOf, NO_FILTERS, passes, queryOf, type Filters } from "@/components/exercises/filters";
import { changeLines } from "@/components/exercises/history-words";
import { doseText, restText } from "@/components/exercises/words";
import { EXERCISES } from "@/db/seed/exercises";
import { EQUIPMENT, LIMITATIONS, QUALITIES, type Exercise } from "@/lib/engine/prescription/exercise";
import type { ExerciseSummary } from "@/lib/schemas/exercise";

const summary = (exercise: Exercise, part: Partial<ExerciseSummary> = {}): ExerciseSummary => ({
  exercise,
  origin: "library",
  shelved: false,
  changedAt: null,
  use: { camps: 0, sets: 0 },
  ...part,
});
const left = (filters: Partial<Filters>) =>
  EXERCISES.filter((exercise) => passes(summary(exercise), { ...NO_FILTERS, ...filters }));
const [first] = EXERCISES;
if (!first) throw new Error("the library is empty");

describe("filters of the exercises", () => {
  it("survive the address bar, whatever they are", () => {
    const inOrder = <T extends string>(all: readonly T[]) => fc.subarray([...all]);
    const filters = fc.record({
      search: fc.string().map((text) => text.trim()),
      quality: fc.option(fc.constantFrom(...QUALITIES)),
      equipment: fc.option(inOrder(EQUIPMENT)),
      limitations: inOrder(LIMITATIONS),
      own: fc.boolean(),
      shelved: fc.boolean(),
    });
    fc.assert(
      fc.property(filters, (given) => {
        // A lone half of a surrogate pair is no text that an address could hold.
        fc.pre(given.search.isWellFormed());
        expect(filtersOf(new URLSearchParams(queryOf(given)))).toEqual(given);
      }),
      { seed: 20261201 },
    );
    expect(queryOf(NO_FILTERS)).toBe("");
  });

  it("an address that names unknown things filters by nothing", () => {
    expect(filtersOf(new URLSearchParams("quality=charm&without=soul&own=yes"))).toEqual(NO_FILTERS);
  });

  it("without any, all are left", () => {
    expect(left({})).toEqual(EXERCISES);
  });

  it("what needs more than is there, and what a limitation rules out, is hidden, and nothing else", () => {
    const equipment = ["band", "box"] as const;
    expect(left({ equipment })).toEqual(
      EXERCISES.filter((one) => one.equipment.every((piece) => piece === "band" || piece === "box")),
    );
    expect(left({ equipment: [] }).every((one) => one.equipment.length === 0)).toBe(true);
    expect(left({ limitations: ["ankle", "rib"] })).toEqual(
      EXERCISES.filter((one) => !one.ruledOutBy.includes("ankle") && !one.ruledOutBy.includes("rib")),
    );
  });

  it("the search takes words in any order, without accents and case, from name and qualities", () => {
    const exercise: Exercise = { ...first, name: "Čamac push, slow", qualities: ["grip", "neck"] };
    const found = (search: string) => passes(summary(exercise), { ...NO_FILTERS, search });
    expect(["", "  ", "camac", "SLOW čam", "neck push"].map(found)).toEqual([true, true, true, true, true]);
    expect(["camac fast", "knee"].map(found)).toEqual([false, false]);
  });

  it("shelved ones show when asked for; the team's own are what it added, changed or shelved", () => {
    const shelved = summary(first, { shelved: true });
    expect(passes(shelved, NO_FILTERS)).toBe(false);
    expect(passes(shelved, { ...NO_FILTERS, shelved: true, own: true })).toBe(true);
    const own = { ...NO_FILTERS, own: true };
    expect(passes(summary(first), own)).toBe(false);
    expect(passes(summary(first, { origin: "changed" }), own)).toBe(true);
    expect(passes(summary(first, { origin: "team" }), own)).toBe(true);
  });
});

describe("words of an exercise", () => {
  it("sets, repetitions and rest read as a coach says them", () => {
    const dose = { sets: { low: 3, high: 4 }, reps: { low: 8, high: 12 } };
    expect(doseText("volume", dose, "each")).toBe("3 to 4 × 8 to 12 a side");
    expect(doseText("hold", { sets: { low: 2, high: 2 }, reps: { low: 30, high: 30 } }, "both")).toBe(
      "2 × 30 s",
    );
    expect([45, 75, 90, 120, 150].map(restText)).toEqual([
      "45 s",
      "75 s",
      "1 min 30 s",
      "2 min",
      "2 min 30 s",
    ]);
  });

  it("history tells what an edit did and nothing that stayed", () => {
    const entry = { id: "1", at: "2026-12-01T08:00:00.000Z", by: null };
    const before = { exercise: first, shelved: false };
    const nameOf = (id: string) => `<${id}>`;
    const after = {
      exercise: {
        ...first,
        rest: 150,
        harder: "some-other",
        doses: { heavy: { sets: { low: 3, high: 3 }, reps: { low: 5, high: 5 } } },
      },
      shelved: true,
    };
    const lines = changeLines({ ...entry, before, after }, nameOf);
    expect(lines[0]).toBe("Shelved");
    expect(lines.map((line) => line.split(":")[0])).toEqual([
      "Shelved",
      "Heavy",
      "Volume",
      "Rest",
      "Harder form",
    ]);
    expect(lines).toContain("Rest: 2 min 30 s, was 60 s");
    expect(changeLines({ ...entry, before: null, after: before }, nameOf)).toEqual(["Added"]);
    expect(changeLines({ ...entry, before, after: null }, nameOf)).toEqual(["Back to the library’s form"]);
  });
});
