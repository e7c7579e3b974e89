import type { ReactNode } from "react";
import { ToastRegion } from "@/components/ui/toast-region";
import { MAIN_ID, SkipLink } from "./skip-link";
import { TopBar, type TopBarProps } from "./top-bar";

/** What stands around every page of a team: bar, content, messages. */
export function TeamShell({ children, ...bar }: TopBarProps & { readonly children: ReactNode }) {
  return (
    <>
      <SkipLink />
      <TopBar {...bar} />
      <main
        id={MAIN_ID}
        tabIndex={-1}
        className="mx-auto max-w-page px-4 py-5 outline-none md:px-7 print:p-0"
      >
        {children}
      </main>
      <ToastRegion />
    </>
  );
}
