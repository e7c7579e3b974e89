"use client";

import { Button } from "@/components/ui/button";
import type { Role } from "@/lib/policy";
import type { FeedView } from "@/lib/schemas/feed";
import { feedFacts, feedTitle } from "./feed-words";

interface FeedListProps {
  readonly feeds: readonly FeedView[];
  readonly role: Role;
  readonly onRenew: (feed: FeedView) => void;
  readonly onEnd: (feed: FeedView) => void;
}

/** Subscriptions with what can be done about each. */
export function FeedList({ feeds, role, onRenew, onEnd }: FeedListProps) {
  return (
    <ul className="divide-y divide-line-soft border-y border-line-soft">
      {feeds.map((feed) => {
        const title = feedTitle(feed, role);
        return (
          <li key={feed.id} className="flex flex-wrap items-center gap-x-4 gap-y-2 py-3">
            <div className="min-w-52 flex-1">
              <p className="font-semibold">{title}</p>
              <p className="text-sm text-ink-2">{feedFacts(feed)}</p>
              {feed.allowed ? null : <p className="text-sm">Stopped: your role no longer allows it.</p>}
            </div>
            <div className="flex gap-2">
              {feed.allowed ? (
                <Button size="small" onClick={() => onRenew(feed)} aria-label={`Renew the address: ${title}`}>
                  Renew
                </Button>
              ) : null}
              <Button
                size="small"
                variant="quiet"
                onClick={() => onEnd(feed)}
                aria-label={`End the subscription: ${title}`}
              >
                End
              </Button>
            </div>
          </li>
        );
      })}
    </ul>
  );
}
