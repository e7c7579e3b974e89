import type { ReactNode } from "react";
import { classNames } from "@/components/ui/class-names";
import type { Mark } from "./kinds";

const line = { fill: "none", stroke: "currentColor", strokeWidth: 1.6 } as const;

const SHAPES: Record<Mark, ReactNode> = {
  square: <rect x="1.5" y="1.5" width="9" height="9" />,
  triangle: <path d="M6 1l5.5 10H.5z" />,
  diamond: <path d="M6 .5L11.5 6 6 11.5.5 6z" />,
  "two-dots": (
    <>
      <circle cx="3" cy="6" r="2.8" />
      <circle cx="9" cy="6" r="2.8" />
    </>
  ),
  ring: <circle cx="6" cy="6" r="4.2" {...line} />,
  dot: <circle cx="6" cy="6" r="4" />,
  bar: <rect x="0" y="4" width="12" height="4" />,
  arrow: <path d="M0 6h10M6.5 2L10.5 6l-4 4" {...line} />,
  pause: <path d="M2 1.5h2.8v9H2zM7.2 1.5H10v9H7.2z" />,
  frame: <rect x="2" y="2" width="8" height="8" {...line} />,
  scale: <path d="M1 10.5h10M6 10V3M1.5 3h9" {...line} />,
};

interface KindMarkProps {
  readonly mark: Mark;
  /** Pixels; 9 in a chip, 13 beside a heading. */
  readonly size?: number;
  readonly className?: string;
}

/** The mark of a kind of work in the current text colour; the word stands beside it, so it is hidden from readers. */
export function KindMark({ mark, size = 10, className }: KindMarkProps) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 12 12"
      fill="currentColor"
      aria-hidden="true"
      className={classNames("shrink-0", className)}
    >
      {SHAPES[mark]}
    </svg>
  );
}
