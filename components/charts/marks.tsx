import { area, line } from "d3-shape";
import { PLOT_WIDTH, type Plot } from "./plot";

export interface Point {
  readonly day: number;
  readonly value: number;
}

interface MarkProps {
  readonly plot: Plot;
  readonly className: string;
}

/** A line through points in order of their days. */
export function LineMark({
  plot,
  points,
  className,
  dashed = false,
  step = false,
}: MarkProps & { readonly points: readonly Point[]; readonly dashed?: boolean; readonly step?: boolean }) {
  const path = line<Point>()
    .x((point) => plot.x(point.day))
    .y((point) => plot.y(point.value));
  return (
    <path
      d={path([...points]) ?? ""}
      fill="none"
      strokeWidth={step ? 1.2 : 1.6}
      strokeDasharray={dashed ? "5 4" : undefined}
      strokeLinejoin="round"
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}

/** One dot a point. Strokes without length keep them round however the drawing is stretched. */
export function DotMarks({
  plot,
  points,
  className,
  size = 6,
}: MarkProps & { readonly points: readonly Point[]; readonly size?: number }) {
  return (
    <path
      d={points.map((point) => `M${plot.x(point.day)} ${plot.y(point.value)}h0`).join("")}
      fill="none"
      strokeWidth={size}
      strokeLinecap="round"
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}

/** A band across the whole width, between two values. */
export function BandMark({
  plot,
  low,
  high,
  className,
}: MarkProps & { readonly low: number; readonly high: number }) {
  const path = area<number>()
    .x((x) => x)
    .y0(plot.y(low))
    .y1(plot.y(high));
  return <path d={path([0, PLOT_WIDTH]) ?? ""} className={className} />;
}

/** A level across the width, from a day on where one is given. */
export function LevelMark({
  plot,
  value,
  className,
  from,
  to,
}: MarkProps & { readonly value: number; readonly from?: number; readonly to?: number }) {
  const half = PLOT_WIDTH / (plot.to - plot.from + 1) / 2;
  return (
    <line
      x1={from === undefined ? 0 : Math.max(0, plot.x(from) - half)}
      x2={to === undefined ? PLOT_WIDTH : Math.min(PLOT_WIDTH, plot.x(to) + half)}
      y1={plot.y(value)}
      y2={plot.y(value)}
      strokeWidth={1.4}
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}

interface BarProps extends MarkProps {
  readonly day: number;
  /** Value at its foot and at its top. */
  readonly low: number;
  readonly high: number;
  /** Share of the day's width, 0 to 1. */
  readonly width?: number;
  readonly outlined?: boolean;
}

/** One bar over its day. */
export function BarMark({ plot, day, low, high, width = 0.8, outlined = false, className }: BarProps) {
  const span = (PLOT_WIDTH / (plot.to - plot.from + 1)) * width;
  return (
    <rect
      x={plot.x(day) - span / 2}
      y={plot.y(high)}
      width={span}
      height={plot.y(low) - plot.y(high)}
      fill={outlined ? "none" : undefined}
      strokeWidth={outlined ? 1 : 0}
      vectorEffect="non-scaling-stroke"
      className={className}
    />
  );
}
