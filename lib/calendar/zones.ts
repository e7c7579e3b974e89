import { tzOffset } from "@date-fns/tz/tzOffset";
import type { Day, Instant, Minute, OffsetStep } from "@/lib/engine/types";

/**
 * Civil time and instants: the one place where a time zone is looked up. Offsets come from the runtime's own zone data
 * through `Intl`, which is slow, so that transitions are found once a zone and block of days and kept.
 */

const DAY_MINUTES = 1440;
const MINUTE_MS = 60_000;
const DAY_MS = 86_400_000;
/** Days measured at once; a camp of 20 weeks meets three blocks. */
const BLOCK_DAYS = 64;
/** Keeps a caller who asks for every century from filling the memory; a gym needs a dozen. */
const MOST_BLOCKS = 1000;

interface Block {
  /** Minutes east of UTC at the block's first instant. */
  readonly offset: number;
  /** Instants in milliseconds from which another offset holds. */
  readonly changes: readonly { readonly at: number; readonly offset: number }[];
}

const blocks = new Map<string, Block>();

/** Whole minutes east of UTC; seconds of local mean time, before zones were in use, are rounded. */
const offsetAt = (zone: string, ms: number): number => {
  const offset = tzOffset(zone, new Date(ms));
  if (Number.isNaN(offset)) throw new RangeError(`Not a time zone: ${zone}`);
  return Math.round(offset);
};

/** First whole minute in (`low`, `high`] at which the offset is no longer that of `low`. */
function changeBetween(zone: string, low: number, high: number, before: number): number {
  let [same, other] = [low, high];
  while (other - same > MINUTE_MS) {
    const middle = Math.floor((same + other) / 2 / MINUTE_MS) * MINUTE_MS;
    if (offsetAt(zone, middle) === before) same = middle;
    else other = middle;
  }
  return other;
}

/** Measured once a day: no zone has changed twice within one since zones are kept. */
function measure(zone: string, first: number): Block {
  const start = first * BLOCK_DAYS * DAY_MS;
  const offset = offsetAt(zone, start);
  const changes: { at: number; offset: number }[] = [];
  let last = offset;
  for (let day = 0; day < BLOCK_DAYS; day++) {
    const [low, high] = [start + day * DAY_MS, start + (day + 1) * DAY_MS];
    const next = offsetAt(zone, high);
    if (next !== last) changes.push({ at: changeBetween(zone, low, high, last), offset: next });
    last = next;
  }
  return { offset, changes };
}

function blockOf(zone: string, index: number): Block {
  const key = `${zone} ${index}`;
  const known = blocks.get(key);
  if (known) return known;
  if (blocks.size >= MOST_BLOCKS) blocks.clear();
  const block = measure(zone, index);
  blocks.set(key, block);
  return block;
}

/** Steps of one zone that cover the civil days `from` to `to`, with a day to spare on both sides. */
function stepsOf(zone: string, from: Day, to: Day): OffsetStep[] {
  const first = Math.floor((from - 2) / BLOCK_DAYS);
  const last = Math.floor((to + 2) / BLOCK_DAYS);
  const steps: OffsetStep[] = [];
  let before = blockOf(zone, first).offset;
  steps.push({ from: first * BLOCK_DAYS * DAY_MINUTES + before, offset: before });
  for (let index = first; index <= last; index++) {
    for (const { at, offset } of blockOf(zone, index).changes) {
      // The later of the two wall readings: before it the old offset holds, in the gap as in the overlap.
      steps.push({ from: at / MINUTE_MS + Math.max(before, offset), offset });
      before = offset;
    }
  }
  return steps;
}

const offsetHolding = (steps: readonly OffsetStep[], civil: number): number =>
  (steps.findLast((step) => step.from <= civil) ?? steps[0])?.offset ?? 0;

/**
 * Offsets for the wall clock of an athlete who lives in `homeZone` until the midnight that begins `venueFrom`, and in
 * `venueZone` from then on; they hold for the days `from` to `to`, both inclusive. A wall time in a gap moves forward by
 * the gap, one in an overlap takes the first. Throws `RangeError` for a zone that the runtime does not know.
 */
export function offsetSteps(span: {
  readonly homeZone: string;
  readonly venueZone: string;
  readonly from: Day;
  readonly to: Day;
  readonly venueFrom: Day;
}): OffsetStep[] {
  const { homeZone, venueZone, from, to, venueFrom } = span;
  const start = from * DAY_MINUTES;
  const change = venueFrom * DAY_MINUTES;
  const home = stepsOf(homeZone, from, to);
  const venue = homeZone === venueZone ? home : stepsOf(venueZone, from, to);
  const lived = [
    { from: start, offset: offsetHolding(change <= start ? venue : home, start) },
    ...home.filter((step) => step.from > start && step.from < change),
    ...(change > start ? [{ from: change, offset: offsetHolding(venue, change) }] : []),
    ...venue.filter((step) => step.from > Math.max(start, change)),
  ];
  return lived.filter(
    (step, index) => step.offset !== lived[index - 1]?.offset && step.from < (to + 1) * DAY_MINUTES,
  );
}

/** True for a name of the IANA time zone database that this runtime knows. */
export function isTimeZone(name: string): boolean {
  return name !== "" && !Number.isNaN(tzOffset(name, new Date(0)));
}

/** The instant of a `Date`: whole minutes, the begun one counts as not yet over. */
export const instantOf = (date: Date): Instant => Math.floor(date.getTime() / MINUTE_MS) as Instant;

/** The `Date` of an instant. */
export const dateOf = (instant: Instant): Date => new Date(instant * MINUTE_MS);

/** What calendar and clock on the wall of `zone` show at `now`. */
export function civilNow(zone: string, now: Date): { day: Day; minute: Minute } {
  const civil = instantOf(now) + offsetAt(zone, now.getTime());
  const day = Math.floor(civil / DAY_MINUTES);
  return { day: day as Day, minute: (civil - day * DAY_MINUTES) as Minute };
}
