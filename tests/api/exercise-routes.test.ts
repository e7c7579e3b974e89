import { eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import { GET as readExercise, PUT as putExercise } from "@/app/api/exercises/[id]/route";
import { POST as restore } from "@/app/api/exercises/[id]/restore/route";
import { POST as shelve } from "@/app/api/exercises/[id]/shelve/route";
import { GET as listExercises, POST as addExercise } from "@/app/api/exercises/route";
import { auditLog, liftEdits, loggedSets, swaps, teamExercises } from "@/db/schema";
import { EXERCISES } from "@/db/seed/exercises";
import {
  exerciseFormSchema,
  exerciseOfForm,
  formOfExercise,
  type ExerciseSummary,
  type ExerciseView,
} from "@/lib/schemas/exercise";
import { testDatabase } from "../setup/database";
import { call, problemOf } from "./client";
import { EXERCISE_FORM } from "./bodies";
import { sceneOf } from "./scene";

const NOW = "2026-12-01T08:00:00Z";
process.env.BELLWARD_NOW = NOW;
const { db } = await testDatabase();

let own: Awaited<ReturnType<typeof sceneOf>>;
let cookie: string;
beforeEach(async () => {
  own = await sceneOf(db, new Date(NOW));
  cookie = await own.cookie("strength");
});

const json = async <T>(response: Response, status = 200): Promise<T> => {
  expect(response.status, await response.clone().text()).toBe(status);
  return (await response.json()) as T;
};
const listed = async () =>
  (await json<{ exercises: ExerciseSummary[] }>(await call(listExercises, { cookie }))).exercises;
const read = async (id: string) => json<ExerciseView>(await call(readExercise, { cookie, params: { id } }));
const put = (id: string, body: unknown) => call(putExercise, { method: "PUT", cookie, params: { id }, body });
const first = EXERCISES[0];
if (!first) throw new Error("the library is empty");
const { id } = first;
const slower = { ...formOfExercise(first), rest: first.rest + 15 };

describe("the form of an exercise", () => {
  it("takes every exercise of the library and gives it back as it was", () => {
    for (const exercise of EXERCISES) {
      const form = exerciseFormSchema.safeParse(formOfExercise(exercise));
      expect([exercise.id, form.error?.issues ?? []]).toEqual([exercise.id, []]);
      if (form.success) expect(exerciseOfForm(exercise.id, form.data)).toEqual(exercise);
    }
  });
});

describe("the team's list", () => {
  it("holds the library and the team's own, and says where each comes from", async () => {
    const list = await listed();
    expect(list).toHaveLength(EXERCISES.length + 1);
    expect(list.find((one) => one.exercise.id === id)).toEqual({
      exercise: first,
      origin: "library",
      shelved: false,
      changedAt: null,
      use: { camps: 0, sets: 0 },
    });
    expect(list.at(-1)).toMatchObject({ exercise: { id: own.scene.exerciseId }, origin: "team" });
  });

  it("counts camps that chose or logged an exercise, and sets of the last 8 weeks, of this team alone", async () => {
    const other = await sceneOf(db, new Date(NOW));
    const at = new Date(NOW);
    for (const { teamId, scene } of [own, other]) {
      const { campId, athleteId } = scene;
      const where = { teamId, campId };
      await db.insert(swaps).values({ ...where, item: "strength-a", fromExercise: "x", toExercise: id });
      const edit = { lines: { "main-lower": { exercise: id, sets: 3 }, other: { sets: 2 } } };
      await db.insert(liftEdits).values({ ...where, liftId: "a1", edit, changedAt: at });
      const set = { ...where, athleteId, sessionId: "a1", slot: "s", exerciseId: id, reps: 5 };
      await db.insert(loggedSets).values([
        { ...set, number: 1, day: "2026-11-30" },
        // 8 weeks before 1 December 2026 is 6 October.
        { ...set, number: 2, day: "2026-10-06" },
        { ...set, number: 3, day: "2026-10-05" },
      ]);
    }
    const use = (await listed()).find((one) => one.exercise.id === id)?.use;
    expect(use).toEqual({ camps: 1, sets: 2 });
    expect((await read(id)).use).toEqual(use);
  });
});

describe("an edit", () => {
  it("is the team's own form, with who, when and what in its history and in the log", async () => {
    const view = await json<ExerciseView>(await put(id, { ...slower, changedAt: null }));
    expect(view).toMatchObject({ exercise: { ...first, rest: first.rest + 15 }, origin: "changed" });
    expect(view.history).toMatchObject([
      {
        before: { exercise: first, shelved: false },
        after: { exercise: { ...first, rest: first.rest + 15 }, shelved: false },
        at: view.changedAt,
        by: own.people[1]?.name,
      },
    ]);
    const log = await db.select().from(auditLog).where(eq(auditLog.teamId, own.teamId));
    expect(log.map(({ action, subject }) => [action, subject])).toContainEqual(["exercise.update", id]);
  });

  it("of what someone else changed meanwhile is refused, also right after it", async () => {
    const view = await json<ExerciseView>(await put(id, { ...slower, changedAt: null }));
    const stale = await put(id, { ...slower, rest: 20, changedAt: null });
    expect(stale.status).toBe(409);
    expect((await problemOf(stale)).type).toBe("tag:bellward,2026:stale");
    const next = await json<ExerciseView>(await put(id, { ...slower, rest: 20, changedAt: view.changedAt }));
    expect(next.changedAt).not.toBe(view.changedAt);
    expect((await put(id, { ...slower, changedAt: view.changedAt })).status).toBe(409);
    expect((await read(id)).exercise.rest).toBe(20);
  });

  it("of two at once, one is saved and one refused", async () => {
    const answers = await Promise.all([10, 20].map((rest) => put(id, { ...slower, rest, changedAt: null })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
  });

  it("that changes nothing writes nothing", async () => {
    await json(await put(id, { ...formOfExercise(first), changedAt: null }));
    const rows = await db.select().from(teamExercises).where(eq(teamExercises.teamId, own.teamId));
    expect(rows.map((row) => row.id)).toEqual([own.scene.exerciseId]);
    expect((await read(id)).history).toEqual([]);
  });

  const bad = (over: object) => ({ ...slower, ...over, changedAt: null });
  it.each([
    ["no name", bad({ name: " " }), "/name"],
    ["the name of another", bad({ name: EXERCISES[1]?.name.toUpperCase() }), "/name"],
    ["no quality", bad({ qualities: [] }), "/qualities"],
    ["a quality twice", bad({ qualities: ["grip", "grip"] }), "/qualities"],
    ["nothing it is for", bad({ doses: { heavy: null, volume: null, fast: null, hold: null } }), "/doses"],
    [
      "sets that end before they begin",
      bad({ doses: { ...slower.doses, volume: { sets: { low: 4, high: 3 }, reps: { low: 5, high: 5 } } } }),
      "/doses/volume/sets/high",
    ],
    [
      "more repetitions than heavy is",
      bad({ doses: { ...slower.doses, heavy: { sets: { low: 3, high: 3 }, reps: { low: 5, high: 13 } } } }),
      "/doses/heavy/reps/high",
    ],
    [
      "a main lift that is never heavy",
      bad({ main: true, doses: { ...slower.doses, heavy: null } }),
      "/main",
    ],
    ["one cue", bad({ cues: ["One", " "] }), "/cues"],
    ["a cue of 91 characters", bad({ cues: ["One", "x".repeat(91)] }), "/cues/1"],
    ["an hour of rest", bad({ rest: 3600 }), "/rest"],
    ["a power zone without a best", bad({ load: "body", powerZone: { low: 30, high: 60 } }), "/powerZone"],
    ["itself as its easier form", bad({ easier: id }), "/easier"],
    ["an unknown harder form", bad({ harder: "no-such" }), "/harder"],
    ["the best of what has none", bad({ load: "best", bestOf: "no-such" }), "/bestOf"],
  ])("with %s is refused beside its field, and nothing is saved", async (_, body, pointer) => {
    const response = await put(id, body);
    expect(response.status).toBe(422);
    expect((await problemOf(response)).errors?.map((error) => error.pointer)).toContain(pointer);
    expect((await read(id)).changedAt).toBeNull();
  });
});

describe("an exercise of the team's own", () => {
  it("gets an id from its name, another one for the same letters, and none of the library", async () => {
    const add = async (name: string) =>
      (await json<{ id: string }>(await call(addExercise, { cookie, body: { ...EXERCISE_FORM, name } }), 201))
        .id;
    expect(await add("Čamac: pull & turn")).toBe("own-camac-pull-turn");
    expect(await add("Camac pull turn")).toBe("own-camac-pull-turn-2");
    expect(await add("—")).toBe("own-exercise");
    expect((await read("own-camac-pull-turn")).history).toMatchObject([{ before: null }]);
    const again = await call(addExercise, { cookie, body: { ...EXERCISE_FORM, name: "camac PULL turn" } });
    expect((await problemOf(again)).errors?.[0]?.pointer).toBe("/name");
  });

  it("has no form in the library to go back to", async () => {
    const params = { id: own.scene.exerciseId };
    const { changedAt } = await read(params.id);
    const response = await call(restore, { cookie, params, body: { changedAt } });
    expect(response.status).toBe(409);
    expect((await problemOf(response)).type).toBe("tag:bellward,2026:conflict");
  });
});

describe("shelving and going back", () => {
  it("a shelved exercise keeps its form, and comes back", async () => {
    const params = { id };
    const away = await json<ExerciseView>(
      await call(shelve, { cookie, params, body: { shelved: true, changedAt: null } }),
    );
    expect(away).toMatchObject({ shelved: true, origin: "library", exercise: first });
    const { changedAt } = away;
    const back = await json<ExerciseView>(
      await call(shelve, { cookie, params, body: { shelved: false, changedAt } }),
    );
    expect(back).toMatchObject({ shelved: false, changedAt: null });
    expect(back.history.map((entry) => entry.after?.shelved)).toEqual([false, true]);
  });

  it("shelving what someone else changed meanwhile is refused", async () => {
    await json(await put(id, { ...slower, changedAt: null }));
    const body = { shelved: true, changedAt: null };
    expect((await call(shelve, { cookie, params: { id }, body })).status).toBe(409);
  });

  it("the library's form comes back with the whole history kept, and once", async () => {
    const { changedAt } = await json<ExerciseView>(await put(id, { ...slower, changedAt: null }));
    const stale = await call(restore, { cookie, params: { id }, body: { changedAt: null } });
    expect((await problemOf(stale)).type).toBe("tag:bellward,2026:stale");
    const back = await json<ExerciseView>(
      await call(restore, { cookie, params: { id }, body: { changedAt } }),
    );
    expect(back).toMatchObject({ exercise: first, origin: "library", changedAt: null });
    expect(back.history.map((entry) => entry.after?.exercise.rest ?? null)).toEqual([null, first.rest + 15]);
    const again = await call(restore, { cookie, params: { id }, body: { changedAt: null } });
    expect((await problemOf(again)).type).toBe("tag:bellward,2026:conflict");
  });
});
