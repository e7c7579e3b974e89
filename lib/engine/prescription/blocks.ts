import { isLighterWeek } from "../dose/wave";
import type { Day, Lift } from "../types";

/** A run of weeks that keeps its main lifts. */
export interface Block {
  /** From 0, in the order of the camp. */
  readonly index: number;
  /** Day of its first lift. */
  readonly from: Day;
}

const KEEPS = {
  foundation: "foundation",
  strength: "strength",
  power: "strength",
  taper: "strength",
} as const;

/**
 * The block of each camp week, by weeks out. A block ends after a lighter week, which belongs to it, and with the foundation. Power
 * and taper go on with the last block of strength: what was built there is what they keep.
 */
export function blocksOf(lifts: readonly Lift[]): ReadonlyMap<number, Block> {
  const blocks = new Map<number, Block>();
  let block: Block | null = null;
  let kept = "";
  let lighter = false;
  for (const lift of [...lifts].sort((a, b) => b.week - a.week || a.day - b.day || a.start - b.start)) {
    if (blocks.has(lift.week)) continue;
    const keeps = KEEPS[lift.phase];
    const building = lift.phase === "foundation" || lift.phase === "strength";
    const ends = keeps !== kept || (lighter && building);
    lighter = isLighterWeek(lift.factors);
    // A lighter week never begins a block of its own: the next week would begin another.
    if (!block || (ends && !lighter)) {
      block = { index: block ? block.index + 1 : 0, from: lift.day };
      kept = keeps;
    }
    blocks.set(lift.week, block);
  }
  return blocks;
}
