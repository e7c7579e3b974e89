import type { Violation } from "../types";
import { SlotDay } from "./slot-day";
import type { StandingLift, Surroundings } from "./surroundings";

const byId = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** What a broken rule involves still lies ahead, and can be moved. */
function isAhead({ input, sport, fixed }: Surroundings, ids: readonly string[]): boolean {
  return [...sport.list, ...fixed.list].some(({ id, startsAt }) => startsAt > input.now && ids.includes(id));
}

/**
 * Must rules that lifts break where they stand. Lifts that were placed break none. Of past lifts that nobody pinned only what
 * can still be helped is told: the other session lies ahead.
 */
export function violationsOf(around: Surroundings): readonly Violation[] {
  const found = new Map<string, Violation>();
  const see = (lift: StandingLift): void => {
    for (const { rule, ids, text } of new SlotDay(around, lift, around.dayOf(lift.day)).breaks(
      lift.startsAt,
      lift.start,
    )) {
      if (lift.past && !lift.pinned && !isAhead(around, ids)) continue;
      const all = [lift.id, ...ids];
      // Two lifts that break a rule with one another are told once, by the earlier.
      const key = `${rule} ${[...all].sort(byId).join(" ")}`;
      if (!found.has(key)) found.set(key, { rule, ids: all, day: lift.day, text });
    }
  };
  around.fixed.list.forEach(see);
  return [...found.values()].sort(
    (a, b) => a.day - b.day || byId(a.rule, b.rule) || byId(a.ids.join(" "), b.ids.join(" ")),
  );
}
