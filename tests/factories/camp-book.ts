import type { CampBook, SportEntry } from "@/lib/schemas/camp-book";
import type { CampForm } from "@/lib/schemas/camp";

/** A weekly session of the gym: an invented timetable. */
export const weekly = (id: string, start: string, over: Partial<SportEntry> = {}): SportEntry => ({
  id,
  series: id,
  idShift: 0,
  kind: "skill",
  title: "Pads",
  start,
  minutes: 60,
  effort: 4,
  place: "",
  rrule: "FREQ=WEEKLY",
  exdate: [],
  ...over,
});

export const hardSparring = (id: string, start: string, over: Partial<SportEntry> = {}): SportEntry =>
  weekly(id, start, { kind: "hard-sparring", title: "Hard sparring", effort: 8, ...over });

/** An 8-week camp to Saturday 9 January 2027: Sunday 15 November 2026 is its first day. */
export const campBook = (over: Partial<CampBook> = {}): CampBook => ({
  status: "on",
  homeZone: "Europe/Lisbon",
  bout: {
    date: "2027-01-09",
    time: "20:30",
    timeZone: "Europe/Lisbon",
    place: "Ellery Hall",
    opponent: "Petra Holm-Aziz",
    ruleset: "Kickboxing",
    rounds: 3,
    roundMinutes: 3,
    limitKg: 60,
  },
  weeks: 8,
  weighIn: { date: "2027-01-08", time: "11:00" },
  athlete: {
    trainingAge: "intermediate",
    liftsPerWeek: 3,
    strikingBase: "whipping-round-kicks",
    freeHours: [1, 2, 3, 4, 5, 6, 7].map((weekday) => ({ weekday, from: "10:00", to: "20:00" })),
  },
  sport: [
    hardSparring("tue", "2026-11-17T18:00", { rrule: "FREQ=WEEKLY;UNTIL=20261229T235900Z" }),
    hardSparring("sat", "2026-11-21T11:00", { rrule: "FREQ=WEEKLY;UNTIL=20261229T235900Z" }),
    weekly("mon", "2026-11-16T18:00"),
  ],
  pins: [],
  coachFactors: {},
  responses: [],
  holds: [],
  rules: {},
  ...over,
});

/** The same camp as a form that a coach sends. */
export const campForm = (over: Partial<CampForm> = {}): CampForm => {
  const book = campBook();
  return {
    athlete: { name: "Tamsin Velloso" },
    homeZone: book.homeZone,
    bout: book.bout,
    weeks: book.weeks,
    weighIn: book.weighIn,
    facts: book.athlete,
    sport: book.sport.map(({ kind, title, start, minutes, effort, place, rrule, exdate }) => ({
      kind,
      title,
      start,
      minutes,
      effort,
      place,
      rrule,
      exdate,
    })),
    ...over,
  };
};
