import { weekSpan } from "../geometry";
import { PHASES, type Day, type Phase, type PhaseSpan } from "../types";
import { phaseSpans, type CampShape } from "./phase-spans";

/** A camp week: one row of the calendar. */
export interface CampWeek {
  readonly weeksOut: number;
  readonly from: Day;
  readonly to: Day;
  /** The phase that holds most of its days; the later one on a tie. */
  readonly phase: Phase;
  readonly deload: boolean;
  /** Place in the run of building weeks of one phase since the last deload: 1, 2, 3 ...; 0 in a deload and in the taper. */
  readonly step: number;
}

const daysOf = (span: PhaseSpan, from: Day, to: Day): number =>
  Math.max(0, Math.min(span.to, to) - Math.max(span.from, from) + 1);

function phaseOf(spans: readonly PhaseSpan[], from: Day, to: Day): Phase {
  let best: Phase = PHASES[3];
  let most = 0;
  for (const span of spans) {
    const days = daysOf(span, from, to);
    if (days >= most && days > 0) [best, most] = [span.phase, days];
  }
  return best;
}

/** The phase that holds a day; a day before the camp counts as its first phase, one after the bout as the taper. */
export function phaseOfDay(spans: readonly PhaseSpan[], day: Day): Phase {
  const later = spans.find((span) => day <= span.to);
  return later?.phase ?? "taper";
}

/**
 * The weeks of a camp, first to last. Every `deload.every`-th building week from the camp's start is a deload, never the
 * last one before the taper: that week is already followed by lighter ones.
 */
export function campWeeks(
  shape: CampShape,
  spans: readonly PhaseSpan[] = phaseSpans(shape),
): readonly CampWeek[] {
  const rows = Array.from({ length: shape.weeks }, (_, index) => {
    const weeksOut = shape.weeks - 1 - index;
    const { from, to } = weekSpan(shape.boutDay, weeksOut);
    return { weeksOut, from, to, phase: phaseOf(spans, from, to) };
  });
  const building = rows.filter((row) => row.phase !== "taper").length;
  const every = shape.rules["deload.every"];
  let step = 0;
  let previous: Phase | null = null;
  return rows.map((row, index): CampWeek => {
    // Building weeks come before all taper weeks, so the index counts them.
    const deload = row.phase !== "taper" && (index + 1) % every === 0 && index + 1 < building;
    step = row.phase === "taper" || deload ? 0 : row.phase === previous ? step + 1 : 1;
    previous = row.phase;
    return { ...row, deload, step };
  });
}
