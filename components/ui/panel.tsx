import type { ReactNode } from "react";
import { classNames } from "./class-names";

interface PanelProps {
  readonly title?: ReactNode;
  /** Buttons or a link at the right of the title. */
  readonly actions?: ReactNode;
  readonly children: ReactNode;
  readonly className?: string;
}

/** A sheet of paper on the canvas, with a title of its own. */
export function Panel({ title, actions, children, className }: PanelProps) {
  return (
    <section className={classNames("rounded-md border border-line bg-paper px-5 py-4", className)}>
      {title || actions ? (
        <header className="mb-3 flex flex-wrap items-center justify-between gap-2">
          <h2 className="text-lg font-semibold">{title}</h2>
          {actions}
        </header>
      ) : null}
      {children}
    </section>
  );
}
