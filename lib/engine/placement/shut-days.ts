import { campStart } from "../geometry";
import type { Day, PlanInput } from "../types";

/** A day on which nothing is lifted. */
export interface ShutDay {
  /** "a rest day" */
  readonly why: string;
  /** Sport sessions that make it one. */
  readonly ids: readonly string[];
}

/** Bout, weigh-in, held, rest and travel days; the first of these where a day is several. */
export function shutDaysOf({ bout, weighIn, sport, holds, weeks }: PlanInput): ReadonlyMap<Day, ShutDay> {
  const days = new Map<Day, ShutDay>();
  const shut = (day: Day, why: string, ids: readonly string[] = []): void => {
    if (!days.has(day)) days.set(day, { why, ids });
  };
  shut(bout.day, "the bout day");
  if (weighIn) shut(weighIn.day, "the weigh-in day");
  const first = campStart(bout.day, weeks);
  for (const hold of holds) {
    const last = Math.min(hold.to ?? bout.day, bout.day);
    for (let day = Math.max(hold.from, first); day <= last; day++) shut(day as Day, "a day on hold");
  }
  for (const [kind, why] of [
    ["rest", "a rest day"],
    ["travel", "a travel day"],
  ] as const) {
    for (const session of sport) {
      if (session.kind !== kind) continue;
      const known = days.get(session.day);
      if (known?.why === why) days.set(session.day, { why, ids: [...known.ids, session.id].sort() });
      else shut(session.day, why, [session.id]);
    }
  }
  return days;
}
