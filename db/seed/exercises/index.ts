import type { Exercise } from "@/lib/engine/prescription/exercise";
import { ANTI_ROTATION } from "./anti-rotation";
import { BALLISTIC_LIFTS } from "./ballistic-lifts";
import { CALF_AND_FOOT } from "./foot-and-calf";
import { HIP_FLEXION } from "./hip-flexion";
import { JUMPS } from "./jumps";
import { KNEE_DOMINANT } from "./knee-dominant";
import { LATERAL_PUSH } from "./lateral-push";
import { LATERAL_TRUNK } from "./lateral-trunk";
import { MOBILITY } from "./mobility";
import { GRIP, NECK } from "./neck-and-grip";
import { POSTERIOR_CHAIN } from "./posterior-chain";
import { PRESS } from "./press";
import { PULL } from "./pull";
import { ROTATION } from "./rotation";
import { THROWS } from "./throws";
import { TRUNK_FLEXION } from "./trunk";

/** The exercise library every team starts with. Ids are stable: plans, bests and logs name them. */
export const EXERCISES: readonly Exercise[] = [
  ...ROTATION,
  ...ANTI_ROTATION,
  ...TRUNK_FLEXION,
  ...LATERAL_TRUNK,
  ...LATERAL_PUSH,
  ...HIP_FLEXION,
  ...POSTERIOR_CHAIN,
  ...KNEE_DOMINANT,
  ...PRESS,
  ...PULL,
  ...NECK,
  ...GRIP,
  ...JUMPS,
  ...BALLISTIC_LIFTS,
  ...THROWS,
  ...CALF_AND_FOOT,
  ...MOBILITY,
];
