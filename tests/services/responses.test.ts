import { randomUUID } from "node:crypto";
import { describe, expect, it } from "vitest";
import { AppError } from "@/lib/errors";
import type { Change } from "@/lib/schemas/change";
import { createCamp } from "@/lib/services/camps/create";
import { listChanges, readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import type { TeamContext } from "@/lib/services/context";
import { campForm } from "../factories/camp-book";
import { teamWithEveryRole } from "../factories/team";
import { testDatabase } from "../setup/database";

const { db } = await testDatabase();
const NOW = new Date("2026-11-26T12:00:00Z");
const ACCEPTED = {
  id: "effort:a+b",
  from: "2026-11-30",
  to: "2026-12-06",
  factor: 0.7,
  because: "Check-in beyond own normal",
};

async function camp() {
  const team = await teamWithEveryRole(db, NOW);
  const { id } = await createCamp(team.as("head"), { body: campForm({ athlete: { id: team.athlete.id } }) });
  const read = (ctx: TeamContext) => readCamp(ctx, { params: { id } });
  const save = (ctx: TeamContext, change: Change, baseRevision: number) =>
    saveChange(ctx, { params: { id }, body: { change, baseRevision, idempotencyKey: randomUUID() } });
  return { ...team, id, read, save };
}

describe("an accepted suggestion, saved", () => {
  it("stays with the camp, lowers its sets, and put back leaves lifts and book as they were", async () => {
    const { as, id, read, save } = await camp();
    const before = await read(as("strength"));
    const { knockOn } = await save(as("strength"), { kind: "response.add", ...ACCEPTED }, 1);
    expect(knockOn.lifts.length).toBeGreaterThan(0);
    const standing = await read(as("strength"));
    expect(standing.book.responses).toEqual([ACCEPTED]);
    expect(standing.plan.lifts).not.toEqual(before.plan.lifts);
    await save(as("head"), { kind: "put-back", revision: 2 }, 2);
    const after = await read(as("strength"));
    expect(after.book).toEqual(before.book);
    expect(after.plan.lifts).toEqual(before.plan.lifts);
    expect(JSON.stringify(await listChanges(as("skills"), { params: { id } }))).not.toContain("own normal");
  });

  it("is written by coaches of lifting alone, and its reason read by those who may read check-ins", async () => {
    const { as, read, save } = await camp();
    for (const role of ["skills", "medic", "athlete"] as const) {
      await expect(save(as(role), { kind: "response.add", ...ACCEPTED }, 1)).rejects.toThrow(AppError);
    }
    await save(as("strength"), { kind: "response.add", ...ACCEPTED }, 1);
    const reasons = async (role: Parameters<typeof as>[0]) =>
      (await read(as(role))).book.responses.map((response) => response.because);
    expect(await reasons("medic")).toEqual([ACCEPTED.because]);
    expect(await reasons("athlete")).toEqual([ACCEPTED.because]);
    expect(await reasons("skills")).toEqual([""]);
    expect(await reasons("guest")).toEqual([]);
  });
});
