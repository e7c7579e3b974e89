import type { Lift } from "../types";
import type { Weights } from "./base-weights";
import type { Exercise, Quality } from "./exercise";
import type { Filled } from "./line";

/** Mobility exercises of a warm-up: common practice, no published source. */
const MANY = 3;
const FEW = 2;
/** Sessions of at most so many sets get the short one. */
const SHORT = 5;

/** What a stretch is worth before fast work and before other work: long still ones come last. Common practice. */
const STRETCH = {
  active: { fast: 1, other: 1 },
  "against-antagonist": { fast: 0.8, other: 1 },
  passive: { fast: 0.4, other: 0.9 },
} as const;

/** What the base wants counts this much beside what the session loads. */
const BASE_PART = 0.15;
/** A place already opened. */
const AGAIN = 0.4;
/** Within this share of the best, exercises take turns by camp week. */
const NEAR = 0.6;

/** How much of the session's work is of each quality, 0 to 1. */
function demandOf(
  lines: readonly { readonly exercise: Exercise; readonly sets: number }[],
): Map<Quality, number> {
  const all = lines.reduce((sum, { sets }) => sum + sets, 0) || 1;
  const demand = new Map<Quality, number>();
  for (const { exercise, sets } of lines) {
    for (const [index, quality] of exercise.qualities.entries()) {
      const part = ((index === 0 ? 1 : 0.5) * sets) / all;
      demand.set(quality, (demand.get(quality) ?? 0) + part);
    }
  }
  return demand;
}

/** Two or three mobility exercises by what the session loads and what the base wants; they change with the weeks. */
export function warmUpOf(
  lift: Lift,
  lines: readonly { readonly exercise: Exercise; readonly sets: number }[],
  mobility: readonly Exercise[],
  weights: Weights,
): readonly Filled[] {
  const demand = demandOf(lines);
  const open = new Set<Quality>();
  const picked: Exercise[] = [];
  const number = lift.sets <= SHORT ? FEW : MANY;
  for (let place = 0; place < number; place += 1) {
    const scores = mobility.map((exercise) => {
      if (picked.includes(exercise)) return 0;
      let worth = 0;
      let places = 0;
      for (const quality of exercise.qualities) {
        if (quality === "mobility") continue;
        places += 1;
        worth +=
          ((demand.get(quality) ?? 0) + BASE_PART * weights[quality]) * (open.has(quality) ? AGAIN : 1);
      }
      const stretch = STRETCH[exercise.stretch ?? "active"][lift.explosive ? "fast" : "other"];
      return ((BASE_PART + worth) / Math.max(1, places)) * stretch;
    });
    const least = NEAR * Math.max(0, ...scores);
    const near = mobility.filter((_, index) => (scores[index] ?? 0) > 0 && (scores[index] ?? 0) >= least);
    const next = near[(lift.week + place) % Math.max(1, near.length)];
    if (!next) break;
    picked.push(next);
    for (const quality of next.qualities) open.add(quality);
  }
  return picked.flatMap((exercise, index): Filled[] => {
    const aim = (["hold", "volume", "fast"] as const).find((name) => exercise.doses[name] !== undefined);
    if (!aim) return [];
    const slot = { id: `mobility-${index + 1}`, purpose: "Mobility", work: "warm-up" } as const;
    return [{ slot, exercise, aim, tier: 0, reasons: [], chosenByCoach: false }];
  });
}
