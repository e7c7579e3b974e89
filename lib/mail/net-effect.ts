import type {
  Item,
  KnockOn,
  LiftEffect,
  Reason,
  SportEffect,
  SportKind,
  SportSession,
} from "@/lib/engine/types";

/** One saved revision of a burst; `told` where the reader is concerned by it. */
export interface BurstRevision {
  readonly knockOn: KnockOn;
  readonly told: boolean;
}

type LiftPlace = NonNullable<LiftEffect["from"]>;
type SportPlace = NonNullable<SportEffect["from"]>;

export interface NetLift {
  readonly id: string;
  readonly item: Item;
  readonly before: { readonly at: LiftPlace; readonly sets: number | null } | null;
  readonly after: { readonly at: LiftPlace; readonly sets: number | null } | null;
  /** No candidate is left for it, as against taken out. */
  readonly unplaced: boolean;
  readonly because: readonly Reason[];
}

export interface NetSport {
  readonly id: string;
  readonly title: string;
  readonly sport: SportKind;
  readonly before: SportPlace | null;
  readonly after: SportPlace | null;
}

/**
 * Effects on each thing that a told revision touched: from its first told effect to its very last one, told or not, so that
 * what a mail says of the present is true when it is read.
 */
function runsOf<E extends { readonly id: string }>(
  burst: readonly BurstRevision[],
  effects: (knockOn: KnockOn) => readonly E[],
): E[][] {
  const runs = new Map<string, E[]>();
  for (const { knockOn, told } of burst) {
    for (const effect of effects(knockOn)) {
      const run = runs.get(effect.id);
      if (run) run.push(effect);
      else if (told) runs.set(effect.id, [effect]);
    }
  }
  return [...runs.values()];
}

const samePlace = (a: LiftPlace, b: LiftPlace): boolean => a.day === b.day && a.start === b.start;

const liftBefore = ({ kind, from, to, setsBefore }: LiftEffect): NetLift["before"] => {
  const at = kind === "added" ? null : (from ?? to);
  return at && { at, sets: setsBefore };
};

const liftAfter = ({ kind, from, to, setsAfter }: LiftEffect): NetLift["after"] => {
  const at = kind === "dropped" || kind === "unplaced" ? null : (to ?? from);
  return at && { at, sets: setsAfter };
};

/**
 * What a burst did to lifting on balance: a session that moved and came back is left out. `unplaced` names the lifts that
 * find no place as things stand.
 */
export function netLifts(burst: readonly BurstRevision[], unplaced: ReadonlySet<string>): NetLift[] {
  return runsOf(burst, (knockOn) => knockOn.lifts).flatMap((run) => {
    const [first, last] = [run[0], run.at(-1)];
    if (!first || !last) return [];
    const [before, after] = [liftBefore(first), liftAfter(last)];
    const lost = after === null && unplaced.has(last.id);
    if (!before && !after && !lost) return [];
    if (before && after && samePlace(before.at, after.at) && before.sets === after.sets) return [];
    // Why it stands where it does now: an earlier reason of the burst may no longer hold.
    const because = run.findLast((effect) => effect.because.length > 0)?.because ?? [];
    return [{ id: last.id, item: last.item, before, after, unplaced: lost, because }];
  });
}

const sameSession = (a: SportSession | undefined, b: SportSession | undefined): boolean =>
  a !== undefined && b !== undefined && a.title === b.title && a.kind === b.kind && a.effort === b.effort;

/**
 * What a burst did to sport sessions on balance. `before` and `after` are the sessions by id as they stood and stand: an
 * edit of a title or an effort shows only there.
 */
export function netSport(
  burst: readonly BurstRevision[],
  before: ReadonlyMap<string, SportSession>,
  after: ReadonlyMap<string, SportSession>,
): NetSport[] {
  return runsOf(burst, (knockOn) => knockOn.sport).flatMap((run) => {
    const [first, last] = [run[0], run.at(-1)];
    if (!first || !last) return [];
    const was = first.kind === "added" ? null : first.from;
    const is = last.kind === "dropped" ? null : last.to;
    if (!was && !is) return [];
    const untouched = was && is && samePlace(was, is) && was.minutes === is.minutes;
    if (untouched && sameSession(before.get(last.id), after.get(last.id))) return [];
    return [{ id: last.id, title: last.title, sport: last.sport, before: was, after: is }];
  });
}
