import type { ReactNode } from "react";

/** Width of the drawing in its own units; it is stretched to the space there is. */
export const ROPE_WIDTH = 1000;

interface LaneProps {
  readonly title: string;
  readonly unit: string;
  /** Height on screen and in units of the drawing. */
  readonly height: number;
  readonly children: ReactNode;
  /** Words over the drawing, not stretched with it. */
  readonly over?: ReactNode;
}

/** One rope: what it is at the left, the days of the camp at the right. */
export function Lane({ title, unit, height, children, over }: LaneProps) {
  return (
    <div className="grid grid-cols-[1fr] md:grid-cols-[96px_minmax(0,1fr)]">
      <div className="pr-2 text-2xs text-ink-2 max-md:flex max-md:gap-1.5">
        <b className="block font-semibold text-ink">{title}</b>
        {unit}
      </div>
      <div className="relative">
        <svg
          viewBox={`0 0 ${ROPE_WIDTH} ${height}`}
          preserveAspectRatio="none"
          height={height}
          className="block w-full overflow-visible"
          aria-hidden="true"
        >
          {children}
        </svg>
        {over}
      </div>
    </div>
  );
}

/** The rope itself, along the foot of its lane. */
export const Rope = ({ height, className }: { readonly height: number; readonly className: string }) => (
  <line
    x1={0}
    x2={ROPE_WIDTH}
    y1={height - 1}
    y2={height - 1}
    strokeWidth={2}
    vectorEffect="non-scaling-stroke"
    className={className}
  />
);
