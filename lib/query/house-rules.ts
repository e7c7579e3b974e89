"use client";

import { queryOptions, useQuery } from "@tanstack/react-query";
import type { HouseRulesForm, HouseRulesSaved, HouseRulesView } from "@/lib/schemas/house-rules";
import { sendJson } from "./send";
import { useChange } from "./use-change";

const URL = "/api/house-rules";

const rulesQuery = queryOptions({
  queryKey: ["house-rules"],
  queryFn: () => sendJson<HouseRulesView>(URL),
});

/** The team's own values; `initial` is what the server rendered. */
export const useHouseRules = (initial: HouseRulesView) => useQuery({ ...rulesQuery, initialData: initial });

export const useSaveRules = () =>
  useChange((form: HouseRulesForm) => sendJson<HouseRulesSaved>(URL, form, "PUT"), rulesQuery.queryKey);
