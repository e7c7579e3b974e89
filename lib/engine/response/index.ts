export { againstNormal, checkInSum, type AgainstNormal } from "./check-in";
export * from "./suggestions";
export * from "./types";
