"use client";

import { useSearchParams } from "next/navigation";
import { useState } from "react";
import { useAddress } from "@/components/ui/use-address";
import { filtersOf, queryOf, type Filters } from "./filters";

/** The filters of the list. They come from the address bar and go back to it; links to an exercise carry `query` along. */
export function useFilters() {
  const given = useSearchParams();
  const [filters, setFilters] = useState<Filters>(() => filtersOf(given));
  const query = queryOf(filters);
  useAddress(query);
  return { filters, setFilters, query };
}
