import type { PlacementProblem } from "../../types";
import type { Option } from "./options";
import type { Timeline } from "./timeline";

/** What has to be settled by the end of a day: its price is paid where its bit is not set by then. */
export interface Closing {
  readonly bit: number;
  readonly price: number;
}

export interface AgendaDay {
  readonly options: readonly Option[];
  /** Bits that are set where the day stays without a lift: weeks that have their free day then. */
  readonly freeBits: number;
  readonly closings: readonly Closing[];
  /** Bits of `closings`. */
  readonly closingBits: number;
}

export interface Agenda {
  readonly days: readonly AgendaDay[];
  /** Bit of each item: set once it is placed. 0 for an item that no day can take. */
  readonly itemBits: readonly number[];
  /** Bits in use at once are below this. */
  readonly size: number;
  /** Paid whatever is chosen. */
  readonly lost: number;
}

/** Something open from its first day to its last. */
interface Span {
  from: number;
  to: number;
  readonly price: number;
  readonly item: number | null;
  readonly free: readonly number[];
}

/** Items with a day that can take them. */
function itemSpans(problem: PlacementProblem, byDay: readonly (readonly Option[])[]): Span[] {
  const spans = new Map<number, Span>();
  byDay.forEach((options, day) => {
    for (const { item } of options) {
      const known = spans.get(item);
      if (known) known.to = day;
      else spans.set(item, { from: day, to: day, price: problem.items[item]?.unplaced ?? 0, item, free: [] });
    }
  });
  return [...spans.values()];
}

/** Weeks whose free days could all be taken; the others have a free day whatever is chosen. */
function weekSpans(
  problem: PlacementProblem,
  timeline: Timeline,
  byDay: readonly (readonly Option[])[],
): Span[] {
  return problem.weekly.flatMap(({ freeDays, noRestCost }): Span[] => {
    const free = freeDays.map((day) => day - timeline.first);
    const takers = new Set(free.flatMap((day) => byDay[day]?.map(({ item }) => item) ?? []));
    const canFill = takers.size >= free.length && free.every((day) => (byDay[day]?.length ?? 0) > 0);
    if (free.length === 0 || !canFill) return [];
    return [{ from: Math.min(...free), to: Math.max(...free), price: noRestCost, item: null, free }];
  });
}

/** Days with what can be chosen on them and what ends with them. Bits are used again by what opens later. */
export function agendaOf(
  problem: PlacementProblem,
  timeline: Timeline,
  byDay: readonly (readonly Option[])[],
): Agenda {
  const spans = [...itemSpans(problem, byDay), ...weekSpans(problem, timeline, byDay)];
  spans.sort((a, b) => a.from - b.from);
  const busyUntil: number[] = [];
  const itemBits = problem.items.map(() => 0);
  const days = byDay.map((options) => ({ options, freeBits: 0, closings: [] as Closing[], closingBits: 0 }));
  for (const { from, to, price, item, free } of spans) {
    const idle = busyUntil.findIndex((last) => last < from);
    const place = idle < 0 ? busyUntil.length : idle;
    busyUntil[place] = to;
    const bit = 1 << place;
    if (item !== null) itemBits[item] = bit;
    for (const day of free) {
      const open = days[day];
      if (open) open.freeBits |= bit;
    }
    const last = days[to];
    if (last) {
      last.closings.push({ bit, price });
      last.closingBits |= bit;
    }
  }
  const withoutDay = problem.items.reduce(
    (sum, { unplaced }, item) => (itemBits[item] === 0 ? sum + unplaced : sum),
    0,
  );
  const withoutRest = problem.weekly.reduce(
    (sum, { freeDays, noRestCost }) => (freeDays.length === 0 ? sum + noRestCost : sum),
    0,
  );
  return { days, itemBits, size: 1 << busyUntil.length, lost: withoutDay + withoutRest };
}
