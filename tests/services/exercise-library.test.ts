import { asc, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import {
  findExercise,
  listExercises,
  putTeamExercise,
  removeTeamExercise,
  replaceLibrary,
} from "@/db/queries/exercises";
import { libraryExercises } from "@/db/schema";
import { EXERCISES } from "@/db/seed/exercises";
import { ensureLibrary } from "@/lib/services/exercises/library";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const AT = new Date("2026-12-01T08:00:00Z");

const stored = async () =>
  (await db.select().from(libraryExercises).orderBy(asc(libraryExercises.position))).map(
    (row) => row.exercise,
  );
const first = EXERCISES[0];
if (!first) throw new Error("the library is empty");

describe("the exercise library", () => {
  it("stands in every database, as its data say and in their order", async () => {
    expect(await stored()).toEqual(EXERCISES);
  });

  it("is written only where it differs: a second start writes nothing", async () => {
    expect(await replaceLibrary(db, EXERCISES)).toBe(0);
    await db.update(libraryExercises).set({ position: 999 }).where(eq(libraryExercises.id, first.id));
    expect(await replaceLibrary(db, EXERCISES)).toBe(1);
    expect(await stored()).toEqual(EXERCISES);
  });

  it("forgets what its data no longer hold and takes it back, also when four processes start at once", async () => {
    await replaceLibrary(db, EXERCISES.slice(1));
    expect(await stored()).toEqual(EXERCISES.slice(1));
    await Promise.all([1, 2, 3, 4].map(() => ensureLibrary(db)));
    expect(await stored()).toEqual(EXERCISES);
  });

  it("no id can meet a team's own, which begin with own-", () => {
    expect(EXERCISES.filter(({ id }) => id.startsWith("own-") || id === "new")).toEqual([]);
  });
});

describe("a team's exercises", () => {
  it("are the library's until the team changes one, and for that team alone", async () => {
    const { team } = await teamWithEveryRole(db);
    const other = await teamWithEveryRole(db);
    const changed = { ...first, rest: first.rest + 30 };
    await putTeamExercise(db, team.id, { exercise: changed, shelved: false }, AT);
    const list = await listExercises(db, team.id);
    expect(list).toHaveLength(EXERCISES.length);
    expect(list[0]).toEqual({
      exercise: changed,
      origin: "changed",
      shelved: false,
      changedAt: AT,
      library: first,
    });
    expect((await listExercises(db, other.team.id))[0]).toMatchObject({ exercise: first, origin: "library" });
    await ensureLibrary(db);
    expect((await findExercise(db, team.id, first.id))?.exercise).toEqual(changed);
    await removeTeamExercise(db, team.id, first.id);
    expect(await findExercise(db, team.id, first.id)).toMatchObject({ exercise: first, changedAt: null });
  });

  it("own ones stand behind the library's and are nobody else's", async () => {
    const { team } = await teamWithEveryRole(db);
    const other = await teamWithEveryRole(db);
    const own = { ...first, id: "own-quay-turn", name: "Quay turn" };
    await putTeamExercise(db, team.id, { exercise: own, shelved: true }, AT);
    const list = await listExercises(db, team.id);
    expect(list.at(-1)).toMatchObject({ exercise: own, origin: "team", shelved: true, library: null });
    expect(await findExercise(db, other.team.id, own.id)).toBeNull();
    expect(await listExercises(db, other.team.id)).toHaveLength(EXERCISES.length);
  });

  it("a library exercise that is only shelved keeps saying that it is the library's form", async () => {
    const { team } = await teamWithEveryRole(db);
    await putTeamExercise(db, team.id, { exercise: first, shelved: true }, AT);
    expect(await findExercise(db, team.id, first.id)).toMatchObject({ origin: "library", shelved: true });
  });
});
