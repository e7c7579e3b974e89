export { placeLifts } from "./place-lifts";
export { placementProblem } from "./problem";
export { solvePlacement } from "./solver";
export type * from "./request";
