import type { Day, Instant, Minute, OffsetStep } from "../types";
import { MINUTES_A_DAY } from "./civil";

/**
 * The instant of a wall-clock reading. `minute` may run past midnight (1440 to 2880 is the next day). A reading in a
 * gap moves forward by the gap, one in an overlap takes the first: that follows from where a step begins (`OffsetStep`).
 * Without steps the wall clock is UTC.
 */
export function instantAt(zone: readonly OffsetStep[], day: Day, minute: Minute): Instant {
  const civil = day * MINUTES_A_DAY + minute;
  let offset = zone[0]?.offset ?? 0;
  for (const step of zone) {
    if (step.from > civil) break;
    offset = step.offset;
  }
  return (civil - offset) as Instant;
}

/** Hours between two instants, negative where `to` comes first. */
export function hoursBetween(from: Instant, to: Instant): number {
  return (to - from) / 60;
}
