import type {
  Aim,
  AimDose,
  Equipment,
  Exercise,
  Intent,
  Limitation,
  LoadModel,
  Quality,
  Range,
} from "@/lib/engine/prescription/exercise";
import type { ExerciseSummary } from "@/lib/schemas/exercise";

export const QUALITY_WORDS: Record<Quality, string> = {
  rotation: "Rotation",
  "anti-rotation": "Against rotation",
  "trunk-flexion": "Trunk flexion",
  "lateral-trunk": "Side of the trunk",
  "lateral-push": "Sideways push",
  "hip-flexion": "Hip flexion",
  "posterior-chain": "Posterior chain",
  "knee-dominant": "Knee-dominant",
  press: "Press",
  pull: "Pull",
  neck: "Neck",
  grip: "Grip",
  jump: "Jump",
  throw: "Throw",
  "calf-and-foot": "Calf and foot",
  mobility: "Mobility",
};

export const EQUIPMENT_WORDS: Record<Equipment, string> = {
  barbell: "Barbell",
  rack: "Rack",
  "trap-bar": "Trap bar",
  dumbbell: "Dumbbells",
  kettlebell: "Kettlebell",
  plate: "Plate to hold",
  cable: "Cable pulley",
  band: "Band",
  "medicine-ball": "Medicine ball",
  "pull-up-bar": "Pull-up bar",
  bench: "Bench",
  "extension-bench": "Extension bench",
  box: "Box",
  landmine: "Landmine",
  sled: "Sled",
  rope: "Rope",
  "neck-harness": "Neck harness",
  "heavy-bag": "Heavy bag",
};

/** What a limitation does not stand. */
export const LIMITATION_WORDS: Record<Limitation, string> = {
  "shoulder-overhead": "Shoulder: nothing overhead",
  "shoulder-press": "Shoulder: no pressing",
  elbow: "Elbow",
  wrist: "Wrist",
  neck: "Neck",
  "low-back-load": "Low back: no load on it",
  "low-back-twist": "Low back: no twisting",
  "hip-deep": "Hip: no deep bend",
  groin: "Groin",
  hamstring: "Hamstring",
  "knee-deep": "Knee: no deep bend",
  "knee-impact": "Knee: no landing",
  ankle: "Ankle",
  rib: "Rib",
};

export const AIM_WORDS: Record<Aim, string> = {
  heavy: "Heavy",
  volume: "Volume",
  fast: "Fast",
  hold: "Hold",
};

export const INTENT_WORDS: Record<Intent, string> = {
  explosive: "As fast as it goes",
  controlled: "Under control both ways",
  held: "Held still",
};

export const LOAD_WORDS: Record<LoadModel, string> = {
  best: "Percent of a best",
  reserve: "By repetitions in reserve",
  body: "Body mass",
  throw: "A ball that still flies fast",
  none: "None",
};

export const SIDES_WORDS: Record<Exercise["sides"], string> = {
  both: "Both together",
  each: "One side, then the other",
};

export const ORDER_WORDS: Record<Exercise["order"], string> = {
  any: "Anywhere in the session",
  last: "Last in the session",
};

export const STRETCH_WORDS: Record<NonNullable<Exercise["stretch"]>, string> = {
  active: "Active stretch",
  passive: "Passive stretch",
  "against-antagonist": "Held against the working antagonist",
};

/** "3 to 4", or "3" where both ends are the same. */
export const rangeText = ({ low, high }: Range): string => (low === high ? `${low}` : `${low} to ${high}`);

const UNITS: Record<Aim, string> = { heavy: "", volume: "", fast: "", hold: " s" };

/** "3 to 4 × 8 to 12 a side". */
export const doseText = (aim: Aim, { sets, reps }: AimDose, sides: Exercise["sides"]): string =>
  `${rangeText(sets)} × ${rangeText(reps)}${UNITS[aim]}${sides === "each" ? " a side" : ""}`;

/** "Rotation, trunk flexion". */
export function qualitiesText(qualities: readonly Quality[]): string {
  const words = qualities.map((quality) => QUALITY_WORDS[quality]);
  return words.map((word, index) => (index === 0 ? word : word.toLowerCase())).join(", ");
}

/** "Barbell, rack", or "Nothing". */
export const equipmentText = (equipment: readonly Equipment[]): string =>
  equipment.length === 0
    ? "Nothing"
    : equipment
        .map((piece, index) => (index === 0 ? EQUIPMENT_WORDS[piece] : EQUIPMENT_WORDS[piece].toLowerCase()))
        .join(", ");

/** "75 s", "2 min", "2 min 30 s". */
export function restText(seconds: number): string {
  const minutes = Math.floor(seconds / 60);
  const rest = seconds % 60;
  if (minutes === 0 || seconds < 90) return `${seconds} s`;
  return rest === 0 ? `${minutes} min` : `${minutes} min ${rest} s`;
}

/** Where an exercise comes from, where that is not the library as it is; "" where it is. */
export function originText({ origin, shelved }: Pick<ExerciseSummary, "origin" | "shelved">): string {
  const own = { library: null, team: "The team’s own", changed: "Changed by the team" }[origin];
  return [own, shelved ? "Shelved" : null].filter(Boolean).join(", ");
}

/** "2 current camps; 14 sets in 8 weeks"; "" where it is not used. */
export function usedText({ camps, sets }: ExerciseSummary["use"]): string {
  const inCamps = camps === 0 ? null : camps === 1 ? "1 current camp" : `${camps} current camps`;
  const logged = sets === 0 ? null : `${sets} ${sets === 1 ? "set" : "sets"} in 8 weeks`;
  return [inCamps, logged].filter(Boolean).join("; ");
}
