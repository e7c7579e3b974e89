"use client";

import { MessagePage } from "@/components/shell/message-page";
import { Button } from "@/components/ui/button";
import { fontVariables } from "./fonts";
import "./globals.css";

interface GlobalErrorProps {
  readonly error: Error & { readonly digest?: string };
  readonly reset: () => void;
}

/** Stands in for the root layout itself, so it brings its own html element. */
export default function GlobalError({ error, reset }: GlobalErrorProps) {
  return (
    <html lang="en" className={fontVariables}>
      <body>
        <title>Bellward</title>
        <main>
          <MessagePage
            title="Bellward could not show this page"
            actions={
              <Button variant="primary" onClick={reset}>
                Try again
              </Button>
            }
          >
            <p>
              Nothing that was saved is lost. Try again; if it stays broken, tell whoever runs this server.
            </p>
            {error.digest ? <p className="mt-2 text-sm">Their log has it under {error.digest}.</p> : null}
          </MessagePage>
        </main>
      </body>
    </html>
  );
}
