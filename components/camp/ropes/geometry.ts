import { line } from "d3-shape";
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

/** Share of the sets left on day `t` of the taper: `exp(-t / tau)`, the engine's own curve. */
const shareLeft = (t: number, tau: number): number => (t < 1 ? 1 : Math.exp(-t / tau));

/** The taper's time constant, read off any lift in it: its factor is the share left on its day. Null without such a lift. */
function tauOf({ lifts, phases }: Plan): number | null {
  const taper = phases.find((span) => span.phase === "taper");
  if (!taper) return null;
  for (const lift of lifts) {
    const share = lift.factors.find((factor) => factor.name === "taper")?.value ?? 1;
    if (lift.day >= taper.from && share > 0 && share < 1)
      return -(lift.day - taper.from + 1) / Math.log(share);
  }
  return null;
}

/** Share of the sets that the taper leaves, as a line over the days: 1 until it begins. `top` and `foot` bound it. */
export function taperPath(plan: Plan, days: RopeDays, top: number, foot: number): string | null {
  const taper = plan.phases.find((span) => span.phase === "taper");
  const tau = tauOf(plan);
  if (!taper || tau === null) return null;
  const y = (share: number): number => foot - share * (foot - top);
  const points: [number, number][] = [[0, y(1)]];
  for (let day = taper.from; day <= taper.to; day++) {
    points.push([dayX(days, day), y(shareLeft(day - taper.from, tau))]);
  }
  points.push([ROPE_WIDTH, y(shareLeft(taper.to - taper.from + 1, tau))]);
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

/** Weights between the heaviest at `top` and the limit at `foot`; below the limit stays at the foot. Null without two. */
export function weightPath(
  points: readonly (readonly [x: number, kg: number])[],
  limitKg: number,
  top: number,
  foot: number,
): string | null {
  if (points.length < 2) return null;
  const range = Math.max(...points.map(([, kg]) => kg)) - limitKg;
  const share = (kg: number): number => (range <= 0 ? 0 : Math.max(0, kg - limitKg) / range);
  return path(points.map(([x, kg]) => [x, foot - share(kg) * (foot - top)]));
}
