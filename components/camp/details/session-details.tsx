"use client";

import { dayFromIso, minuteFromHhmm } from "@/lib/engine/geometry";
import { WEIGH_IN_LOOK } from "@/components/session/kinds";
import { momentText } from "@/lib/format/civil";
import type { Desk } from "../use-desk";
import { DetailHead } from "./detail-parts";
import { LiftDetails } from "./lift-details";
import { SportDetails } from "./sport-details";

interface SessionDetailsProps {
  readonly desk: Desk;
  readonly id: string;
  readonly onEdit: (sportId: string) => void;
  readonly onClose: () => void;
}

/** Details of whatever was opened in the calendar; a session that is not in the camp any more says so. */
export function SessionDetails({ desk, id, onEdit, onClose }: SessionDetailsProps) {
  const { shown } = desk;
  const lift = shown.plan.lifts.find((candidate) => candidate.id === id);
  if (lift) return <LiftDetails desk={desk} lift={lift} onClose={onClose} />;
  const session = shown.sport.find((candidate) => candidate.id === id);
  if (session)
    return <SportDetails desk={desk} session={session} onEdit={() => onEdit(id)} onClose={onClose} />;
  const weighIn = shown.book.weighIn;
  if (id === "weigh-in" && weighIn) {
    const at = { day: dayFromIso(weighIn.date), start: minuteFromHhmm(weighIn.time) };
    return (
      <DetailHead look={WEIGH_IN_LOOK} title="Weigh-in" when={momentText(at)} facts="" onClose={onClose} />
    );
  }
  return (
    <div className="flex items-center justify-between gap-3 px-4 py-3 text-sm">
      <p>That session is not in the camp any more.</p>
      <button type="button" className="font-semibold underline underline-offset-4" onClick={onClose}>
        Close
      </button>
    </div>
  );
}
