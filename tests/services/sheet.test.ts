import { describe, expect, it } from "vitest";
import { createCamp } from "@/lib/services/camps/create";
import { addBest } from "@/lib/services/prescription/bests";
import { saveEdit } from "@/lib/services/prescription/save-edit";
import { readSheet } from "@/lib/services/prescription/sheet";
import type { SheetView } from "@/lib/schemas/prescription";
import { campForm } from "../factories/camp-book";
import { testDatabase } from "../setup/database";
import { dayScene, done, keep, refusal } from "./day-scene";

const { db } = await testDatabase();
const liftsOf = (view: SheetView) =>
  view.days.flatMap(({ sessions }) => sessions).filter(({ source }) => source === "lift");

describe("the sheet of a camp week", () => {
  it("has seven days with sport and lifting, and each lift's lines add up to its sets", async () => {
    const scene = await dayScene(db);
    const view = await readSheet(scene.as("strength"), { campId: scene.campId, week: "4" });
    expect(view.days).toHaveLength(7);
    expect(view.week).toMatchObject({ weeksOut: 4, from: "2026-12-06", to: "2026-12-12", daysOut: 34 });
    expect(view.weeks).toEqual([7, 6, 5, 4, 3, 2, 1, 0]);
    expect(view.days.flatMap(({ sessions }) => sessions).some(({ source }) => source === "sport")).toBe(true);
    expect(liftsOf(view).length).toBeGreaterThan(1);
    for (const { lift } of liftsOf(view))
      expect(lift?.lines.reduce((sum, line) => sum + line.sets, 0)).toBe(lift?.sets);
  });

  it("is that of today unless another is asked for, and never outside the camp", async () => {
    const scene = await dayScene(db);
    const weekFor = async (week: string | null) =>
      (await readSheet(scene.as("head"), { campId: scene.campId, week })).week.weeksOut;
    // Tuesday 1 December is 39 days before Saturday 9 January.
    expect(await weekFor(null)).toBe(5);
    expect([await weekFor("x"), await weekFor("-1"), await weekFor("99"), await weekFor("0")]).toEqual([
      5, 5, 7, 0,
    ]);
  });

  it("shows what a coach wrote, and what was asked when it was logged", async () => {
    const scene = await dayScene(db);
    const row = await scene.lastLift();
    const body = { base: null, edit: { lines: {}, note: "As discussed." } };
    await saveEdit(scene.as("strength"), { params: { id: scene.campId, sid: row.id }, body });
    const week = String(row.lift?.week);
    const before = liftsOf(await readSheet(scene.as("head"), { campId: scene.campId, week }));
    await keep(scene.as("strength"), scene.campId, row.id, done());
    await addBest(scene.as("head"), {
      params: { id: scene.athlete.id },
      body: { exerciseId: "back-squat", day: "2026-11-16", kg: 140, reps: 1, formula: null },
    });
    const after = liftsOf(await readSheet(scene.as("head"), { campId: scene.campId, week }));
    const of = (lifts: typeof before) => lifts.find(({ id }) => id === row.id)?.lift;
    expect(of(after)?.note).toBe("As discussed.");
    expect(of(after)).toEqual(of(before));
  });

  it("gives a guest dates alone, and is missing for another athlete", async () => {
    const scene = await dayScene(db);
    const guest = await readSheet(scene.as("guest"), { campId: scene.campId, week: "4" });
    expect(liftsOf(guest).length).toBeGreaterThan(0);
    expect(liftsOf(guest).every(({ lift }) => lift === null)).toBe(true);
    const { id: campId } = await createCamp(scene.as("head"), {
      body: campForm({ athlete: { name: "Someone else" } }),
    });
    expect(await refusal(readSheet(scene.as("athlete"), { campId, week: null }))).toMatchObject({
      code: "not-found",
    });
  });
});
