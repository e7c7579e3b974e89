import { byTime } from "./changes/base";
import { causesOf } from "./changes/causes";
import { doseCamp, sessionMinutes, type Dose } from "./dose";
import { campStart } from "./geometry";
import { inputProblems, PlanInputError } from "./input";
import { dayLoads, formOf, sportLoads, weekSummaries } from "./load";
import { intensityOf, itemSpec, layOut } from "./menu";
import { frameOf, phaseOfDay, type CampFrame } from "./phases";
import { placeLifts } from "./placement";
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

function liftOf(frame: CampFrame, { minutes: _reserved, ...standing }: Standing, dose: Dose): Lift {
  const { sets: baseSets, floor: floorSets, effort, heavyLower, explosive } = itemSpec(standing.item);
  return {
    ...standing,
    phase: phaseOfDay(frame.spans, standing.day),
    minutes: sessionMinutes(dose.sets, frame.input.rules),
    sets: dose.sets,
    baseSets,
    floorSets,
    intensity: intensityOf(standing.item, frame.weekOf(standing.week, standing.day), frame.weeks),
    effort,
    heavyLower,
    explosive,
    factors: dose.factors,
  };
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

  const pins = new Set(layout.pins.map((pin) => pin.id));
  const standing: readonly Standing[] = [
    ...layout.fixed
      .filter((lift) => pins.has(lift.id))
      .map(({ id, item, week, day, start, minutes, past }) => ({
        ...{ id, item, week, day, start, minutes, past },
        pinned: true,
        reasons: PINNED,
      })),
    ...placement.placed.map(({ slot: { id, item, week, minutes }, day, start, reasons }) => ({
      ...{ id, item, week, day, start, minutes },
      pinned: false,
      past: false,
      // A lift reads the same whatever the plan was measured against; `causes` tells what the base did.
      reasons: reasons.filter((reason) => reason.rule !== "stay-put"),
    })),
  ];
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
