import type { Exercise } from "@/lib/engine/prescription/exercise";
import { entry, of } from "./entry";

type Stretch = Pick<Exercise, "id" | "name" | "qualities" | "cues"> & Partial<Exercise>;

const SHARED = { load: "none", rest: 15 } as const;
/** Moved through the range by the body's own muscles. */
const active = (fields: Stretch): Exercise =>
  entry({ ...SHARED, stretch: "active", doses: { volume: of([1, 2], [6, 10]) }, ...fields });
/** Held by gravity, a hand or the floor. Short: long still holds before fast work take some of its speed. */
const passive = (fields: Stretch): Exercise =>
  entry({ ...SHARED, stretch: "passive", intent: "held", doses: { hold: of([1, 2], [20, 30]) }, ...fields });
/** Held by the muscle on the other side, so that the range can be used. */
const against = (fields: Stretch): Exercise =>
  entry({
    ...SHARED,
    stretch: "against-antagonist",
    intent: "held",
    doses: { hold: of([2, 3], [8, 15]) },
    ...fields,
  });

/** Range of motion for the warm-up; the qualities after the first say what each prepares for. */
export const MOBILITY = [
  active({
    id: "leg-swing-front",
    name: "Leg swing, front and back",
    qualities: ["mobility", "hip-flexion", "posterior-chain"],
    sides: "each",
    ruledOutBy: ["hamstring"],
    cues: ["A hand on the wall, trunk upright", "Grow the swing over the set", "Loose leg, no forcing"],
  }),
  active({
    id: "leg-swing-side",
    name: "Leg swing, side to side",
    qualities: ["mobility", "lateral-push", "rotation"],
    sides: "each",
    ruledOutBy: ["groin"],
    cues: [
      "Face the wall, both hands on it",
      "Let the standing foot pivot",
      "Toes lead across, heel leads out",
    ],
  }),
  active({
    id: "all-fours-hip-circle",
    name: "Hip circle on all fours",
    qualities: ["mobility", "hip-flexion", "lateral-push"],
    sides: "each",
    ruledOutBy: ["wrist"],
    cues: ["Knee up, out, back and round", "The back does not join in", "Both directions"],
  }),
  active({
    id: "seated-hip-switch",
    name: "Seated hip switch",
    qualities: ["mobility", "rotation", "lateral-push"],
    sides: "each",
    ruledOutBy: ["knee-deep", "groin"],
    cues: [
      "Sit, feet wide, knees bent",
      "Drop both knees to one side, then the other",
      "Hands behind you until you need them less",
    ],
  }),
  active({
    id: "toe-grab-squat-to-stand",
    name: "Squat to stand, hands on the toes",
    qualities: ["mobility", "knee-dominant", "posterior-chain"],
    ruledOutBy: ["knee-deep", "hip-deep", "hamstring"],
    cues: [
      "Hold the toes, sink the hips",
      "Chest up at the bottom",
      "Straighten the knees without letting go",
    ],
  }),
  active({
    id: "all-fours-chest-turn",
    name: "Chest turn on all fours",
    qualities: ["mobility", "rotation", "anti-rotation"],
    sides: "each",
    ruledOutBy: ["low-back-twist", "rib", "wrist"],
    cues: ["Hand behind the head", "Elbow under, then up to the ceiling", "Follow it with the eyes"],
  }),
  active({
    id: "side-lying-arm-arc",
    name: "Arm arc lying on the side",
    qualities: ["mobility", "rotation", "press", "throw"],
    sides: "each",
    ruledOutBy: ["low-back-twist", "rib"],
    cues: [
      "Knees stacked and bent, they stay down",
      "Draw a big half circle with the hand",
      "Breathe out as the chest opens",
    ],
  }),
  active({
    id: "wall-arm-slide",
    name: "Arm slide on the wall",
    qualities: ["mobility", "press", "pull", "throw"],
    ruledOutBy: ["shoulder-overhead"],
    cues: ["Back and forearms on the wall", "Slide up as far as they stay on it", "Ribs stay down"],
  }),
  active({
    id: "ankle-rock",
    name: "Ankle rock, knee over toes",
    qualities: ["mobility", "calf-and-foot", "jump"],
    sides: "each",
    ruledOutBy: ["ankle"],
    cues: [
      "Half kneeling, heel nailed down",
      "Knee travels past the little toe and back",
      "No collapse of the arch",
    ],
  }),
  active({
    id: "hand-walk-out",
    name: "Hand walk-out from standing",
    qualities: ["mobility", "posterior-chain", "press", "trunk-flexion"],
    ruledOutBy: ["wrist", "hamstring", "shoulder-press"],
    cues: [
      "Fold, walk the hands out to a plank",
      "Knees as straight as they allow",
      "Walk back in, stand up slowly",
    ],
  }),
  active({
    id: "slow-neck-half-circle",
    name: "Slow neck half circle",
    qualities: ["mobility", "neck"],
    ruledOutBy: ["neck"],
    cues: [
      "Chin from shoulder to shoulder along the chest",
      "Never tip the head back",
      "Slow enough to count to six",
    ],
  }),
  active({
    id: "wrist-and-finger-circles",
    name: "Wrist circles and finger spreads",
    qualities: ["mobility", "grip"],
    ruledOutBy: ["wrist"],
    cues: ["Five circles each way, fists closed", "Then spread the fingers wide", "Elbows still"],
  }),
  passive({
    id: "half-kneeling-hip-stretch",
    name: "Half-kneeling hip stretch",
    qualities: ["mobility", "hip-flexion", "knee-dominant"],
    sides: "each",
    cues: [
      "Tuck the tail under before you lean",
      "Front of the back hip opens",
      "Arm on that side reaches up",
    ],
  }),
  passive({
    id: "lying-hamstring-stretch",
    name: "Lying hamstring stretch",
    qualities: ["mobility", "posterior-chain"],
    sides: "each",
    ruledOutBy: ["hamstring"],
    cues: [
      "On your back, hands behind one thigh",
      "Straighten the knee to the first pull",
      "Other leg stays long",
    ],
  }),
  passive({
    id: "straddle-sit",
    name: "Straddle sit",
    qualities: ["mobility", "lateral-push", "posterior-chain"],
    ruledOutBy: ["groin", "hamstring"],
    cues: [
      "Sit on something low, legs wide",
      "Knees and toes point up",
      "Lean from the hips with a long back",
    ],
  }),
  passive({
    id: "lying-figure-four",
    name: "Lying figure four",
    qualities: ["mobility", "rotation", "posterior-chain"],
    sides: "each",
    ruledOutBy: ["hip-deep"],
    cues: [
      "Ankle over the other knee",
      "Pull the thigh in, head stays down",
      "Feel it in the seat, never in the knee",
    ],
  }),
  passive({
    id: "doorway-chest-stretch",
    name: "Doorway chest stretch",
    qualities: ["mobility", "press", "throw"],
    sides: "each",
    ruledOutBy: ["shoulder-overhead", "shoulder-press"],
    cues: [
      "Forearm on the frame, elbow at shoulder height",
      "Turn the chest away",
      "Back off at any tingling",
    ],
  }),
  passive({
    id: "kneeling-side-reach",
    name: "Kneeling side reach",
    qualities: ["mobility", "lateral-trunk", "pull"],
    sides: "each",
    ruledOutBy: ["knee-deep", "shoulder-overhead"],
    cues: [
      "Sit back on the heels, arms long in front",
      "Walk both hands to one side",
      "Breathe into the long side",
    ],
  }),
  passive({
    id: "wall-calf-stretch",
    name: "Calf stretch at the wall",
    qualities: ["mobility", "calf-and-foot", "jump"],
    sides: "each",
    ruledOutBy: ["ankle"],
    cues: ["Back heel down, toes straight ahead", "Knee straight, then bent", "Lean with the whole body"],
  }),
  against({
    id: "seated-leg-raise-hold",
    name: "Seated straight-leg raise, held",
    qualities: ["mobility", "hip-flexion", "trunk-flexion"],
    sides: "each",
    cues: [
      "Sit tall against a wall",
      "Thigh lifts the leg while the hamstring gives way",
      "A hand's width is enough",
    ],
  }),
  against({
    id: "side-kick-chamber-hold",
    name: "Side kick, leg held up",
    qualities: ["mobility", "lateral-push", "lateral-trunk"],
    sides: "each",
    ruledOutBy: ["groin", "ankle"],
    cues: [
      "Hand on the wall, lift the leg with the hand's help",
      "Let go and hold it where it was",
      "Height comes second, stillness first",
    ],
  }),
  against({
    id: "straddle-leg-lift-hold",
    name: "Straddle leg lift, held",
    qualities: ["mobility", "lateral-push", "hip-flexion"],
    sides: "each",
    ruledOutBy: ["groin", "hamstring"],
    cues: [
      "Straddle sit, hands on the floor in front",
      "Lift one heel and keep it up",
      "Sit tall or the lift is a cheat",
    ],
  }),
  against({
    id: "seat-squeeze-hip-stretch",
    name: "Hip stretch with the seat squeezed",
    qualities: ["mobility", "hip-flexion", "posterior-chain"],
    sides: "each",
    ruledOutBy: ["knee-deep"],
    cues: [
      "Half kneeling, squeeze the seat hard",
      "The squeeze opens the front of the hip",
      "Let go for two breaths, go again",
    ],
  }),
  against({
    id: "face-down-arm-lift-hold",
    name: "Face-down arm lift, held",
    qualities: ["mobility", "pull", "press", "throw"],
    ruledOutBy: ["shoulder-overhead", "rib"],
    cues: [
      "Lie on the belly, arms long, thumbs up",
      "Lift the arms from between the shoulder blades",
      "Forehead stays down",
    ],
  }),
  against({
    id: "toes-up-hold",
    name: "Toes pulled up, held",
    qualities: ["mobility", "calf-and-foot", "jump"],
    cues: [
      "Seated, legs long",
      "Pull the toes to the shins as hard as you can",
      "The calf gives way, the shin works",
    ],
  }),
];
