import { DAY_MINUTES, hoursBetween, instantAt } from "../geometry";
import type { HouseRules, Instant, PlanInput } from "../types";

/** Hard sparring as instants. */
export interface HardSession {
  readonly startsAt: Instant;
  readonly endsAt: Instant;
}

/** Hard sparring of an input, by start. */
export function hardSessions({ sport, zone }: Pick<PlanInput, "sport" | "zone">): readonly HardSession[] {
  return sport
    .filter((session) => session.kind === "hard-sparring")
    .map((session) => {
      const startsAt = instantAt(zone, session.day, session.start);
      return { startsAt, endsAt: (startsAt + session.minutes) as Instant };
    })
    .sort((a, b) => a.startsAt - b.startsAt);
}

/** Factor that rises from `floor` at `near` hours to 1 at `far` hours; infinite hours are never. */
export function ramp(hours: number, floor: number, near: number, far: number): number {
  if (hours <= near) return floor;
  if (hours >= far) return 1;
  return floor + ((1 - floor) * (hours - near)) / (far - near);
}

/** Hours between a lift and hard sparring: infinite where none is near enough to count, 0 where the two overlap. */
export interface SparringGaps {
  /** From the lift's end to the next start. */
  readonly before: number;
  /** From the last end to the lift's start. */
  readonly after: number;
  /** The same, with hard sparring within a day of the lift left out. */
  readonly beforeFar: number;
  readonly afterFar: number;
  /** Hard sparring lies within a day: the lift gives up at least one set. */
  readonly nearBefore: boolean;
  readonly nearAfter: boolean;
}

/** Index of the first session that starts at or after `instant`. */
function firstFrom(hard: readonly HardSession[], instant: Instant): number {
  let [low, high] = [0, hard.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((hard[middle]?.startsAt ?? Infinity) < instant) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Gaps from a lift to the hard sparring around it; `hard` is sorted by start. */
export function sparringGaps(
  lift: { readonly startsAt: Instant; readonly endsAt: Instant },
  hard: readonly HardSession[],
  rules: HouseRules,
): SparringGaps {
  const dayBefore = rules["before.near"];
  // A day, but never past the hour from which sparring no longer counts.
  const dayAfter = Math.max(rules["after.near"], Math.min(24, rules["after.far"]));
  const next = firstFrom(hard, lift.startsAt);
  let [before, beforeFar, after, afterFar] = [Infinity, Infinity, Infinity, Infinity];
  for (let index = next; index < hard.length && beforeFar === Infinity; index++) {
    const session = hard[index];
    if (!session) break;
    const hours = Math.max(0, hoursBetween(lift.endsAt, session.startsAt));
    before = Math.min(before, hours);
    if (hours > dayBefore) beforeFar = hours;
  }
  // Ends are not in order, but no session is longer than a day.
  const reach = (rules["after.far"] + 24) * 60 + DAY_MINUTES;
  for (let index = next - 1; index >= 0; index--) {
    const session = hard[index];
    if (!session || lift.startsAt - session.startsAt > reach) break;
    const hours = Math.max(0, hoursBetween(session.endsAt, lift.startsAt));
    after = Math.min(after, hours);
    if (hours > dayAfter) afterFar = Math.min(afterFar, hours);
  }
  return {
    before,
    after,
    beforeFar,
    afterFar,
    nearBefore: before <= dayBefore,
    nearAfter: after <= dayAfter,
  };
}

/** Share of the sets that is left ahead of hard sparring. */
export const beforeFactor = (hours: number, rules: HouseRules): number =>
  ramp(hours, rules["before.floor"], rules["before.near"], rules["before.far"]);

/** Share of the sets that is left after hard sparring. */
export const afterFactor = (hours: number, rules: HouseRules): number =>
  ramp(hours, rules["after.floor"], rules["after.near"], rules["after.far"]);
