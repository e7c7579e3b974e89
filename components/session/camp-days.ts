import { hhmm } from "@/lib/engine/geometry";
import type { Day, Lift, Minute, Plan, SportSession, WeekSummary } from "@/lib/engine/types";
import { SPORT_LOOKS, WEIGH_IN_LOOK, liftLook, type WorkLook } from "./kinds";

/** One session in a cell of the camp, whatever it is. */
export interface CellEntry {
  readonly id: string;
  readonly look: WorkLook;
  readonly title: string;
  readonly day: Day;
  readonly start: Minute;
  readonly minutes: number;
  readonly lift: Lift | null;
  readonly sport: SportSession | null;
}

export interface WeekRow {
  readonly week: WeekSummary;
  readonly days: readonly { readonly day: Day; readonly entries: readonly CellEntry[] }[];
}

interface CampFacts {
  readonly plan: Plan;
  readonly sport: readonly SportSession[];
  readonly weighIn: { readonly day: Day; readonly start: Minute } | null;
}

const ofLift = (lift: Lift): CellEntry => {
  const look = liftLook(lift.item, lift.phase);
  return { ...lift, look, title: look.label, lift, sport: null };
};

const ofSport = (session: SportSession): CellEntry => ({
  ...session,
  look: SPORT_LOOKS[session.kind],
  lift: null,
  sport: session,
});

const ofWeighIn = ({ day, start }: { day: Day; start: Minute }): CellEntry => ({
  id: "weigh-in",
  look: WEIGH_IN_LOOK,
  title: WEIGH_IN_LOOK.label,
  day,
  start,
  minutes: 0,
  lift: null,
  sport: null,
});

/** The camp as rows of weeks, first week first, each day with its sessions in order. */
export function weekRows({ plan, sport, weighIn }: CampFacts): WeekRow[] {
  const all = [...sport.map(ofSport), ...plan.lifts.map(ofLift), ...(weighIn ? [ofWeighIn(weighIn)] : [])];
  const byDay = new Map<Day, CellEntry[]>();
  for (const entry of all.sort((a, b) => a.start - b.start)) {
    const entries = byDay.get(entry.day);
    if (entries) entries.push(entry);
    else byDay.set(entry.day, [entry]);
  }
  return [...plan.weeks]
    .sort((a, b) => b.weeksOut - a.weeksOut)
    .map((week) => ({
      week,
      days: Array.from({ length: week.to - week.from + 1 }, (_, index) => {
        const day = (week.from + index) as Day;
        return { day, entries: byDay.get(day) ?? [] };
      }),
    }));
}

/** "08:00 to 09:05"; only the start where there is no length. */
export const hoursText = ({ start, minutes }: Pick<CellEntry, "start" | "minutes">): string =>
  minutes === 0 ? hhmm(start) : `${hhmm(start)} to ${hhmm(((start + minutes) % 1440) as Minute)}`;
