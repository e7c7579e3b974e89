export * from "./phase-spans";
export * from "./camp-weeks";
export * from "./frame";
