import type { BestRow } from "@/db/queries/prescription";
import type { Exercise, Line, PrescribedLift, Swap } from "@/lib/engine";
import type { Item } from "@/lib/engine/types";
import { dayFromIso } from "@/lib/engine";
import type { BestView, LineView, PlannedLine, ShownLoad } from "@/lib/schemas/prescription";

/** Names of exercises by id. */
export const namesOf = (exercises: readonly Exercise[]): ReadonlyMap<string, string> =>
  new Map(exercises.map(({ id, name }) => [id, name]));

export interface LineReader {
  readonly item: Item;
  /** Whether the reader may see bests; the others get percentages. */
  readonly seesBests: boolean;
  readonly swaps: readonly Swap[];
  readonly names: ReadonlyMap<string, string>;
  /** The same lift without what a coach wrote over it; null where that is not known. */
  readonly planned: PrescribedLift | null;
}

const shownLoad = ({ load }: Line, { seesBests }: LineReader): ShownLoad =>
  load.of === "best" && !seesBests ? { of: "percent", percent: load.percent } : load;

/** A line that a swap made says so in the engine's own sentence, which names whose turn it is. */
function swappedFrom(
  { exercise, reasons }: Line,
  { item, swaps, names }: LineReader,
): LineView["swappedFrom"] {
  const said = reasons.find(({ rule }) => rule === "swap");
  if (!said) return null;
  for (const { from, item: swapped } of swaps) {
    const name = names.get(from) ?? from;
    if (swapped === item && from !== exercise && said.text.startsWith(`Instead of ${name},`))
      return { id: from, name };
  }
  return null;
}

function plannedOf(line: Line, reader: LineReader): PlannedLine | null {
  if (line.edited.length === 0) return null;
  const planned = reader.planned?.lines.find(({ slot }) => slot === line.slot);
  if (!planned) return null;
  const { exercise, name, aim, sides, sets, reps } = planned;
  return { exercise, name, aim, sides, sets, reps, load: shownLoad(planned, reader) };
}

/** A line as one reader sees it. */
export const lineView = (line: Line, reader: LineReader): LineView => ({
  ...line,
  load: shownLoad(line, reader),
  // The sentence on percent says the best itself.
  reasons: reader.seesBests ? line.reasons : line.reasons.filter(({ rule }) => rule !== "percent"),
  swappedFrom: swappedFrom(line, reader),
  planned: plannedOf(line, reader),
});

export const bestView = (row: BestRow, names: ReadonlyMap<string, string>): BestView => ({
  id: row.id,
  exerciseId: row.exerciseId,
  name: names.get(row.exerciseId) ?? row.exerciseId,
  date: row.day,
  liftedKg: row.liftedKg,
  reps: row.reps,
  formula: row.formula,
  kg: row.kg,
});

/** The rows behind the loads of some lines. */
export function bestsBehind(lines: readonly Line[], rows: readonly BestRow[]): BestRow[] {
  const used = lines.flatMap(({ load }) => (load.of === "best" ? [load.best] : []));
  return rows.filter((row) =>
    used.some(
      (best) =>
        best.exercise === row.exerciseId &&
        best.day === dayFromIso(row.day) &&
        best.kg === row.kg &&
        best.from === (row.formula ?? "measured"),
    ),
  );
}
