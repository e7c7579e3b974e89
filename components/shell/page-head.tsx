import type { ReactNode } from "react";

interface PageHeadProps {
  readonly title: ReactNode;
  /** A line under the title: what the page is for, or the facts of what it shows. */
  readonly lead?: ReactNode;
  /** Buttons and links at the right. */
  readonly actions?: ReactNode;
}

/** The head of a page: its one `h1`. */
export function PageHead({ title, lead, actions }: PageHeadProps) {
  return (
    <header className="mb-5 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
      <div className="min-w-0">
        <h1 className="text-2xl font-semibold">{title}</h1>
        {lead ? <p className="mt-1 max-w-prose text-ink-2">{lead}</p> : null}
      </div>
      {actions ? <div className="flex flex-wrap gap-2">{actions}</div> : null}
    </header>
  );
}
