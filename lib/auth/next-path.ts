/** Set by proxy.ts on every page request: the address that was asked for, path and query. */
export const PATH_HEADER = "x-bellward-path";

/**
 * Where to go after sign-in: a path on this site and nothing else. `//other.example` and `/\other.example` are other
 * sites to a browser, and control characters are dropped by it before it looks; all of those give the first page.
 */
export function safeNext(given: string | null | undefined, first = "/board"): string {
  if (!given || !/^\/(?![/\\])[\x21-\x7e]*$/.test(given) || given.includes("\\")) return first;
  return given;
}

/** The sign-in page that leads back to `path`. */
export const signInAddress = (path: string | null): string =>
  path && path !== "/" ? `/sign-in?next=${encodeURIComponent(safeNext(path))}` : "/sign-in";
