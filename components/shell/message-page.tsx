import type { ReactNode } from "react";

interface MessagePageProps {
  readonly title: ReactNode;
  readonly children: ReactNode;
  readonly actions?: ReactNode;
}

/** A page that only says something: not found, broken, gone. Stands with or without a shell around it. */
export function MessagePage({ title, children, actions }: MessagePageProps) {
  return (
    <div className="mx-auto max-w-[560px] px-4 py-16 md:py-24">
      <h1 className="text-2xl font-semibold">{title}</h1>
      <div className="mt-2 text-ink-2">{children}</div>
      {actions ? <div className="mt-6 flex flex-wrap gap-2">{actions}</div> : null}
    </div>
  );
}
