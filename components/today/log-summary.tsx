import type { MassUnit } from "@/lib/format/load";
import { massNumber } from "@/lib/format/load";
import type { SessionLog } from "@/lib/schemas/today";
import { effortText } from "./effort-words";

const STATES: Record<SessionLog["state"], string> = { open: "Begun", done: "Done", missed: "Missed" };

/** Best load of the sets, for a glance. */
function setsText(sets: SessionLog["sets"], unit: MassUnit): string {
  if (sets.length === 0) return "";
  const heaviest = sets.reduce<number | null>(
    (most, { kg }) => (kg === null ? most : Math.max(most ?? 0, kg)),
    null,
  );
  const count = sets.length === 1 ? "1 set" : `${sets.length} sets`;
  return heaviest === null ? count : `${count}, up to ${massNumber(heaviest, unit)} ${unit}`;
}

/** A log in one line of facts: "Done · effort 7, very hard · 65 min · 16 sets, up to 105 kg". */
export const logFacts = (log: SessionLog, unit: MassUnit): string[] =>
  [
    STATES[log.state],
    log.effort === null ? "" : `effort ${effortText(log.effort)}`,
    log.minutes === null ? "" : `${log.minutes} min`,
    setsText(log.sets, unit),
    log.hardRounds === null ? "" : `${log.hardRounds} hard rounds`,
    log.knock ? "knock to the head" : "",
    log.pain === null || log.pain === 0 ? "" : `pain ${log.pain} of 10, ${log.painPlace}`,
    log.note ? `“${log.note}”` : "",
  ].filter(Boolean);

export const LogSummary = ({ log, unit }: { readonly log: SessionLog; readonly unit: MassUnit }) => (
  <p className="mt-2.5 text-sm">{logFacts(log, unit).join(" · ")}</p>
);
