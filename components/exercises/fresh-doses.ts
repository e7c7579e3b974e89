import type { Aim, AimDose } from "@/lib/engine/prescription/exercise";

/** Where a form starts when an aim is switched on. Common practice, no published source. */
export const FRESH_DOSES: Record<Aim, AimDose> = {
  heavy: { sets: { low: 3, high: 5 }, reps: { low: 3, high: 6 } },
  volume: { sets: { low: 3, high: 4 }, reps: { low: 8, high: 12 } },
  fast: { sets: { low: 3, high: 4 }, reps: { low: 3, high: 5 } },
  hold: { sets: { low: 2, high: 3 }, reps: { low: 20, high: 40 } },
};
