import type { Day, Instant, Minute, OffsetStep } from "../types";
import { DAY_MINUTES } from "./civil";

/** UTC offset that holds at a civil minute, minutes east of UTC; 0 without steps. */
export function offsetAt(zone: readonly OffsetStep[], civilMinute: number): number {
  let offset = zone[0]?.offset ?? 0;
  for (const step of zone) {
    if (step.from > civilMinute) break;
    offset = step.offset;
  }
  return offset;
}

/**
 * The instant of a wall-clock reading. `minute` may run past midnight (1440 to 2880 is the next day). A reading in a
 * gap moves forward by the gap, one in an overlap takes the first: that follows from where a step begins (`OffsetStep`).
 */
export function instantAt(zone: readonly OffsetStep[], day: Day, minute: Minute): Instant {
  const civilMinute = day * DAY_MINUTES + minute;
  return (civilMinute - offsetAt(zone, civilMinute)) as Instant;
}

/** Hours between two instants, negative where `to` comes first. */
export function hoursBetween(from: Instant, to: Instant): number {
  return (to - from) / 60;
}
