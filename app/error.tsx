"use client";

import { MessagePage } from "@/components/shell/message-page";
import { Button } from "@/components/ui/button";

interface ErrorPageProps {
  readonly error: Error & { readonly digest?: string };
  readonly reset: () => void;
}

export default function ErrorPage({ error, reset }: ErrorPageProps) {
  return (
    <main>
      <MessagePage
        title="This page broke"
        actions={
          <>
            <Button variant="primary" onClick={reset}>
              Try again
            </Button>
            {/* A plain request, so that whatever broke in the running page is left behind; and every page loads this file. */}
            <form action="/">
              <Button type="submit">To the start page</Button>
            </form>
          </>
        }
      >
        <p>Nothing that was saved is lost. Try again; if it stays broken, tell whoever runs this server.</p>
        {error.digest ? <p className="mt-2 text-sm">Their log has it under {error.digest}.</p> : null}
      </MessagePage>
    </main>
  );
}
