export { placeLifts, whyNotAt } from "./place-lifts";
export { placementProblem } from "./problem";
export { solvePlacement } from "./solve";
export type * from "./request";
