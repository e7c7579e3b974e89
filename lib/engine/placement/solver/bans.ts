/** Starts that a chosen candidate forbids later: those before `until` of sessions that end after `from`. */
export interface Ban {
  readonly heavyOnly: boolean;
  /** Instant. */
  readonly until: number;
  /** Instant; minus infinity where nothing later ends so early, which is always so but for journeys east. */
  readonly from: number;
}

export const NO_BANS: readonly Ban[] = [];

const covers = (a: Ban, b: Ban): boolean =>
  a.until >= b.until && a.from <= b.from && (b.heavyOnly || !a.heavyOnly);

/** Everything that `weaker` forbids, `stronger` forbids too. */
export const isWeaker = (weaker: readonly Ban[], stronger: readonly Ban[]): boolean =>
  weaker.every((ban) => stronger.some((other) => covers(other, ban)));

/** Both, without what the others cover. */
export function joined(one: readonly Ban[], other: readonly Ban[]): readonly Ban[] {
  const left = one.filter((ban) => !other.some((also) => covers(also, ban)));
  const right = other.filter((ban) => !left.some((also) => covers(also, ban)));
  return [...left, ...right];
}

const keyOf = ({ heavyOnly, until, from }: Ban): string => `${heavyOnly ? "h" : "a"}${until},${from}`;

/** Two numbers of memories as one: there are far fewer than 2^26 of them. */
const pairOf = (memory: number, other: number): number => memory * 2 ** 26 + other;

/** What lifts chosen so far forbid, by number: 0 forbids nothing. Equal bans have equal numbers. */
export class Memories {
  readonly #bans: (readonly Ban[])[] = [NO_BANS];
  readonly #ids = new Map<string, number>([["", 0]]);
  /** By both numbers in one, see `pairOf`. */
  readonly #joins = new Map<number, number>();

  idOf(bans: readonly Ban[]): number {
    if (bans.length === 0) return 0;
    const [first] = bans;
    // Mostly there is one, and a list of one needs no sorting.
    const key = first && bans.length === 1 ? keyOf(first) : bans.map(keyOf).sort().join(";");
    const known = this.#ids.get(key);
    if (known !== undefined) return known;
    this.#ids.set(key, this.#bans.length);
    return this.#bans.push(bans) - 1;
  }

  bansOf(memory: number): readonly Ban[] {
    return this.#bans[memory] ?? NO_BANS;
  }

  /** The memory with the bans of another. */
  join(memory: number, other: number): number {
    if (other === 0 || memory === other) return memory;
    if (memory === 0) return other;
    const key = pairOf(memory, other);
    const known = this.#joins.get(key);
    if (known !== undefined) return known;
    const id = this.idOf(joined(this.bansOf(memory), this.bansOf(other)));
    this.#joins.set(key, id);
    return id;
  }

  /** The memory without the bans that nothing can break any more. */
  without(memory: number, spent: (ban: Ban) => boolean): number {
    const bans = this.bansOf(memory);
    return bans.some(spent) ? this.idOf(bans.filter((ban) => !spent(ban))) : memory;
  }
}
