import { blocksOf } from "./blocks";
import { libraryOf } from "./library";
import { prescribeLift } from "./session";
import type { PrescribedLift, PrescriptionInput } from "./types";

/**
 * What is in each lifting session of a plan, in the order of `lifts`. Same input, same answer, to the byte, whatever the order of
 * exercises and bests; the input is not changed. Never throws.
 *
 * Equipment and limitations are never broken, also by a swap or an edit: one that they rule out does not stand, and its line
 * says so. Sets of the lines add up to the lift's, unless a coach wrote over sets, no slot has a legal exercise, or every open
 * slot has reached the end of the lift-count table (`empty` says so).
 */
export function prescribe(input: PrescriptionInput): readonly PrescribedLift[] {
  const library = libraryOf(input);
  const blocks = blocksOf(input.lifts);
  return input.lifts.map((lift) =>
    prescribeLift(lift, library, blocks.get(lift.week) ?? { index: 0, from: lift.day }),
  );
}
