export * from "./camp-dose";
export * from "./cap";
export * from "./lift-dose";
export * from "./response";
export * from "./sets";
export * from "./sparring";
export * from "./taper";
export * from "./wave";
