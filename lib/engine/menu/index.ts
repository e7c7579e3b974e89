export * from "./items";
export * from "./week-menu";
export * from "./intensity";
export * from "./lay-out";
export * from "./pins";
