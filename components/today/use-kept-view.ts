"use client";

import { useQuery, useQueryClient } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { claimDevice, keepView, keptView } from "@/lib/offline/device";
import { openWithoutNet } from "@/lib/offline/register";
import { ProblemError } from "@/lib/query/send";
import { todayQuery } from "@/lib/query/today";
import type { TodayView } from "@/lib/schemas/today";

/**
 * What the server says, also without a net: the newer of the page's copy and this phone's, asked again when there is a net,
 * and kept. `opens`: the page itself opens without a net. `signedOut`: the session has ended.
 */
export function useKeptView(initial: TodayView, userId: string) {
  const client = useQueryClient();
  const { data, error } = useQuery({
    ...todayQuery(userId),
    initialData: initial,
    initialDataUpdatedAt: Date.parse(initial.madeAt),
  });
  const [looked, setLooked] = useState(false);
  const [opens, setOpens] = useState(false);

  useEffect(() => {
    const { queryKey } = todayQuery(userId);
    void (async () => {
      await claimDevice(userId);
      const kept = await keptView(userId);
      const shown = client.getQueryData(queryKey);
      // Of the same instant this phone's copy is the better one: what was sent since is in it.
      if (kept && shown && kept.madeAt >= shown.madeAt)
        client.setQueryData(queryKey, kept, { updatedAt: Date.parse(kept.madeAt) });
      setLooked(true);
      setOpens(await openWithoutNet());
    })();
  }, [client, userId]);

  useEffect(() => {
    if (looked) void keepView(userId, data);
  }, [looked, data, userId]);

  return { data, opens, signedOut: error instanceof ProblemError && error.problem.status === 401 };
}
