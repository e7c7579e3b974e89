import { isWeaker, type Memories } from "./bans";
import type { Ways } from "./ways";

/** The states after a day, each with the best way to it. One state a position in each list. */
export class Layer {
  readonly key: number[] = [];
  readonly memory: number[] = [];
  readonly cost: number[] = [];
  /** Sum of starts. */
  readonly starts: number[] = [];
  /** Way up to the day before; after `settle` up to this day. */
  readonly way: number[] = [];
  readonly #chosen: number[] = [];
  readonly #lists = [this.key, this.memory, this.cost, this.starts, this.way, this.#chosen];
  /** Position + 1 by state, 0 for none. Memories are numbered anew in each layer, which keeps it small. */
  #table: Int32Array;
  readonly #localOf: number[] = [];
  #locals: number[] = [];

  /** Keys are below `size`. */
  constructor(
    private readonly size: number,
    private readonly ways: Ways,
  ) {
    // Room for the few memories that most camps need at once.
    this.#table = new Int32Array(8 * size);
  }

  /** A way to a state: kept where it is the first or the best. */
  offer(key: number, memory: number, cost: number, starts: number, way: number, chosen: number): void {
    const place = this.#placeOf(key, memory);
    const at = (this.#table[place] ?? 0) - 1;
    if (at < 0) {
      this.#table[place] = this.key.push(key);
      this.memory.push(memory);
      this.cost.push(cost);
      this.starts.push(starts);
      this.way.push(way);
      this.#chosen.push(chosen);
      return;
    }
    if (this.compare(at, cost, starts, way, chosen) <= 0) return;
    this.cost[at] = cost;
    this.starts[at] = starts;
    this.way[at] = way;
    this.#chosen[at] = chosen;
  }

  /** Negative where the state's way is better than another: cost, then the sum of starts, then the order of items. */
  compare(at: number, cost: number, starts: number, way: number, chosen: number): number {
    return (
      (this.cost[at] ?? 0) - cost ||
      (this.starts[at] ?? 0) - starts ||
      this.ways.byItems(this.way[at] ?? 0, this.#chosen[at] ?? -1, way, chosen)
    );
  }

  /** Ends the day: the ways take in what was chosen on it. */
  settle(memories: Memories): void {
    for (let at = 0; at < this.key.length; at++) {
      this.#table[this.#placeOf(this.key[at] ?? 0, this.memory[at] ?? 0)] = 0;
    }
    for (const memory of this.#locals) this.#localOf[memory] = 0;
    if (this.#locals.length > 1) this.#dropBeaten(memories);
    this.#locals = [];
    for (let at = 0; at < this.key.length; at++) {
      this.way[at] = this.ways.add(this.way[at] ?? 0, this.#chosen[at] ?? -1);
      this.#chosen[at] = -1;
    }
  }

  clear(): void {
    for (const list of this.#lists) list.length = 0;
  }

  /** Without states that cost no less than one of the same key that forbids no more: however it goes on, that is better. */
  #dropBeaten(memories: Memories): void {
    const { key, memory, cost, starts } = this;
    if (new Set(key).size === key.length) return;
    const order = key.map((_, at) => at);
    order.sort(
      (a, b) =>
        (key[a] ?? 0) - (key[b] ?? 0) ||
        (cost[a] ?? 0) - (cost[b] ?? 0) ||
        (starts[a] ?? 0) - (starts[b] ?? 0),
    );
    const kept: number[] = [];
    let first = 0;
    for (const at of order) {
      if (key[kept[first] ?? -1] !== key[at]) first = kept.length;
      let beaten = false;
      for (let n = first; n < kept.length && !beaten; n++) {
        const other = kept[n] ?? 0;
        // Where both score the same the order of items would have to tell, so both stay.
        const better = cost[other] !== cost[at] || starts[other] !== starts[at];
        beaten = better && isWeaker(memories.bansOf(memory[other] ?? 0), memories.bansOf(memory[at] ?? 0));
      }
      if (!beaten) kept.push(at);
    }
    if (kept.length === key.length) return;
    for (const list of this.#lists) {
      const values = kept.map((at) => list[at] ?? 0);
      list.length = 0;
      for (const value of values) list.push(value);
    }
  }

  #placeOf(key: number, memory: number): number {
    let local = this.#localOf[memory] ?? 0;
    if (local === 0) {
      local = this.#locals.push(memory);
      this.#localOf[memory] = local;
      if (this.#table.length < local * this.size) {
        const wider = new Int32Array(2 * local * this.size);
        wider.set(this.#table);
        this.#table = wider;
      }
    }
    return (local - 1) * this.size + key;
  }
}
