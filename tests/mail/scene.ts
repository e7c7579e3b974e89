import { eq } from "drizzle-orm";
import { beforeEach } from "vitest";
import { users } from "@/db/schema";
import type { Role } from "@/lib/policy";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";
import { mailDeps, mailbox } from "./mailbox";
import { knockOn, liftMoved, revise, savedCamp, sportMoved, type Saved } from "./saved-camp";

export const NOW = new Date("2026-11-26T12:00:00Z");
export const later = (seconds: number) => new Date(NOW.getTime() + seconds * 1000);

export const WHY = {
  rule: "rest.before-contact",
  text: "Was 17 h before the sparring; house rule asks 24 h.",
};
/** A sparring that moved, and the lift that moved with it. */
export const MOVE = knockOn({
  sport: [sportMoved("sat@2026-12-05", "2026-12-05 11:00", "2026-12-03 18:00")],
  lifts: [
    liftMoved("strength-a.5", "strength-a", "2026-12-02 18:00", "2026-11-30 18:00", { because: [WHY] }),
  ],
});

/** A database, a mail server and teams with a saved camp, for one test file. Jobs of one test never reach the next. */
export async function mailScene() {
  const database = await testDatabase();
  const { sql } = database;
  const box = await mailbox();
  beforeEach(async () => {
    await sql`delete from graphile_worker._private_jobs`;
  });
  return { database, deps: mailDeps(database, box.url, () => later(120)), scene: () => scene(database, box) };
}

async function scene(
  { db }: Awaited<ReturnType<typeof testDatabase>>,
  box: Awaited<ReturnType<typeof mailbox>>,
) {
  const team = await teamWithEveryRole(db, NOW);
  const campId = await savedCamp(db, team.team.id, team.athlete.id);
  const id = (role: Role) => team.as(role).userId;
  const address = (role: Role) => team.people.find((person) => person.id === id(role))?.email ?? "";
  return {
    ...team,
    campId,
    id,
    save: (saved: Partial<Saved>) =>
      revise(db, team.team.id, campId, {
        knockOn: MOVE,
        by: id("head"),
        to: [id("athlete")],
        now: NOW,
        ...saved,
      }),
    mailsTo: async (role: Role) =>
      (await box.caught()).filter(({ envelope }) => envelope.to.includes(address(role))),
    set: (role: Role, values: Partial<typeof users.$inferInsert>) =>
      db
        .update(users)
        .set(values)
        .where(eq(users.id, id(role))),
  };
}
