import type { ReactNode } from "react";

/** A part of a long form, under a heading of its own. */
export const FormPart = ({ title, children }: { readonly title: string; readonly children: ReactNode }) => (
  <section className="border-t border-line py-4 first:border-0">
    <h2 className="mb-3 text-lg font-semibold">{title}</h2>
    {children}
  </section>
);
