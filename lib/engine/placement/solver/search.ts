import type { Agenda, AgendaDay } from "./agenda";
import { Memories, type Ban } from "./bans";
import { Layer } from "./layer";
import type { Option } from "./options";
import type { Reach } from "./reach";
import { Ways } from "./ways";

export interface Best {
  readonly cost: number;
  readonly chosen: readonly number[];
}

const isBanned = ({ heavy, startsAt, endsAt }: Option, bans: readonly Ban[]): boolean => {
  for (const ban of bans) {
    if ((heavy || !ban.heavyOnly) && startsAt < ban.until && endsAt > ban.from) return true;
  }
  return false;
};

/**
 * Goes through the days and keeps, for each state, the best way to it. The state holds all that the days to come can
 * depend on: which open items are placed and which open weeks have had their free day (bits), on which of the last days a
 * lift stood (for the spread), and which later starts the lifts chosen so far forbid (memory, mostly none). So the best
 * way to the end goes by the best way to one of the states before it: the optimum is exact, in time linear in days.
 *
 * The better of two ways is the cheaper; then the one with the smaller sum of starts, so earlier days and starts; then the
 * one with the more important item on the first day on which they differ, a lift before none. Two ways continued alike
 * keep their order, so ties are exact too.
 */
export function search(
  agenda: Agenda,
  reaches: readonly Reach[],
  spread: readonly number[],
  itemOf: Int32Array,
): Best {
  const ways = new Ways(itemOf);
  const memories = new Memories();
  // Bit g - 1 of `recent`: a lift stood g days ago.
  const window = 1 << spread.length;
  const spreadCost = Array.from({ length: window }, (_, recent) =>
    spread.reduce((sum, cost, gap) => (recent & (1 << gap) ? sum + cost : sum), 0),
  );
  const size = agenda.size * window;
  let [layer, next] = [new Layer(size, ways), new Layer(size, ways)];
  layer.offer(0, 0, agenda.lost, 0, 0, -1);
  layer.settle(memories);

  const step = (day: AgendaDay, index: number): void => {
    const spent = (ban: Ban): boolean =>
      reaches.every((reach) => reach.heavyOnly !== ban.heavyOnly || ban.until <= reach.earliest(index + 1));
    const offer = (
      bits: number,
      recent: number,
      memory: number,
      cost: number,
      starts: number,
      way: number,
      chosen: number,
    ): void => {
      let points = cost;
      for (const { bit, price } of day.closings) if (!(bits & bit)) points += price;
      next.offer((bits & ~day.closingBits) * window + recent, memory, points, starts, way, chosen);
    };
    const forbids = day.options.map((option) => memories.idOf(option.bans));
    // Many states share a memory: what is left of it is asked once a day.
    const heldOf = new Map<number, number>();
    const heldIn = (memory: number): number => {
      const known = heldOf.get(memory);
      if (known !== undefined) return known;
      const held = memories.without(memory, spent);
      heldOf.set(memory, held);
      return held;
    };
    for (let at = 0; at < layer.key.length; at++) {
      const key = layer.key[at] ?? 0;
      const memory = layer.memory[at] ?? 0;
      const cost = layer.cost[at] ?? 0;
      const starts = layer.starts[at] ?? 0;
      const way = layer.way[at] ?? 0;
      const recent = key & (window - 1);
      const bits = (key - recent) / window;
      const older = (recent << 1) & (window - 1);
      const held = memory === 0 ? 0 : heldIn(memory);
      offer(bits | day.freeBits, older, held, cost, starts, way, -1);
      const near = spreadCost[recent] ?? 0;
      for (let n = 0; n < day.options.length; n++) {
        const option = day.options[n];
        if (!option) continue;
        const bit = agenda.itemBits[option.item] ?? 0;
        if (bits & bit || (memory !== 0 && isBanned(option, memories.bansOf(memory)))) continue;
        const after = memories.join(held, forbids[n] ?? 0);
        const lately = window > 1 ? older | 1 : 0;
        offer(
          bits | bit,
          lately,
          after,
          cost + option.cost + near,
          starts + option.starts,
          way,
          option.index,
        );
      }
    }
    next.settle(memories);
    [layer, next] = [next, layer];
    next.clear();
  };
  agenda.days.forEach(step);

  let best = 0;
  for (let at = 1; at < layer.key.length; at++) {
    const [cost, starts, way] = [layer.cost[best] ?? 0, layer.starts[best] ?? 0, layer.way[best] ?? 0];
    if (layer.compare(at, cost, starts, way, -1) < 0) best = at;
  }
  return { cost: layer.cost[best] ?? 0, chosen: ways.chosenOn(layer.way[best] ?? 0) };
}
