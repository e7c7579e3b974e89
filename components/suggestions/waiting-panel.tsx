"use client";

import { useEffect, useRef } from "react";
import type { Desk } from "@/components/camp/use-desk";
import { Button } from "@/components/ui/button";
import type { WaitingRequest } from "@/lib/schemas/board";
import type { WaitingView } from "@/lib/schemas/suggestion";
import { DecisionList } from "./decision-list";
import { RequestCard } from "./request-card";
import { SuggestionCard } from "./suggestion-card";
import { useDecide } from "./use-decide";

interface WaitingPanelProps {
  readonly desk: Desk;
  readonly waiting: WaitingView;
}

/** Tries on the camp what letting the athlete off would do: a sport session is dropped, a lift is opened for the coach to move. */
const tryWithout = ({ tryChange, dispatch }: Desk, { source, sessionId }: WaitingRequest): void => {
  if (source === "sport") tryChange({ kind: "sport.drop", sportId: sessionId, scope: "this" });
  else dispatch({ type: "select", id: sessionId });
};

/** The board leads here with the session to try. */
function useTriedRequest(desk: Desk, requests: readonly WaitingRequest[]): void {
  const done = useRef(false);
  useEffect(() => {
    const query = new URLSearchParams(window.location.search);
    const asked = requests.find(({ sessionId }) => sessionId === query.get("session"));
    if (done.current || query.get("try") !== "drop" || !asked) return;
    done.current = true;
    tryWithout(desk, asked);
  }, [desk, requests]);
}

/** What waits for the coach: requests first, then suggestions with their effect, then what was decided. */
export function WaitingPanel({ desk, waiting }: WaitingPanelProps) {
  const { view } = desk;
  const { busy, accept, dismiss } = useDecide(desk);
  useTriedRequest(desk, waiting.requests);
  return (
    <section aria-label="Waiting for you" className="mb-3 rounded-md border border-line bg-paper">
      {waiting.requests.length > 0 ? (
        <div className="grid gap-2 px-4 py-3">
          {waiting.requests.map((request) => (
            <RequestCard
              key={request.id}
              request={request}
              athlete={view.athlete.name}
              look={
                <Button size="small" onClick={() => tryWithout(desk, request)}>
                  See what it does
                </Button>
              }
            />
          ))}
        </div>
      ) : null}
      <ul aria-label="Suggestions" className="grid xl:grid-cols-2">
        {waiting.suggestions.map((suggestion) => (
          <SuggestionCard
            key={suggestion.key}
            suggestion={suggestion}
            unit={waiting.unit}
            busy={busy}
            onAccept={(note) => accept(suggestion.key, waiting.revision, note)}
            onDismiss={(reason) => dismiss(suggestion.key, reason)}
          />
        ))}
      </ul>
      {waiting.suggestions.length + waiting.requests.length === 0 ? (
        <p className="px-4 py-3 text-sm text-ink-2">Nothing waits for you.</p>
      ) : null}
      <DecisionList decisions={waiting.decisions} zone={view.book.homeZone} />
    </section>
  );
}
