"use client";

import { usePathname, useSearchParams } from "next/navigation";
import { useEffect, useState } from "react";
import { filtersOf, queryOf, type BoardFilters } from "./filters";

/** Browsers refuse more than about 100 address changes in half a minute; typing must not get near that. */
const QUIET_MS = 250;

/** The board's filters. They come from the address bar and go back to it. */
export function useBoardFilters() {
  const path = usePathname();
  const given = useSearchParams();
  const [filters, setFilters] = useState<BoardFilters>(() => filtersOf(given));
  const query = queryOf(filters);
  useEffect(() => {
    const address = query === "" ? path : `${path}?${query}`;
    const timer = setTimeout(() => {
      if (`${window.location.pathname}${window.location.search}` !== address)
        window.history.replaceState(null, "", address);
    }, QUIET_MS);
    return () => clearTimeout(timer);
  }, [path, query]);
  return { filters, setFilters };
}
