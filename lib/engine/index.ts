/** The one public face of the engine. Pure: no clock, no chance, no machine; see `types.ts` for the glossary. */
export * from "./types";
export * from "./geometry";
export * from "./phases";
export { ITEM_TITLES } from "./menu";
export * from "./load";
export * from "./measures";
export * from "./weight";
export * from "./response";
export { inputProblems, PlanInputError } from "./input";
export { plan } from "./plan";
export { knockOn } from "./changes/knock-on";
export { DEFAULT_RULES, HOUSE_RULES, RULE_KEYS, withOverrides } from "./rules/house-rules";
export { PLACEMENT_RULES } from "./rules/placement-rules";
export * from "./prescription";
