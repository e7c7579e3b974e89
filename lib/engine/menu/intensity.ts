import type { CampWeek } from "../phases";
import type { Intensity, Item } from "../types";
import { menuOf } from "./week-menu";

const best = (low: number, high: number): Intensity => ({ low, high, of: "best" });

/** 67 to 85 % suits general strength and size. NSCA goal table (Essentials; from memory). */
const FOUNDATION = best(67, 75);

/**
 * Percent of best over the weeks of a block. At or above 85 % is the strength zone of the NSCA goal table (Essentials;
 * from memory); the climb towards it is common practice, no published source.
 */
const STEPS = [best(80, 85), best(82.5, 87.5), best(85, 90)] as const;

/** Strength B works this much lower, percent of best: upper body and total lifts with more repetitions. Common practice. */
const B_LOWER_BY = 5;

/** Jump squats give most power at or under 30 % of best. Soriano et al. 2015, Sports Med 45(8):1191-1205. */
const BALLISTIC = best(0, 30);

/** A priming session needs 85 % or more, or ballistic work. Harrison et al. 2019, Sports Med 49:1487-1514. */
const PRIMING = best(85, 90);

/** Reserve is judged well up to about three: Hackett et al. 2017, J Strength Cond Res 31(8):2162-2168. */
const RESERVE: Intensity = { low: 2, high: 3, of: "reserve" };

/** The step of a week's wave, 1 to 3; a deload keeps the first: lighter, and still strength. */
function strengthStep(week: Pick<CampWeek, "step">): Intensity {
  return STEPS[Math.min(3, Math.max(1, week.step)) - 1] ?? STEPS[0];
}

function buildingIntensity(item: Item, week: Pick<CampWeek, "phase" | "step">): Intensity {
  switch (item) {
    case "strength-a":
      return week.phase === "foundation" ? FOUNDATION : strengthStep(week);
    case "strength-b": {
      if (week.phase === "foundation") return FOUNDATION;
      const { low, high } = strengthStep(week);
      return best(low - B_LOWER_BY, high - B_LOWER_BY);
    }
    case "strength-keep":
      return STEPS[2];
    case "power-a":
    case "power-touch":
    case "power-short":
      return BALLISTIC;
    case "primer":
      return PRIMING;
    case "trunk-and-kick":
    case "power-b":
      return RESERVE;
  }
}

/**
 * Intensity of an item in a camp week. In the taper it is that of the last building week with the item on its menu, never
 * lower: only sets fall (Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365: intensity unchanged).
 */
export function intensityOf(item: Item, week: CampWeek, weeks: readonly CampWeek[]): Intensity {
  if (week.phase !== "taper") return buildingIntensity(item, week);
  const last = weeks
    .filter((row) => row.phase !== "taper" && !row.deload && menuOf(row).includes(item))
    .at(-1);
  return buildingIntensity(item, last ?? { phase: "strength", step: 3 });
}
