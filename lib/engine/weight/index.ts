export * from "./ceilings";
export * from "./descent";
export * from "./remark";
