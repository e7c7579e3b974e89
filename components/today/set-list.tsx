"use client";

import { classNames } from "@/components/ui/class-names";
import type { Line } from "@/lib/engine/prescription/types";
import { massText, type MassUnit } from "@/lib/format/load";
import type { LastTime, LoggedSet } from "@/lib/schemas/today";
import { amountText, asWritten, lastText, setText } from "./prescription-words";
import { cueOf } from "./lift-lines";
import { SetEditor } from "./set-editor";

interface SetListProps {
  readonly line: Line;
  readonly unit: MassUnit;
  readonly last: LastTime | undefined;
  readonly sets: readonly LoggedSet[];
  /** `slot/number` of the set under the thumb. */
  readonly active: string | null;
  readonly onActive: (place: string | null) => void;
  readonly onPut: (set: LoggedSet, ticked: boolean) => void;
  readonly onRemove: (set: Pick<LoggedSet, "slot" | "number">) => void;
}

export const placeOfSet = ({ slot, number }: Pick<LoggedSet, "slot" | "number">): string =>
  `${slot}/${number}`;

const Tick = ({ on }: { readonly on: boolean }) => (
  <svg
    width="20"
    height="20"
    viewBox="0 0 20 20"
    fill="none"
    stroke="currentColor"
    strokeWidth="2"
    aria-hidden="true"
  >
    <rect x="1.5" y="1.5" width="17" height="17" rx="2" className={on ? "fill-ink" : undefined} />
    {on ? <path d="M5 10.500l3.500 3.500L15 6.500" className="stroke-ink-on" /> : null}
  </svg>
);

/** The sets of one exercise: what is done in words, and one at a time under the thumb. */
export function SetList(props: SetListProps) {
  const { line, unit, last, sets, active, onActive, onPut, onRemove } = props;
  // An extra set that was logged stays in sight.
  const count = Math.max(line.sets, ...sets.map(({ number }) => number));
  const startOf = (number: number): LoggedSet => {
    const before = sets.findLast((set) => set.number < number);
    const written = asWritten(line, number, last);
    // What was put on the bar a moment ago is the best guess for the next set.
    return before ? { ...written, kg: before.kg } : written;
  };
  return (
    <section className="border-t border-line pt-3 pb-1">
      <h3 className="font-semibold">{line.name}</h3>
      <p className="text-sm text-ink-2">
        {[amountText(line, unit), lastText(last, unit)].filter(Boolean).join(" · ")}
        {cueOf(line) ? <span className="block">{cueOf(line)}</span> : null}
      </p>
      <ol className="mt-1">
        {Array.from({ length: count }, (_, index) => index + 1).map((number) => {
          const place = placeOfSet({ slot: line.slot, number });
          const done = sets.find((set) => set.number === number);
          const start = done ?? startOf(number);
          return (
            <li key={number}>
              <button
                type="button"
                aria-expanded={place === active}
                onClick={() => onActive(place === active ? null : place)}
                className={classNames(
                  "flex min-h-12 w-full items-center gap-3 rounded text-left",
                  done ? "text-ink" : "text-ink-2",
                )}
              >
                <Tick on={done !== undefined} />
                <span className="w-12 shrink-0">Set {number}</span>
                <span className={done ? "font-semibold" : undefined}>
                  {done
                    ? setText(done, line, unit)
                    : start.kg === null
                      ? "not done"
                      : `not done, ${massText(start.kg, unit)}`}
                </span>
              </button>
              {place === active ? (
                <SetEditor
                  line={line}
                  unit={unit}
                  start={start}
                  ticked={done !== undefined}
                  onChange={(set) => onPut(set, true)}
                  onTick={(set) => onPut(set, false)}
                  onAsWritten={() => onPut(asWritten(line, number, last), false)}
                  onRemove={() => onRemove({ slot: line.slot, number })}
                />
              ) : null}
            </li>
          );
        })}
      </ol>
    </section>
  );
}
