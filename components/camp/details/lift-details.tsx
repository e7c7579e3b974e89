"use client";

import { hoursText } from "@/components/session/camp-days";
import { liftLook } from "@/components/session/kinds";
import { DoseFacts, intensityText } from "@/components/session/session-why";
import { Button } from "@/components/ui/button";
import type { Lift, Violation } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { moveChange } from "../move-change";
import { isPastAt } from "../picture";
import type { Desk } from "../use-desk";
import { CoachFactor } from "./coach-factor";
import { DetailHead, DetailPart, OpenSession } from "./detail-parts";
import { MoveForm } from "./move-form";
import { moveSpan } from "./move-span";

function Reasons({ lift, broken }: { readonly lift: Lift; readonly broken: readonly Violation[] }) {
  return (
    <ul className="grid gap-1 text-sm">
      {broken.map((violation) => (
        <li key={violation.rule} className="font-semibold">
          Breaks a rule: {violation.text}
        </li>
      ))}
      {lift.reasons.map((reason) => (
        <li key={`${reason.rule} ${reason.text}`}>{reason.text}</li>
      ))}
      {lift.reasons.length + broken.length === 0 ? <li>Nothing else is near it.</li> : null}
    </ul>
  );
}

function PinPart({ lift, desk }: { readonly lift: Lift; readonly desk: Desk }) {
  const here = moveChange(desk.standing, null, lift.id, lift);
  if (lift.pinned) {
    return (
      <div className="flex flex-wrap items-center justify-between gap-2 text-sm">
        <span>Pinned by a coach: the planner leaves it here.</span>
        <Button size="small" onClick={() => desk.tryChange({ kind: "lift.release", liftId: lift.id })}>
          Let it go
        </Button>
      </div>
    );
  }
  return (
    <div className="flex flex-wrap items-center justify-between gap-2 text-sm">
      <span>The planner may move it.</span>
      {here ? (
        <Button size="small" onClick={() => desk.tryChange(here)}>
          Pin it here
        </Button>
      ) : null}
    </div>
  );
}

interface LiftDetailsProps {
  readonly desk: Desk;
  readonly lift: Lift;
  readonly onClose: () => void;
}

/** One lifting session: when, how much, why there and why so much; and what a coach may do with it. */
export function LiftDetails({ desk, lift, onClose }: LiftDetailsProps) {
  const { shown, view, now, standing } = desk;
  const detail = view.may.includes("lifts.detail");
  const past = lift.past || isPastAt(shown.zone, lift, now);
  const write = view.may.includes("lifts.write") && !past && shown.book.status === "on";
  const span = moveSpan(desk);
  const look = liftLook(lift.item, lift.phase);
  return (
    <article aria-label={look.label}>
      <DetailHead
        look={look}
        title={look.label}
        when={`${dayText(lift.day)}, ${hoursText(lift)}`}
        facts={
          detail
            ? `${lift.sets} sets · ${intensityText(lift.intensity)} · expect an effort of ${lift.effort}`
            : ""
        }
        onClose={onClose}
      />
      {standing.plan.lifts.some(({ id }) => id === lift.id) ? (
        <OpenSession campId={view.id} id={lift.id} />
      ) : null}
      {past ? <p className="px-4 pb-3 text-sm">This is past, and what is past stays.</p> : null}
      {detail ? (
        <>
          <DetailPart title="Why it stands here">
            <Reasons
              lift={lift}
              broken={shown.plan.violations.filter((violation) => violation.ids.includes(lift.id))}
            />
          </DetailPart>
          <DetailPart title={`Why it has ${lift.sets} sets`}>
            <DoseFacts lift={lift} />
          </DetailPart>
        </>
      ) : null}
      {write ? (
        <>
          <DetailPart title="Pin">
            <PinPart lift={lift} desk={desk} />
          </DetailPart>
          <DetailPart title="Move it">
            <MoveForm
              at={lift}
              {...span}
              onMove={(to) => {
                const change = moveChange(standing, null, lift.id, to);
                if (change) desk.tryChange(change);
              }}
            />
          </DetailPart>
          <DetailPart title="Volume">
            <CoachFactor
              value={shown.book.coachFactors[lift.id] ?? 1}
              onFactor={(factor) => desk.tryChange({ kind: "lift.factor", liftId: lift.id, factor })}
            />
          </DetailPart>
        </>
      ) : null}
    </article>
  );
}
