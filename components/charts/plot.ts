import { scaleLinear } from "d3-scale";

/** Width of the drawing in its own units; it is stretched to the space there is. Words lie over it, unstretched. */
export const PLOT_WIDTH = 1000;

/** Days from left to right, a quantity from the foot up. */
export interface Plot {
  readonly height: number;
  readonly from: number;
  readonly to: number;
  /** Centre of a day. */
  readonly x: (day: number) => number;
  readonly y: (value: number) => number;
  /** Values at which the axis has a line and a number. */
  readonly ticks: readonly number[];
}

interface PlotFrame {
  /** First and last day. */
  readonly days: readonly [number, number];
  /** Everything that must be seen. */
  readonly values: readonly number[];
  readonly height?: number;
  /** Bars begin at 0; a line may begin anywhere. */
  readonly fromZero?: boolean;
  /** Takes these ends and ticks as they are: answers of 1 to 7. */
  readonly fixed?: { readonly low: number; readonly high: number; readonly ticks: readonly number[] };
}

/** Scales of a chart. */
export function plotOf({ days, values, height = 180, fromZero = false, fixed }: PlotFrame): Plot {
  const [from, to] = days;
  const low = fromZero ? 0 : Math.min(...values);
  const high = Math.max(...values, fromZero ? 1 : Number.NEGATIVE_INFINITY);
  const pad = !fromZero && low === high ? Math.max(1, Math.abs(low) * 0.05) : 0;
  const scale = fixed
    ? scaleLinear([fixed.low, fixed.high], [height, 0])
    : scaleLinear([low - pad, high + pad], [height, 0]).nice(4);
  const width = PLOT_WIDTH / (to - from + 1);
  return {
    height,
    from,
    to,
    x: (day) => (day - from + 0.5) * width,
    y: (value) => scale(value),
    ticks: fixed?.ticks ?? scale.ticks(4),
  };
}

/** Steps between dates on the axis, days: readable multiples of weeks where there are many. */
const STEPS = [1, 2, 7, 14, 28, 56, 91, 182, 364, 728, 1820];

/** Days that have their date on the axis: at most `most`, the last one among them. */
export function dayTicks({ from, to }: Plot, most = 5): number[] {
  const step = STEPS.find((days) => (to - from) / days < most) ?? to - from + 1;
  return Array.from(
    { length: Math.floor((to - from) / step) + 1 },
    (_, index) => to - index * step,
  ).reverse();
}

/** Share of the width or height in percent, for what lies over the drawing. */
export const percentX = (x: number): string => `${(x / PLOT_WIDTH) * 100}%`;
export const percentY = ({ height }: Plot, y: number): string => `${(y / height) * 100}%`;
