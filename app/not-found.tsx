import type { Metadata } from "next";
import { MessagePage } from "@/components/shell/message-page";
import { LinkButton } from "@/components/ui/link-button";

export const metadata: Metadata = { title: "Not found" };

export default function NotFound() {
  return (
    <main>
      <MessagePage
        title="There is nothing at this address"
        actions={
          <>
            <LinkButton href="/camps" variant="primary">
              To the camps
            </LinkButton>
            <LinkButton href="/">To the start page</LinkButton>
          </>
        }
      >
        <p>It may have been removed, or it belongs to a team that you are not in.</p>
      </MessagePage>
    </main>
  );
}
