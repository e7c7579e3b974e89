import { byTime } from "./changes/base";
import { causesOf } from "./changes/causes";
import { doseCamp, sessionMinutes, type Dose } from "./dose";
import { campStart } from "./geometry";
import { inputProblems, PlanInputError } from "./input";
import { dayLoads, formOf, sportLoads, weekSummaries } from "./load";
import { intensityOf, itemSpec, layOut, type Layout } from "./menu";
import { frameOf, phaseOfDay, type CampFrame } from "./phases";
import { placeLifts, type Placement } from "./placement";
import type { Base, Day, Item, Lift, Minute, Plan, PlanInput, Reason } from "./types";

/** A lift with its place, before its sets. */
interface Standing {
  readonly id: string;
  readonly item: Item;
  readonly week: number;
  readonly day: Day;
  readonly start: Minute;
  /** Reserved. */
  readonly minutes: number;
  readonly pinned: boolean;
  readonly past: boolean;
  readonly reasons: readonly Reason[];
}

const PINNED: readonly Reason[] = [{ rule: "pin", text: "Pinned by the coach." }];

/** Written out field by field: this runs for every lift of every preview. */
function liftOf(frame: CampFrame, standing: Standing, { sets, factors }: Dose): Lift {
  const { id, item, week, day, start, pinned, past, reasons } = standing;
  const { sets: baseSets, floor: floorSets, effort, heavyLower, explosive } = itemSpec(item);
  return {
    id,
    item,
    week,
    phase: phaseOfDay(frame.spans, day),
    day,
    start,
    minutes: sessionMinutes(sets, frame.input.rules),
    sets,
    baseSets,
    floorSets,
    intensity: intensityOf(item, frame.weekOf(week, day), frame.weeks),
    effort,
    heavyLower,
    explosive,
    pinned,
    past,
    factors,
    reasons,
  };
}

/** Pins as they stand, then what was placed. */
function standingLifts(layout: Layout, placement: Placement): readonly Standing[] {
  const pins = new Set(layout.pins.map((pin) => pin.id));
  const standing: Standing[] = [];
  for (const { id, item, week, day, start, minutes, past } of layout.fixed) {
    if (pins.has(id)) {
      standing.push({ id, item, week, day, start, minutes, pinned: true, past, reasons: PINNED });
    }
  }
  for (const { slot, day, start, reasons: all } of placement.placed) {
    const { id, item, week, minutes } = slot;
    // A lift reads the same whatever the plan was measured against; `causes` tells what the base did.
    const reasons = all.filter((reason) => reason.rule !== "stay-put");
    standing.push({ id, item, week, day, start, minutes, pinned: false, past: false, reasons });
  }
  return standing;
}

/**
 * Lays a camp. Same input and base, same plan, to the byte; neither is changed.
 *
 * `base` is the plan that stands: what is past in it stays as it was, its other lifts keep their identity and move only for
 * a reason. Without it the camp is made from scratch. Throws `PlanInputError` for an input that `inputProblems` refuses, and
 * for nothing else: what cannot be placed comes back in `unplaced`, and what a pin breaks in `violations`.
 */
export function plan(input: PlanInput, base?: Base): Plan {
  const problems = inputProblems(input);
  if (problems.length > 0) throw new PlanInputError(problems);
  const frame = frameOf(input);
  const layout = layOut(frame, base);
  const request = { input, slots: layout.slots, fixed: layout.fixed };
  const placement = placeLifts(request);

  const standing = standingLifts(layout, placement);
  const { doses, caps } = doseCamp(frame, standing, layout.past, sportLoads(frame));
  const planned = standing.flatMap((lift): Lift[] => {
    const dose = doses.get(lift.id);
    return dose ? [liftOf(frame, lift, dose)] : [];
  });
  const lifts = [...layout.past, ...planned].sort(byTime);
  const days = dayLoads(frame, lifts);
  const { rules, bout } = input;
  return {
    bout,
    weeks: weekSummaries(frame, days, caps),
    phases: frame.spans,
    lifts,
    unplaced: placement.unplaced.map(({ slot: { id, item, week }, rules: shut }) => ({
      id,
      item,
      week,
      rules: shut,
    })),
    violations: placement.violations,
    days,
    form: formOf(
      campStart(bout.day, input.weeks),
      days.map((day) => day.sport + day.lifting),
      rules,
    ),
    cost: placement.cost,
    causes: base ? causesOf(frame, base, layout, lifts, placement.whyNot) : [],
  };
}
