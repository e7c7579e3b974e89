"use client";

import { useState, type ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/text-input";
import { showToast } from "@/components/ui/toasts";
import { dayFromIso, minuteFromHhmm } from "@/lib/engine/geometry";
import { momentText } from "@/lib/format/civil";
import { useAnswerRequest } from "@/lib/query/suggestions";
import type { WaitingRequest } from "@/lib/schemas/board";

interface RequestCardProps {
  readonly request: WaitingRequest;
  readonly athlete: string;
  /** Shows what dropping the session does: a link on the board, a button on the camp page. */
  readonly look: ReactNode;
}

/** "I can't make it": the reason, what it would do, and the answer. Answering changes no plan. */
export function RequestCard({ request, athlete, look }: RequestCardProps) {
  const [note, setNote] = useState("");
  const answer = useAnswerRequest(request.campId);
  const at = momentText({ day: dayFromIso(request.date), start: minuteFromHhmm(request.start) });
  const send = (state: "accepted" | "declined"): void =>
    answer.mutate(
      { id: request.id, state, answer: note.trim() },
      {
        onSuccess: () =>
          showToast(`${state === "accepted" ? "Accepted" : "Declined"}. ${athlete} is being told.`),
        onError: (error) => showToast(error.message, { tone: "error" }),
      },
    );
  return (
    <section aria-label={`Request of ${athlete}`} className="rounded border border-line px-3 py-2.5 text-sm">
      <p>
        <b className="font-semibold">
          Cannot make {request.title}, {at}.
        </b>{" "}
        {request.reason}
      </p>
      <p className="mt-1">{look}</p>
      <div className="mt-2 flex flex-wrap items-end gap-2">
        <Field label="Note to the athlete" className="min-w-48 flex-1">
          <TextInput maxLength={500} value={note} onChange={(event) => setNote(event.target.value)} />
        </Field>
        <Button size="small" variant="primary" busy={answer.isPending} onClick={() => send("accepted")}>
          Accept
        </Button>
        <Button size="small" busy={answer.isPending} onClick={() => send("declined")}>
          Decline
        </Button>
      </div>
    </section>
  );
}
