import type { Item, Phase } from "../types";
import type { CampWeek } from "../phases";

const STRENGTH: readonly Item[] = ["strength-a", "strength-b", "trunk-and-kick", "power-touch"];
const FIGHT_WEEK: readonly Item[] = ["power-short", "primer"];

/**
 * Items by phase, most important first. The taper before fight week has four, so that an athlete who lifts four times
 * keeps lifting four times: volume is what the taper cuts, not frequency (Bosquet et al. 2007, Med Sci Sports Exerc
 * 39(8):1358-1365: frequency unchanged). Which items: common practice, no published source.
 */
const MENUS: Readonly<Record<Phase, readonly Item[]>> = {
  foundation: STRENGTH,
  strength: STRENGTH,
  power: ["power-a", "strength-keep", "power-b", "trunk-and-kick"],
  taper: ["power-a", "strength-keep", "trunk-and-kick", "power-touch"],
};

/** All items of a camp week, most important first, before it is cut to the athlete's lifts a week. */
export function menuOf(week: Pick<CampWeek, "phase" | "weeksOut">): readonly Item[] {
  return week.weeksOut === 0 ? FIGHT_WEEK : MENUS[week.phase];
}

/** Lifts that a week may hold: `most`, one less where hard sparring takes the recovery, never none. */
export function liftsOfWeek(most: number, hardDays: number, hardDaysOff: number): number {
  return hardDays >= hardDaysOff ? Math.max(1, most - 1) : most;
}
