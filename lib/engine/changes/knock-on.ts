import { campStart } from "../geometry";
import type { KnockOn, LiftEffect, Plan, Reason, SportSession, Violation, WeekEffect } from "../types";
import { liftEffects } from "./lift-effects";
import { sportEffects } from "./sport-effects";

/** A plan with the sport it was laid around. */
export interface PlannedCamp {
  readonly plan: Plan;
  readonly sport: readonly SportSession[];
}

/** One of each text, so that a week with three lifts of one cause says it once. */
function distinct(reasons: readonly Reason[]): readonly Reason[] {
  return [...new Map(reasons.map((reason) => [`${reason.rule} ${reason.text}`, reason])).values()];
}

function weekEffects(before: Plan, after: Plan, effects: readonly LiftEffect[]): readonly WeekEffect[] {
  const old = new Map(before.weeks.map((week) => [week.weeksOut, week.sets]));
  const now = new Map(after.weeks.map((week) => [week.weeksOut, week]));
  const weeksOut = [...new Set([...old.keys(), ...now.keys()])].sort((a, b) => b - a);
  return weeksOut.flatMap((week): WeekEffect[] => {
    const setsBefore = old.get(week) ?? 0;
    const setsAfter = now.get(week)?.sets ?? 0;
    if (setsBefore === setsAfter) return [];
    const span = now.get(week) ?? before.weeks.find((row) => row.weeksOut === week);
    const inWeek = (place: LiftEffect["from"]): boolean =>
      place !== null && span !== undefined && place.day >= span.from && place.day <= span.to;
    const because = effects
      .filter(({ from, to }) => inWeek(from) || inWeek(to))
      .flatMap((effect) => effect.because);
    return [{ weeksOut: week, setsBefore, setsAfter, because: distinct(because) }];
  });
}

const violationKey = ({ rule, ids, day }: Violation): string => [rule, day, ...[...ids].sort()].join(" ");

function boutEffect(before: Plan, after: Plan): KnockOn["bout"] {
  const same = before.bout.day === after.bout.day && before.bout.start === after.bout.start;
  return same ? null : { from: before.bout, to: after.bout };
}

/**
 * What a change does, session by session, with its cause. An empty change gives five empty answers. Causes come from the
 * base that `after` was planned on, which is `before` unless a change is put back.
 */
export function knockOn(before: PlannedCamp, after: PlannedCamp): KnockOn {
  const lifts = liftEffects(before.plan, after.plan);
  const known = new Set(before.plan.violations.map(violationKey));
  const first = (camp: PlannedCamp): number => campStart(camp.plan.bout.day, camp.plan.weeks.length);
  return {
    lifts,
    sport: sportEffects(before.sport, after.sport, {
      from: Math.max(first(before), first(after)),
      to: Math.min(before.plan.bout.day, after.plan.bout.day),
    }),
    weeks: weekEffects(before.plan, after.plan, lifts),
    violations: after.plan.violations.filter((violation) => !known.has(violationKey(violation))),
    bout: boutEffect(before.plan, after.plan),
  };
}
