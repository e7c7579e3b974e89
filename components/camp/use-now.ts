"use client";

import { useEffect, useState } from "react";
import { instantOf } from "@/lib/calendar/zones";
import type { Instant } from "@/lib/engine/types";

/** Half a minute: what starts in this minute becomes past while the page is open. */
const TICK_MS = 30_000;

/** The present instant, from the server's at first, so that both render the same. */
export function useNow(initial: Instant): Instant {
  const [now, setNow] = useState(initial);
  useEffect(() => {
    const timer = setInterval(() => setNow(instantOf(new Date())), TICK_MS);
    return () => clearInterval(timer);
  }, []);
  return now;
}
