"use client";

import { Button } from "@/components/ui/button";
import { formatInstant } from "@/lib/format/dates";
import type { ChangeView } from "@/lib/schemas/camp";
import { EffectList } from "../rail/effect-list";

interface ChangeRowProps {
  readonly change: ChangeView;
  readonly zone: string;
  /** Putting back was asked for and waits for a yes. */
  readonly asked: boolean;
  readonly busy: boolean;
  readonly onAsk: (() => void) | null;
  readonly onPutBack: () => void;
}

const hasEffects = ({ knockOn }: ChangeView): boolean =>
  knockOn !== null &&
  knockOn.lifts.length + knockOn.sport.length + knockOn.weeks.length + knockOn.violations.length > 0;

const noteOf = ({ putBackOf, putBackBy }: ChangeView): string | null => {
  if (putBackBy !== null) return `Put back by change ${putBackBy}.`;
  return putBackOf === null ? null : `Puts back change ${putBackOf}.`;
};

/** One saved change: who, when, what; its knock-on folded away; and the way back, which is asked twice. */
export function ChangeRow({ change, zone, asked, busy, onAsk, onPutBack }: ChangeRowProps) {
  const note = noteOf(change);
  return (
    <li className="rounded-md border border-line bg-paper">
      <div className="flex flex-wrap items-start gap-x-4 gap-y-2 px-4 py-3">
        <span className="w-8 font-display text-week text-ink-2">{change.number}</span>
        <div className="min-w-0 flex-1 basis-60">
          <p className="font-semibold">{change.summary}</p>
          <p className="text-sm text-ink-2">
            {change.by}, {formatInstant(new Date(change.at), zone)}
            {note ? `. ${note}` : ""}
          </p>
        </div>
        {onAsk && change.canPutBack ? (
          <Button size="small" onClick={onAsk} aria-expanded={asked} busy={busy}>
            Put back
          </Button>
        ) : null}
      </div>
      {asked ? (
        <div className="flex flex-wrap items-center gap-2 border-t border-line-soft px-4 py-3 text-sm">
          <p className="min-w-0 flex-1 basis-60">
            The camp goes back to how it was before this change; what is past stays. The people concerned are
            told.
          </p>
          <Button size="small" variant="primary" onClick={onPutBack}>
            Put change {change.number} back
          </Button>
        </div>
      ) : null}
      {hasEffects(change) && change.knockOn ? (
        <details className="border-t border-line-soft">
          <summary className="flex min-h-control-small items-center px-4 py-1.5 text-sm font-semibold underline decoration-1 underline-offset-4">
            What it knocked on
          </summary>
          <EffectList knockOn={change.knockOn} subject={null} />
        </details>
      ) : null}
    </li>
  );
}
