import { randomUUID } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { mails, notices } from "@/db/schema";
import { ITEM_TITLES } from "@/lib/engine";
import type { Role } from "@/lib/policy";
import type { Change } from "@/lib/schemas/change";
import { createCamp } from "@/lib/services/camps/create";
import { readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { mailDeps, mailbox, makeJobsDue, runDueJobs } from "../mail/mailbox";
import { testDatabase } from "../setup/database";

const database = await testDatabase();
const { db, url } = database;
const box = await mailbox();
const NOW = new Date("2026-11-26T12:00:00Z");
const deps = mailDeps(database, box.url, () => NOW);

/** A laid-out camp; nobody has been told of anything yet. */
async function camp() {
  const team = await teamWithEveryRole(db, NOW);
  const head = team.as("head");
  const { id } = await createCamp(head, { body: campForm({ athlete: { id: team.athlete.id } }) });
  await makeJobsDue(database);
  await runDueJobs(url, deps);
  const before = (await box.caught()).length;
  const save = (change: Change, baseRevision: number) =>
    saveChange(head, { params: { id }, body: { change, baseRevision, idempotencyKey: randomUUID() } });
  const deliver = async () => {
    await makeJobsDue(database);
    await runDueJobs(url, deps);
    return (await box.caught()).slice(before);
  };
  return { ...team, id, save, deliver, view: await readCamp(head, { params: { id } }) };
}

const sparringTo = (sportId: string, date: string): Change => ({
  kind: "sport.edit",
  sportId,
  scope: "this",
  values: { date, start: "18:00" },
});

describe("a saved change", () => {
  it("is mailed once to each person concerned, and not to the one who saved it", async () => {
    const { save, deliver, view, people } = await camp();
    const saturday = view.sport.find(
      ({ kind, id }) => kind === "hard-sparring" && id.endsWith("@2026-12-05"),
    );
    const answer = await save(sparringTo(saturday?.id ?? "", "2026-12-03"), view.revision);
    const caught = await deliver();
    const concerned: Role[] = ["strength", "skills", "athlete"];
    const expected = people
      .filter(({ name }) => concerned.some((role) => name.startsWith(`${role} `)))
      .map(({ email }) => email);
    expect(caught.flatMap(({ envelope }) => envelope.to).sort()).toEqual(expected.sort());
    expect(caught).toHaveLength(answer.told);
  });

  it("tells the athlete every effect that the coach saw, with its sets and reasons", async () => {
    const { save, deliver, view, people } = await camp();
    const saturday = view.sport.find(
      ({ kind, id }) => kind === "hard-sparring" && id.endsWith("@2026-12-05"),
    );
    const { knockOn } = await save(sparringTo(saturday?.id ?? "", "2026-12-03"), view.revision);
    const address = people.find(({ name }) => name.startsWith("athlete "))?.email ?? "";
    const text = (await deliver()).find(({ envelope }) => envelope.to.includes(address))?.mail.text ?? "";
    expect(knockOn.lifts.length).toBeGreaterThan(0);
    for (const effect of knockOn.lifts) {
      expect(text).toContain(ITEM_TITLES[effect.item]);
      expect(text).toContain(`?session=${encodeURIComponent(effect.id)}`);
      for (const { text: why } of effect.because) expect(text).toContain(why);
      if (effect.setsBefore !== null && effect.setsAfter !== null && effect.setsBefore !== effect.setsAfter) {
        expect(text).toContain(`${effect.setsBefore} → ${effect.setsAfter} sets`);
      }
    }
  });

  it("that is put back within two minutes is told to nobody", async () => {
    const { save, deliver, view, team } = await camp();
    const saturday = view.sport.find(
      ({ kind, id }) => kind === "hard-sparring" && id.endsWith("@2026-12-05"),
    );
    const { revision } = await save(sparringTo(saturday?.id ?? "", "2026-12-03"), view.revision);
    await save({ kind: "put-back", revision }, revision);
    expect(await deliver()).toEqual([]);
    const rows = await db
      .select({ status: mails.status })
      .from(notices)
      .innerJoin(mails, eq(mails.id, notices.mailId))
      .where(and(eq(notices.teamId, team.id), eq(notices.revision, revision)));
    expect(rows).toEqual([{ status: "withheld" }, { status: "withheld" }, { status: "withheld" }]);
  });
});
