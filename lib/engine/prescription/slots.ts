import type { Item } from "../types";
import type { Aim, Quality } from "./exercise";

/** What the work is, in the order in which a session does it: fast while fresh, then heavy, the small things, the trunk. */
export const WORK = ["warm-up", "fast", "heavy", "accessory", "trunk"] as const;
export type Work = (typeof WORK)[number];

/**
 * A way to fill a slot: what the sets are for; `main` asks for a main lift, `light` leaves out fast lifts whose zone of most power
 * begins above that of jump squats.
 */
export interface Tier {
  readonly aims: readonly Aim[];
  readonly main?: true;
  readonly light?: true;
}

/** A place in a session. */
export interface Slot {
  /** Stable within an item; edits hang on it. */
  readonly id: string;
  readonly purpose: string;
  readonly work: Work;
  /** Main qualities that fit, and how well, 0 to 1. */
  readonly wanted: Readonly<Partial<Record<Quality, number>>>;
  /** The athlete's striking base weighs the wanted qualities, and they take turns. */
  readonly byBase: boolean;
  /** Stays for a block; others change every camp week. */
  readonly stays: boolean;
  /** Best first; a later one is used only where an earlier one has no exercise. */
  readonly tiers: readonly Tier[];
  /** Part of the session's sets, against the other slots'. */
  readonly share: number;
  /** Opened only when the sets are more than the others take. */
  readonly extra: boolean;
}

type Given = Pick<Slot, "id" | "purpose" | "work" | "wanted" | "tiers" | "share"> & Partial<Slot>;
const slot = (given: Given): Slot => ({ byBase: false, stays: false, extra: false, ...given });

const HEAVY: readonly Tier[] = [{ aims: ["heavy"], main: true }, { aims: ["heavy"] }, { aims: ["volume"] }];
const VOLUME: readonly Tier[] = [{ aims: ["volume"] }, { aims: ["heavy"] }, { aims: ["hold"] }];
const TRUNK: readonly Tier[] = [{ aims: ["hold", "volume"] }, { aims: ["heavy"] }];
const TRUNK_LATE: readonly Tier[] = [{ aims: ["fast", "hold", "volume"] }, { aims: ["heavy"] }];
const FAST_LIGHT: readonly Tier[] = [{ aims: ["fast"], light: true }];
const FAST: readonly Tier[] = [...FAST_LIGHT, { aims: ["fast"] }];

const TRUNK_QUALITIES = { rotation: 1, "anti-rotation": 1, "trunk-flexion": 1, "lateral-trunk": 1 } as const;

const mainLower = (share: number): Slot =>
  slot({
    id: "main-lower",
    purpose: "Heavy legs",
    work: "heavy",
    wanted: { "knee-dominant": 1, "posterior-chain": 1, "lateral-push": 0.8 },
    byBase: true,
    stays: true,
    tiers: HEAVY,
    share,
  });

const lower = (number: number, share: number, over: Partial<Slot> = {}): Slot =>
  slot({
    id: `lower-${number}`,
    purpose: "Legs and hips for the style",
    work: "accessory",
    wanted: {
      "lateral-push": 1,
      "posterior-chain": 1,
      "hip-flexion": 1,
      "knee-dominant": 0.7,
      "calf-and-foot": 0.7,
    },
    byBase: true,
    tiers: VOLUME,
    share,
    ...over,
  });

const trunk = (number: number, share: number, over: Partial<Slot> = {}): Slot =>
  slot({
    id: `trunk-${number}`,
    purpose: "Trunk for the style",
    work: "trunk",
    wanted: TRUNK_QUALITIES,
    byBase: true,
    tiers: TRUNK,
    share,
    ...over,
  });

/** A ballistic lift loaded where it gives most power; a jump where nothing can be loaded. */
const ballisticLower = (share: number): Slot =>
  slot({
    id: "ballistic-lower",
    purpose: "Fast legs against a load",
    work: "fast",
    wanted: { "knee-dominant": 1, "posterior-chain": 0.9, jump: 0.9, "lateral-push": 0.7 },
    stays: true,
    tiers: FAST,
    share,
  });

const jump = (share: number, over: Partial<Slot> = {}): Slot =>
  slot({
    id: "jump",
    purpose: "Jumps",
    work: "fast",
    wanted: { jump: 1, "calf-and-foot": 0.4, "knee-dominant": 0.3, "posterior-chain": 0.3 },
    tiers: FAST,
    share,
    ...over,
  });

const rotationalThrow = (share: number, over: Partial<Slot> = {}): Slot =>
  slot({
    id: "throw",
    purpose: "Fast turn and throw",
    work: "fast",
    wanted: { throw: 1, rotation: 1, press: 0.3 },
    tiers: FAST,
    share,
    ...over,
  });

const fastUpper = (share: number, over: Partial<Slot> = {}): Slot =>
  slot({
    id: "fast-upper",
    purpose: "Fast press or pull",
    work: "fast",
    wanted: { press: 1, pull: 0.7, throw: 0.7 },
    tiers: FAST,
    share,
    ...over,
  });

/**
 * Slots of each item in order of importance; few sets close the later ones. Which slots, and their shares: common practice, no
 * published source. Held and anti-motion trunk work belongs to the strength items, fast rotation to the power items: isometric
 * work raised impact, dynamic work speed (Lee & McGill 2017, J Sports Sci 35:1768-1780).
 */
const SLOTS: Readonly<Record<Item, readonly Slot[]>> = {
  "strength-a": [
    mainLower(5),
    lower(1, 4),
    trunk(1, 3.6),
    trunk(2, 3.4),
    lower(2, 3, { extra: true }),
    trunk(3, 3, { extra: true }),
  ],
  "strength-b": [
    slot({
      id: "main-press",
      purpose: "Heavy press",
      work: "heavy",
      wanted: { press: 1 },
      stays: true,
      tiers: HEAVY,
      share: 4,
    }),
    slot({
      id: "main-pull",
      purpose: "Heavy pull",
      work: "heavy",
      wanted: { pull: 1 },
      stays: true,
      tiers: HEAVY,
      share: 4,
    }),
    trunk(1, 3),
    slot({
      id: "upper",
      purpose: "Upper body, neck and grip for the style",
      work: "accessory",
      wanted: { press: 0.8, pull: 1, neck: 1, grip: 0.8 },
      byBase: true,
      tiers: VOLUME,
      share: 3,
    }),
    lower(1, 3, { extra: true }),
    trunk(2, 3, { extra: true }),
  ],
  "trunk-and-kick": [
    trunk(1, 3, { tiers: TRUNK_LATE }),
    slot({
      id: "kick",
      purpose: "Hips for the kick",
      work: "accessory",
      wanted: { "hip-flexion": 1, "lateral-push": 0.9, "posterior-chain": 0.6, "calf-and-foot": 0.5 },
      byBase: true,
      tiers: VOLUME,
      share: 3,
    }),
    trunk(2, 3, { tiers: TRUNK_LATE }),
    slot({
      id: "neck-and-grip",
      purpose: "Neck and grip",
      work: "accessory",
      wanted: { neck: 1, grip: 0.7 },
      byBase: true,
      tiers: VOLUME,
      share: 3,
    }),
    trunk(3, 3, { extra: true }),
    lower(1, 3, { extra: true }),
  ],
  "power-touch": [jump(3), rotationalThrow(3), fastUpper(2), trunk(1, 3, { extra: true })],
  "power-a": [
    ballisticLower(4),
    jump(3),
    rotationalThrow(3),
    trunk(1, 2, { tiers: TRUNK_LATE }),
    fastUpper(3, { extra: true }),
  ],
  "strength-keep": [
    mainLower(3.5),
    slot({
      id: "main-upper",
      purpose: "Heavy press or pull",
      work: "heavy",
      wanted: { press: 1, pull: 1 },
      byBase: true,
      stays: true,
      tiers: HEAVY,
      share: 3,
    }),
    trunk(1, 2.5),
    lower(1, 3, { extra: true }),
    trunk(2, 3, { extra: true }),
  ],
  "power-b": [
    rotationalThrow(3.5),
    jump(3),
    slot({
      id: "fast-turn",
      purpose: "Fast turn against a load",
      work: "fast",
      wanted: { rotation: 1, throw: 0.5, "lateral-push": 0.4 },
      tiers: [{ aims: ["fast"] }, { aims: ["volume"] }],
      share: 3,
    }),
    fastUpper(2.5),
    trunk(1, 3, { tiers: TRUNK_LATE, extra: true }),
  ],
  "power-short": [ballisticLower(3), jump(3), rotationalThrow(2), fastUpper(2, { extra: true })],
  // Ballistic and fast work only, far from failure: it wakes up, it does not tire.
  primer: [
    jump(2, { tiers: FAST_LIGHT }),
    rotationalThrow(2, { tiers: FAST_LIGHT }),
    fastUpper(2, { tiers: FAST_LIGHT }),
  ],
};

/** Places of a session of this item, most important first. */
export const slotsOf = (item: Item): readonly Slot[] => SLOTS[item];
