export * from "./asymmetry";
export * from "./change-verdict";
export * from "./flight";
export * from "./jump-power";
export * from "./reliability";
export * from "./test-kinds";
