import type { ComponentProps, ReactNode } from "react";
import { classNames } from "./class-names";

interface TableProps {
  /** What the table holds; said to screen readers, shown where `showCaption`. */
  readonly caption: string;
  readonly showCaption?: boolean;
  readonly children: ReactNode;
  readonly className?: string;
}

/** A real table on paper; on a narrow screen it scrolls sideways by itself, also by keyboard. */
export function Table({ caption, showCaption = false, children, className }: TableProps) {
  return (
    <div
      role="region"
      aria-label={caption}
      tabIndex={0}
      className={classNames("overflow-x-auto rounded-md border border-line bg-paper", className)}
    >
      <table className="w-full border-collapse text-left text-sm">
        <caption className={showCaption ? "px-4 py-3 text-left text-base font-semibold" : "sr-only"}>
          {caption}
        </caption>
        {children}
      </table>
    </div>
  );
}

/** Head cell of a column, or of a row with `scope="row"`. */
export function HeadCell({ scope = "col", className, ...rest }: ComponentProps<"th">) {
  return (
    <th
      scope={scope}
      {...rest}
      className={classNames(
        "px-4 py-2.5",
        scope === "col"
          ? "text-xs font-semibold whitespace-nowrap text-ink-2"
          : "border-t border-line-soft font-semibold",
        className,
      )}
    />
  );
}

export function Cell({ className, ...rest }: ComponentProps<"td">) {
  return <td {...rest} className={classNames("border-t border-line-soft px-4 py-2.5", className)} />;
}
