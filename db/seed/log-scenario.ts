/** How the demo's athletes answered for their days. All figures are invented. */

export interface AthleteStory {
  /** Body mass at the start, kilograms. */
  readonly mass: number;
  /** Share of the way down to the limit that is really taken; below 1 falls behind the line. */
  readonly descent: number;
  /** Bests against the table below. */
  readonly strength: number;
  /** Usual answers of a check-in, 1 to 7. */
  readonly usual: {
    readonly sleep: number;
    readonly fatigue: number;
    readonly soreness: number;
    readonly stress: number;
  };
  /** Added to each answer on the last two days. */
  readonly lately: number;
  /** Added to the effort of the last two lifting sessions. */
  readonly hardLately: number;
  /** Pain in the newest session. */
  readonly pain?: { readonly place: string; readonly of10: number };
  /** The newest sparring ended with a knock to the head. */
  readonly knock?: string;
  /** Cannot make the next session of this title. */
  readonly cannot?: { readonly title: string; readonly reason: string };
}

const FRESH = { sleep: 2, fatigue: 2, soreness: 3, stress: 2 };
const BUSY = { sleep: 3, fatigue: 3, soreness: 3, stress: 4 };

export const STORIES: Readonly<Record<string, AthleteStory>> = {
  "Tamsin Velloso": { mass: 63.6, descent: 1, strength: 1, usual: FRESH, lately: 0, hardLately: 2 },
  "Idris Calloway": { mass: 80.4, descent: 0.2, strength: 1.15, usual: BUSY, lately: 0, hardLately: 0 },
  "Lena Strandqvist": {
    mass: 59.4,
    descent: 1,
    strength: 0.8,
    usual: FRESH,
    lately: 0,
    hardLately: 0,
    pain: { place: "Right ankle", of10: 4 },
  },
  "Joaquim Okoro": {
    mass: 76.9,
    descent: 1,
    strength: 1,
    usual: FRESH,
    lately: 3,
    hardLately: 0,
    cannot: { title: "Technical spar", reason: "Late shift at work until 19:00." },
  },
  "Bram Achterberg": {
    mass: 88.2,
    descent: 0.9,
    strength: 1.2,
    usual: BUSY,
    lately: 0,
    hardLately: 0,
    knock: "Head knock in the last round, headache in the evening.",
  },
  "Noor Haddadin": { mass: 58.5, descent: 0, strength: 0.7, usual: FRESH, lately: 0, hardLately: 0 },
};

/** Best lifted for so many repetitions, as a share of body mass; one of several repetitions gives an estimate. */
export const BEST_LIFTS: Readonly<Record<string, { readonly share: number; readonly reps: number }>> = {
  "trap-bar-deadlift": { share: 1.6, reps: 3 },
  "wide-stance-deadlift": { share: 1.5, reps: 3 },
  "conventional-deadlift": { share: 1.55, reps: 3 },
  "back-squat": { share: 1.2, reps: 3 },
  "front-squat": { share: 1.05, reps: 3 },
  "bench-press": { share: 0.9, reps: 3 },
  "incline-press": { share: 0.75, reps: 3 },
  "bent-row": { share: 0.75, reps: 5 },
  "barbell-hip-thrust": { share: 1.5, reps: 5 },
};
