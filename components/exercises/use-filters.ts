"use client";

import { usePathname, useSearchParams } from "next/navigation";
import { useEffect, useState } from "react";
import { filtersOf, queryOf, type Filters } from "./filters";

/** Browsers refuse more than about 100 address changes in half a minute; typing must not get near that. */
const QUIET_MS = 250;

/** The filters of the list. They come from the address bar and go back to it, on whichever exercise the page stands. */
export function useFilters() {
  const path = usePathname();
  const given = useSearchParams();
  const [filters, setFilters] = useState<Filters>(() => filtersOf(given));
  const query = queryOf(filters);
  useEffect(() => {
    const address = query === "" ? path : `${path}?${query}`;
    const timer = setTimeout(() => {
      if (`${window.location.pathname}${window.location.search}` !== address)
        window.history.replaceState(null, "", address);
    }, QUIET_MS);
    return () => clearTimeout(timer);
  }, [path, query]);
  return { filters, setFilters, query };
}
