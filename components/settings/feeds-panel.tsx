"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { EmptyState } from "@/components/ui/empty-state";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { Loading, Skeleton } from "@/components/ui/skeleton";
import type { Role } from "@/lib/policy";
import { useFeeds } from "@/lib/query/feeds";
import type { FeedView } from "@/lib/schemas/feed";
import { FeedAddress } from "./feed-address";
import { EndFeed, RenewFeed } from "./feed-confirm";
import { FeedForm } from "./feed-form";
import { FeedList } from "./feed-list";
import { feedTitle, type FollowedAthlete } from "./feed-words";

interface FeedsPanelProps {
  readonly role: Role;
  /** Whom this person may follow: the team's athletes, or the one the membership is tied to. */
  readonly athletes: readonly FollowedAthlete[];
}

type Shown =
  | { readonly step: "form" }
  | { readonly step: "address"; readonly address: string }
  | { readonly step: "renew" | "end"; readonly feed: FeedView };

const TITLES: Record<Shown["step"], string> = {
  form: "Subscribe to a calendar",
  address: "Add it to your calendar",
  renew: "Renew the address?",
  end: "End the subscription?",
};

/** Calendar subscriptions: what there is, a new one, a new address for one, an end to one. */
export function FeedsPanel({ role, athletes }: FeedsPanelProps) {
  const [shown, setShown] = useState<Shown | null>(null);
  const feeds = useFeeds();
  const close = (): void => setShown(null);
  const subscribe = (
    <Button size="small" onClick={() => setShown({ step: "form" })}>
      Subscribe
    </Button>
  );
  return (
    <div id="feeds">
      <Panel title="Calendar on your phone" actions={feeds.data?.length ? subscribe : null}>
        <p className="mb-3 max-w-prose text-sm text-ink-2">
          A subscribed calendar follows every change by itself. How soon depends on the device: minutes to a
          day.
        </p>
        {feeds.isPending ? (
          <Loading label="Loading subscriptions">
            <Skeleton className="h-16" />
          </Loading>
        ) : feeds.isError ? (
          <Notice tone="error" role="alert" title={feeds.error.message} />
        ) : feeds.data.length === 0 ? (
          <EmptyState title="No subscription yet" action={subscribe}>
            Make one, and the camp stands in your own calendar, bout and weigh-in included.
          </EmptyState>
        ) : (
          <FeedList
            feeds={feeds.data}
            role={role}
            onRenew={(feed) => setShown({ step: "renew", feed })}
            onEnd={(feed) => setShown({ step: "end", feed })}
          />
        )}
      </Panel>
      {shown ? (
        <Dialog
          open
          onOpenChange={(open) => !open && close()}
          title={TITLES[shown.step]}
          description={"feed" in shown ? feedTitle(shown.feed, role) : undefined}
        >
          {shown.step === "form" ? (
            <FeedForm
              role={role}
              athletes={athletes}
              onClose={close}
              onMade={({ address }) => setShown({ step: "address", address })}
            />
          ) : shown.step === "address" ? (
            <FeedAddress address={shown.address} onClose={close} />
          ) : shown.step === "renew" ? (
            <RenewFeed
              feed={shown.feed}
              onClose={close}
              onRenewed={({ address }) => setShown({ step: "address", address })}
            />
          ) : (
            <EndFeed feed={shown.feed} onClose={close} />
          )}
        </Dialog>
      ) : null}
    </div>
  );
}
