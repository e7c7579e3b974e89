export * from "./teams";
export * from "./athletes";
export * from "./camps";
export * from "./feeds";
export * from "./mails";
