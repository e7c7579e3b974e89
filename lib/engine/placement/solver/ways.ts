/** The ways to the states of all days, as a tree that grows by one level a day. */
export class Ways {
  readonly #parents = [-1];
  readonly #choices = [-1];

  /** `itemOf`: item of each candidate. */
  constructor(private readonly itemOf: Int32Array) {}

  /** A way that goes on from `parent` with a candidate, or with none (-1). */
  add(parent: number, chosen: number): number {
    this.#parents.push(parent);
    return this.#choices.push(chosen) - 1;
  }

  /** Candidates along a way. */
  chosenOn(way: number): number[] {
    const chosen: number[] = [];
    for (let at = way; at >= 0; at = this.#parents[at] ?? -1) {
      const choice = this.#choices[at] ?? -1;
      if (choice >= 0) chosen.push(choice);
    }
    return chosen;
  }

  /**
   * The order of items between two ways of the same length, each with one more choice: on the first day on which they
   * differ the item that comes first is better, and any lift better than none. Negative where the first way is better.
   */
  byItems(wayA: number, chosenA: number, wayB: number, chosenB: number): number {
    let order = this.#rank(chosenA) - this.#rank(chosenB);
    let [a, b] = [wayA, wayB];
    // Ways that have met are the same before: mostly a few days back.
    while (a !== b) {
      const earlier = this.#rank(this.#choices[a] ?? -1) - this.#rank(this.#choices[b] ?? -1);
      if (earlier !== 0) order = earlier;
      a = this.#parents[a] ?? -1;
      b = this.#parents[b] ?? -1;
    }
    return order;
  }

  #rank(chosen: number): number {
    return chosen < 0 ? 2 ** 31 : (this.itemOf[chosen] ?? 0);
  }
}
