"use client";

import { useEffect } from "react";
import { previewChange } from "@/lib/book";
import type { Instant } from "@/lib/engine/types";
import type { Picture } from "./picture";

/** Runs of the engine before the first drag. */
const RUNS = 4;

/** Runs the engine a few times while the page is idle, so that the browser has compiled it when the first session is dragged. */
export function useWarmEngine(standing: Picture, now: Instant, wanted: boolean): void {
  useEffect(() => {
    const lift = standing.plan.lifts.findLast((candidate) => !candidate.past);
    if (!wanted || !lift || typeof requestIdleCallback === "undefined") return;
    let left = RUNS;
    const run = (): void => {
      previewChange(standing, { kind: "lift.factor", liftId: lift.id, factor: 1 }, now);
      if (--left > 0) handle = requestIdleCallback(run);
    };
    let handle = requestIdleCallback(run);
    return () => cancelIdleCallback(handle);
    // Once a page: what is warm stays warm.
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [wanted]);
}
