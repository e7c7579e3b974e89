import type { Day, Instant } from "../types";

/** Anything that takes time. */
export interface Span {
  readonly id: string;
  readonly title: string;
  readonly day: Day;
  readonly startsAt: Instant;
  readonly endsAt: Instant;
}

const NONE: readonly never[] = [];

/** Spans by start, to be asked for those near an instant and those of a day. The order given does not matter. */
export class Spans<T extends Span> {
  readonly list: readonly T[];
  readonly #days = new Map<Day, T[]>();
  readonly #longest: number;

  constructor(spans: readonly T[]) {
    this.list = [...spans].sort(
      (a, b) => a.startsAt - b.startsAt || (a.id < b.id ? -1 : a.id > b.id ? 1 : 0),
    );
    let longest = 0;
    for (const span of this.list) {
      longest = Math.max(longest, span.endsAt - span.startsAt);
      const known = this.#days.get(span.day);
      if (known) known.push(span);
      else this.#days.set(span.day, [span]);
    }
    this.#longest = longest;
  }

  /** Those of a civil day. */
  on(day: Day): readonly T[] {
    return this.#days.get(day) ?? NONE;
  }

  /** Those that reach into the time between two instants. */
  within(from: number, to: number): readonly T[] {
    let first = this.#firstFrom(from - this.#longest);
    while ((this.list[first]?.endsAt ?? Number.POSITIVE_INFINITY) < from) first++;
    let end = first;
    while ((this.list[end]?.startsAt ?? Number.POSITIVE_INFINITY) <= to) end++;
    return first === end ? NONE : this.list.slice(first, end);
  }

  /** First that starts at or after an instant. */
  nextFrom(instant: number): T | null {
    return this.list[this.#firstFrom(instant)] ?? null;
  }

  /** Of those that start before an instant, the one that ends last. */
  lastBefore(instant: number): T | null {
    let last: T | null = null;
    for (let at = this.#firstFrom(instant) - 1; at >= 0; at--) {
      const span = this.list[at];
      if (!span || (last && span.startsAt + this.#longest <= last.endsAt)) break;
      if (!last || span.endsAt > last.endsAt) last = span;
    }
    return last;
  }

  #firstFrom(instant: number): number {
    let [low, high] = [0, this.list.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((this.list[middle]?.startsAt ?? 0) < instant) low = middle + 1;
      else high = middle;
    }
    return low;
  }
}
