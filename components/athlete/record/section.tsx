import type { ReactNode } from "react";

interface SectionProps {
  readonly id: string;
  readonly title: string;
  readonly actions?: ReactNode;
  readonly children: ReactNode;
}

/** One part of an athlete's page under a heading that the list of parts leads to. */
export const Section = ({ id, title, actions, children }: SectionProps) => (
  <section aria-labelledby={id} className="rounded-md border border-line bg-paper px-5 py-4">
    <header className="mb-3 flex flex-wrap items-center justify-between gap-2">
      <h2 id={id} className="scroll-mt-20 text-lg font-semibold">
        {title}
      </h2>
      {actions ? <div className="flex flex-wrap gap-2">{actions}</div> : null}
    </header>
    {children}
  </section>
);

/** Links to the parts of the page. */
export const PartLinks = ({ parts }: { readonly parts: readonly (readonly [string, string])[] }) => (
  <nav aria-label="On this page" className="mb-4">
    <ul className="flex flex-wrap gap-x-4 gap-y-1">
      {parts.map(([id, title]) => (
        <li key={id}>
          <a
            href={`#${id}`}
            className="inline-flex min-h-control-small items-center underline underline-offset-4"
          >
            {title}
          </a>
        </li>
      ))}
    </ul>
  </nav>
);
