import type { Item, Phase } from "../types";
import type { Block } from "./blocks";
import { turnsOf, type Weights } from "./base-weights";
import {
  QUALITIES,
  type Aim,
  type Equipment,
  type Exercise,
  type Limitation,
  type Quality,
} from "./exercise";
import type { Slot } from "./slots";

/** An exercise that may fill a slot. */
export interface Candidate {
  readonly exercise: Exercise;
  readonly aim: Aim;
  /** Index into the slot's tiers. */
  readonly tier: number;
  /** Fit, without the week's turn. */
  readonly score: number;
}

/* Weights of the choice: common practice, no published source. */

/** A quality that is not the exercise's main one counts this much. */
const SECOND = 0.4;
/** What the base wants, whichever quality of the exercise gives it. */
const BASE_BONUS = 0.1;
/** A quality whose turn it is. */
const TURN = 3;
/** A main quality that the session already has. */
const AGAIN = 0.4;
/** Work that belongs to this part of the camp: Lee & McGill 2017, J Sports Sci 35:1768-1780 (direction only). */
const TIMELY = 1.4;
/** A lift whose kilograms can be said. */
const SAYS_LOAD = 1.25;
/** Within this share of the best score, exercises take turns. */
const NEAR = { stays: 0.85, rotates: 0.7 } as const;
/** How many take turns: of main lifts, of the others. */
const POOL = { stays: 2, rotates: 4 } as const;
/** Turns before the order of qualities begins anew. */
const TURNS = 12;

export const isEarly = (phase: Phase): boolean => phase === "foundation" || phase === "strength";

/** Everything it needs is there, and nothing rules it out. */
export function isAllowed(
  exercise: Exercise,
  equipment: ReadonlySet<Equipment>,
  limitations: ReadonlySet<Limitation>,
): boolean {
  return (
    exercise.equipment.every((thing) => equipment.has(thing)) &&
    !exercise.ruledOutBy.some((limitation) => limitations.has(limitation))
  );
}

/** The first tier of a slot that the exercise fits, and the aim it has there; null where its main quality is not wanted. */
export function fitOf(slot: Slot, exercise: Exercise): { readonly tier: number; readonly aim: Aim } | null {
  if (slot.wanted[exercise.qualities[0]] === undefined) return null;
  for (const [tier, { aims, main }] of slot.tiers.entries()) {
    if (main && !exercise.main) continue;
    const aim = aims.find((name) => exercise.doses[name] !== undefined);
    if (aim) return { tier, aim };
  }
  return null;
}

/** The aim a coach's own choice gets in a slot: one of the slot's where it has it, else its first. */
export function aimIn(slot: Slot, exercise: Exercise): Aim | null {
  for (const { aims } of slot.tiers) {
    const aim = aims.find((name) => exercise.doses[name] !== undefined);
    if (aim) return aim;
  }
  return (["volume", "hold", "fast", "heavy"] as const).find((name) => exercise.doses[name]) ?? null;
}

/** What counts for the part of the camp: held and anti-motion work early, fast turns late. */
function timely(slot: Slot, { qualities, intent }: Exercise, aim: Aim, early: boolean): number {
  if (slot.work !== "trunk") return 1;
  const still = intent === "held" || aim === "hold" || qualities[0] === "anti-rotation";
  const fast = intent === "explosive" && qualities[0] === "rotation";
  return (early ? still : fast) ? TIMELY : 1;
}

/** Loaded fast lifts: those whose zone of most power meets the session's percent come first. */
function zoned(slot: Slot, { powerZone, load }: Exercise, light: number): number {
  if (slot.id !== "ballistic-lower") return 1;
  if (powerZone) return powerZone.low <= light ? 2 : 1.3;
  return load === "body" ? 0.8 : 1;
}

function scoreOf(slot: Slot, exercise: Exercise, aim: Aim, weights: Weights, early: boolean): number {
  const wanted = (quality: Quality): number =>
    (slot.wanted[quality] ?? 0) * (slot.byBase ? weights[quality] : 1);
  let score = 0;
  for (const [index, quality] of exercise.qualities.entries()) {
    score += wanted(quality) * (index === 0 ? 1 : SECOND) + BASE_BONUS * weights[quality];
  }
  const said = slot.work === "heavy" && exercise.load === "best" ? SAYS_LOAD : 1;
  // 30 % of best: where ballistic work of the engine's menu ends.
  return score * said * timely(slot, exercise, aim, early) * zoned(slot, exercise, 30);
}

const byRank = (a: Candidate, b: Candidate): number =>
  a.tier - b.tier || b.score - a.score || (a.exercise.id < b.exercise.id ? -1 : 1);

/** Legal candidates of a slot, best first, whatever the week. */
export function candidatesOf(
  slot: Slot,
  allowed: readonly Exercise[],
  weights: Weights,
  early: boolean,
): readonly Candidate[] {
  return allowed
    .flatMap((exercise): Candidate[] => {
      const fit = fitOf(slot, exercise);
      return fit ? [{ exercise, ...fit, score: scoreOf(slot, exercise, fit.aim, weights, early) }] : [];
    })
    .sort(byRank);
}

/** The order in which a slot's qualities take their turns; empty for slots that the base does not weigh. */
export function slotTurns(slot: Slot, weights: Weights): readonly Quality[] {
  if (!slot.byBase || slot.stays) return [];
  const among = QUALITIES.filter((quality) => slot.wanted[quality] !== undefined);
  return turnsOf(among, (quality) => (slot.wanted[quality] ?? 0) * weights[quality], TURNS);
}

/** What the choice of one session depends on beside the candidates. */
export interface Moment {
  readonly item: Item;
  /** Weeks out. */
  readonly week: number;
  readonly block: Block;
  /** Differs between the items of a week, so that they do not pick the same. */
  readonly shift: number;
  readonly used: ReadonlySet<string>;
  readonly usedQualities: ReadonlySet<Quality>;
  /** Whether a best of the exercise was known when the block began. */
  readonly known: (exercise: Exercise) => boolean;
}

/**
 * Candidates in the order in which this session would take them: those near the best score of the first tier in turns (main lifts by
 * block, others by camp week), then the rest by rank. What the session already uses is left out.
 */
export function inTurn(
  slot: Slot,
  candidates: readonly Candidate[],
  turns: readonly Quality[],
  place: number,
  moment: Moment,
): readonly Candidate[] {
  const { week, shift, block, used, usedQualities, known } = moment;
  // 5 and 7 share no factor with a turn of 12: qualities and exercises drift against each other.
  const turn = turns.length > 0 ? turns[(week * 5 + shift * 7 + place) % turns.length] : undefined;
  const open = candidates.filter(({ exercise }) => !used.has(exercise.id));
  const first = open[0]?.tier;
  const scored = open
    .filter(({ tier }) => tier === first)
    .map((candidate): Candidate => {
      const quality = candidate.exercise.qualities[0];
      const factor =
        (quality === turn ? TURN : 1) *
        (slot.byBase && !slot.stays && usedQualities.has(quality) ? AGAIN : 1) *
        (slot.stays && known(candidate.exercise) ? SAYS_LOAD : 1);
      return factor === 1 ? candidate : { ...candidate, score: candidate.score * factor };
    })
    .sort(byRank);
  const most = scored[0]?.score ?? 0;
  const near = scored
    .filter(({ score }) => score >= (slot.stays ? NEAR.stays : NEAR.rotates) * most)
    .slice(0, slot.stays ? POOL.stays : POOL.rotates);
  const start = near.length > 0 ? (slot.stays ? block.index : week + shift) % near.length : 0;
  const rest = [...scored.slice(near.length), ...open.filter(({ tier }) => tier !== first)];
  return [...near.slice(start), ...near.slice(0, start), ...rest];
}
