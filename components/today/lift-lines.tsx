import { ChevronDown } from "@/components/ui/icons";
import { dayFromIso } from "@/lib/engine/geometry";
import type { Line } from "@/lib/engine/prescription/types";
import { dayText } from "@/lib/format/civil";
import { loadText, restText, spanText, type MassUnit } from "@/lib/format/load";
import type { DaySession } from "@/lib/schemas/today";
import { amountText, lastText } from "./prescription-words";

interface LineProps {
  readonly line: Line;
  readonly session: DaySession;
  readonly unit: MassUnit;
}

/** The one thing to keep in mind: the coach's note, else how it is moved, else the first cue. */
export const cueOf = (line: Line): string => line.note ?? (line.tempo || (line.cues[0] ?? ""));

/** An exercise as asked for: name and amount over how and what it was last time. */
function LineRow({ line, session, unit }: LineProps) {
  const last = session.lastTime[line.exercise];
  const { load } = line;
  const how =
    load.of === "best" ? `${spanText(load.percent)} % of best, ${restText(line.rest)} rest` : cueOf(line);
  const right = [load.of === "best" ? "" : loadText(load, unit), lastText(last, unit)]
    .filter(Boolean)
    .join(" · ");
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_fit-content(58%)] gap-x-3 gap-y-0.5 border-t border-line-soft py-2.5">
      <b className="font-semibold">{line.name}</b>
      <span className="text-right font-semibold">{amountText(line, unit)}</span>
      <span className="text-sm text-ink-2">{how}</span>
      <span
        className="text-right text-sm text-ink-2"
        title={last ? `on ${dayText(dayFromIso(last.date))}` : undefined}
      >
        {right}
      </span>
    </li>
  );
}

/** What is in a lifting session, warm-up folded away; a slot that no exercise may fill says why. */
export function LiftLines({ session, unit }: { readonly session: DaySession; readonly unit: MassUnit }) {
  const { prescription } = session;
  if (!prescription)
    return <p className="mt-2.5 text-sm text-ink-2">What is in it is not written yet. Ask your coach.</p>;
  const { warmUp, lines, empty, note } = prescription;
  return (
    <>
      {note ? <p className="mt-2 border-l-4 border-ink-3 pl-3 text-sm">{note}</p> : null}
      {warmUp.length > 0 ? (
        <details className="group mt-2.5 border-t border-line-soft">
          <summary className="flex min-h-11 items-center justify-between text-sm font-semibold">
            Warm-up, {warmUp.length === 1 ? "1 exercise" : `${warmUp.length} exercises`}
            <ChevronDown className="group-open:rotate-180" />
          </summary>
          <ul className="pb-2 text-sm text-ink-2">
            {warmUp.map((line) => (
              <li key={line.slot} className="flex justify-between gap-3 py-1">
                <span>{line.name}</span>
                <span className="text-right whitespace-nowrap">{amountText(line, unit)}</span>
              </li>
            ))}
          </ul>
        </details>
      ) : null}
      <ul className={warmUp.length > 0 ? undefined : "mt-2.5"}>
        {lines.map((line) => (
          <LineRow key={line.slot} line={line} session={session} unit={unit} />
        ))}
        {empty.map(({ slot, purpose, why }) => (
          <li key={slot} className="border-t border-line-soft py-2.5 text-sm text-ink-2">
            {purpose}: {why}
          </li>
        ))}
      </ul>
    </>
  );
}
