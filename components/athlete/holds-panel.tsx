"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Actions, Dialog } from "@/components/ui/dialog";
import { Notice } from "@/components/ui/notice";
import { Panel } from "@/components/ui/panel";
import { showToast } from "@/components/ui/toasts";
import { useLiftHold } from "@/lib/query/athletes";
import type { AthleteView, HoldDetail } from "@/lib/schemas/athlete";
import { HoldDialog } from "./hold-form";
import { dateText, holdSpan, replannedText } from "./words";

interface HoldsPanelProps {
  readonly athlete: AthleteView;
  readonly today: string;
  /** Sets and lifts holds: the medic. */
  readonly writes: boolean;
}

function LiftDialog({ hold, athlete, onClose }: HoldLineProps & { readonly onClose: () => void }) {
  const lift = useLiftHold(athlete.id);
  const run = (): void =>
    lift.mutate(hold.id, {
      onSuccess: ({ replanned }) => {
        showToast(`The hold is lifted. ${replannedText(replanned)}`);
        onClose();
      },
    });
  return (
    <Dialog open onOpenChange={(open) => !open && onClose()} title={`Lift the hold on ${athlete.name}?`}>
      <p>Training is planned again from now on, contact too. This is no medical clearance.</p>
      {lift.error ? <Notice tone="error" role="alert" title={lift.error.message} className="mt-3" /> : null}
      <Actions>
        <Button variant="primary" busy={lift.isPending} onClick={run}>
          Lift the hold
        </Button>
        <Button onClick={onClose}>Keep it</Button>
      </Actions>
    </Dialog>
  );
}

interface HoldLineProps {
  readonly hold: HoldDetail;
  readonly athlete: AthleteView;
}

function HoldLine({ hold, athlete, writes }: HoldLineProps & { readonly writes: boolean }) {
  const [lifting, setLifting] = useState(false);
  return (
    <li className="flex flex-wrap items-start justify-between gap-3 py-2.5">
      <div className="min-w-0">
        <p className="font-semibold">{holdSpan(hold)}</p>
        <p className="text-sm text-ink-2">
          Set on {dateText(hold.createdAt)}
          {hold.setBy ? ` by ${hold.setBy}` : ""}
          {hold.liftedAt ? `, lifted on ${dateText(hold.liftedAt)}` : ""}
        </p>
        {hold.reason ? (
          <p className="mt-1 max-w-prose break-words whitespace-pre-line">{hold.reason}</p>
        ) : null}
      </div>
      {writes && hold.liftedAt === null ? (
        <Button size="small" onClick={() => setLifting(true)}>
          Lift it
        </Button>
      ) : null}
      {lifting ? <LiftDialog hold={hold} athlete={athlete} onClose={() => setLifting(false)} /> : null}
    </li>
  );
}

/** Holds of an athlete: nothing is planned on their days, and only a medic sets and lifts them. */
export function HoldsPanel({ athlete, today, writes }: HoldsPanelProps) {
  const [setting, setSetting] = useState(false);
  return (
    <Panel
      title="Holds"
      actions={
        writes ? (
          <Button size="small" onClick={() => setSetting(true)}>
            Set a hold
          </Button>
        ) : null
      }
    >
      <Notice tone="caution" title="This is no medical clearance." className="mb-2">
        A hold keeps training from being planned. Going back to contact is decided by a doctor, in person.
      </Notice>
      {athlete.holds.length === 0 ? (
        <p className="py-2 text-ink-2">There has been none.</p>
      ) : (
        <ul className="divide-y divide-line-soft">
          {athlete.holds.map((hold) => (
            <HoldLine key={hold.id} hold={hold} athlete={athlete} writes={writes} />
          ))}
        </ul>
      )}
      {setting ? (
        <HoldDialog
          athleteId={athlete.id}
          name={athlete.name}
          today={today}
          onClose={() => setSetting(false)}
        />
      ) : null}
    </Panel>
  );
}
