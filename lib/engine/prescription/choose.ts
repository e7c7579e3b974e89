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
  /** Place among the candidates of its tier and main quality: even ones belong to even weeks, odd ones to odd. */
  readonly number: number;
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
/** An exercise that belongs to the other weeks, so that accessories change from one week to the next. */
const OTHER_WEEK = 0.4;
/** A main lift as an accessory: it tires more than the session is placed for. */
const BIG_LIFT = 0.4;
/** A lift whose kilograms can be said. */
const SAYS_LOAD = 1.25;
/** Within this share of the best score, exercises take turns. */
const NEAR = { stays: 0.85, rotates: 0.7 } as const;
/** How many take turns: of main lifts, of the others. */
const POOL = { stays: 2, rotates: 4 } as const;
/** Turns before the order of qualities begins anew. */
const TURNS = 12;

/** Percent of best up to which a fast lift is light: where the zone of jump squats ends (Soriano et al. 2015). */
const LIGHT = 30;

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
  for (const [tier, { aims, main, light }] of slot.tiers.entries()) {
    if (main && !exercise.main) continue;
    if (light && (exercise.powerZone?.low ?? 0) > LIGHT) continue;
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

/** A fast lift against a load is loaded, and a jump is not, where there is a choice. */
function loaded({ id }: Slot, { powerZone, load }: Exercise): number {
  if (id === "ballistic-lower") return powerZone ? 2 : load === "body" ? 0.8 : 1;
  if (id === "jump") return load === "body" ? 1 : 0.5;
  return 1;
}

function scoreOf(slot: Slot, exercise: Exercise, aim: Aim, weights: Weights, early: boolean): number {
  const wanted = (quality: Quality): number =>
    (slot.wanted[quality] ?? 0) * (slot.byBase ? weights[quality] : 1);
  let score = 0;
  for (const [index, quality] of exercise.qualities.entries()) {
    score += wanted(quality) * (index === 0 ? 1 : SECOND) + BASE_BONUS * weights[quality];
  }
  const said = slot.work === "heavy" && exercise.load === "best" ? SAYS_LOAD : 1;
  const big = slot.work === "accessory" && exercise.main ? BIG_LIFT : 1;
  return score * said * big * timely(slot, exercise, aim, early) * loaded(slot, exercise);
}

const byRank = (a: Candidate, b: Candidate): number =>
  a.tier - b.tier || b.score - a.score || (a.exercise.id < b.exercise.id ? -1 : 1);

/** Legal candidates of a slot, best first, whatever the week; `allowed` by main quality. */
export function candidatesOf(
  slot: Slot,
  allowed: ReadonlyMap<Quality, readonly Exercise[]>,
  weights: Weights,
  early: boolean,
): readonly Candidate[] {
  const fitting: Candidate[] = [];
  for (const quality of QUALITIES) {
    if (slot.wanted[quality] === undefined) continue;
    for (const exercise of allowed.get(quality) ?? []) {
      const fit = fitOf(slot, exercise);
      if (!fit) continue;
      const { tier, aim } = fit;
      fitting.push({ exercise, tier, aim, score: scoreOf(slot, exercise, aim, weights, early), number: 0 });
    }
  }
  const seen = new Map<string, number>();
  return fitting.sort(byRank).map((candidate): Candidate => {
    const key = `${candidate.tier} ${candidate.exercise.qualities[0]}`;
    const number = seen.get(key) ?? 0;
    seen.set(key, number + 1);
    return { ...candidate, number };
  });
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
 * block, others by camp week), then the rest by rank. What the session already uses is left out. Lazy: mostly the first is taken.
 */
export function* inTurn(
  slot: Slot,
  candidates: readonly Candidate[],
  turns: readonly Quality[],
  place: number,
  moment: Moment,
): Generator<Candidate> {
  const { week, shift, block, used, usedQualities, known } = moment;
  // 5 and 7 share no factor with a turn of 12: qualities and exercises drift against each other.
  const turn = turns.length > 0 ? turns[(week * 5 + shift * 7 + place) % turns.length] : undefined;
  const open = candidates.filter(({ exercise }) => !used.has(exercise.id));
  const first = open[0]?.tier;
  const scoreOfTurn = ({ exercise, score, tier, number }: Candidate): number => {
    if (tier !== first) return 0;
    const quality = exercise.qualities[0];
    return (
      score *
      (quality === turn ? TURN : 1) *
      (slot.byBase && !slot.stays && usedQualities.has(quality) ? AGAIN : 1) *
      (slot.stays ? (known(exercise) ? SAYS_LOAD : 1) : (number + week) % 2 === 0 ? 1 : OTHER_WEEK)
    );
  };
  const scores = open.map(scoreOfTurn);
  const least = (slot.stays ? NEAR.stays : NEAR.rotates) * Math.max(0, ...scores);
  const near: Candidate[] = [];
  for (const [index, candidate] of open.entries()) {
    const score = scores[index] ?? 0;
    if (candidate.tier === first && score >= least) near.push({ ...candidate, score });
  }
  const pool = near.sort(byRank).slice(0, slot.stays ? POOL.stays : POOL.rotates);
  const start = pool.length > 0 ? (slot.stays ? block.index : Math.floor(week / 2) + shift) % pool.length : 0;
  yield* pool.slice(start);
  yield* pool.slice(0, start);
  const taken = new Set(pool.map(({ exercise }) => exercise));
  for (const candidate of open) if (!taken.has(candidate.exercise)) yield candidate;
}
