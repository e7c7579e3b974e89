import { entry, ladder, of } from "./entry";

// Zones of most power by lift: Soriano et al. 2015, Sports Med 45:1191-1205 (27 studies). Jump squat up to 30 % of the squat's best,
// power clean and hang power clean from 70 %.

/** Fast lifts with a load that leaves the hands or the floor, or would if let go. */
export const BALLISTIC_LIFTS = [
  ...ladder(
    entry({
      id: "dumbbell-jump",
      name: "Dumbbell jump",
      qualities: ["jump", "knee-dominant"],
      load: "reserve",
      intent: "explosive",
      doses: { fast: of([3, 5], [3, 5]) },
      rest: 120,
      equipment: ["dumbbell"],
      ruledOutBy: ["knee-impact", "ankle", "low-back-load"],
      cues: ["Light pair held still at the sides", "Dip and jump in one", "Settle before the next"],
    }),
    entry({
      id: "trap-bar-jump",
      name: "Trap-bar jump",
      qualities: ["jump", "posterior-chain"],
      load: "best",
      bestOf: "trap-bar-deadlift",
      // The jump squat's zone; the review has none of its own for this bar.
      powerZone: { low: 0, high: 30 },
      intent: "explosive",
      doses: { fast: of([3, 5], [2, 4]) },
      rest: 150,
      equipment: ["trap-bar"],
      ruledOutBy: ["knee-impact", "ankle", "low-back-load"],
      cues: ["Arms long, jump straight up", "Land with the bar quiet", "Take weight off if the height drops"],
    }),
    entry({
      id: "barbell-jump-squat",
      name: "Barbell jump squat",
      qualities: ["jump", "knee-dominant"],
      load: "best",
      bestOf: "back-squat",
      powerZone: { low: 0, high: 30 },
      intent: "explosive",
      doses: { fast: of([3, 5], [2, 4]) },
      rest: 150,
      equipment: ["barbell", "rack"],
      ruledOutBy: ["knee-impact", "ankle", "low-back-load", "neck", "shoulder-overhead"],
      cues: [
        "Pull the bar into the back so it cannot bounce",
        "Quarter dip, then leave the floor",
        "Soft landing, full stop",
      ],
    }),
  ),
  ...ladder(
    entry({
      id: "one-arm-dumbbell-snatch",
      name: "One-arm dumbbell snatch",
      qualities: ["jump", "posterior-chain"],
      load: "reserve",
      sides: "each",
      intent: "explosive",
      doses: { fast: of([3, 5], [3, 5]) },
      rest: 120,
      equipment: ["dumbbell"],
      ruledOutBy: ["shoulder-overhead", "low-back-load", "elbow"],
      cues: [
        "From the shins to overhead in one pull",
        "Keep it close, elbow high",
        "Catch with a straight arm, then stand",
      ],
    }),
    entry({
      id: "hang-power-clean",
      name: "Hang power clean",
      qualities: ["jump", "posterior-chain", "pull"],
      load: "best",
      // The review says 70 % and above; 90 is where Cormie et al. 2011 (Sports Med 41:125-146, from memory) end these lifts.
      powerZone: { low: 70, high: 90 },
      intent: "explosive",
      doses: { fast: of([3, 5], [1, 3]) },
      rest: 150,
      equipment: ["barbell"],
      ruledOutBy: ["low-back-load", "wrist", "elbow"],
      cues: [
        "Bar at mid-thigh, shoulders over it",
        "Jump, shrug, elbows round fast",
        "Catch high on the shoulders, knees soft",
      ],
    }),
    entry({
      id: "power-clean",
      name: "Power clean",
      qualities: ["jump", "posterior-chain", "pull"],
      load: "best",
      powerZone: { low: 70, high: 90 },
      intent: "explosive",
      doses: { fast: of([3, 5], [1, 3]) },
      rest: 180,
      equipment: ["barbell"],
      ruledOutBy: ["low-back-load", "wrist", "elbow", "hamstring"],
      cues: [
        "Slow off the floor, fast past the knees",
        "Stay over the bar, then jump",
        "Meet the bar, do not wait for it",
      ],
    }),
  ),
];
