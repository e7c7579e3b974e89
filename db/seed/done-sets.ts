import type { Exercise, Line, PrescribedLift, Quality } from "../../lib/engine";
import type { SetRow } from "../queries/logs";
import { between, chance } from "./chance";

/** Share of body mass in one hand or on the bar where the prescription leaves the load to the athlete; invented. */
const SHARES: Partial<Record<Quality, number>> = {
  neck: 0.08,
  grip: 0.08,
  rotation: 0.14,
  "anti-rotation": 0.14,
  "lateral-trunk": 0.16,
  "trunk-flexion": 0.1,
  "hip-flexion": 0.1,
  "posterior-chain": 0.4,
  "knee-dominant": 0.3,
};

/** In steps of 2 kg. */
function freeLoad({ qualities, sides, id }: Exercise, mass: number): number {
  const share = (SHARES[qualities[0]] ?? 0.22) * (sides === "each" ? 0.8 : 1);
  return 2 * Math.max(1, Math.round((mass * share * (0.85 + 0.3 * chance(id))) / 2));
}

function kgOf(line: Line, exercise: Exercise | undefined, mass: number): number | null {
  if (line.load.kg !== null) return line.load.kg;
  if (line.load.of === "throw") return 4;
  return line.load.of === "reserve" && exercise && exercise.load !== "body" ? freeLoad(exercise, mass) : null;
}

/** Sets as an athlete did them: as written, with a repetition less here and there at the end. */
export function doneSets(
  lift: PrescribedLift,
  given: { readonly exercises: ReadonlyMap<string, Exercise>; readonly mass: number; readonly key: string },
): SetRow[] {
  return lift.lines.flatMap((line) => {
    const kg = kgOf(line, given.exercises.get(line.exercise), given.mass);
    return Array.from({ length: line.sets }, (_, index): SetRow => {
      const words = [given.key, line.slot, index] as const;
      const tired = index === line.sets - 1 && chance(...words, "tired") < 0.3 ? 1 : 0;
      return {
        slot: line.slot,
        number: index + 1,
        exerciseId: line.exercise,
        kg,
        reps: Math.max(1, between(line.reps.low, line.reps.high, 1, ...words) - tired),
        reserve: line.aim === "hold" || line.aim === "fast" ? null : between(1, 3, 1, ...words, "reserve"),
      };
    });
  });
}
