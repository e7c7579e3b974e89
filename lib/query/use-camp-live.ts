"use client";

import { useQueryClient } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { campEventsUrl, campQuery } from "./camps";

/**
 * Keeps an open camp page up to date: each revision that the server tells of is fetched. Returns whether the line is open;
 * while it is not, the page has to ask by itself.
 */
export function useCampLive(id: string): boolean {
  const client = useQueryClient();
  const [open, setOpen] = useState(false);
  useEffect(() => {
    const source = new EventSource(campEventsUrl(id));
    const { queryKey } = campQuery(id);
    source.onopen = () => setOpen(true);
    source.onerror = () => setOpen(false);
    source.onmessage = (message: MessageEvent<string>) => {
      const { revision } = JSON.parse(message.data) as { revision: number };
      const known = client.getQueryData(queryKey)?.revision ?? 0;
      // With its list of changes, where that is open.
      if (revision > known) void client.invalidateQueries({ queryKey });
    };
    return () => source.close();
  }, [client, id]);
  return open;
}
