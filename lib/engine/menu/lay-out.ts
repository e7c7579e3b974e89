import { byTime, isPastLift, weekOfBaseLift } from "../changes/base";
import { LiftIds, matchSlots } from "../changes/identity";
import { roundHalfUp, sessionMinutes } from "../dose/sets";
import { taperFactor } from "../dose/taper";
import { waveFactor } from "../dose/wave";
import { instantAt } from "../geometry";
import type { CampFrame, CampWeek } from "../phases";
import type { FixedLift, Slot } from "../placement/request";
import type { Base, Day, Item, Lift, Minute, SlotKey } from "../types";
import { itemSpec } from "./items";
import { pinnedLifts, type PinnedLift } from "./pins";
import { liftsOfWeek, menuOf } from "./week-menu";

/** What the camp asks of placement. */
export interface Layout {
  /** Lifts of the base that are past, as they were. */
  readonly past: readonly Lift[];
  readonly pins: readonly PinnedLift[];
  readonly slots: readonly Slot[];
  /** Past and pinned lifts, as placement sees them. */
  readonly fixed: readonly FixedLift[];
  /** Lifts of the base, not past, that no slot and no pin goes on as. */
  readonly dropped: readonly Lift[];
  /** Days of hard sparring by weeks out. */
  readonly hardDays: ReadonlyMap<number, number>;
}

const LAST_MINUTE = 1439 as Minute;

/** Days of hard sparring by weeks out. */
function hardDaysByWeek({ input }: CampFrame): ReadonlyMap<number, number> {
  const days = new Set(input.sport.filter(({ kind }) => kind === "hard-sparring").map(({ day }) => day));
  const counts = new Map<number, number>();
  for (const day of days) {
    const week = Math.floor((input.bout.day - day) / 7);
    counts.set(week, (counts.get(week) ?? 0) + 1);
  }
  return counts;
}

/**
 * Items that a week still wants: its menu up to the number of lifts, less those pinned or already past. A pinned or past lift
 * that the menu does not hold takes the place of the least important one, so that the number of lifts stays.
 */
function openItems(
  frame: CampFrame,
  week: CampWeek,
  held: readonly Item[],
  hardDays: number,
): readonly Item[] {
  const { athlete, rules } = frame.input;
  const menu = menuOf(week);
  const number = liftsOfWeek(Math.min(menu.length, athlete.liftsPerWeek), hardDays, rules["hard-days.off"]);
  return menu.filter((item) => !held.includes(item)).slice(0, Math.max(0, number - held.length));
}

/** Minutes that the lift can need at most: sparring, cap and an accepted suggestion only take sets away. */
function reservedMinutes(frame: CampFrame, item: Item, week: CampWeek, day: Day, id: string): number {
  const { rules, coachFactors } = frame.input;
  const spec = itemSpec(item);
  const product =
    spec.sets *
    waveFactor(week, rules).value *
    taperFactor(frame.taperDay(day), frame.reserveTau) *
    (coachFactors[id] ?? 1);
  return sessionMinutes(Math.max(spec.floor, roundHalfUp(product)), rules);
}

function fixedOf(lift: Lift): FixedLift {
  const { id, item, week, day, start, minutes, heavyLower, pinned } = lift;
  return {
    id,
    item,
    week,
    day,
    start,
    minutes,
    heavyLower,
    primer: itemSpec(item).primer,
    pinned,
    past: true,
  };
}

/** Turns weeks, pins and the base into slots with identities, and into what is fixed. */
export function layOut(frame: CampFrame, base: Base | undefined): Layout {
  const { input } = frame;
  const baseLifts = [...(base?.lifts ?? [])].sort(byTime);
  const past = baseLifts
    .filter((lift) => isPastLift(lift, input))
    .map((lift): Lift => ({
      ...lift,
      past: true,
      week: base ? weekOfBaseLift(lift, base, input) : lift.week,
    }));
  const pins = pinnedLifts(input, base);
  const pinned = new Set(pins.map((pin) => pin.id));
  const open = baseLifts.filter((lift) => !isPastLift(lift, input) && !pinned.has(lift.id));
  const hardDays = hardDaysByWeek(frame);

  const wanted = frame.weeks.flatMap((week): (SlotKey & { readonly row: CampWeek })[] => {
    if (instantAt(input.zone, week.to, LAST_MINUTE) <= input.now) return [];
    const held = [...past, ...pins].filter((lift) => lift.week === week.weeksOut).map((lift) => lift.item);
    return openItems(frame, week, held, hardDays.get(week.weeksOut) ?? 0).map((item) => ({
      item,
      week: week.weeksOut,
      row: week,
    }));
  });
  const matched = base ? matchSlots(wanted, open, base, input) : new Map<SlotKey, Lift>();
  const ids = new LiftIds([...baseLifts, ...pins]);

  const slots = wanted.map((slot): Slot => {
    const { item, week, row } = slot;
    const before = matched.get(slot);
    const id = before?.id ?? ids.next(slot);
    const { heavyLower, explosive, fresh, primer } = itemSpec(item);
    return {
      id,
      item,
      week,
      minutes: reservedMinutes(frame, item, row, row.from, id),
      heavyLower,
      explosive,
      fresh,
      primer,
      order: menuOf(row).indexOf(item),
      base: before ? { day: before.day, start: before.start } : null,
    };
  });
  const goesOn = new Set([...matched.values()].map((lift) => lift.id));
  return {
    past,
    pins,
    slots,
    fixed: [
      ...past.map(fixedOf),
      ...pins.map(({ id, item, week, day, start, past: isPast }): FixedLift => {
        const { heavyLower, primer } = itemSpec(item);
        const minutes = reservedMinutes(frame, item, frame.weekOf(week, day), day, id);
        return { id, item, week, day, start, minutes, heavyLower, primer, pinned: true, past: isPast };
      }),
    ].sort(byTime),
    dropped: open.filter((lift) => !goesOn.has(lift.id)),
    hardDays,
  };
}
