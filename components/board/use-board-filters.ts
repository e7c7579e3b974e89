"use client";

import { useSearchParams } from "next/navigation";
import { useState } from "react";
import { useAddress } from "@/components/ui/use-address";
import { filtersOf, queryOf, type BoardFilters } from "./filters";

/** The board's filters. They come from the address bar and go back to it. */
export function useBoardFilters() {
  const given = useSearchParams();
  const [filters, setFilters] = useState<BoardFilters>(() => filtersOf(given));
  useAddress(queryOf(filters));
  return { filters, setFilters };
}
