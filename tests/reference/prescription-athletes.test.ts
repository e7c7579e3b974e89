import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  insideLiftCount,
  isAllowed,
  ITEMS,
  prescribe,
  slotsOf,
  stepKg,
  weightsOf,
  type Exercise,
  type Lift,
  type Line,
  type PrescribedLift,
  type PrescriptionInput,
} from "@/lib/engine";
import { fitOf } from "@/lib/engine/prescription/choose";
import { arbAthlete } from "../factories/prescription";
import { deepFreeze } from "../factories/plan-input";

// A thousand camps with everything in them on a shared machine: generous, and never what decides.
const TIME = { timeout: 300_000 };

interface Case {
  readonly input: PrescriptionInput;
  readonly allowed: readonly Exercise[];
  readonly byId: ReadonlyMap<string, Exercise>;
}

const sum = (lines: readonly Line[]): number => lines.reduce((total, { sets }) => total + sets, 0);

/** Equipment, limitations, no exercise twice, sets that add up, no slot left empty that had a choice. */
function checkSession({ allowed, byId }: Case, lift: Lift, session: PrescribedLift): void {
  expect(session.id).toBe(lift.id);
  const ids = [...session.warmUp, ...session.lines].map(({ exercise }) => exercise);
  expect(new Set(ids).size).toBe(ids.length);
  for (const id of ids) {
    const exercise = byId.get(id);
    expect(exercise && allowed.includes(exercise)).toBe(true);
  }
  const open = session.empty.some(({ slot }) => slot === "open-sets");
  if (session.lines.length > 0 && !open) expect(sum(session.lines)).toBe(lift.sets);
  else expect(sum(session.lines)).toBeLessThanOrEqual(lift.sets);
  for (const slot of slotsOf(lift.item)) {
    const empty = session.empty.find((row) => row.slot === slot.id);
    if (!empty) continue;
    const choice = allowed.filter((exercise) => fitOf(slot, exercise) !== null && !ids.includes(exercise.id));
    expect(choice).toEqual([]);
    expect(empty.why).not.toBe("");
  }
  if (allowed.some(({ qualities }) => qualities[0] === "mobility")) {
    expect(session.warmUp.length).toBeGreaterThan(0);
    expect(session.warmUp.length).toBeLessThanOrEqual(3);
  }
}

/** The published tables, the athlete's plates and the session's percent. */
function checkLine({ input, byId }: Case, lift: Lift, line: Line): void {
  const { aim, sets, reps, load } = line;
  expect(sets).toBeGreaterThanOrEqual(1);
  expect(reps.low).toBeGreaterThanOrEqual(1);
  expect(reps.high).toBeGreaterThanOrEqual(reps.low);
  expect(line.reasons.length).toBeGreaterThan(0);
  const percent = (lift.intensity.low + lift.intensity.high) / 2;
  if (aim === "heavy" && lift.intensity.of === "best" && percent >= 55) {
    expect(insideLiftCount(percent, sets, reps.low)).toBe(true);
    expect(reps.low).toBe(reps.high);
  }
  if (load.of === "best") {
    const steps = load.kg / stepKg(input.plates);
    expect(Math.abs(steps - Math.round(steps))).toBeLessThan(1e-9);
    // Never above the percent's high end; below its low end only where no step of the plates lies inside.
    const [low, high] = [(load.best.kg * load.percent.low) / 100, (load.best.kg * load.percent.high) / 100];
    expect(load.kg).toBeLessThanOrEqual(high + 1e-6);
    expect(load.kg >= low - 1e-6 || load.kg + stepKg(input.plates) > high - 1e-6).toBe(true);
    expect(load.best.day).toBeLessThanOrEqual(lift.day);
    const zone = byId.get(line.exercise)?.powerZone;
    if (aim === "fast" && zone) expect(load.percent).toEqual(zone);
    if (aim === "heavy") expect(load.percent).toEqual({ low: lift.intensity.low, high: lift.intensity.high });
    if (aim === "volume" && lift.intensity.of === "best" && lift.intensity.high >= 55) {
      expect(load.percent.high).toBeLessThanOrEqual(lift.intensity.high);
    }
  }
  if (load.of === "reserve") {
    expect(load.reserve.low).toBeGreaterThanOrEqual(0);
    expect(load.reserve.high).toBeLessThanOrEqual(4);
    expect(load.reserve.low).toBeLessThanOrEqual(load.reserve.high);
  }
  if (lift.item === "primer") {
    expect(aim).toBe("fast");
    expect(sets * reps.high).toBeLessThanOrEqual(Math.max(12, sets));
  }
}

describe("a thousand athletes on real plans", TIME, () => {
  it("no rule broken, no slot empty that had a choice, the same answer twice, nothing of the input changed", () => {
    const seen = { lines: 0, heavy: 0, kilograms: 0, empty: 0, items: new Set<string>() };
    fc.assert(
      fc.property(arbAthlete, (made) => {
        const input = deepFreeze(made);
        const [equipment, limitations] = [new Set(input.equipment), new Set(input.limitations)];
        const all: Case = {
          input,
          allowed: input.exercises.filter((exercise) => isAllowed(exercise, equipment, limitations)),
          byId: new Map(input.exercises.map((exercise) => [exercise.id, exercise])),
        };
        const sessions = prescribe(input);
        expect(sessions).toHaveLength(input.lifts.length);
        input.lifts.forEach((lift, index) => {
          const session = sessions[index];
          if (!session) throw new Error("a lift without a prescription");
          seen.items.add(lift.item);
          seen.empty += session.empty.length;
          checkSession(all, lift, session);
          for (const line of session.lines) {
            checkLine(all, lift, line);
            seen.lines += 1;
            if (line.aim === "heavy") seen.heavy += 1;
            if (line.load.of === "best") seen.kilograms += 1;
          }
        });
        // The order in which exercises and bests come changes nothing, and neither does asking twice.
        const turned = {
          ...input,
          exercises: [...input.exercises].reverse(),
          bests: [...input.bests].reverse(),
        };
        expect(JSON.stringify(prescribe(turned))).toBe(JSON.stringify(sessions));
      }),
      { numRuns: 1000, seed: 301 },
    );
    // The generator reaches what it is there for.
    expect(seen.items).toEqual(new Set(ITEMS));
    expect(seen.heavy).toBeGreaterThan(1000);
    expect(seen.kilograms).toBeGreaterThan(1000);
    expect(seen.empty).toBeGreaterThan(100);
  });

  it("weights of a mix are the average of its bases by share", () => {
    fc.assert(
      fc.property(arbAthlete, ({ mix }) => {
        const weights = weightsOf(mix);
        const single = mix.map(({ base, share }) => ({ share, of: weightsOf([{ base, share: 1 }]) }));
        for (const quality of ["rotation", "press", "neck"] as const) {
          expect(weights[quality]).toBeCloseTo(
            single.reduce((total, { share, of }) => total + share * of[quality], 0),
            10,
          );
        }
      }),
      { numRuns: 30, seed: 302 },
    );
  });
});
