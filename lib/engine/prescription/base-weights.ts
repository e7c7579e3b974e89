import { STRIKING_BASES, type StrikingBase } from "../types";
import { QUALITIES, type BaseMix, type Quality } from "./exercise";

/** How much an athlete wants each quality: 1 is as anybody does, 3 is what the style lives on. */
export type Weights = Readonly<Record<Quality, number>>;

/** Common practice, no published source. */
const PLAIN = 1;
const LIVES_ON = 3;

/**
 * What each striking base lives on: common practice, no published source. Leg drive for boxing: the legs contribute most to
 * punch force (Lenetsky, Harris & Brughelli 2013, Strength Cond J 35(2):1-7; Dunn et al. 2022, J Strength Cond Res
 * 36(4):1019-1025).
 */
const LIVES: Readonly<Record<StrikingBase, readonly Quality[]>> = {
  "whipping-round-kicks": ["rotation", "anti-rotation", "trunk-flexion"],
  "in-and-out-kicks": ["lateral-push", "rotation", "hip-flexion", "trunk-flexion"],
  "dynamic-high-kicks": ["posterior-chain", "lateral-push", "anti-rotation"],
  boxing: ["rotation", "press", "knee-dominant"],
  grappling: ["posterior-chain", "pull", "neck", "grip"],
};

/** What one base lives on, for words and tests. */
export const qualitiesOfBase = (base: StrikingBase): readonly Quality[] => LIVES[base];

/** Weights of a mix: the average of its bases by share. An empty mix wants everything alike. */
export function weightsOf(mix: BaseMix): Weights {
  const all = mix.reduce((sum, { share }) => sum + share, 0);
  const weight = (quality: Quality): number =>
    all > 0
      ? mix.reduce(
          (sum, { base, share }) => sum + (share / all) * (LIVES[base].includes(quality) ? LIVES_ON : PLAIN),
          0,
        )
      : PLAIN;
  return Object.fromEntries(QUALITIES.map((quality) => [quality, weight(quality)])) as Record<
    Quality,
    number
  >;
}

/** The base that wants a quality most, with a share above 0; null where none lives on it. */
export function baseFor(quality: Quality, mix: BaseMix): StrikingBase | null {
  let most: StrikingBase | null = null;
  let share = 0;
  for (const base of STRIKING_BASES) {
    if (!LIVES[base].includes(quality)) continue;
    const here = mix.reduce((sum, row) => (row.base === base ? sum + row.share : sum), 0);
    if (here > share) [most, share] = [base, here];
  }
  return most;
}

/**
 * Order in which qualities take their turns so that each gets its share and none comes in a lump: smooth weighted round-robin.
 * The heaviest comes first; `length` turns. Ties go to the quality named first.
 */
export function turnsOf(
  among: readonly Quality[],
  weight: (quality: Quality) => number,
  length: number,
): readonly Quality[] {
  const due = among.map((quality) => ({ quality, weight: weight(quality), credit: 0 }));
  const sum = due.reduce((all, row) => all + row.weight, 0);
  return Array.from({ length }, () => {
    for (const row of due) row.credit += row.weight;
    const next = due.reduce((best, row) => (row.credit > best.credit + 1e-9 ? row : best));
    next.credit -= sum;
    return next.quality;
  });
}

/**
 * What a slot's part of the sets is multiplied by: up to half as much again where the style lives on what it trains. Common
 * practice, no published source.
 */
export function leanOf(wanted: Readonly<Partial<Record<Quality, number>>>, weights: Weights): number {
  const most = QUALITIES.reduce(
    (top, quality) => (wanted[quality] === undefined ? top : Math.max(top, weights[quality])),
    PLAIN,
  );
  return 1 + (0.5 * (most - PLAIN)) / (LIVES_ON - PLAIN);
}
