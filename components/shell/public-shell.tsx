import type { ReactNode } from "react";
import { Cautions } from "./cautions";
import { MAIN_ID, SkipLink } from "./skip-link";
import { Wordmark } from "./wordmark";
import { PageLink } from "@/components/ui/page-link";

const LINK = "min-h-11 inline-flex items-center rounded font-medium hover:underline";

/** What stands around the pages that need no account. */
export function PublicShell({ children }: { readonly children: ReactNode }) {
  return (
    <div className="mx-auto flex min-h-dvh max-w-page flex-col px-4 md:px-10">
      <SkipLink />
      <header className="flex items-center gap-5 py-3 md:gap-7">
        <PageLink
          href="/"
          aria-label="Bellward, start page"
          className="mr-auto flex min-h-11 items-center rounded"
        >
          <Wordmark />
        </PageLink>
        <nav aria-label="Main" className="flex gap-5 md:gap-7">
          <PageLink href="/how" className={LINK}>
            How it plans
          </PageLink>
          <PageLink href="/sign-in" className={LINK}>
            Sign in
          </PageLink>
        </nav>
      </header>
      <main id={MAIN_ID} tabIndex={-1} className="flex-1 pt-2 pb-12 outline-none">
        {children}
      </main>
      <Cautions />
    </div>
  );
}
