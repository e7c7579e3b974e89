import type { StrikingBase } from "../types";

/** What a movement trains. */
export const QUALITIES = [
  "rotation",
  "anti-rotation",
  "trunk-flexion",
  "lateral-trunk",
  "lateral-push",
  "hip-flexion",
  "posterior-chain",
  "knee-dominant",
  "press",
  "pull",
  "neck",
  "grip",
  "jump",
  "throw",
  "calf-and-foot",
  "mobility",
] as const;
export type Quality = (typeof QUALITIES)[number];

/**
 * How the load of an exercise is said.
 * - best     percent of the best (1RM) of `bestOf`; kilograms where that best is known, else repetitions in reserve.
 * - reserve  a load that leaves some repetitions in reserve.
 * - body     body mass, or the range of motion sets the difficulty.
 * - throw    a ball that still flies fast.
 * - none     nothing to load (mobility).
 */
export const LOAD_MODELS = ["best", "reserve", "body", "throw", "none"] as const;
export type LoadModel = (typeof LOAD_MODELS)[number];

/** How it is moved: as fast as possible, under control both ways, or held still. */
export const INTENTS = ["explosive", "controlled", "held"] as const;
export type Intent = (typeof INTENTS)[number];

/**
 * What a set is for.
 * - heavy   few repetitions near the best.
 * - volume  more repetitions, some in reserve.
 * - fast    moved at full speed, far from failure.
 * - hold    `reps` are seconds.
 */
export const AIMS = ["heavy", "volume", "fast", "hold"] as const;
export type Aim = (typeof AIMS)[number];

/** What must be there to do it; body mass and floor always are. */
export const EQUIPMENT = [
  "barbell",
  "rack",
  "trap-bar",
  "dumbbell",
  "kettlebell",
  "plate",
  "cable",
  "band",
  "medicine-ball",
  "pull-up-bar",
  "bench",
  "extension-bench",
  "box",
  "landmine",
  "sled",
  "rope",
  "neck-harness",
  "heavy-bag",
] as const;
export type Equipment = (typeof EQUIPMENT)[number];

/** What an athlete must leave out: a place and what it does not stand. */
export const LIMITATIONS = [
  "shoulder-overhead",
  "shoulder-press",
  "elbow",
  "wrist",
  "neck",
  "low-back-load",
  "low-back-twist",
  "hip-deep",
  "groin",
  "hamstring",
  "knee-deep",
  "knee-impact",
  "ankle",
  "rib",
] as const;
export type Limitation = (typeof LIMITATIONS)[number];

/** Whole numbers, both ends included. */
export interface Range {
  readonly low: number;
  readonly high: number;
}

/** Working sets and the repetitions of each (seconds for the aim `hold`); a side each where `sides` is `each`. */
export interface AimDose {
  readonly sets: Range;
  readonly reps: Range;
}

export interface Exercise {
  /** Stable, kebab-case. */
  readonly id: string;
  readonly name: string;
  /** What it trains, the main one first; at least one. */
  readonly qualities: readonly [Quality, ...Quality[]];
  /** May be the main lift of a strength session: a big lift that takes heavy loads safely. */
  readonly main: boolean;
  readonly load: LoadModel;
  /** Whose best the percentage is of (own id where left out); for the load model `best`. */
  readonly bestOf?: string;
  /** Percent of best at which it gives most power, for explosive lifts (Soriano et al. 2015). */
  readonly powerZone?: Range;
  readonly sides: "both" | "each";
  readonly intent: Intent;
  /** What it may be used for, and how much of it. An aim left out is not done with this exercise. */
  readonly doses: Readonly<Partial<Record<Aim, AimDose>>>;
  /** Rest between sets, seconds. */
  readonly rest: number;
  /** All of it is needed. */
  readonly equipment: readonly Equipment[];
  /** Any of these rules it out. */
  readonly ruledOutBy: readonly Limitation[];
  /** `last`: tires what the rest of the session needs. */
  readonly order: "any" | "last";
  /** The stretch of a mobility exercise. */
  readonly stretch?: "active" | "passive" | "against-antagonist";
  /** Id of an easier and a harder form of the same quality. */
  readonly easier: string | null;
  readonly harder: string | null;
  /** Two to four, in our own words, each at most 90 characters. */
  readonly cues: readonly string[];
}

/** Share of each striking base in an athlete's style; shares are above 0 and add up to 1. */
export type BaseMix = readonly { readonly base: StrikingBase; readonly share: number }[];
