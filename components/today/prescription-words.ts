import type { Line } from "@/lib/engine/prescription/types";
import { massNumber, massText, type MassUnit } from "@/lib/format/load";
import type { LastTime, LoggedSet } from "@/lib/schemas/today";

type Range = Line["reps"];

/** "8 to 10", or "8" where both ends are the same. */
const rangeText = ({ low, high }: Range): string => (low === high ? String(low) : `${low} to ${high}`);

/** "3 min", "45 s", "1:30 min". */
export function restText(seconds: number): string {
  if (seconds < 60) return `${seconds} s`;
  const rest = seconds % 60;
  return rest === 0
    ? `${seconds / 60} min`
    : `${Math.floor(seconds / 60)}:${String(rest).padStart(2, "0")} min`;
}

/** "5 × 4 at 105 kg", "4 × 8 to 10 each side", "3 × 30 s". */
export function amountText(line: Line, unit: MassUnit): string {
  const reps = `${rangeText(line.reps)}${line.aim === "hold" ? " s" : ""}`;
  const each = line.sides === "each" ? " each side" : "";
  const kg = line.load.of === "best" ? ` at ${massText(line.load.kg, unit)}` : "";
  return `${line.sets} × ${reps}${each}${kg}`;
}

/** "84 % of best", "2 in reserve, 40 kg"; empty where there is nothing to load. */
export function loadText({ load }: Line, unit: MassUnit): string {
  if (load.of === "best") return `${rangeText(load.percent)} % of best`;
  const kg = load.kg === null ? "" : massText(load.kg, unit);
  const reserve = load.of === "reserve" ? `${rangeText(load.reserve)} in reserve` : "";
  return [reserve, kg].filter(Boolean).join(", ");
}

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
