import type { Metadata } from "next";
import { MessagePage } from "@/components/shell/message-page";
import { buttonLook } from "@/components/ui/button-look";
import { PageLink } from "@/components/ui/page-link";

export const metadata: Metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <main>
      <MessagePage
        title="There is nothing at this address"
        actions={
          <>
            <PageLink href="/camps" className={buttonLook({ variant: "primary" })}>
              To the camps
            </PageLink>
            <PageLink href="/" className={buttonLook({})}>
              To the start page
            </PageLink>
          </>
        }
      >
        <p>It may have been removed, or it belongs to a team that you are not in.</p>
      </MessagePage>
    </main>
  );
}
