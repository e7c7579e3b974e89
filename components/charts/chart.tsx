import type { ReactNode } from "react";
import type { Day } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { PLOT_WIDTH, dayTicks, percentX, percentY, type Plot } from "./plot";

interface ChartProps {
  readonly title: string;
  /** Of the upright axis. */
  readonly unit: string;
  readonly plot: Plot;
  /** What the drawing shows, in words, for those who do not see it. */
  readonly alternative: string;
  readonly children: ReactNode;
  /** What each mark means. */
  readonly legend?: ReactNode;
  /** The same numbers as a table. */
  readonly table?: ReactNode;
}

/** A drawing over days with both axes, its unit, its words and its table. */
export function Chart({ title, unit, plot, alternative, children, legend, table }: ChartProps) {
  return (
    <figure className="min-w-0">
      <figcaption className="mb-2 flex flex-wrap items-baseline gap-x-2 text-sm">
        <b className="font-semibold">{title}</b>
        <span className="text-ink-2">{unit}, by day</span>
      </figcaption>
      <div className="pr-2 pl-11">
        <div className="relative" style={{ height: plot.height }}>
          <svg
            role="img"
            aria-label={alternative}
            viewBox={`0 0 ${PLOT_WIDTH} ${plot.height}`}
            preserveAspectRatio="none"
            className="absolute inset-0 block size-full overflow-visible"
          >
            {plot.ticks.map((tick) => (
              <line
                key={tick}
                x1={0}
                x2={PLOT_WIDTH}
                y1={plot.y(tick)}
                y2={plot.y(tick)}
                vectorEffect="non-scaling-stroke"
                className="stroke-line-soft"
              />
            ))}
            {children}
            <line
              x1={0}
              x2={PLOT_WIDTH}
              y1={plot.height}
              y2={plot.height}
              vectorEffect="non-scaling-stroke"
              className="stroke-edge"
            />
          </svg>
          <div aria-hidden="true" className="text-2xs text-ink-2">
            {plot.ticks.map((tick) => (
              <span
                key={tick}
                className="absolute right-full mr-1.5 -translate-y-1/2"
                style={{ top: percentY(plot, plot.y(tick)) }}
              >
                {tick}
              </span>
            ))}
          </div>
        </div>
        <div aria-hidden="true" className="relative h-5 text-2xs text-ink-2">
          {dayTicks(plot).map((day) => (
            <span
              key={day}
              className="absolute top-1 -translate-x-1/2 whitespace-nowrap"
              style={{ left: percentX(plot.x(day)) }}
            >
              {dayText(day as Day).slice(4)}
            </span>
          ))}
        </div>
      </div>
      {legend ? (
        <div className="mt-1.5 flex flex-wrap gap-x-4 gap-y-1 pl-11 text-xs text-ink-2">{legend}</div>
      ) : null}
      {table ? (
        <details className="mt-2">
          <summary className="inline-flex min-h-control-small items-center text-sm underline underline-offset-4">
            {title}: table
          </summary>
          <div className="mt-2">{table}</div>
        </details>
      ) : null}
    </figure>
  );
}

const SHAPES = {
  line: "h-0 w-5 border-t-2",
  dashed: "h-0 w-5 border-t-2 border-dashed",
  dot: "size-2 rounded-full",
  field: "h-2.5 w-4",
  outline: "h-2.5 w-4 border",
} as const;

/** A mark with what it means. */
export const LegendItem = ({
  shape,
  className,
  children,
}: {
  readonly shape: keyof typeof SHAPES;
  readonly className: string;
  readonly children: ReactNode;
}) => (
  <span className="inline-flex items-center gap-1.5">
    <span aria-hidden="true" className={`${SHAPES[shape]} ${className}`} />
    {children}
  </span>
);
