import type { LiftEdit, LineEdit } from "@/lib/engine/prescription/types";
import { fromKg, readNumber, toKg, type MassUnit } from "@/lib/format/load";

/** A line's edit as it is typed: an empty field stays as planned. */
export interface LineTexts {
  readonly exercise: string;
  readonly sets: string;
  readonly low: string;
  readonly high: string;
  readonly load: string;
  readonly note: string;
}

const text = (value: number | undefined): string => (value === undefined ? "" : String(value));

/** What stands, as fields of the form. */
export const textsOf = (edit: LineEdit | undefined, unit: MassUnit): LineTexts => ({
  exercise: edit?.exercise ?? "",
  sets: text(edit?.sets),
  low: text(edit?.reps?.low),
  high: text(edit?.reps?.high),
  load: edit?.kg === undefined ? "" : text(fromKg(edit.kg, unit)),
  note: edit?.note ?? "",
});

/** The form as an edit; what was not touched keeps its exact kilograms, however its unit rounds them. */
export function lineEditOf(typed: LineTexts, before: LineEdit | undefined, unit: MassUnit): LineEdit {
  const [sets, low, high] = [readNumber(typed.sets), readNumber(typed.low), readNumber(typed.high)];
  const [from, to] = [low ?? high, high ?? low];
  const untouched = typed.load === textsOf(before, unit).load;
  const load = readNumber(typed.load);
  const kg = untouched ? (before?.kg ?? null) : load === null ? null : toKg(load, unit);
  return {
    ...(typed.exercise !== "" && { exercise: typed.exercise }),
    ...(sets !== null && { sets }),
    ...(from !== null && to !== null && { reps: { low: from, high: to } }),
    ...(kg !== null && { kg }),
    ...(typed.note.trim() !== "" && { note: typed.note.trim() }),
  };
}

const EMPTY: LiftEdit = { lines: {} };

/** The whole edit of a lift with one line written anew; null takes the line's edit away. */
export function withLine(edit: LiftEdit | null, slot: string, line: LineEdit | null): LiftEdit {
  const { lines, ...rest } = edit ?? EMPTY;
  const others = Object.fromEntries(Object.entries(lines).filter(([id]) => id !== slot));
  return { ...rest, lines: line === null ? others : { ...others, [slot]: line } };
}

/** The whole edit of a lift with its note written anew. */
export const withNote = (edit: LiftEdit | null, note: string): LiftEdit => {
  const { lines } = edit ?? EMPTY;
  return note.trim() === "" ? { lines } : { lines, note: note.trim() };
};
