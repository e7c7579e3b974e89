import type { Exercise } from "@/lib/engine/prescription/exercise";
import { ANTI_ROTATION } from "./anti-rotation";
import { KNEE_DOMINANT } from "./knee-dominant";
import { LATERAL_PUSH } from "./lateral-push";
import { LATERAL_TRUNK } from "./lateral-trunk";
import { POSTERIOR_CHAIN } from "./posterior-chain";
import { ROTATION } from "./rotation";
import { TRUNK_FLEXION } from "./trunk";

/** The exercise library every team starts with. Ids are stable: plans, bests and logs name them. */
export const EXERCISES: readonly Exercise[] = [
  ...ROTATION,
  ...ANTI_ROTATION,
  ...TRUNK_FLEXION,
  ...LATERAL_TRUNK,
  ...LATERAL_PUSH,
  ...POSTERIOR_CHAIN,
  ...KNEE_DOMINANT,
];
