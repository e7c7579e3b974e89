/** The camp book: from people's decisions to the engine's input, the same in browser and server. Pure. */
export * from "./camp-span";
export * from "./camp-zone";
export * from "./edit";
export * from "./edit-for";
export * from "./plan-book";
export * from "./preview";
export * from "./preview-result";
export * from "./put-back";
export * from "./suggested-change";
export * from "./words";
