"use client";

import { useEffect, type PointerEvent, type RefObject } from "react";
import { dayFromIso, isoFromDay } from "@/lib/engine/geometry";
import type { DayMark } from "../day-mark";

const POINTED = "camp-pointed";

/** Marks the day of the calendar that is pointed at in the ropes, and tells the ropes which day is pointed at here. */
export function useDayMark(root: RefObject<HTMLElement | null>, mark: DayMark) {
  useEffect(
    () =>
      mark.subscribe(() => {
        const area = root.current;
        const day = mark.read();
        area?.querySelectorAll(`.${POINTED}`).forEach((cell) => cell.classList.remove(POINTED));
        if (day !== null) area?.querySelector(`td[data-date="${isoFromDay(day)}"]`)?.classList.add(POINTED);
      }),
    [root, mark],
  );
  return {
    onPointerOver: (event: PointerEvent): void => {
      if (!(event.target instanceof Element) || event.pointerType === "touch") return;
      const date = event.target.closest<HTMLElement>("td[data-date]")?.dataset.date;
      mark.set(date ? dayFromIso(date) : null);
    },
    onPointerLeave: (): void => mark.set(null),
  };
}
