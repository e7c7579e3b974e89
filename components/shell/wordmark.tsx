import { classNames } from "@/components/ui/class-names";

const Bell = ({ className }: { readonly className: string }) => (
  <svg width="22" height="24" viewBox="0 0 20 22" aria-hidden="true" className={className}>
    <path d="M10 1v3M3 17c0-9 2-12 7-12s7 3 7 12z" fill="none" stroke="currentColor" strokeWidth="2.4" />
    <path d="M1 18h18" stroke="currentColor" strokeWidth="2.4" />
  </svg>
);

/** The bell and the name. `onBar` for the dark bar of the signed-in pages. */
export function Wordmark({ onBar = false }: { readonly onBar?: boolean }) {
  return (
    <span
      className={classNames(
        "flex items-center gap-2 font-display text-wordmark tracking-[0.03em]",
        onBar && "text-bar-text",
      )}
    >
      <Bell className={onBar ? "text-brass-bell" : "text-brass"} />
      BELLWARD
    </span>
  );
}
