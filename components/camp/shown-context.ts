"use client";

import { createContext, useContext } from "react";
import type { Day } from "@/lib/engine/types";
import type { Picture } from "./picture";

export interface Shown {
  readonly shown: Picture;
  readonly standing: Picture;
  readonly today: Day;
  /** Whether this reader sees sets, loads and reasons. */
  readonly detail: boolean;
}

/** What the calendar's cells are about; they are drawn inside FullCalendar, so it reaches them from around it. */
export const ShownContext = createContext<Shown | null>(null);

export function useShown(): Shown {
  const shown = useContext(ShownContext);
  if (!shown) throw new Error("No camp around this cell.");
  return shown;
}
