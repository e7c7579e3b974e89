import type { ReactNode } from "react";

/** A key to press: `<KeyHint>Esc</KeyHint>`. */
export const KeyHint = ({ children }: { readonly children: ReactNode }) => (
  <kbd className="inline-block rounded border border-edge bg-field px-1.5 font-sans text-2xs font-semibold text-ink-2">
    {children}
  </kbd>
);
