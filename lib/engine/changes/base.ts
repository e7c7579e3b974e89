import { instantAt, weeksOutOf } from "../geometry";
import type { Base, Lift, PlanInput } from "../types";

/** What starts at or before now, or was already past when it was written down, is past: it never moves. */
export function isPastLift(lift: Lift, { zone, now }: Pick<PlanInput, "zone" | "now">): boolean {
  return lift.past || instantAt(zone, lift.day, lift.start) <= now;
}

/**
 * The camp week whose slot a lift of the base fills, in weeks out of the new bout. An unpinned lift always stands in its
 * own week, so its day says it; a pinned one may stand elsewhere and keeps its week, carried along when the bout moves.
 */
export function weekOfBaseLift(lift: Lift, base: Base, { bout }: Pick<PlanInput, "bout">): number {
  const now = weeksOutOf(bout.day, lift.day);
  return lift.pinned ? lift.week + now - weeksOutOf(base.boutDay, lift.day) : now;
}

/** Day, start and identity order: the order in which lifts are listed. */
export function byTime(
  a: { readonly day: number; readonly start: number; readonly id: string },
  b: { readonly day: number; readonly start: number; readonly id: string },
): number {
  return a.day - b.day || a.start - b.start || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0);
}
