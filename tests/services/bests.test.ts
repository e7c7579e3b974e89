import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { athletes } from "@/db/schema";
import { addBest, dropBest, listAthleteBests } from "@/lib/services/prescription/bests";
import { testDatabase } from "../setup/database";
import { dayScene, refusal, type DayScene } from "./day-scene";
import { coming, liftOf, read } from "./prescription-scene";

const { db } = await testDatabase();

describe("a best", () => {
  const params = (scene: DayScene) => ({ params: { id: scene.athlete.id } });
  const record = { exerciseId: "back-squat", day: "2026-11-03", kg: 110, reps: 4, formula: "epley" } as const;

  it("added by the athlete loads the sessions to come at once, with what it comes from", async () => {
    const scene = await dayScene(db);
    await db
      .update(athletes)
      .set({ equipment: ["barbell", "rack", "plate"] })
      .where(eq(athletes.id, scene.athlete.id));
    const loads = async () => {
      const views = [];
      for (const { id } of await coming(scene, "strength-a"))
        views.push(await read(scene.as("athlete"), scene, id));
      return views.flatMap((view) =>
        liftOf(view).lines.flatMap(({ load }) =>
          load.of === "best" ? [{ load, bests: liftOf(view).bests }] : [],
        ),
      );
    };
    expect(await loads()).toEqual([]);
    const best = await addBest(scene.as("athlete"), { ...params(scene), body: record });
    // 110 x (1 + 4 / 30), the equation as LeSuer et al. 1997 list it (from memory).
    expect(best.kg).toBeCloseTo(124.667, 3);
    const loaded = await loads();
    expect(loaded.length).toBeGreaterThan(0);
    for (const { load, bests } of loaded) {
      expect(load.best.from).toBe("epley");
      expect(load.kg % 2.5).toBe(0);
      expect(bests).toContainEqual(best);
    }
  });

  it("newest of its lift counts, and taken away the older one counts again", async () => {
    const scene = await dayScene(db);
    const head = scene.as("head");
    const older = await addBest(head, { ...params(scene), body: record });
    const newer = await addBest(head, {
      ...params(scene),
      body: { ...record, day: "2026-11-20", kg: 130, reps: 1, formula: null },
    });
    expect(newer).toMatchObject({ formula: null, kg: 130 });
    const list = async () => (await listAthleteBests(head, params(scene))).bests.map(({ id }) => id);
    expect(await list()).toEqual([newer.id, older.id]);
    await dropBest(head, { params: { id: newer.id } });
    expect(await list()).toEqual([older.id]);
    expect(await refusal(dropBest(head, { params: { id: newer.id } }))).toMatchObject({ code: "not-found" });
  });

  it("is refused beside its field: a day to come, an exercise without a best, one that takes another's", async () => {
    const scene = await dayScene(db);
    const ask = async (over: Partial<Parameters<typeof addBest>[1]["body"]>) =>
      (await refusal(addBest(scene.as("head"), { ...params(scene), body: { ...record, ...over } }))).extra
        .errors;
    expect(await ask({ day: "2026-12-02" })).toMatchObject([{ pointer: "/day" }]);
    expect(await ask({ exerciseId: "wall-sit" })).toMatchObject([{ pointer: "/exerciseId" }]);
    expect(await ask({ exerciseId: "nothing" })).toMatchObject([{ pointer: "/exerciseId" }]);
    // The schema stops it before; the engine would too (Reynolds et al. 2006: at most 10 repetitions).
    expect(await ask({ reps: 11 })).toMatchObject([{ pointer: "/reps" }]);
  });

  it("of another athlete or team cannot be added, seen or taken away", async () => {
    const scene = await dayScene(db);
    const other = await dayScene(db);
    const best = await addBest(scene.as("head"), { ...params(scene), body: record });
    for (const ctx of [other.as("head"), other.as("athlete")]) {
      expect(await refusal(addBest(ctx, { ...params(scene), body: record }))).toMatchObject({
        code: "not-found",
      });
      expect(await refusal(listAthleteBests(ctx, params(scene)))).toMatchObject({ code: "not-found" });
      expect(await refusal(dropBest(ctx, { params: { id: best.id } }))).toMatchObject({ code: "not-found" });
    }
    expect(await refusal(addBest(scene.as("skills"), { ...params(scene), body: record }))).toMatchObject({
      code: "forbidden",
    });
    expect(await refusal(dropBest(scene.as("medic"), { params: { id: best.id } }))).toMatchObject({
      code: "forbidden",
    });
  });
});
