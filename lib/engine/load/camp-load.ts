import { campStart } from "../geometry";
import type { CampFrame } from "../phases";
import type { Au, Day, DayLoad, Lift, WeekSummary } from "../types";
import { sessionLoad, sportLoad } from "./session-load";
import { weekLoad } from "./week-load";

/** Sport load, AU, by weeks out. */
export function sportLoads({ input }: CampFrame): ReadonlyMap<number, number> {
  const loads = new Map<number, number>();
  for (const session of input.sport) {
    const week = Math.floor((input.bout.day - session.day) / 7);
    loads.set(week, (loads.get(week) ?? 0) + sportLoad(session));
  }
  return loads;
}

/** One entry a camp day, first to last. */
export function dayLoads({ input }: CampFrame, lifts: readonly Lift[]): readonly DayLoad[] {
  const first = campStart(input.bout.day, input.weeks);
  const count = 7 * input.weeks;
  const rows = Array.from({ length: count }, () => ({ sport: 0, lifting: 0, hard: false, sets: 0 }));
  for (const session of input.sport) {
    const row = rows[session.day - first];
    if (!row) continue;
    row.sport += sportLoad(session);
    row.hard ||= session.kind === "hard-sparring";
  }
  for (const lift of lifts) {
    const row = rows[lift.day - first];
    if (!row) continue;
    row.lifting += sessionLoad(lift.effort, lift.minutes);
    row.sets += lift.sets;
  }
  return rows.map(({ sport, lifting, hard, sets }, index) => ({
    day: (first + index) as Day,
    sport: sport as Au,
    lifting: lifting as Au,
    hard,
    sets,
  }));
}

/** One entry a camp week, first to last. `days` are all camp days in order. */
export function weekSummaries(
  frame: CampFrame,
  days: readonly DayLoad[],
  caps: ReadonlyMap<number, Au | null>,
): readonly WeekSummary[] {
  return frame.weeks.map((week, index): WeekSummary => {
    const own = days.slice(7 * index, 7 * index + 7);
    const { monotony, strain } = weekLoad(own.map((day) => day.sport + day.lifting));
    const sum = (of: (day: DayLoad) => number): number => own.reduce((total, day) => total + of(day), 0);
    return {
      weeksOut: week.weeksOut,
      from: week.from,
      to: week.to,
      phase: week.phase,
      deload: week.deload,
      sets: sum((day) => day.sets),
      sportLoad: sum((day) => day.sport) as Au,
      liftingLoad: sum((day) => day.lifting) as Au,
      monotony,
      strain,
      loadCap: caps.get(week.weeksOut) ?? null,
    };
  });
}
