"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { showToast } from "@/components/ui/toasts";
import type { Instant } from "@/lib/engine/types";
import { loadPlanner, type Planner } from "./load-planner";
import type { Picture } from "./picture";
import { warm } from "./warm";

/** The planner, once it is wanted and has arrived. `want` may be called as often as one likes. */
export function usePlanner(standing: Picture, now: Instant): { planner: Planner | null; want: () => void } {
  const [planner, setPlanner] = useState<Planner | null>(null);
  const latest = useRef({ standing, now });
  useEffect(() => {
    latest.current = { standing, now };
  });
  useEffect(
    () => (planner ? warm(planner, latest.current.standing, latest.current.now) : undefined),
    [planner],
  );
  const want = useCallback((): void => {
    loadPlanner().then(setPlanner, () =>
      showToast("The planner could not be fetched. Check the connection and try again.", { tone: "error" }),
    );
  }, []);
  return { planner, want };
}
