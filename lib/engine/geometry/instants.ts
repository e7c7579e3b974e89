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

/** Instant of a wall-clock reading. */
export function instantAt(zone: readonly OffsetStep[], day: Day, minute: Minute): Instant {
  const civilMinute = day * DAY_MINUTES + minute;
  return (civilMinute - offsetAt(zone, civilMinute)) as Instant;
}
