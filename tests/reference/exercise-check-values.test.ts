import { describe, expect, it } from "vitest";
import { EXERCISES } from "@/db/seed/exercises";
import type { Exercise } from "@/lib/engine/prescription/exercise";

const exercise = (id: string): Exercise => {
  const found = EXERCISES.find((one) => one.id === id);
  if (!found) throw new Error(`No exercise ${id}`);
  return found;
};

/** "3-4 x 8-12", or null where the aim is not used. */
const doseOf = (id: string, aim: keyof Exercise["doses"]): string | null => {
  const dose = exercise(id).doses[aim];
  return dose ? `${dose.sets.low}-${dose.sets.high} x ${dose.reps.low}-${dose.reps.high}` : null;
};

describe("doses of the library against common practice, no published source", () => {
  it("cable rotational lift: explosive, 3 to 4 sets of 8 to 12", () => {
    // Common practice, no published source.
    expect(exercise("cable-rotational-lift")).toMatchObject({ intent: "explosive", equipment: ["cable"] });
    expect(doseOf("cable-rotational-lift", "fast")).toBe("3-4 x 8-12");
    expect(doseOf("cable-rotational-lift", "volume")).toBe("3-4 x 8-12");
  });

  it("split-stance cable press-out against rotation: 3 to 4 of 8 to 10 a side", () => {
    // Common practice, no published source.
    expect(exercise("split-stance-cable-press-out").sides).toBe("each");
    expect(exercise("split-stance-cable-press-out").qualities[0]).toBe("anti-rotation");
    expect(doseOf("split-stance-cable-press-out", "volume")).toBe("3-4 x 8-10");
  });

  it("hanging leg raise: 3 to 4 of 10 to 15", () => {
    // Common practice, no published source.
    expect(doseOf("hanging-leg-raise", "volume")).toBe("3-4 x 10-15");
  });

  it("deep side squat with a weight: 3 of 8 to 10 a side, or heavy 5 to 6 a side and no more sets or repetitions", () => {
    // Common practice, no published source.
    const { sides, doses } = exercise("deep-side-squat");
    expect(sides).toBe("each");
    expect(doseOf("deep-side-squat", "volume")).toBe("3-3 x 8-10");
    expect(doseOf("deep-side-squat", "heavy")).toBe("3-3 x 5-6");
    expect(doses.heavy?.sets.high).toBeLessThanOrEqual(doses.volume?.sets.high ?? 0);
  });

  it("seated weighted twist: 3 to 4 of 10 to 20 a side, for volume and nothing else", () => {
    // Common practice, no published source.
    expect(exercise("seated-weighted-twist").sides).toBe("each");
    expect(doseOf("seated-weighted-twist", "volume")).toBe("3-4 x 10-20");
    expect(Object.keys(exercise("seated-weighted-twist").doses)).toEqual(["volume"]);
  });

  it("side-lying trunk raise on an extension bench: 3 to 4 of 10 to 15, last in the session", () => {
    // Common practice, no published source.
    expect(exercise("side-lying-trunk-raise")).toMatchObject({
      order: "last",
      sides: "each",
      equipment: ["extension-bench"],
    });
    expect(doseOf("side-lying-trunk-raise", "volume")).toBe("3-4 x 10-15");
  });

  it("anti-rotation press walked three steps out and three back as one repetition: 3 of 5 to 6 a side", () => {
    // Common practice, no published source.
    const { sides, qualities, cues } = exercise("press-out-walk");
    expect(sides).toBe("each");
    expect(qualities[0]).toBe("anti-rotation");
    expect(cues.join(" ")).toContain("three steps away and three back: one rep");
    expect(doseOf("press-out-walk", "volume")).toBe("3-3 x 5-6");
  });

  it.each(["barbell-good-morning", "wide-stance-deadlift"])(
    "%s trains the posterior chain and the push to the side",
    (id) => {
      // Common practice, no published source.
      expect(exercise(id).qualities).toEqual(["posterior-chain", "lateral-push"]);
      expect(exercise(id).equipment).toContain("barbell");
    },
  );
});
