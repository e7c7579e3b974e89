import type { ExerciseForm } from "@/lib/schemas/exercise";
import type { BestForm } from "@/lib/schemas/prescription";
import type { SessionLog } from "@/lib/schemas/today";

/* Good bodies of requests. Invented. */

export const SESSION = {
  kind: "skill",
  title: "Pads",
  start: "2026-12-07T18:00",
  minutes: 60,
  effort: 4,
  place: "",
  rrule: "FREQ=WEEKLY;BYDAY=MO",
  exdate: [],
} as const;

export const PROFILE = {
  name: "Ilse Marrow",
  sport: "Boxing",
  dateOfBirth: null,
  secondBase: null,
  secondShare: null,
  limitations: "",
  limitationCodes: [],
  equipment: ["barbell", "rack"],
  plateUnit: "kg",
  plateStep: 2.5,
  trainingAge: "novice",
  strikingBase: "boxing",
  liftsPerWeek: 2,
  freeHours: [{ weekday: 1, from: "10:00", to: "24:00" }],
} as const;

/** An invented rep record. */
export const BEST = {
  exerciseId: "back-squat",
  day: "2026-11-03",
  kg: 110,
  reps: 4,
  formula: "epley",
} satisfies BestForm;

/** What a form says of an exercise; the sets and repetitions are invented. */
export const EXERCISE_FORM = {
  name: "Quayside rope turn",
  qualities: ["rotation", "anti-rotation"],
  main: false,
  load: "reserve",
  bestOf: null,
  powerZone: null,
  sides: "each",
  intent: "controlled",
  doses: {
    heavy: null,
    volume: { sets: { low: 3, high: 4 }, reps: { low: 8, high: 12 } },
    fast: null,
    hold: null,
  },
  rest: 75,
  equipment: ["cable"],
  ruledOutBy: ["low-back-twist"],
  order: "any",
  stretch: null,
  easier: null,
  harder: null,
  cues: ["Turn from the floor", "Stop where you want, not where it ends"],
} satisfies ExerciseForm;

export const CHANGE = {
  change: { kind: "bout.off" },
  baseRevision: 1,
  idempotencyKey: "5d1f0a52-6f0e-4b57-9a55-0c7f3a1f7b99",
};
export const ACCOUNT = { name: "New Name", units: "lb", timeZone: "Europe/Zagreb", mailChoice: "daily" };

/** A sport session as done: the numbers are invented. */
export const LOG = {
  state: "done",
  effort: 6,
  minutes: 55,
  hardRounds: null,
  knock: false,
  painPlace: "",
  pain: null,
  note: "",
  sets: [],
} as const satisfies SessionLog;

export const TRIAL = {
  kind: "jump-height",
  side: "both",
  day: "2026-11-20",
  value: 38.5,
  second: null,
  massKg: 80,
  note: "",
} as const;
