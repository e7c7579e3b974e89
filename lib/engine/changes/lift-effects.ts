import type { Lift, LiftEffect, Plan, Reason } from "../types";

const NO_CAUSE: readonly Reason[] = [{ rule: "stay-put", text: "Back where it stood before." }];

const times = (value: number): string => `× ${Number(value.toFixed(2))}`;

/** The factors whose value changed, in the coach's words. */
function doseReasons(before: Lift, after: Lift): readonly Reason[] {
  return after.factors.flatMap((factor): Reason[] => {
    const old = before.factors.find((candidate) => candidate.name === factor.name);
    if (!old || Math.abs(old.value - factor.value) < 1e-9) return [];
    return [
      { rule: factor.name, text: `${factor.text}: ${times(factor.value)} instead of ${times(old.value)}.` },
    ];
  });
}

const placeOf = ({ day, start }: Lift) => ({ day, start });

type CauseOf = (id: string) => readonly Reason[];

function changedLift(before: Lift, after: Lift, causeOf: CauseOf): LiftEffect | null {
  const moved = before.day !== after.day || before.start !== after.start;
  if (!moved && before.sets === after.sets) return null;
  const dose = before.sets === after.sets ? [] : doseReasons(before, after);
  return {
    id: after.id,
    item: after.item,
    kind: moved ? "moved" : "dose",
    from: placeOf(before),
    to: placeOf(after),
    setsBefore: before.sets,
    setsAfter: after.sets,
    because: moved ? [...causeOf(after.id), ...dose] : dose,
  };
}

/** What became of each lifting session, earliest first. */
export function liftEffects(before: Plan, after: Plan): readonly LiftEffect[] {
  const causes = new Map(after.causes.map(({ id, because }) => [id, because]));
  const causeOf: CauseOf = (id) => causes.get(id) ?? NO_CAUSE;
  const old = new Map(before.lifts.map((lift) => [lift.id, lift]));
  const now = new Map(after.lifts.map((lift) => [lift.id, lift]));
  const unplaced = new Map(after.unplaced.map((slot) => [slot.id, slot]));
  const wasUnplaced = new Set(before.unplaced.map((slot) => slot.id));
  const effects: LiftEffect[] = [];
  for (const lift of after.lifts) {
    const was = old.get(lift.id);
    const effect = was
      ? changedLift(was, lift, causeOf)
      : {
          id: lift.id,
          item: lift.item,
          kind: "added" as const,
          from: null,
          to: placeOf(lift),
          setsBefore: null,
          setsAfter: lift.sets,
          because: causeOf(lift.id),
        };
    if (effect) effects.push(effect);
  }
  for (const lift of before.lifts) {
    if (now.has(lift.id)) continue;
    const shut = unplaced.get(lift.id);
    effects.push({
      id: lift.id,
      item: lift.item,
      kind: shut ? "unplaced" : "dropped",
      from: placeOf(lift),
      to: null,
      setsBefore: lift.sets,
      setsAfter: null,
      because: shut?.rules ?? causeOf(lift.id),
    });
  }
  for (const { id, item, rules } of after.unplaced) {
    if (old.has(id) || wasUnplaced.has(id)) continue;
    effects.push({
      id,
      item,
      kind: "unplaced",
      from: null,
      to: null,
      setsBefore: null,
      setsAfter: null,
      because: rules,
    });
  }
  const dayOf = ({ from, to }: LiftEffect): number => to?.day ?? from?.day ?? Infinity;
  const startOf = ({ from, to }: LiftEffect): number => to?.start ?? from?.start ?? 0;
  return effects.sort((a, b) => dayOf(a) - dayOf(b) || startOf(a) - startOf(b) || (a.id < b.id ? -1 : 1));
}
