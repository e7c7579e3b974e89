import { weekSpan } from "../geometry";
import type { Candidate, Day, Instant, Minute } from "../types";
import type { CampDay } from "./camp-day";
import type { Slot } from "./request";
import { ShutCount } from "./shut-count";
import { SlotDay } from "./slot-day";
import { liftingOf, type Lifting, type Surroundings } from "./surroundings";

/** A slot with its index among the items of the problem, and what shuts its starts. */
export interface Wanted {
  readonly item: number;
  readonly slot: Slot;
  readonly lift: Lifting;
  readonly shut: ShutCount;
}

export const wantedOf = (slots: readonly Slot[]): readonly Wanted[] =>
  slots.map((slot, item) => ({ item, slot, lift: liftingOf(slot), shut: new ShutCount() }));

/** A slot on a day that some of its starts may be open on. */
interface Open extends Wanted {
  readonly rules: SlotDay;
  /** Where the published plan has it on this day, else -1. */
  readonly published: number;
}

/** The starts of the day: the grid, and between them where lifts of the published plan stand. */
function startsOf(grid: readonly number[], open: readonly Open[]): readonly number[] {
  const extra = open.map(({ published }) => published).filter((start) => start >= 0 && !grid.includes(start));
  return extra.length === 0 ? grid : [...new Set([...grid, ...extra])].sort((a, b) => a - b);
}

/** The slots that a day is not wholly shut to; of the others is counted what shut it. */
function openOn(
  around: Surroundings,
  day: CampDay,
  wanted: readonly Wanted[],
  grid: readonly number[],
): readonly Open[] {
  const open: Open[] = [];
  for (const one of wanted) {
    const { slot, lift, shut } = one;
    const rules = new SlotDay(around, lift, day);
    const published = slot.base?.day === day.day ? slot.base.start : -1;
    const shutBy = rules.shutBy();
    if (shutBy.length === 0 && (grid.length > 0 || published >= 0)) {
      open.push({ ...one, rules, published });
      continue;
    }
    // A whole day counts with all its starts, and with one where it has no free hours anyway.
    const lost = Math.max(1, grid.length);
    shut.tried(lost);
    for (const rule of shutBy) shut.add(rule, lost);
    if (shutBy.length === 0) shut.add("free-hours", lost);
  }
  return open;
}

function addDay(around: Surroundings, day: CampDay, wanted: readonly Wanted[], found: Candidate[]): void {
  const grid = around.free.grid(day.weekday);
  const open = openOn(around, day, wanted, grid);
  if (open.length === 0) return;
  const starts = startsOf(grid, open);
  for (const start of starts as readonly Minute[]) {
    const startsAt = day.at(start);
    const isPast = startsAt <= around.input.now;
    const onGrid = starts === grid || grid.includes(start);
    for (const { item, lift, rules, published, shut } of open) {
      // A published start off the grid is kept for its own lift alone.
      if (!onGrid && start !== published) continue;
      shut.tried(1);
      if (isPast) shut.past();
      else if (!rules.isOpen(startsAt, start)) rules.countShut(startsAt, start, shut);
      else {
        const endsAt = (startsAt + lift.minutes) as Instant;
        found.push({ item, day: day.day, start, startsAt, endsAt, cost: rules.points(startsAt, start) });
      }
    }
  }
}

/** Legal places by day, start and item, with what each costs by itself; counts in `shut` what the rules shut. */
export function candidatesOf(around: Surroundings, wanted: readonly Wanted[]): readonly Candidate[] {
  const { bout } = around.input;
  const found: Candidate[] = [];
  // Farthest week first: that is the order of days.
  const weeks = [...new Set(wanted.map(({ slot }) => slot.week))].sort((a, b) => b - a);
  for (const week of weeks) {
    const ofWeek = wanted.filter(({ slot }) => slot.week === week);
    const { from, to } = weekSpan(bout.day, week);
    for (let day = from; day <= to; day = (day + 1) as Day) {
      addDay(around, around.dayOf(day), ofWeek, found);
    }
  }
  return found;
}
