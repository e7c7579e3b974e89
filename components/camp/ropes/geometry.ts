import { line } from "d3-shape";
import { HOUSE_RULES, tauFor, taperFactor } from "@/lib/engine";
import type { Day, Plan } from "@/lib/engine/types";
import { ROPE_WIDTH } from "./lane";

/** The days of the ropes: the same as those of the calendar. */
export interface RopeDays {
  readonly from: Day;
  readonly count: number;
}

/** Left edge of a day. */
export const dayX = ({ from, count }: RopeDays, day: number): number => ((day - from) / count) * ROPE_WIDTH;

/** Share of the width, percent, for what lies over the drawing. */
export const dayPercent = (days: RopeDays, day: number): number => (dayX(days, day) / ROPE_WIDTH) * 100;

const path = line<readonly [number, number]>()
  .x((point) => point[0])
  .y((point) => point[1]);

/** Share of the sets that the taper leaves, as a line over the days: 1 until it begins. `top` and `foot` bound it. */
export function taperPath(
  plan: Plan,
  days: RopeDays,
  cut: number | undefined,
  top: number,
  foot: number,
): string | null {
  const taper = plan.phases.find((span) => span.phase === "taper");
  if (!taper) return null;
  const tau = tauFor(cut ?? HOUSE_RULES["taper.cut"].value, taper.to - taper.from + 1);
  const y = (share: number): number => foot - share * (foot - top);
  const points: [number, number][] = [[0, y(1)]];
  for (let day = taper.from; day <= taper.to; day++) {
    points.push([dayX(days, day), y(taperFactor(day - taper.from, tau))]);
  }
  points.push([ROPE_WIDTH, y(taperFactor(taper.to - taper.from + 1, tau))]);
  return path(points);
}

/** The form curve between `top` and `foot`; null where there is nothing to draw. */
export function formPath({ form }: Plan, days: RopeDays, top: number, foot: number): string | null {
  if (form.values.length < 2) return null;
  const least = Math.min(...form.values);
  const range = Math.max(...form.values) - least || 1;
  return path(
    form.values.map((value, index) => [
      dayX(days, form.from + index + 0.5),
      foot - ((value - least) / range) * (foot - top),
    ]),
  );
}
