import type { Line } from "@/lib/engine/prescription/types";
import { massNumber, massText, workText, type MassUnit } from "@/lib/format/load";
import type { LastTime, LoggedSet } from "@/lib/schemas/today";

/** "5 × 4 at 105 kg", "4 × 8 to 10 a side", "3 × 30 s". */
export const amountText = (line: Line, unit: MassUnit): string =>
  line.load.of === "best" ? `${workText(line)} at ${massText(line.load.kg, unit)}` : workText(line);

/** "last time 102.5". */
export const lastText = (last: LastTime | undefined, unit: MassUnit): string =>
  last === undefined ? "" : `last time ${last.kg === null ? `${last.reps} reps` : massNumber(last.kg, unit)}`;

/** One set as prescribed: the least that was asked, at the load that was asked or else that of the last time. */
export const asWritten = (line: Line, number: number, last: LastTime | undefined): LoggedSet => ({
  slot: line.slot,
  number,
  exerciseId: line.exercise,
  kg: line.load.kg ?? (line.load.of === "reserve" ? (last?.kg ?? null) : null),
  reps: line.reps.low,
  reserve: line.load.of === "reserve" ? line.load.reserve.low : null,
});

/** "105 kg × 4 · 2 in reserve". */
export function setText(set: LoggedSet, line: Line, unit: MassUnit): string {
  const reps = `${set.reps}${line.aim === "hold" ? " s" : ""}`;
  const done =
    set.kg === null ? `${reps}${line.aim === "hold" ? "" : " reps"}` : `${massText(set.kg, unit)} × ${reps}`;
  return set.reserve === null ? done : `${done} · ${set.reserve} in reserve`;
}
