import { DAY_MINUTES, instantAt, offsetAt, weekdayOf } from "../geometry";
import type { Day, Instant, Minute, PlanInput, Weekday } from "../types";

/** A civil day and its place in time. */
export class CampDay {
  readonly weekday: Weekday;
  /** No reading of the day means an instant before `first` or after `last`. */
  readonly first: number;
  readonly last: number;
  /** The one offset of the day; null where a step falls into it. */
  readonly #offset: number | null;
  readonly #zone: PlanInput["zone"];

  constructor(
    { zone }: Pick<PlanInput, "zone">,
    readonly day: Day,
  ) {
    this.weekday = weekdayOf(day);
    this.#zone = zone;
    const from = day * DAY_MINUTES;
    const hasStep = zone.some((step) => step.from > from && step.from < from + DAY_MINUTES);
    const offset = offsetAt(zone, from);
    this.#offset = hasStep ? null : offset;
    const offsets = hasStep ? zone.map((step) => step.offset) : [offset];
    this.first = from - Math.max(...offsets);
    this.last = from + DAY_MINUTES - Math.min(...offsets);
  }

  /** The instant of a wall-clock reading, as `instantAt` has it. */
  at(minute: Minute): Instant {
    if (this.#offset === null) return instantAt(this.#zone, this.day, minute);
    return (this.day * DAY_MINUTES + minute - this.#offset) as Instant;
  }
}
