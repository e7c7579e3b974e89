import { ITEMS, type Item } from "../types";

/** What a lifting session of one kind is. */
export interface ItemSpec {
  readonly item: Item;
  readonly title: string;
  /** Working sets before any factor. */
  readonly sets: number;
  /** Fewest working sets the session is worth doing for. */
  readonly floor: number;
  /** Expected CR-10 effort of the session. */
  readonly effort: number;
  /** Squats, pulls and the like that leave the legs slow for a day or two. */
  readonly heavyLower: boolean;
  /** Meant to be moved as fast as possible. */
  readonly explosive: boolean;
  /** Wants the freshest day of the week. */
  readonly fresh: boolean;
  /** A short session that wakes up and does not tire. */
  readonly primer: boolean;
}

type Rest = Partial<Pick<ItemSpec, "heavyLower" | "explosive" | "fresh" | "primer">>;

const spec = (
  item: Item,
  title: string,
  sets: number,
  floor: number,
  effort: number,
  rest: Rest = {},
): ItemSpec => ({
  item,
  title,
  sets,
  floor,
  effort,
  heavyLower: false,
  explosive: false,
  fresh: false,
  primer: false,
  ...rest,
});

/** Sets, floors and efforts: common practice, no published source. */
const ITEM_SPECS: Readonly<Record<Item, ItemSpec>> = {
  "strength-a": spec("strength-a", "Strength A", 16, 5, 7, { heavyLower: true, fresh: true }),
  "strength-b": spec("strength-b", "Strength B", 14, 5, 6),
  "trunk-and-kick": spec("trunk-and-kick", "Trunk and kick", 12, 4, 5),
  "power-touch": spec("power-touch", "Power touch", 8, 3, 4, { explosive: true }),
  "power-a": spec("power-a", "Power A", 12, 4, 6, { explosive: true, fresh: true }),
  "strength-keep": spec("strength-keep", "Strength keep", 9, 3, 7, { heavyLower: true }),
  "power-b": spec("power-b", "Power B", 12, 4, 5, { explosive: true }),
  "power-short": spec("power-short", "Power, short", 8, 3, 4, { explosive: true }),
  // At most about 12 fast repetitions, far from failure: Harrison et al. 2019, Sports Med 49:1487-1514 (the effect; the
  // dose is common practice).
  primer: spec("primer", "Primer", 6, 3, 3, { explosive: true, primer: true }),
};

/** What a session of this item is. */
export const itemSpec = (item: Item): ItemSpec => ITEM_SPECS[item];

/** Names that people read. */
export const ITEM_TITLES = Object.fromEntries(
  ITEMS.map((item) => [item, ITEM_SPECS[item].title]),
) as Readonly<Record<Item, string>>;
