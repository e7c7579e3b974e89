import { dayFromIso, isoFromDay, weekSpan, weekdayOf } from "../../lib/engine";
import type { Day } from "../../lib/engine/types";
import type { CampBook, SportEntry } from "../../lib/schemas/camp-book";
import { GYM_WEEK, TEAM, type DemoAthlete, type DemoCamp, type WeekSession } from "./scenario";

const firstOn = (from: Day, weekday: number): Day => (from + ((weekday - weekdayOf(from) + 7) % 7)) as Day;
const compact = (day: Day): string => isoFromDay(day).replaceAll("-", "");

/** A weekly entry of the gym from a day on; `until` bounds it. Ids are the same on every seeding of the same day. */
export function weeklyEntry(session: WeekSession, key: string, from: Day, until: Day | null): SportEntry {
  const id = `${key}-${session.weekday}`;
  return {
    id,
    series: id,
    idShift: 0,
    kind: session.kind,
    title: session.title,
    start: `${isoFromDay(firstOn(from, session.weekday))}T${session.start}`,
    minutes: session.minutes,
    effort: session.effort,
    place: "",
    exdate: [],
    rrule: until === null ? "FREQ=WEEKLY" : `FREQ=WEEKLY;UNTIL=${compact(until)}T235900Z`,
  };
}

const travelEntry = (key: string, day: Day): SportEntry => ({
  id: `${key}-travel`,
  series: `${key}-travel`,
  idShift: 0,
  kind: "travel",
  title: "Travel to the venue",
  start: `${isoFromDay(day)}T09:00`,
  minutes: 600,
  effort: 0,
  place: "",
  rrule: null,
  exdate: [],
});

export const factsOf = (athlete: DemoAthlete): CampBook["athlete"] => ({
  trainingAge: athlete.trainingAge,
  strikingBase: athlete.strikingBase,
  liftsPerWeek: athlete.liftsPerWeek,
  freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({
    weekday,
    from: athlete.freeFrom,
    to: athlete.freeTo,
  })),
});

/** The camp book of a demo athlete, with the bout so many days from `today`. */
export function demoBook(athlete: DemoAthlete, camp: DemoCamp, today: string, key: string): CampBook {
  const bout = (dayFromIso(today) + camp.daysOut) as Day;
  const { from } = weekSpan(bout, camp.weeks - 1);
  const travelDay = camp.travelDaysBefore === undefined ? null : ((bout - camp.travelDaysBefore) as Day);
  const sport = GYM_WEEK.flatMap((session): SportEntry[] => {
    const last = Math.min(bout - session.lastDaysOut, travelDay === null ? bout : travelDay - 1) as Day;
    return firstOn(from, session.weekday) > last ? [] : [weeklyEntry(session, key, from, last)];
  });
  return {
    status: "on",
    homeZone: TEAM.timeZone,
    bout: {
      date: isoFromDay(bout),
      time: camp.time,
      timeZone: camp.timeZone,
      place: camp.place,
      opponent: camp.opponent,
      ruleset: camp.ruleset,
      rounds: camp.rounds,
      roundMinutes: camp.roundMinutes,
      limitKg: camp.limitKg,
    },
    weeks: camp.weeks,
    weighIn: { date: isoFromDay((bout - camp.weighIn.daysBefore) as Day), time: camp.weighIn.time },
    athlete: factsOf(athlete),
    sport: travelDay === null ? sport : [...sport, travelEntry(key, travelDay)],
    pins: [],
    coachFactors: {},
    responses: [],
    holds: [],
    rules: {},
  };
}
