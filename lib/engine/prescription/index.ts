/** What is in a lifting session: slots, exercises, sets, loads. Pure, as all of the engine. */
export * from "./exercise";
export * from "./types";
export * from "./rep-max";
export * from "./loading-tables";
export { KG_PER_LB, loadOnPlates, stepKg } from "./plates";
export { baseFor, qualitiesOfBase, weightsOf } from "./base-weights";
export { isAllowed } from "./choose";
export { slotsOf } from "./slots";
export { prescribe } from "./prescribe";
