import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { athletes, auditLog, users } from "@/db/schema";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import type { SaveEdit } from "@/lib/schemas/prescription";
import { createCamp } from "@/lib/services/camps/create";
import { readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import type { TeamContext } from "@/lib/services/context";
import { addBest } from "@/lib/services/prescription/bests";
import { saveEdit } from "@/lib/services/prescription/save-edit";
import { dropSwap, saveSwap } from "@/lib/services/prescription/swap";
import { readToday } from "@/lib/services/today/read-today";
import { campForm } from "../factories/camp-book";
import { testDatabase } from "../setup/database";
import { dayScene, done, keep, refusal, type DayScene } from "./day-scene";
import { coming, first, liftOf, lineOf, read } from "./prescription-scene";

const { db } = await testDatabase();

const put = (ctx: TeamContext, scene: DayScene, sid: string, body: SaveEdit) =>
  saveEdit(ctx, { params: { id: scene.campId, sid }, body });

const swap = (ctx: TeamContext, scene: DayScene, body: Parameters<typeof saveSwap>[1]["body"]) =>
  saveSwap(ctx, { params: { id: scene.campId }, body });

describe("the page of a session", () => {
  it("gives the coach lines whose sets add up to the lift's, with reasons, and what stands before and after", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    const view = await read(scene.as("strength"), scene, row.id);
    const { lift, lines } = liftOf(view);
    expect(lines.reduce((sum, line) => sum + line.sets, 0)).toBe(lift.sets);
    expect(lines.every((line) => line.reasons.length > 0 && line.planned === null)).toBe(true);
    expect(view.previous && view.previous.date <= view.session.date).toBe(true);
    expect(view.next && view.next.date >= view.session.date).toBe(true);
    const there = await read(scene.as("strength"), scene, view.next?.id ?? "");
    expect(there.previous?.id).toBe(row.id);
  });

  it("gives a guest dates and no number", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    const view = await read(scene.as("guest"), scene, row.id);
    expect(view).toMatchObject({ lift: null, log: null, lastTime: {}, may: [] });
    expect(view.session).toMatchObject({ date: row.day, start: row.start, effort: null });
    expect(JSON.stringify(view)).not.toMatch(/reserve|percent|"sets"/);
  });

  it("gives a skills coach percentages without the best behind them", async () => {
    const scene = await dayScene(db);
    await addBest(scene.as("head"), {
      params: { id: scene.athlete.id },
      body: { exerciseId: "back-squat", day: "2026-11-01", kg: 140, reps: 1, formula: null },
    });
    const row = await first(scene, "strength-a");
    const coach = await read(scene.as("strength"), scene, row.id);
    const skills = await read(scene.as("skills"), scene, row.id);
    expect(liftOf(coach).lines.some((line) => line.load.of === "best")).toBe(true);
    expect(liftOf(skills).lines.some((line) => line.load.of === "percent")).toBe(true);
    expect(JSON.stringify(skills)).not.toContain("140");
    expect(skills.log).toBeNull();
  });

  it("shows what was logged beside what was asked, which then stands whatever is planned later", async () => {
    const scene = await dayScene(db);
    const row = await scene.lastLift();
    const before = liftOf(await read(scene.as("strength"), scene, row.id));
    const line = before.lines[0];
    if (!line) throw new Error("no line");
    const set = { slot: line.slot, number: 1, exerciseId: line.exercise, kg: 80, reps: 5, reserve: 2 };
    await keep(scene.as("strength"), scene.campId, row.id, done({ sets: [set] }));
    await db.update(athletes).set({ equipment: [] }).where(eq(athletes.id, scene.athlete.id));
    const after = await read(scene.as("athlete"), scene, row.id);
    expect(after.log?.sets).toEqual([set]);
    expect(liftOf(after).lines.map((one) => one.exercise)).toEqual(before.lines.map((one) => one.exercise));
    expect(liftOf(after).closed).toContain("logged as done");
    expect(after.may).not.toContain("prescription.write");
  });

  it("shows athletes the unit of their plates and others that of their account", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    await db.update(athletes).set({ plateUnit: "lb" }).where(eq(athletes.id, scene.athlete.id));
    expect((await read(scene.as("athlete"), scene, row.id)).unit).toBe("lb");
    expect((await read(scene.as("head"), scene, row.id)).unit).toBe("kg");
    await db
      .update(users)
      .set({ units: "lb" })
      .where(eq(users.id, scene.as("head").userId));
    expect((await read(scene.as("head"), scene, row.id)).unit).toBe("lb");
  });

  it("is missing for another athlete, another team, and a session that the camp does not have", async () => {
    const scene = await dayScene(db);
    const other = await dayScene(db);
    const row = await first(scene, "strength-a");
    const { id: campId } = await createCamp(scene.as("head"), {
      body: campForm({ athlete: { name: "Someone else" } }),
    });
    const [theirs] = (await readCamp(scene.as("head"), { params: { id: campId } })).plan.lifts;
    for (const attempt of [
      () => read(other.as("head"), scene, row.id),
      () => read(scene.as("head"), scene, "nothing"),
      () => read(scene.as("athlete"), { campId }, theirs?.id ?? ""),
    ])
      expect(await refusal(attempt())).toMatchObject({ code: "not-found" });
  });
});

describe("a coach's edit", () => {
  const EDIT = {
    base: null,
    edit: { lines: { "main-lower": { sets: 4, kg: 100, note: "Stop two short." } }, note: "Slow today." },
  } satisfies SaveEdit;

  it("is shown as an edit beside what was planned, and reaches the athlete at once", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    const planned = lineOf(await read(scene.as("strength"), scene, row.id), "main-lower");
    const view = await put(scene.as("strength"), scene, row.id, EDIT);
    expect(lineOf(view, "main-lower")).toMatchObject({
      sets: 4,
      note: "Stop two short.",
      edited: ["sets", "kg", "note"],
      load: { kg: 100 },
      planned: { sets: planned.sets, exercise: planned.exercise, load: planned.load },
    });
    expect(view.lift).toMatchObject({
      note: "Slow today.",
      edit: { by: expect.stringContaining("strength") },
    });
    // Some hours before: the phone keeps seven days.
    const ahead = new Date(row.startsAt.getTime() - 3 * 3_600_000);
    const today = await readToday(scene.as("athlete", ahead));
    const session = today.days.flatMap((day) => day.sessions).find(({ id }) => id === row.id);
    expect(session?.prescription?.lines.find(({ slot }) => slot === "main-lower")).toMatchObject({ sets: 4 });
    const rows = await db.select().from(auditLog).where(eq(auditLog.action, "prescription.edit"));
    expect(rows.find(({ subject }) => subject === scene.campId)?.detail).toMatchObject({ liftId: row.id });
  });

  it("survives re-planning: the lift moves, the edit stays on it", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    await put(scene.as("strength"), scene, row.id, EDIT);
    const head = scene.as("head");
    const { revision, plan } = await readCamp(head, { params: { id: scene.campId } });
    const lift = plan.lifts.find(({ id }) => id === row.id);
    if (!lift) throw new Error("no lift");
    const week = plan.weeks.find(({ weeksOut }) => weeksOut === lift.week);
    const day = Math.max((week?.from ?? lift.day) as number, lift.day + 1) as Day;
    await saveChange(head, {
      params: { id: scene.campId },
      body: {
        change: {
          kind: "lift.move",
          liftId: lift.id,
          item: lift.item,
          week: lift.week,
          date: isoFromDay(day),
          start: "15:00",
        },
        baseRevision: revision,
        idempotencyKey: randomUUID(),
      },
    });
    const view = await read(head, scene, row.id);
    expect(view.session).toMatchObject({ date: isoFromDay(day), start: "15:00" });
    expect(lineOf(view, "main-lower")).toMatchObject({ sets: 4, load: { kg: 100 } });
  });

  it("on an older one is stale, with what stands; empty takes it away", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    const view = await put(scene.as("strength"), scene, row.id, EDIT);
    const error = await refusal(put(scene.as("head"), scene, row.id, EDIT));
    expect(error).toMatchObject({ code: "stale", extra: { current: { edit: EDIT.edit } } });
    const base = view.lift?.edit?.changedAt ?? null;
    const again = await put(scene.as("head"), scene, row.id, {
      base,
      edit: { lines: { "main-lower": { sets: 3 } } },
    });
    expect(again.lift?.edit?.changedAt).not.toBe(base);
    const bare = await put(scene.as("head"), scene, row.id, {
      base: again.lift?.edit?.changedAt ?? null,
      edit: { lines: { "main-lower": { note: "" } } },
    });
    expect(bare.lift?.edit).toBeNull();
    expect(lineOf(bare, "main-lower").edited).toEqual([]);
  });

  it("names an exercise of the team that the athlete may do, in a place that the session has", async () => {
    const scene = await dayScene(db);
    const row = await first(scene, "strength-a");
    const coach = scene.as("strength");
    const line = (exercise: string, slot = "main-lower") =>
      put(coach, scene, row.id, { base: null, edit: { lines: { [slot]: { exercise } } } });
    const chosen = await line("goblet-squat");
    expect(lineOf(chosen, "main-lower")).toMatchObject({ exercise: "goblet-squat", edited: ["exercise"] });
    await put(coach, scene, row.id, { base: chosen.lift?.edit?.changedAt ?? null, edit: { lines: {} } });
    expect((await refusal(line("no-such-thing"))).extra.errors).toMatchObject([
      { pointer: "/edit/lines/main-lower/exercise" },
    ]);
    expect((await refusal(line("goblet-squat", "elsewhere"))).extra.errors).toMatchObject([
      { pointer: "/edit/lines/elsewhere" },
    ]);
    await db
      .update(athletes)
      .set({ equipment: ["barbell", "rack"] })
      .where(eq(athletes.id, scene.athlete.id));
    expect((await refusal(line("goblet-squat"))).userMessage).toMatch(/there is no/);
  });

  it("is refused once the session was logged, and to everyone but head and S&C coach", async () => {
    const scene = await dayScene(db);
    const row = await scene.lastLift();
    // Not logged yet: a coach may still write down what was meant.
    await put(scene.as("strength"), scene, row.id, {
      base: null,
      edit: { lines: {}, note: "As discussed." },
    });
    await keep(scene.as("strength"), scene.campId, row.id, done());
    expect(await refusal(put(scene.as("strength"), scene, row.id, EDIT))).toMatchObject({ code: "conflict" });
    for (const role of ["athlete", "skills", "medic", "guest"] as const)
      expect(await refusal(put(scene.as(role), scene, row.id, EDIT))).toMatchObject({ code: "forbidden" });
    const other = await dayScene(db);
    expect(await refusal(put(other.as("head"), scene, row.id, EDIT))).toMatchObject({ code: "not-found" });
  });
});

describe("a swap", () => {
  /** An accessory of the next Strength A with its first alternative. */
  async function swappable(scene: DayScene) {
    const row = await first(scene, "strength-a");
    const view = await read(scene.as("athlete"), scene, row.id);
    const line = liftOf(view).lines.find(({ slot, swaps }) => slot !== "main-lower" && swaps.length > 0);
    const to = line?.swaps[0];
    if (!line || to === undefined) throw new Error("nothing to swap");
    return { row, slot: line.slot, from: line.exercise, to };
  }

  it("by the athlete is kept for all sessions of the item in this camp, and put back", async () => {
    const scene = await dayScene(db);
    const { row, slot, from, to } = await swappable(scene);
    const athlete = scene.as("athlete");
    expect(await swap(athlete, scene, { item: "strength-a", from, to })).toEqual({
      swaps: [{ item: "strength-a", from, to }],
    });
    const view = await read(athlete, scene, row.id);
    expect(lineOf(view, slot)).toMatchObject({ exercise: to, swappedFrom: { id: from } });
    for (const { id } of await coming(scene, "strength-a"))
      expect(liftOf(await read(athlete, scene, id)).lines.map(({ exercise }) => exercise)).not.toContain(
        from,
      );
    const back = { params: { id: scene.campId }, body: { item: "strength-a", from } as const };
    expect(await dropSwap(scene.as("strength"), back)).toEqual({ swaps: [] });
    expect(lineOf(await read(athlete, scene, row.id), slot)).toMatchObject({
      exercise: from,
      swappedFrom: null,
    });
    expect(await refusal(dropSwap(athlete, back))).toMatchObject({ code: "not-found" });
  });

  it("made again takes the place of the first", async () => {
    const scene = await dayScene(db);
    const { from, to } = await swappable(scene);
    const row = await first(scene, "strength-a");
    await swap(scene.as("athlete"), scene, { item: "strength-a", from, to });
    const view = await read(scene.as("athlete"), scene, row.id);
    const other = liftOf(view).lines.find((line) => line.exercise === to)?.swaps[0];
    if (other === undefined) throw new Error("no other");
    await swap(scene.as("strength"), scene, { item: "strength-a", from, to: other });
    const lines = liftOf(await read(scene.as("athlete"), scene, row.id)).lines;
    expect(lines.find((line) => line.swappedFrom)).toMatchObject({
      exercise: other,
      swappedFrom: { id: from },
    });
  });

  it("is refused in words for other work, for what the athlete may not do, and for what is not there", async () => {
    const scene = await dayScene(db);
    await db
      .update(athletes)
      .set({ limitationCodes: ["knee-deep"] })
      .where(eq(athletes.id, scene.athlete.id));
    const ask = (from: string, to: string) =>
      refusal(swap(scene.as("athlete"), scene, { item: "strength-a", from, to }));
    const [deep, other, none, same] = [
      await ask("high-box-squat", "front-squat"),
      await ask("back-squat", "bench-press"),
      await ask("back-squat", "no-such-thing"),
      await ask("back-squat", "back-squat"),
    ];
    expect(deep).toMatchObject({ code: "invalid", extra: { errors: [{ pointer: "/to" }] } });
    expect(deep.userMessage).toMatch(/limitation rules it out: knee deep/);
    expect(other.userMessage).toMatch(/trains nothing that/);
    expect(none.extra.errors).toMatchObject([{ pointer: "/to" }]);
    expect(same.code).toBe("invalid");
  });

  it("is forbidden to those who neither coach lifting nor lift, and the camp is missing for another athlete", async () => {
    const scene = await dayScene(db);
    const body = { item: "strength-a", from: "back-squat", to: "front-squat" } as const;
    for (const role of ["skills", "medic", "guest"] as const)
      expect(await refusal(swap(scene.as(role), scene, body))).toMatchObject({ code: "forbidden" });
    const other = await dayScene(db);
    expect(await refusal(swap(other.as("athlete"), scene, body))).toMatchObject({ code: "not-found" });
  });
});
