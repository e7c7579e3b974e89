import { eq } from "drizzle-orm";
import { describe, expect, it } from "vitest";
import { athletes, holds, testTrials, weights } from "@/db/schema";
import { readReport } from "@/lib/services/report/read-report";
import { recordResult } from "@/lib/services/report/record-result";
import { exportReport } from "@/lib/services/report/report-csv";
import { standDownOf } from "@/lib/services/report/stand-down";
import type { ResultForm } from "@/lib/schemas/report";
import type { Role } from "@/lib/policy";
import { testDatabase } from "../setup/database";
import { NOW, dayScene, done, keep, refusal, type DayScene } from "./day-scene";

const { db } = await testDatabase();

const WON: ResultForm = {
  result: { result: "won", how: "Decision", stopped: false, standDownDays: null, note: "" },
};
const STOPPED: ResultForm = {
  result: { result: "lost", how: "Stopped in round 2", stopped: true, standDownDays: 30, note: "" },
};

const after = async (scene: DayScene, role: Role) => {
  const bout = (await readReport(scene.as("head"), { params: { id: scene.campId } })).bout.date;
  return { ...scene.as(role), now: new Date(`${bout}T23:59:00Z`) };
};
const params = ({ campId }: DayScene) => ({ params: { id: campId } });

describe("the report of a camp", () => {
  it("counts what was planned, done, missed and never answered, and adds up loads of what was done", async () => {
    const scene = await dayScene(db);
    const { id } = await scene.sessionOn("2026-11-30");
    await keep(scene.as("athlete"), scene.campId, id, done({ effort: 5, minutes: 60 }));
    const report = await readReport(scene.as("strength"), params(scene));
    const lines = report.attendance ?? [];
    expect(lines.reduce((sum, line) => sum + line.done, 0)).toBe(1);
    for (const line of lines)
      expect(line.done + line.missed + line.unanswered).toBeLessThanOrEqual(line.planned);
    expect(lines.some((line) => line.unanswered > 0)).toBe(true);
    expect(report.byWeek?.reduce((sum, week) => sum + (week.loadDone ?? 0), 0)).toBe(300);
    expect(report.byWeek).toHaveLength(report.weeks);
  });

  it("says of tests whether a change is beyond their noise, and of weight the way", async () => {
    const scene = await dayScene(db);
    const trial = (day: string, value: number) => ({
      teamId: scene.as("head").teamId,
      athleteId: scene.athlete.id,
      day,
      kind: "jump-height",
      value,
    });
    await db.insert(testTrials).values([trial("2026-11-20", 38), trial("2026-11-30", 41)]);
    await db.insert(weights).values(
      ["2026-11-20", "2026-11-30"].map((day, n) => ({
        teamId: scene.as("head").teamId,
        athleteId: scene.athlete.id,
        day,
        kg: 72 - n,
        changedAt: NOW,
      })),
    );
    const report = await readReport(scene.as("head"), params(scene));
    expect(report.tests?.[0]?.verdict.change).toBeCloseTo(3);
    expect(report.weight).toMatchObject({ points: [{ kg: 72 }, { kg: 71 }] });
  });

  it.each([
    ["head", { attendance: true, tests: true, weight: true, changes: true, record: true }],
    ["strength", { attendance: true, tests: true, weight: true, changes: true, record: false }],
    ["skills", { attendance: false, tests: false, weight: false, changes: true, record: false }],
    ["medic", { attendance: false, tests: false, weight: false, changes: true, record: false }],
    ["athlete", { attendance: true, tests: true, weight: true, changes: false, record: false }],
  ] as const)("shows to %s what the role may see and no more", async (role, sees) => {
    const scene = await dayScene(db);
    const report = await readReport(scene.as(role), params(scene));
    expect({
      attendance: report.attendance !== null,
      tests: report.tests !== null,
      weight: report.weight !== null,
      changes: report.changes !== null,
      record: report.may.record,
    }).toEqual(sees);
  });

  it("is refused to a guest, and is missing for another team", async () => {
    const scene = await dayScene(db);
    const other = await dayScene(db);
    expect((await refusal(readReport(scene.as("guest"), params(scene)))).code).toBe("forbidden");
    expect((await refusal(readReport(other.as("head"), params(scene)))).code).toBe("not-found");
  });

  it("gives no weight of a minor, only the reason", async () => {
    const scene = await dayScene(db);
    await db.update(athletes).set({ dateOfBirth: "2010-06-01" }).where(eq(athletes.id, scene.athlete.id));
    const report = await readReport(scene.as("head"), params(scene));
    expect(report.weight).toHaveProperty("off");
  });

  it("is a file in which a formula is text", async () => {
    const scene = await dayScene(db);
    const head = await after(scene, "head");
    await recordResult(head, {
      ...params(scene),
      body: { result: { result: "draw", how: "=2+2", stopped: false, standDownDays: null, note: "" } },
    });
    const { name, text } = await exportReport(head, params(scene));
    expect(name).toContain(scene.athlete.name);
    expect(text).toContain("'=2+2");
    expect(text.split("\r\n")[0]).toBe("\uFEFFPart,What,When,Planned,Done,In words");
  });
});

describe("how the bout ended", () => {
  it("is written down once the bout is over, not before, and can be taken back", async () => {
    const scene = await dayScene(db);
    expect((await refusal(recordResult(scene.as("head"), { ...params(scene), body: WON }))).code).toBe(
      "conflict",
    );
    const head = await after(scene, "head");
    expect((await recordResult(head, { ...params(scene), body: WON })).result).toMatchObject({
      result: "won",
    });
    expect((await recordResult(head, { ...params(scene), body: { result: null } })).result).toBeNull();
  });

  it("with an ordered stand-down becomes one hold, however often it is saved", async () => {
    const scene = await dayScene(db);
    const head = await after(scene, "head");
    const report = await recordResult(head, { ...params(scene), body: STOPPED });
    await recordResult(head, { ...params(scene), body: STOPPED });
    const rows = await db.select().from(holds).where(eq(holds.athleteId, scene.athlete.id));
    expect(rows).toHaveLength(1);
    expect(rows[0]).toMatchObject({
      fromDay: report.standDown?.from,
      toDay: report.standDown?.to,
      liftedAt: null,
    });
  });
});

it.each([
  // Ohio Admin. Code 3773-7-19: the count starts the first day after the event. Dates worked out by hand from it.
  [7, "2026-03-14", "2026-03-15"],
  [30, "2026-04-06", "2026-04-07"],
  [60, "2026-05-06", "2026-05-07"],
  [90, "2026-06-05", "2026-06-06"],
] as const)(
  "a stand-down of %i days after 7 March 2026 ends on %s, contact from %s",
  (days, to, eligible) => {
    expect(standDownOf("2026-03-07", days)).toEqual({ days, from: "2026-03-08", to, eligible });
  },
);
