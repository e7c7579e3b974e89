import type { Group } from "./timeline";

/**
 * The least of a value over the groups from each day on, without those of a given item: the least of all with its item,
 * and the least of the other items.
 */
export class Extremes {
  readonly #least: Float64Array;
  readonly #owner: Int32Array;
  readonly #others: Float64Array;

  /** `groups` by day; for the days before a day instead, pass them backwards. */
  constructor(groups: readonly (readonly Group[])[], value: (group: Group) => number) {
    const days = groups.length;
    this.#least = new Float64Array(days + 1).fill(Number.POSITIVE_INFINITY);
    this.#owner = new Int32Array(days + 1).fill(-1);
    this.#others = new Float64Array(days + 1).fill(Number.POSITIVE_INFINITY);
    let [least, owner, others] = [Number.POSITIVE_INFINITY, -1, Number.POSITIVE_INFINITY];
    for (let day = days - 1; day >= 0; day--) {
      for (const group of groups[day] ?? []) {
        const own = value(group);
        if (group.item === owner) least = Math.min(least, own);
        else if (own < least) [least, owner, others] = [own, group.item, least];
        else others = Math.min(others, own);
      }
      this.#least[day] = least;
      this.#owner[day] = owner;
      this.#others[day] = others;
    }
  }

  /** Over all items, from `day` on. */
  from(day: number): number {
    return this.#least[day] ?? Number.POSITIVE_INFINITY;
  }

  /** Over the other items than this one, from `day` on. */
  without(item: number, day: number): number {
    return (this.#owner[day] === item ? this.#others[day] : this.#least[day]) ?? Number.POSITIVE_INFINITY;
  }
}
