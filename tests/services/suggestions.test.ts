import { randomUUID } from "node:crypto";
import { describe, expect, it } from "vitest";
import { checkIns } from "@/db/schema";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { readBoard } from "@/lib/services/board/read-board";
import { readCamp } from "@/lib/services/camps/read";
import { saveChange } from "@/lib/services/camps/save-change";
import type { TeamContext } from "@/lib/services/context";
import { acceptSuggestion, dismissSuggestion } from "@/lib/services/suggestions/decide";
import { listSuggestions } from "@/lib/services/suggestions/waiting";
import { testDatabase } from "../setup/database";
import { NOW, dayScene, done, keep, refusal } from "./day-scene";

const { db } = await testDatabase();
const TODAY = Math.floor(NOW.getTime() / 86_400_000) as Day;

/** A bad check-in against three quiet weeks (a change is on offer) and pain of 5 (a talk). Invented numbers. */
async function scene() {
  const day = await dayScene(db);
  const { id: teamId } = day.team;
  await db.insert(checkIns).values(
    Array.from({ length: 21 }, (_, back) => ({
      teamId,
      athleteId: day.athlete.id,
      day: isoFromDay((TODAY - back) as Day),
      sleep: back === 0 ? 6 : back % 3 === 0 ? 3 : 2,
      fatigue: back === 0 ? 6 : 2,
      soreness: 2,
      stress: 2,
      changedAt: NOW,
    })),
  );
  const lift = await day.lastLift();
  await keep(day.as("strength"), day.campId, lift.id, done({ pain: 5, painPlace: "left knee" }));
  const params = { id: day.campId };
  const list = (ctx: TeamContext = day.as("strength")) => listSuggestions(ctx, { params });
  const accept = (
    key: string,
    baseRevision: number,
    over: { note?: string; ctx?: TeamContext; again?: string } = {},
  ) =>
    acceptSuggestion(over.ctx ?? day.as("strength"), {
      params: { ...params, key },
      body: { baseRevision, idempotencyKey: over.again ?? randomUUID(), note: over.note ?? "" },
    });
  const dismiss = (key: string, reason: string, ctx: TeamContext = day.as("strength")) =>
    dismissSuggestion(ctx, { params: { ...params, key }, body: { reason } });
  const camp = () => readCamp(day.as("head"), { params });
  return {
    ...day,
    params,
    list,
    accept,
    dismiss,
    camp,
    keys: { checkIn: `check-in:${TODAY}`, pain: `pain:${lift.id}` },
  };
}

describe("suggestions of a camp", () => {
  it("come with numbers, source and the effect that saving has; reading them changes nothing", async () => {
    const { list, accept, camp, keys } = await scene();
    const before = await camp();
    const { suggestions, revision } = await list();
    const checkIn = suggestions.find(({ key }) => key === keys.checkIn);
    expect(checkIn?.numbers[0]).toEqual({ label: "Check-in, of 4 to 28", value: 16, unit: "points" });
    expect(checkIn?.source).not.toBe("");
    expect(checkIn?.effect).toMatchObject({ factor: 0.8, over: { kind: "days", from: isoFromDay(TODAY) } });
    expect(checkIn?.effect?.setsAfter).toBeLessThan(checkIn?.effect?.setsBefore ?? 0);
    expect(suggestions.find(({ key }) => key === keys.pain)).toMatchObject({ effect: null, problem: null });
    expect(await camp()).toEqual(before);

    await accept(keys.checkIn, revision);
    const sets = (plan: typeof before.plan, ids: ReadonlySet<string>) =>
      plan.lifts.filter(({ id }) => ids.has(id)).reduce((sum, lift) => sum + lift.sets, 0);
    const touched = new Set(checkIn?.effect?.knockOn.lifts.map(({ id }) => id));
    expect(sets(before.plan, touched)).toBe(checkIn?.effect?.setsBefore);
    expect(sets((await camp()).plan, touched)).toBe(checkIn?.effect?.setsAfter);
  });

  it("accepted: change and decision are saved together, it is gone from list and board, and put back undoes it", async () => {
    const { as, params, list, accept, camp, keys, campId } = await scene();
    const before = await camp();
    const { decision, saved } = await accept(keys.checkIn, before.revision, { note: "Bad week." });
    expect(saved?.revision).toBe(before.revision + 1);
    expect(decision).toMatchObject({ decision: "accepted", reason: "Bad week.", revision: saved?.revision });
    const after = await list();
    expect(after.suggestions.map(({ key }) => key)).toEqual([keys.pain]);
    expect(after.decisions.map(({ key }) => key)).toEqual([keys.checkIn]);
    const { rows } = await readBoard(as("head"));
    expect(rows.find((row) => row.campId === campId)?.flags).toContainEqual({
      kind: "suggestions",
      text: "1 suggestion",
    });

    const change = { kind: "put-back", revision: saved?.revision ?? 0 } as const;
    await saveChange(as("head"), {
      params,
      body: { change, baseRevision: saved?.revision ?? 0, idempotencyKey: randomUUID() },
    });
    expect((await camp()).book).toEqual(before.book);
    expect((await list()).decisions[0]).toMatchObject({
      revision: saved?.revision,
      putBackBy: before.revision + 2,
    });
    expect((await list()).suggestions.map(({ key }) => key)).toEqual([keys.pain]);
  });

  it("without a change is accepted as seen: the camp stays, the note is kept", async () => {
    const { list, accept, camp, keys } = await scene();
    const before = await camp();
    const answer = await accept(keys.pain, before.revision, { note: "Knee was looked at." });
    expect(answer).toMatchObject({
      saved: null,
      decision: { revision: null, reason: "Knee was looked at." },
    });
    expect(await camp()).toEqual(before);
    expect((await list()).suggestions.map(({ key }) => key)).toEqual([keys.checkIn]);
  });

  it("dismissed: the reason is kept, the camp stays, and accepting it then is a conflict", async () => {
    const { list, accept, dismiss, camp, keys } = await scene();
    const before = await camp();
    const { decision } = await dismiss(keys.checkIn, "Moved house.");
    expect(decision).toMatchObject({
      decision: "dismissed",
      reason: "Moved house.",
      by: expect.any(String) as string,
    });
    expect((await dismiss(keys.checkIn, "Again.")).decision).toEqual(decision);
    expect((await refusal(accept(keys.checkIn, before.revision))).code).toBe("conflict");
    expect(await camp()).toEqual(before);
    expect((await list()).suggestions.map(({ key }) => key)).toEqual([keys.pain]);
  });

  it("a retry of an accept changes nothing more and answers the same decision", async () => {
    const { accept, camp, keys } = await scene();
    const { revision } = await camp();
    const again = randomUUID();
    const first = await accept(keys.checkIn, revision, { again });
    const second = await accept(keys.checkIn, revision, { again });
    expect(second.decision).toEqual(first.decision);
    expect((await camp()).revision).toBe(revision + 1);
  });

  it("at an older revision is stale: nothing is saved and nothing decided", async () => {
    const { list, accept, camp, keys } = await scene();
    const { revision } = await camp();
    const error = await refusal(accept(keys.checkIn, revision - 1));
    expect(error.code).toBe("stale");
    expect(error.extra).toMatchObject({ revision });
    expect((await camp()).revision).toBe(revision);
    expect((await list()).decisions).toEqual([]);
  });

  it("that do not stand, or are another team's, are as missing as each other", async () => {
    const one = await scene();
    const other = await scene();
    const unknown = await refusal(one.accept("check-in:1", 1));
    const foreign = await refusal(one.accept(one.keys.checkIn, 1, { ctx: other.as("head") }));
    expect([unknown.code, foreign.code]).toEqual(["not-found", "not-found"]);
    expect(unknown.userMessage).toBe(foreign.userMessage);
    expect((await refusal(one.list(other.as("head")))).code).toBe("not-found");
  });

  it("are for head and S&C coaches alone", async () => {
    const { as, list, accept, dismiss, keys } = await scene();
    for (const role of ["skills", "medic", "athlete"] as const) {
      expect([role, (await refusal(list(as(role)))).code]).toEqual([role, "forbidden"]);
      expect((await refusal(accept(keys.checkIn, 1, { ctx: as(role) }))).code).toBe("forbidden");
      expect((await refusal(dismiss(keys.pain, "No.", as(role)))).code).toBe("forbidden");
    }
    expect((await list(as("head"))).suggestions).toHaveLength(2);
  });

  it("keys with signs of an address are found as they come in a path", async () => {
    const { accept, keys, camp } = await scene();
    const answer = await accept(encodeURIComponent(keys.pain), (await camp()).revision);
    expect(answer.decision.key).toBe(keys.pain);
  });
});
