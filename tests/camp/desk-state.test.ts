import { describe, expect, it } from "vitest";
import { deskStep, emptyDesk, type DeskState, type LiveChange } from "@/components/camp/desk-state";
import type { Day, Minute } from "@/lib/engine/types";

const off: LiveChange = { kind: "bout.off" };
const drop: LiveChange = { kind: "sport.drop", sportId: "tue@2026-11-24", scope: "this" };
const trying = (change: LiveChange, key = "key"): DeskState =>
  deskStep(emptyDesk(3, null), { type: "try", change, key });
const at = { day: 1 as Day, start: 600 as Minute };
const missed = [{ number: 4, by: "Someone", at: "2026-11-20T12:00:00Z", summary: "Moved Pads" }];

describe("the desk of the camp page", () => {
  it("tries one change at a time: a new one takes the place of the one before", () => {
    const state = deskStep(trying(off), { type: "try", change: drop, key: "other" });
    expect(state.pending).toEqual({ change: drop, key: "other" });
  });

  it("brings back what was tried before when a carried session is let go", () => {
    const before = trying(off);
    const hand = { by: "keys", id: "tue@2026-11-24", from: at, at, before: before.pending } as const;
    const held = deskStep(before, { type: "hold", hand, change: drop, key: "other" });
    expect(held.pending?.change).toBe(drop);
    const back = deskStep(held, { type: "let-go" });
    expect(back).toMatchObject({ hand: null, pending: { change: off } });
  });

  it("keeps the refused change on the desk, with what others saved", () => {
    const sent = deskStep(trying(drop), { type: "saving" });
    expect(sent).toMatchObject({ pending: null, saving: { change: drop } });
    const refused = deskStep(sent, { type: "refused", refusal: null, missed, seen: 4 });
    expect(refused).toMatchObject({ pending: { change: drop, key: "key" }, saving: null, missed, seen: 4 });
  });

  it("keeps the key of a change over a refused save, so that saving again is harmless", () => {
    const sent = deskStep(trying(drop, "one"), { type: "saving" });
    const refused = deskStep(sent, { type: "refused", refusal: "No answer", missed: [], seen: 0 });
    expect(refused.pending?.key).toBe("one");
    expect(refused.seen).toBe(3);
  });

  it("lists a change of someone else once, however often it is told", () => {
    const told = deskStep(trying(drop), { type: "news", missed, seen: 4 });
    expect(deskStep(told, { type: "news", missed, seen: 4 }).missed).toEqual(missed);
  });

  it("has nothing left to say about others once the change is saved or put back", () => {
    const told = deskStep(trying(drop), { type: "news", missed, seen: 4 });
    expect(deskStep(told, { type: "clear" }).missed).toEqual([]);
    expect(deskStep(deskStep(told, { type: "saving" }), { type: "saved", revision: 5 })).toMatchObject({
      missed: [],
      saving: null,
      seen: 5,
    });
  });
});
