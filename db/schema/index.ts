export * from "./teams";
export * from "./athletes";
export * from "./camps";
export * from "./feeds";
export * from "./mails";
export * from "./rate-limits";
