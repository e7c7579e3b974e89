import type { ReactNode } from "react";
import { Cross } from "@/components/ui/icons";
import type { Factor, Lift } from "@/lib/engine/types";
import { dayText } from "@/lib/format/civil";
import { hoursText, type CellEntry } from "./camp-days";
import { KindMark } from "./kind-mark";

/** "80 to 85 % of best", "2 to 3 in reserve". */
export const intensityText = ({ low, high, of }: Lift["intensity"]): string =>
  of === "best" ? `${low} to ${high} % of best` : `${low} to ${high} in reserve`;

const Fact = ({ name, value }: { readonly name: ReactNode; readonly value: ReactNode }) => (
  <div className="flex justify-between gap-4">
    <dt>{name}</dt>
    <dd className="shrink-0 font-semibold text-ink">{value}</dd>
  </div>
);

const counts = (factor: Factor): boolean => Math.abs(factor.value - 1) >= 0.005;

/** Where a session's number of sets comes from: base, the factors that are not 1, result. */
export function DoseFacts({ lift }: { readonly lift: Lift }) {
  return (
    <dl className="grid gap-1 text-xs text-ink-2">
      <Fact name="Base" value={lift.baseSets} />
      {lift.factors.filter(counts).map((factor) => (
        <Fact key={factor.name} name={factor.text} value={`× ${factor.value.toFixed(2)}`} />
      ))}
      <Fact name="Working sets" value={lift.sets} />
    </dl>
  );
}

function LiftWhy({ lift }: { readonly lift: Lift }) {
  return (
    <div className="mt-3 grid gap-x-8 gap-y-4 sm:grid-cols-2">
      <div>
        <h4 className="mb-1 text-xs font-semibold text-ink-2">Why it stands here</h4>
        <ul className="grid gap-1 text-sm">
          {lift.reasons.map((reason) => (
            <li key={`${reason.rule} ${reason.text}`}>{reason.text}</li>
          ))}
          {lift.reasons.length === 0 ? <li>Nothing else is near it.</li> : null}
        </ul>
      </div>
      <div>
        <h4 className="mb-1 text-xs font-semibold text-ink-2">Why it has {lift.sets} sets</h4>
        <DoseFacts lift={lift} />
      </div>
    </div>
  );
}

interface SessionWhyProps {
  readonly entry: CellEntry;
  readonly onClose: () => void;
}

/** What one session is, why it stands where it does, and where its number of sets comes from. */
export function SessionWhy({ entry, onClose }: SessionWhyProps) {
  const { lift, sport } = entry;
  return (
    <section aria-label={entry.title} className="bg-canvas/50 px-4 py-3">
      <header className="flex items-start gap-2.5">
        <KindMark mark={entry.look.mark} size={13} className={`mt-1 ${entry.look.text}`} />
        <div className="min-w-0 flex-1">
          <h3 className="font-semibold">{entry.title}</h3>
          <p className="text-sm text-ink-2">
            {dayText(entry.day)}, {hoursText(entry)}
            {lift
              ? ` · ${lift.sets} sets · ${intensityText(lift.intensity)} · expect an effort of ${lift.effort}`
              : ""}
            {sport ? ` · effort ${sport.effort} · ${Math.round(sport.effort * sport.minutes)} AU` : ""}
          </p>
        </div>
        <button
          type="button"
          aria-label="Close"
          onClick={onClose}
          className="-mt-1 -mr-2 flex min-h-control-small min-w-control-small items-center justify-center rounded"
        >
          <Cross />
        </button>
      </header>
      {lift ? <LiftWhy lift={lift} /> : null}
    </section>
  );
}
