/** What is in a lifting session: slots, exercises, sets, loads. Pure, as all of the engine. */
export * from "./exercise";
export * from "./types";
export * from "./rep-max";
export * from "./loading-tables";
export { KG_PER_LB, loadOnPlates, stepKg } from "./plates";
export { baseFor, qualitiesOfBase, weightsOf, type Weights } from "./base-weights";
export { BASE_WORDS, FROM_WORDS, qualityWords, thingWords } from "./wording";
export { isAllowed } from "./choose";
export { bestOn } from "./loads";
export { slotsOf, type Slot } from "./slots";
export { prescribe } from "./prescribe";
