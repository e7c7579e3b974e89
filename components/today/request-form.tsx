"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { TextArea } from "@/components/ui/text-area";
import { isWaiting, type Acts } from "./use-acts";
import type { Queue } from "@/lib/offline/queue";
import type { DaySession, RequestView } from "@/lib/schemas/today";

interface RequestFormProps {
  readonly session: DaySession;
  readonly queue: Queue;
  readonly acts: Acts;
}

const SAID: Record<RequestView["state"], string> = {
  asked: "You asked your coach to do without you",
  accepted: "Your coach says: fine, skip it",
  declined: "Your coach says: please come",
  withdrawn: "",
};

function Asked({ request, waiting }: { readonly request: RequestView; readonly waiting: boolean }) {
  return (
    <div role="status" className="mt-3 rounded-r border-l-4 border-ink-3 bg-canvas px-3.5 py-2.5 text-sm">
      <p className="font-semibold">{SAID[request.state]}</p>
      <p>“{request.reason}”</p>
      {request.answer ? <p className="mt-1">Answer: “{request.answer}”</p> : null}
      {waiting ? <p className="mt-1 text-ink-2">Kept on this phone</p> : null}
    </div>
  );
}

/** "I can't make it": asks the coach, and shows what came of it. The plan changes only by the coach's hand. */
export function RequestForm({ session, queue, acts }: RequestFormProps) {
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const { request } = session;
  const live = request !== null && request.state !== "withdrawn";
  const ask = (): void => {
    if (reason.trim() === "") return setProblem("Say why, in a few words.");
    acts.ask(session, reason.trim());
    setOpen(false);
    setReason("");
    setProblem(null);
  };
  return (
    <>
      {live ? (
        <Asked request={request} waiting={isWaiting(queue, `request:${session.campId}/${session.id}`)} />
      ) : null}
      {live && request.state === "asked" ? (
        <Button variant="quiet" wide className="mt-1 min-h-12" onClick={() => acts.withdraw(session)}>
          Take it back
        </Button>
      ) : null}
      {live ? null : open ? (
        <div className="mt-3 border-l-4 border-ink-3 pl-3">
          <Field label="Why can’t you make it?" error={problem} hint="Your coach sees it and answers.">
            <TextArea
              rows={2}
              maxLength={500}
              value={reason}
              onChange={(event) => setReason(event.target.value)}
            />
          </Field>
          <div className="mt-2 grid grid-cols-2 gap-2">
            <Button variant="primary" className="min-h-12" onClick={ask}>
              Ask the coach
            </Button>
            <Button className="min-h-12" onClick={() => setOpen(false)}>
              Never mind
            </Button>
          </div>
        </div>
      ) : (
        <Button variant="quiet" wide className="mt-1 min-h-12" onClick={() => setOpen(true)}>
          I can’t make it
        </Button>
      )}
    </>
  );
}
