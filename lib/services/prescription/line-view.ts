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
  /** What the athlete may do. */
  readonly allowed: readonly Exercise[];
  /** Exercises of the session, which a swap would only double. */
  readonly inSession: ReadonlySet<string>;
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

/** Swaps that a line is offered, at most. */
const OFFERED = 8;

/** The engine's alternatives that share a quality with whose turn it is, then others of the same main quality. */
function swapsFor(line: Line, from: string, { allowed, inSession, names }: LineReader): string[] {
  const was = allowed.find(({ id }) => id === from);
  if (!was || !names.has(from) || was.qualities[0] === "mobility") return [];
  const rank = (id: string): number => line.alternatives.indexOf(id) + 1 || Infinity;
  const fits = ({ id, qualities }: Exercise): boolean =>
    id !== from &&
    id !== line.exercise &&
    !inSession.has(id) &&
    (qualities[0] === was.qualities[0] ||
      (rank(id) < Infinity && qualities.some((one) => was.qualities.includes(one))));
  // A stable sort: what the engine does not rank stays in the library's order.
  return allowed
    .filter(fits)
    .sort((a, b) => Math.min(rank(a.id), 99) - Math.min(rank(b.id), 99))
    .slice(0, OFFERED)
    .map(({ id }) => id);
}

function plannedOf(line: Line, reader: LineReader): PlannedLine | null {
  if (line.edited.length === 0) return null;
  const planned = reader.planned?.lines.find(({ slot }) => slot === line.slot);
  if (!planned) return null;
  const { exercise, name, aim, sides, sets, reps } = planned;
  return { exercise, name, aim, sides, sets, reps, load: shownLoad(planned, reader) };
}

/** A line as one reader sees it. */
export function lineView(line: Line, reader: LineReader): LineView {
  const from = swappedFrom(line, reader);
  return {
    ...line,
    load: shownLoad(line, reader),
    // The sentence on percent says the best itself.
    reasons: reader.seesBests ? line.reasons : line.reasons.filter(({ rule }) => rule !== "percent"),
    swappedFrom: from,
    // A coach's own choice is changed by the coach, not swapped under it.
    swaps: line.edited.includes("exercise") ? [] : swapsFor(line, from?.id ?? line.exercise, reader),
    planned: plannedOf(line, reader),
  };
}

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
