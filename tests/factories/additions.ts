import fc from "fast-check";
import type { Day, Minute, PlanInput, SportSession } from "@/lib/engine";

/** Where in a camp a session is added: as a share of its days, and a start. */
export const arbAddition = fc.record({
  // Of the camp's days; whole thousandths, since doubles are drawn by exponent and pile up at 0.
  share: fc.integer({ min: 0, max: 999 }).map((value) => value / 1000),
  start: fc.integer({ min: 0, max: 95 }).map((quarter) => quarter * 15),
});

/** A session somewhere in the camp, by default hard sparring. */
export const sessionAt = (
  input: PlanInput,
  share: number,
  start: number,
  over: Partial<SportSession> = {},
): SportSession => ({
  id: "added",
  kind: "hard-sparring",
  title: "Hard sparring",
  day: (input.bout.day - 1 - Math.floor(share * (7 * input.weeks - 1))) as Day,
  start: start as Minute,
  minutes: 60,
  effort: 8,
  ...over,
});
