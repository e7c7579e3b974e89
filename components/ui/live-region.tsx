import type { ReactNode } from "react";

/** Text that is read out whenever it changes and not seen: what a drag would do, how many sessions a filter leaves. */
export function LiveRegion({ children }: { readonly children: ReactNode }) {
  return (
    <div role="status" aria-live="polite" className="sr-only">
      {children}
    </div>
  );
}
