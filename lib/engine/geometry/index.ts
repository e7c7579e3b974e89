export * from "./civil";
export * from "./camp";
export * from "./instants";
