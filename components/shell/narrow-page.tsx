import type { ReactNode } from "react";

interface NarrowPageProps {
  readonly title: ReactNode;
  readonly lead?: ReactNode;
  readonly children: ReactNode;
  /** Links under the sheet: "No account yet?" */
  readonly below?: ReactNode;
}

/** A page with one short form: sign-in, sign-up, invitation, reset. */
export function NarrowPage({ title, lead, children, below }: NarrowPageProps) {
  return (
    <div className="mx-auto w-full max-w-[460px] pt-6 md:pt-14">
      <h1 className="text-2xl font-semibold">{title}</h1>
      {lead ? <p className="mt-1.5 text-ink-2">{lead}</p> : null}
      <div className="mt-5 rounded-md border border-line bg-paper px-5 py-5">{children}</div>
      {below ? <div className="mt-4 text-sm text-ink-2">{below}</div> : null}
    </div>
  );
}
