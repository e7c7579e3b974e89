"use client";

import { MessagePage } from "@/components/shell/message-page";
import { Button } from "@/components/ui/button";
import { LinkButton } from "@/components/ui/link-button";

interface CampErrorProps {
  readonly error: Error & { readonly digest?: string };
  readonly reset: () => void;
}

export default function CampError({ error, reset }: CampErrorProps) {
  return (
    <MessagePage
      title="The camp could not be shown"
      actions={
        <>
          <Button variant="primary" onClick={reset}>
            Try again
          </Button>
          <LinkButton href="/camps">To the camps</LinkButton>
        </>
      }
    >
      <p>Nothing that was saved is lost; a change that was only tried is gone.</p>
      {error.digest ? <p className="mt-2 text-sm">The log has it under {error.digest}.</p> : null}
    </MessagePage>
  );
}
