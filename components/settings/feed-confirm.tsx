"use client";

import { Button } from "@/components/ui/button";
import { Actions } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { showToast } from "@/components/ui/toasts";
import { useRenewFeed, useRevokeFeed } from "@/lib/query/feeds";
import type { FeedView, NewFeed } from "@/lib/schemas/feed";

interface ConfirmProps {
  readonly feed: FeedView;
  readonly onClose: () => void;
}

/** Asks before the old address ends. */
export function RenewFeed({
  feed,
  onClose,
  onRenewed,
}: ConfirmProps & { readonly onRenewed: (renewed: NewFeed) => void }) {
  const renew = useRenewFeed();
  return (
    <>
      <p>The old address ends at once. Devices that use it show nothing new until they get the new one.</p>
      {renew.error ? <Notice tone="error" role="alert" title={renew.error.message} className="mt-3" /> : null}
      <Actions>
        <Button
          variant="primary"
          busy={renew.isPending}
          onClick={() => renew.mutate(feed.id, { onSuccess: onRenewed })}
        >
          Renew the address
        </Button>
        <Button onClick={onClose}>Keep the old one</Button>
      </Actions>
    </>
  );
}

/** Asks before a subscription ends. */
export function EndFeed({ feed, onClose }: ConfirmProps) {
  const revoke = useRevokeFeed();
  const end = (): void => {
    revoke.mutate(feed.id, {
      onSuccess: () => {
        showToast("The subscription has ended.");
        onClose();
      },
    });
  };
  return (
    <>
      <p>
        Its address ends at once, on every device that uses it. It cannot be brought back; a new one can be
        made.
      </p>
      {revoke.error ? (
        <Notice tone="error" role="alert" title={revoke.error.message} className="mt-3" />
      ) : null}
      <Actions>
        <Button variant="danger" busy={revoke.isPending} onClick={end}>
          End the subscription
        </Button>
        <Button onClick={onClose}>Keep it</Button>
      </Actions>
    </>
  );
}
