import { describe, expect, it } from "vitest";
import {
  baseFor,
  insideLiftCount,
  prescribe,
  qualitiesOfBase,
  slotsOf,
  STRIKING_BASES,
  weightsOf,
  type Quality,
  type StrikingBase,
} from "@/lib/engine";
import { turnsOf } from "@/lib/engine/prescription/base-weights";
import { blocksOf } from "@/lib/engine/prescription/blocks";
import { isLighterWeek } from "@/lib/engine/dose/wave";
import { best, exerciseOf, linesOf, only, prescriptionInput } from "../factories/prescription";

const LONG = prescriptionInput({}, { weeks: 12 });

const PLANS = new Map(STRIKING_BASES.map((base) => [base, linesOf({ ...LONG, mix: only(base) })]));

/** Share of a plan's sets whose exercise has one of the qualities as its main one. */
function shareOf(base: StrikingBase, qualities: readonly Quality[]): number {
  const lines = PLANS.get(base) ?? [];
  const sets = (rows: typeof lines) => rows.reduce((sum, { line }) => sum + line.sets, 0);
  return sets(lines.filter(({ exercise }) => qualities.includes(exercise.qualities[0]))) / sets(lines);
}

describe("striking bases", () => {
  it.each(STRIKING_BASES)("%s gets all it lives on, and more of it than any other base does", (base) => {
    const lives = qualitiesOfBase(base);
    for (const quality of lives) expect(shareOf(base, [quality])).toBeGreaterThan(0);
    for (const other of STRIKING_BASES) {
      if (other !== base) expect(shareOf(base, lives)).toBeGreaterThan(shareOf(other, lives));
    }
  });

  it("whipping round kickers get rotation, anti-rotation and trunk flexion in every four weeks of building", () => {
    const lines = linesOf(LONG).filter(({ line }) => line.slot.startsWith("trunk"));
    for (const [from, to] of [
      [11, 8],
      [7, 4],
    ] as const) {
      const trained = new Set(
        lines
          .filter(({ lift }) => lift.week <= from && lift.week >= to)
          .map(({ exercise }) => exercise.qualities[0]),
      );
      for (const quality of ["rotation", "anti-rotation", "trunk-flexion"] as const) {
        expect(trained).toContain(quality);
      }
    }
  });

  it("a mix stands between its bases", () => {
    const mix = [
      { base: "boxing", share: 0.25 },
      { base: "grappling", share: 0.75 },
    ] as const;
    // 1 is as anybody does, 3 is what the style lives on: 0.25 x 3 + 0.75 x 1.
    expect(weightsOf(mix).press).toBeCloseTo(1.5, 10);
    expect(weightsOf(mix).neck).toBeCloseTo(2.5, 10);
    expect(baseFor("press", mix)).toBe("boxing");
    expect(baseFor("jump", mix)).toBeNull();
  });

  it("turns give each quality its share, the heaviest first and none in a lump", () => {
    const weights = { rotation: 3, "anti-rotation": 2, "lateral-trunk": 1 } as const;
    const turns = turnsOf(
      ["rotation", "anti-rotation", "lateral-trunk"],
      (quality) => weights[quality as keyof typeof weights],
      12,
    );
    expect(turns[0]).toBe("rotation");
    for (const [quality, weight] of Object.entries(weights)) {
      expect(turns.filter((one) => one === quality)).toHaveLength(2 * weight);
    }
    turns.slice(2).forEach((quality, index) => {
      expect([turns[index], turns[index + 1], quality].every((one) => one === quality)).toBe(false);
    });
  });
});

describe("blocks and rotation", () => {
  it("a lighter week closes its block, and the next one begins another", () => {
    const blocks = blocksOf(LONG.lifts);
    const weeks = [...new Set(LONG.lifts.map(({ week }) => week))].sort((a, b) => b - a);
    const lighter =
      LONG.lifts.find(({ factors, week }) => week > 4 && isLighterWeek(factors))?.week ?? Number.NaN;
    expect(weeks).toContain(lighter);
    expect(blocks.get(lighter)).toBe(blocks.get(lighter + 1));
    expect(blocks.get(lighter - 1)?.index).toBe((blocks.get(lighter)?.index ?? Number.NaN) + 1);
  });

  it("power and taper keep the lifts of the last block of strength", () => {
    const blocks = blocksOf(LONG.lifts);
    const last = LONG.lifts.filter(({ phase }) => phase === "strength").at(-1);
    for (const { phase, week } of LONG.lifts) {
      if (phase === "power" || phase === "taper") expect(blocks.get(week)).toBe(blocks.get(last?.week ?? -1));
    }
  });

  it("a main lift stays for its block", () => {
    const blocks = blocksOf(LONG.lifts);
    const chosen = new Map<string, string>();
    for (const { lift, line } of linesOf(LONG)) {
      if (!slotsOf(lift.item).find(({ id }) => id === line.slot)?.stays) continue;
      const key = `${lift.item} ${line.slot} ${blocks.get(lift.week)?.index ?? -1}`;
      expect(chosen.get(key) ?? line.exercise).toBe(line.exercise);
      chosen.set(key, line.exercise);
    }
    expect(chosen.size).toBeGreaterThan(6);
  });

  it("accessories change from one week to the next", () => {
    const bySlot = new Map<string, Map<number, string>>();
    for (const { lift, line } of linesOf(LONG)) {
      if (slotsOf(lift.item).find(({ id }) => id === line.slot)?.stays) continue;
      const key = `${lift.item} ${line.slot}`;
      bySlot.set(key, (bySlot.get(key) ?? new Map<number, string>()).set(lift.week, line.exercise));
    }
    for (const [key, weeks] of bySlot) {
      for (const [week, exercise] of weeks) {
        if (weeks.has(week - 1)) expect(`${key} ${weeks.get(week - 1) ?? ""}`).not.toBe(`${key} ${exercise}`);
      }
    }
  });

  it("a best that is entered within a block loads the lift and does not change it", () => {
    const first = LONG.lifts.find(({ item }) => item === "strength-a");
    const before = linesOf(LONG).map(({ line }) => line.exercise);
    const added = [best("front-squat", 120, { day: first?.day ?? LONG.lifts[0]?.day })].flatMap((one) =>
      first ? [{ ...one, day: (first.day + 1) as typeof first.day }] : [],
    );
    const block = blocksOf(LONG.lifts).get(first?.week ?? -1);
    const after = linesOf({ ...LONG, bests: added });
    after.forEach(({ lift, line }, index) => {
      if (blocksOf(LONG.lifts).get(lift.week)?.index === block?.index)
        expect(line.exercise).toBe(before[index]);
    });
  });

  it("held and anti-motion trunk work comes early, fast rotation late (Lee & McGill 2017, J Sports Sci 35:1768-1780)", () => {
    const share = (
      phases: readonly string[],
      test: (line: ReturnType<typeof linesOf>[number]) => boolean,
    ) => {
      const lines = linesOf(LONG).filter(({ lift }) => phases.includes(lift.phase));
      const sets = (rows: typeof lines) => rows.reduce((sum, { line }) => sum + line.sets, 0);
      return sets(lines.filter(test)) / sets(lines);
    };
    const still = ({ line, exercise }: ReturnType<typeof linesOf>[number]) =>
      line.aim === "hold" || exercise.qualities[0] === "anti-rotation";
    const fastTurn = ({ line, exercise }: ReturnType<typeof linesOf>[number]) =>
      line.aim === "fast" && exercise.qualities.some((one) => one === "rotation");
    expect(share(["foundation", "strength"], still)).toBeGreaterThan(share(["power", "taper"], still));
    expect(share(["power", "taper"], fastTurn)).toBeGreaterThan(share(["foundation", "strength"], fastTurn));
  });
});

describe("a session", () => {
  it("runs from fast to heavy to accessories to trunk, and what tires the rest stands last", () => {
    const rank = (aim: string, slot: string, last: boolean) =>
      last ? 4 : aim === "fast" ? 0 : slot.startsWith("main") ? 1 : slot.startsWith("trunk") ? 3 : 2;
    for (const session of prescribe(LONG)) {
      const ranks = session.lines.map(({ aim, slot, exercise }) =>
        rank(aim, slot, exerciseOf(exercise).order === "last"),
      );
      expect(ranks).toEqual([...ranks].sort((a, b) => a - b));
    }
  });

  it("has reasons, cues and a tempo on every line, and up to eight alternatives of which none is in the session", () => {
    for (const session of prescribe(LONG)) {
      const ids = session.lines.map(({ exercise }) => exercise);
      for (const line of session.lines) {
        expect(line.reasons.length).toBeGreaterThan(0);
        expect(line.cues.length).toBeGreaterThanOrEqual(2);
        expect(line.tempo).not.toBe("");
        expect(line.alternatives.length).toBeLessThanOrEqual(8);
        for (const id of line.alternatives) expect(ids).not.toContain(id);
      }
    }
  });

  it("warms up what it loads: two or three mobility exercises, of all three kinds over a camp", () => {
    const sessions = prescribe(LONG);
    for (const { warmUp } of sessions) {
      expect(warmUp.length).toBeGreaterThanOrEqual(2);
      expect(warmUp.length).toBeLessThanOrEqual(3);
    }
    const kinds = new Set(
      sessions.flatMap(({ warmUp }) => warmUp.map(({ exercise }) => exerciseOf(exercise).stretch)),
    );
    expect(kinds).toEqual(new Set(["active", "passive", "against-antagonist"]));
  });

  it("an athlete without equipment gets a session all the same, and what stays empty is said with numbers", () => {
    const bare = { ...LONG, equipment: [] };
    for (const [index, session] of prescribe(bare).entries()) {
      expect(session.lines.reduce((sum, { sets }) => sum + sets, 0)).toBe(LONG.lifts[index]?.sets);
      for (const { why } of session.empty) expect(why).toMatch(/^Of \d+ that would fit/);
    }
  });

  it("with an empty library every slot is said to be empty", () => {
    for (const session of prescribe({ ...LONG, exercises: [] })) {
      expect(session.lines).toEqual([]);
      expect(session.empty.length).toBeGreaterThan(0);
      for (const { why } of session.empty) expect(why).toBe("No exercise of the library fits.");
    }
  });
});

describe("loads over the camp", () => {
  const bests = [
    "back-squat",
    "front-squat",
    "trap-bar-deadlift",
    "standing-press",
    "bench-press",
    "barbell-bent-row",
  ].map((id) => best(id, 100));
  const heavy = linesOf({ ...LONG, bests }).filter(({ line }) => line.aim === "heavy");

  // Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365: intensity unchanged, volume cut.
  it("the taper never lowers the percent or the kilograms of the last building week, only the sets", () => {
    const keep = heavy.filter(
      ({ lift, line }) => lift.item === "strength-keep" && line.slot === "main-lower",
    );
    const building = keep.filter(({ lift }) => lift.phase === "power").at(-1);
    const taper = keep.filter(({ lift }) => lift.phase === "taper");
    expect(taper.length).toBeGreaterThan(0);
    for (const { lift, line } of taper) {
      expect(line.exercise).toBe(building?.line.exercise);
      expect(lift.intensity.low).toBeGreaterThanOrEqual(building?.lift.intensity.low ?? Infinity);
      const kg = line.load.of === "best" ? line.load.kg : Number.NaN;
      const before = building?.line.load;
      expect(kg).toBeGreaterThanOrEqual(before?.of === "best" ? before.kg : Infinity);
    }
  });

  it("the power phase is no lighter on the bar than the last week of strength", () => {
    const last = heavy.filter(({ lift }) => lift.item === "strength-a" && lift.phase === "strength").at(-1);
    const power = heavy.filter(({ lift }) => lift.item === "strength-keep" && lift.phase === "power");
    expect(power.length).toBeGreaterThan(0);
    for (const { lift } of power)
      expect(lift.intensity.low).toBeGreaterThanOrEqual(last?.lift.intensity.low ?? Infinity);
  });

  it("heavy work of every week is inside the lift-count table", () => {
    expect(heavy.length).toBeGreaterThan(20);
    for (const { lift, line } of heavy) {
      expect(insideLiftCount((lift.intensity.low + lift.intensity.high) / 2, line.sets, line.reps.low)).toBe(
        true,
      );
    }
  });
});
