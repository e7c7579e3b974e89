import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { plan, prescribe, type LineEdit, type PrescriptionInput } from "@/lib/engine";
import { deepFreeze, planInput } from "../factories/plan-input";
import { arbAthlete, best, exerciseOf, linesOf, prescriptionInput } from "../factories/prescription";

const INPUT = prescriptionInput();
const lift = INPUT.lifts.find(({ item }) => item === "strength-a") ?? INPUT.lifts[0];
if (!lift) throw new Error("a camp without lifts");

const edited = (slot: string, edit: LineEdit, over: Partial<PrescriptionInput> = {}): PrescriptionInput => ({
  ...INPUT,
  ...over,
  edits: { [lift.id]: { lines: { [slot]: edit } } },
});
const sessionOf = (input: PrescriptionInput, id = lift.id) => {
  const found = prescribe(input).find((session) => session.id === id);
  if (!found) throw new Error("no session");
  return found;
};
const lineAt = (input: PrescriptionInput, slot: string) => {
  const session = sessionOf(input);
  const line = [...session.warmUp, ...session.lines].find((one) => one.slot === slot);
  if (!line) throw new Error(`no line ${slot}`);
  return line;
};

describe("a coach's edits", () => {
  it("sets, repetitions, kilograms and a note stand as written and are named; the rest stays as computed", () => {
    const edit = { sets: 2, reps: { low: 1, high: 2 }, kg: 131, note: "Belt on" };
    const before = lineAt(INPUT, "main-lower");
    const after = lineAt(edited("main-lower", edit), "main-lower");
    expect(after).toMatchObject({ sets: 2, reps: edit.reps, note: "Belt on", load: { kg: 131 } });
    expect([...after.edited].sort()).toEqual(["kg", "note", "reps", "sets"]);
    expect(after.exercise).toBe(before.exercise);
    expect(after.tempo).toBe(before.tempo);
  });

  it("kilograms over a percent of a best say the percent they are", () => {
    const id = lineAt(INPUT, "main-lower").exercise;
    const line = lineAt(edited("main-lower", { kg: 130 }, { bests: [best(id, 160)] }), "main-lower");
    // 130 of 160 kg is 81.25 %, in steps of a half 81.5.
    expect(line.load).toMatchObject({ of: "best", kg: 130, percent: { low: 81.5, high: 81.5 } });
  });

  it("an exercise of the coach's takes the slot, and no other slot takes it too", () => {
    const other = lineAt(INPUT, "trunk-1").exercise;
    const session = sessionOf(edited("trunk-2", { exercise: other }));
    expect(session.lines.find(({ slot }) => slot === "trunk-2")).toMatchObject({
      exercise: other,
      edited: ["exercise"],
    });
    expect(session.lines.filter(({ exercise }) => exercise === other)).toHaveLength(1);
    expect(session.lines.reduce((sum, { sets }) => sum + sets, 0)).toBe(lift.sets);
  });

  it("also on a line of the warm-up", () => {
    expect(lineAt(edited("mobility-1", { note: "Slowly" }), "mobility-1")).toMatchObject({
      note: "Slowly",
      edited: ["note"],
    });
  });

  it("an exercise that a new limitation rules out does not stand, and the line says so", () => {
    const ruled = "back-squat";
    const line = lineAt(
      edited("main-lower", { exercise: ruled }, { limitations: ["knee-deep"] }),
      "main-lower",
    );
    expect(exerciseOf(ruled).ruledOutBy).toContain("knee-deep");
    expect(line.exercise).not.toBe(ruled);
    expect(line.edited).toEqual([]);
    expect(line.reasons[0]?.text).toMatch(/The coach chose .*, but .*knee deep/);
  });

  it("an exercise that is gone from the library leaves the line as computed, and the line says so", () => {
    const line = lineAt(edited("main-lower", { exercise: "gone", sets: 4 }), "main-lower");
    expect(line).toMatchObject({ sets: 4, edited: ["sets"] });
    expect(line.reasons[0]?.rule).toBe("edit");
  });

  it("survive a new plan: the session keeps its identity, its edits go with it", () => {
    const camp = planInput();
    const athlete = { ...camp.athlete, liftsPerWeek: 4 };
    const base = plan({ ...camp, athlete });
    const sport = camp.sport.filter((session) => session.kind !== "hard-sparring");
    const again = plan({ ...camp, athlete, sport }, { boutDay: camp.bout.day, lifts: base.lifts });
    const line = lineAt(
      edited("trunk-2", { sets: 1, note: "Keep it short" }, { lifts: again.lifts }),
      "trunk-2",
    );
    expect(line).toMatchObject({ sets: 1, note: "Keep it short", edited: ["sets", "note"] });
  });

  it("a line that the coach wrote on stays open when the sets get few", () => {
    const few = INPUT.lifts.map((one) => (one.id === lift.id ? { ...one, sets: 5 } : one));
    expect(sessionOf({ ...INPUT, lifts: few }).lines.map(({ slot }) => slot)).not.toContain("trunk-2");
    expect(lineAt(edited("trunk-2", { note: "Keep" }, { lifts: few }), "trunk-2").note).toBe("Keep");
  });

  it("a note on the session stands over it", () => {
    const input = { ...INPUT, edits: { [lift.id]: { lines: {}, note: "Early start" } } };
    expect(sessionOf(input).note).toBe("Early start");
  });
});

describe("swaps", () => {
  const from = lineAt(INPUT, "main-lower").exercise;
  const to = lineAt(INPUT, "main-lower").alternatives[0] ?? "";
  const swaps = [{ item: lift.item, from, to }] as const;

  it("hold for every session of the item in the camp, and for no other item", () => {
    const before = linesOf(INPUT);
    const after = linesOf({ ...INPUT, swaps });
    expect(before.some((row) => row.lift.item === lift.item && row.line.exercise === from)).toBe(true);
    for (const row of after) {
      if (row.lift.item === lift.item) expect(row.line.exercise).not.toBe(from);
    }
    for (const id of new Set(before.filter((row) => row.line.exercise === from).map((row) => row.lift.id))) {
      const item = INPUT.lifts.find((one) => one.id === id)?.item;
      const ids = after.filter((row) => row.lift.id === id).map((row) => row.line.exercise);
      expect(ids).toContain(item === lift.item ? to : from);
    }
  });

  it("say what they stand for", () => {
    const line = lineAt({ ...INPUT, swaps }, "main-lower");
    expect(line.reasons).toContainEqual({
      rule: "swap",
      text: `Instead of ${exerciseOf(from).name}, as chosen for this camp.`,
    });
  });

  it("a swap back comes home", () => {
    const back = [...swaps, { item: lift.item, from: to, to: from }];
    expect(lineAt({ ...INPUT, swaps: back }, "main-lower").exercise).toBe(from);
  });

  it("to something that may not be done does not stand", () => {
    const limited = { ...INPUT, swaps: [{ item: lift.item, from, to: "gone" }] };
    expect(lineAt(limited, "main-lower").exercise).toBe(from);
  });
});

describe("edits and swaps on any athlete", { timeout: 120_000 }, () => {
  it("a swap to an alternative is kept, edits stand, nothing forbidden comes in, the input is not changed (60 athletes)", () => {
    let swapped = 0;
    fc.assert(
      fc.property(arbAthlete, fc.nat(), fc.nat(), (made, whichLift, whichLine) => {
        const sessions = prescribe(made);
        const session = sessions[whichLift % Math.max(1, sessions.length)];
        const line = session?.lines[whichLine % Math.max(1, session.lines.length)];
        const at = made.lifts.find(({ id }) => id === session?.id);
        const to = line?.alternatives[0];
        if (!session || !line || !at || to === undefined) return;
        swapped += 1;
        const edit = { sets: 3, note: "n" };
        const input = deepFreeze({
          ...made,
          swaps: [{ item: at.item, from: line.exercise, to }],
          edits: { [session.id]: { lines: { [line.slot]: edit } } },
        });
        const after = prescribe(input);
        const there = after.find(({ id }) => id === session.id);
        const lines = there?.lines ?? [];
        expect(lines.map(({ exercise }) => exercise)).toContain(to);
        expect(lines.find(({ slot }) => slot === line.slot)).toMatchObject({
          sets: 3,
          note: "n",
          edited: ["sets", "note"],
        });
        for (const [index, one] of after.entries()) {
          const used = one.lines.map(({ exercise }) => exercise);
          expect(new Set(used).size).toBe(used.length);
          if (made.lifts[index]?.item === at.item) expect(used).not.toContain(line.exercise);
          for (const id of used) {
            const exercise = exerciseOf(id);
            expect(exercise.equipment.every((thing) => made.equipment.includes(thing))).toBe(true);
            expect(exercise.ruledOutBy.some((limitation) => made.limitations.includes(limitation))).toBe(
              false,
            );
          }
        }
      }),
      { numRuns: 60, seed: 331 },
    );
    expect(swapped).toBeGreaterThan(30);
  });
});
