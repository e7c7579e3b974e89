import { isPastLift, weekOfBaseLift } from "../changes/base";
import { campStart, instantAt, weeksOutOf } from "../geometry";
import type { Base, Day, Item, Lift, Minute, PlanInput } from "../types";

/** A pin with the lift and the camp week it holds. */
export interface PinnedLift {
  readonly id: string;
  readonly item: Item;
  readonly week: number;
  readonly day: Day;
  readonly start: Minute;
  readonly past: boolean;
}

/**
 * The pins that hold something, as lifts. A pin of a lift that is past is spent; one outside the camp has nothing to hold;
 * one into the past would plan the past, but from scratch it stands for a session that was done there.
 */
export function pinnedLifts(input: PlanInput, base: Base | undefined): readonly PinnedLift[] {
  const first = campStart(input.bout.day, input.weeks);
  const spent = new Set<string>();
  const open = new Map<string, Lift>();
  for (const lift of base?.lifts ?? []) {
    if (isPastLift(lift, input)) spent.add(lift.id);
    else open.set(lift.id, lift);
  }
  const claimed = new Set(input.pins.filter((pin) => open.has(pin.id)).map((pin) => pin.id));
  const byId = new Map<string, PinnedLift>();
  for (const pin of input.pins) {
    if (spent.has(pin.id) || pin.day < first || pin.day > input.bout.day) continue;
    const past = instantAt(input.zone, pin.day, pin.start) <= input.now;
    if (past && base) continue;
    const standing = base && (open.get(pin.id) ?? standIn(pin.slot, open, claimed, base, input));
    if (standing) claimed.add(standing.id);
    const id = standing?.id ?? pin.id;
    const named = standing && base ? weekOfBaseLift(standing, base, input) : pin.slot.week;
    const known = named >= 0 && named < input.weeks;
    byId.set(id, {
      id,
      item: standing?.item ?? pin.slot.item,
      week: known ? named : weeksOutOf(input.bout.day, pin.day),
      day: pin.day,
      start: pin.start,
      past,
    });
  }
  return [...byId.values()];
}

/** A pin made on another plan names its slot: the lift that fills that slot now. */
function standIn(
  slot: PlanInput["pins"][number]["slot"],
  open: ReadonlyMap<string, Lift>,
  claimed: ReadonlySet<string>,
  base: Base,
  input: PlanInput,
): Lift | undefined {
  return [...open.values()].find(
    (lift) =>
      lift.item === slot.item && !claimed.has(lift.id) && weekOfBaseLift(lift, base, input) === slot.week,
  );
}
