import { EQUIPMENT, type Equipment, type Limitation } from "../../lib/engine/prescription/exercise";
import type { SportKind, StrikingBase, TrainingAge } from "../../lib/engine/types";

/** An invented gym and its people; dates are days from the day of seeding. Nothing here is a real person, club or bout. */

export const TEAM = { name: "Quayside Striking Club", timeZone: "Europe/Lisbon" };

export interface WeekSession {
  readonly weekday: 1 | 2 | 3 | 4 | 5 | 6 | 7;
  readonly kind: SportKind;
  readonly title: string;
  readonly start: string;
  readonly minutes: number;
  readonly effort: number;
  /** Days out at which it stops: contact leaves the camp before the bout does. */
  readonly lastDaysOut: number;
}

export const GYM_WEEK: readonly WeekSession[] = [
  { weekday: 1, kind: "skill", title: "Pads", start: "18:00", minutes: 75, effort: 4, lastDaysOut: 3 },
  {
    weekday: 2,
    kind: "hard-sparring",
    title: "Hard sparring",
    start: "18:00",
    minutes: 60,
    effort: 8,
    lastDaysOut: 10,
  },
  {
    weekday: 3,
    kind: "skill",
    title: "Clinch drills",
    start: "18:00",
    minutes: 60,
    effort: 4,
    lastDaysOut: 5,
  },
  {
    weekday: 4,
    kind: "conditioning",
    title: "Intervals",
    start: "07:00",
    minutes: 35,
    effort: 7,
    lastDaysOut: 8,
  },
  {
    weekday: 5,
    kind: "technical-sparring",
    title: "Technical spar",
    start: "18:00",
    minutes: 60,
    effort: 5,
    lastDaysOut: 7,
  },
  {
    weekday: 6,
    kind: "hard-sparring",
    title: "Hard sparring",
    start: "11:00",
    minutes: 60,
    effort: 8,
    lastDaysOut: 10,
  },
];

export interface DemoCamp {
  /** Days from seeding to the bout. */
  readonly daysOut: number;
  readonly weeks: number;
  readonly time: string;
  readonly timeZone: string;
  readonly place: string;
  readonly opponent: string;
  readonly ruleset: string;
  readonly rounds: number;
  readonly roundMinutes: number;
  readonly limitKg: number;
  /** Days before the bout, and the time there. */
  readonly weighIn: { readonly daysBefore: number; readonly time: string };
  /** Days before the bout on which the athlete travels. */
  readonly travelDaysBefore?: number;
  /** The bout was signed so many days before today. */
  readonly signedDaysAgo: number;
}

export interface DemoAthlete {
  readonly name: string;
  readonly sport: string;
  readonly dateOfBirth: string;
  readonly trainingAge: TrainingAge;
  readonly strikingBase: StrikingBase;
  readonly liftsPerWeek: number;
  readonly freeFrom: string;
  readonly freeTo: string;
  readonly limitations: string;
  /** The same as exercises are chosen by. */
  readonly limitationCodes: readonly Limitation[];
  /** A second striking base and its share. */
  readonly second?: { readonly base: StrikingBase; readonly share: number };
  /** What the athlete can train with. */
  readonly equipment: readonly Equipment[];
  /** Smallest change of load; steps of 2.5 kg where it is left out. */
  readonly plates?: { readonly unit: "kg" | "lb"; readonly step: number };
  readonly camp: DemoCamp | null;
  /** A hold from so many days ago, open-ended. */
  readonly holdDaysAgo?: number;
}

/** The club's lifting room. */
const CLUB: readonly Equipment[] = [
  "barbell",
  "rack",
  "dumbbell",
  "kettlebell",
  "plate",
  "cable",
  "band",
  "medicine-ball",
  "pull-up-bar",
  "bench",
  "extension-bench",
  "box",
  "landmine",
  "rope",
  "heavy-bag",
];

/** The corner of a hall: nothing with a rack. */
const CORNER: readonly Equipment[] = [
  "dumbbell",
  "kettlebell",
  "plate",
  "band",
  "medicine-ball",
  "pull-up-bar",
  "bench",
  "box",
  "heavy-bag",
];

export const ATHLETES: readonly DemoAthlete[] = [
  {
    name: "Tamsin Velloso",
    sport: "Kickboxing",
    dateOfBirth: "2001-05-17",
    trainingAge: "intermediate",
    strikingBase: "whipping-round-kicks",
    liftsPerWeek: 3,
    freeFrom: "10:00",
    freeTo: "20:00",
    limitations: "Left shoulder dislikes overhead pressing.",
    limitationCodes: ["shoulder-overhead"],
    equipment: CLUB,
    camp: {
      daysOut: 38,
      weeks: 8,
      time: "20:30",
      timeZone: "Europe/Lisbon",
      place: "Ellery Hall",
      opponent: "Petra Holm-Aziz",
      ruleset: "Kickboxing",
      rounds: 3,
      roundMinutes: 3,
      limitKg: 60,
      weighIn: { daysBefore: 1, time: "11:00" },
      signedDaysAgo: 24,
    },
  },
  {
    name: "Idris Calloway",
    sport: "Boxing",
    dateOfBirth: "1996-11-02",
    trainingAge: "advanced",
    strikingBase: "boxing",
    liftsPerWeek: 4,
    freeFrom: "09:00",
    freeTo: "21:00",
    limitations: "",
    limitationCodes: [],
    equipment: [...CLUB, "trap-bar", "neck-harness"],
    plates: { unit: "lb", step: 5 },
    camp: {
      daysOut: 61,
      weeks: 12,
      time: "21:00",
      timeZone: "America/New_York",
      place: "Pier Nine Arena",
      opponent: "Luther Brandvold",
      ruleset: "Boxing",
      rounds: 8,
      roundMinutes: 3,
      limitKg: 76.2,
      weighIn: { daysBefore: 1, time: "12:00" },
      travelDaysBefore: 6,
      signedDaysAgo: 26,
    },
  },
  {
    name: "Lena Strandqvist",
    sport: "Taekwondo",
    dateOfBirth: "2004-02-29",
    trainingAge: "novice",
    strikingBase: "dynamic-high-kicks",
    liftsPerWeek: 2,
    freeFrom: "08:00",
    freeTo: "19:00",
    limitations: "Old ankle sprain, right.",
    limitationCodes: ["ankle"],
    equipment: CORNER,
    plates: { unit: "kg", step: 2 },
    camp: {
      daysOut: 4,
      weeks: 6,
      time: "15:00",
      timeZone: "Europe/Lisbon",
      place: "Saltworks Sports Hall",
      opponent: "Ines Carvalhal",
      ruleset: "Taekwondo",
      rounds: 3,
      roundMinutes: 2,
      limitKg: 57,
      weighIn: { daysBefore: 1, time: "10:00" },
      signedDaysAgo: 41,
    },
  },
  {
    name: "Joaquim Okoro",
    sport: "Karate",
    dateOfBirth: "1999-08-23",
    trainingAge: "intermediate",
    strikingBase: "in-and-out-kicks",
    liftsPerWeek: 3,
    freeFrom: "07:00",
    freeTo: "17:00",
    limitations: "",
    limitationCodes: [],
    equipment: CLUB.filter((piece) => piece !== "landmine" && piece !== "extension-bench"),
    camp: {
      daysOut: 17,
      weeks: 3,
      time: "19:00",
      timeZone: "Europe/Lisbon",
      place: "Ellery Hall",
      opponent: "Sandro Vittel",
      ruleset: "Kumite",
      rounds: 1,
      roundMinutes: 3,
      limitKg: 75,
      weighIn: { daysBefore: 0, time: "09:00" },
      signedDaysAgo: 3,
    },
  },
  {
    name: "Bram Achterberg",
    sport: "Mixed martial arts",
    dateOfBirth: "1994-03-11",
    trainingAge: "advanced",
    strikingBase: "grappling",
    liftsPerWeek: 3,
    freeFrom: "10:00",
    freeTo: "20:00",
    limitations: "Right knee: no deep lunges.",
    limitationCodes: ["knee-deep"],
    second: { base: "boxing", share: 0.4 },
    equipment: [...EQUIPMENT],
    holdDaysAgo: 1,
    camp: {
      daysOut: 47,
      weeks: 10,
      time: "22:00",
      timeZone: "Europe/Lisbon",
      place: "Harbour Dome",
      opponent: "Cato Wennerberg",
      ruleset: "Mixed martial arts",
      rounds: 3,
      roundMinutes: 5,
      limitKg: 83.9,
      weighIn: { daysBefore: 1, time: "09:00" },
      signedDaysAgo: 25,
    },
  },
  {
    name: "Noor Haddadin",
    sport: "Muay Thai",
    dateOfBirth: "2007-06-30",
    trainingAge: "novice",
    strikingBase: "whipping-round-kicks",
    liftsPerWeek: 2,
    freeFrom: "15:00",
    freeTo: "20:00",
    limitations: "",
    limitationCodes: [],
    equipment: CORNER,
    camp: null,
  },
];
