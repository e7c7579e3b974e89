import type { ReactNode } from "react";
import { classNames } from "./class-names";

/** A flat block of the size of what is being loaded. */
export function Skeleton({ className }: { readonly className?: string }) {
  return (
    <div aria-hidden="true" className={classNames("rounded bg-line motion-safe:animate-pulse", className)} />
  );
}

/** Wraps the blocks of a loading page and says so once. */
export function Loading({
  label = "Loading",
  children,
}: {
  readonly label?: string;
  readonly children: ReactNode;
}) {
  return (
    <div role="status" aria-label={label}>
      <span className="sr-only">{label}</span>
      {children}
    </div>
  );
}
