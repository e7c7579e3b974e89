import { createHash } from "node:crypto";

/** A number from 0 to below 1 that is the same for the same words: the demo looks alive and is the same every time. */
export const chance = (...words: readonly (string | number)[]): number =>
  createHash("sha256").update(words.join(" ")).digest().readUInt32BE(0) / 2 ** 32;

/** A number from `low` to `high` in steps of `step`. */
export const between = (
  low: number,
  high: number,
  step: number,
  ...words: readonly (string | number)[]
): number => low + Math.floor(chance(...words) * (Math.round((high - low) / step) + 1)) * step;
