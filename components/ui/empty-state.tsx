import type { ReactNode } from "react";

interface EmptyStateProps {
  readonly title: ReactNode;
  /** What will stand here and how to get it. */
  readonly children?: ReactNode;
  /** A button or a link that does it. */
  readonly action?: ReactNode;
}

/** A list or page with nothing in it yet. */
export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 rounded-md border border-dashed border-edge px-6 py-8">
      <p className="text-xl font-semibold">{title}</p>
      {children ? <div className="max-w-prose text-ink-2">{children}</div> : null}
      {action}
    </div>
  );
}
