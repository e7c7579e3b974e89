export * from "./camp-load";
export * from "./session-load";
export * from "./week-load";
export * from "./weighted";
export * from "./form";
