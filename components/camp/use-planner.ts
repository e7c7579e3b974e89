"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import { showToast } from "@/components/ui/toasts";
import type { Instant } from "@/lib/engine/types";
import { loadPlanner, type Planner } from "./load-planner";
import type { Picture } from "./picture";

/** Runs of the planner before the first drag. */
const WARM_RUNS = 4;

/** Runs the planner while the page is idle, so that the browser has compiled it when the first session is carried. */
function warm({ previewChange }: Planner, standing: Picture, now: Instant): () => void {
  const lift = standing.plan.lifts.findLast((candidate) => !candidate.past);
  if (!lift || typeof requestIdleCallback === "undefined") return () => undefined;
  let left = WARM_RUNS;
  const run = (): void => {
    previewChange(standing, { kind: "lift.factor", liftId: lift.id, factor: 1 }, now);
    if (--left > 0) handle = requestIdleCallback(run);
  };
  let handle = requestIdleCallback(run);
  return () => cancelIdleCallback(handle);
}

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
