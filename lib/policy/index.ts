export * from "./roles";
export * from "./table";
export * from "./changes";
export * from "./concerned";
