/** Caches of the service worker. Pages and answers hold one person's data and go when that person signs out. */
export const CACHES = {
  assets: "bellward-assets",
  pages: "bellward-pages",
  answers: "bellward-answers",
} as const;
