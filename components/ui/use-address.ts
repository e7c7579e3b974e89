"use client";

import { useEffect, useRef } from "react";

/** Browsers refuse more than about 100 address changes in half a minute; typing must not get near that. */
const QUIET_MS = 250;

/**
 * Keeps the address bar at `query` without a request and without a step in the history. Untouched inputs leave it alone: a
 * change of the address ends a navigation that is under way.
 */
export function useAddress(query: string): void {
  const shown = useRef(query);
  useEffect(() => {
    if (shown.current === query) return;
    const timer = setTimeout(() => {
      shown.current = query;
      window.history.replaceState(null, "", query === "" ? window.location.pathname : `?${query}`);
    }, QUIET_MS);
    return () => clearTimeout(timer);
  }, [query]);
}
