import { campSpan } from "../../lib/book";
import { isoFromDay } from "../../lib/engine";
import type { Day } from "../../lib/engine/types";
import type { camps, testTrials } from "../schema";
import { chance } from "./chance";
import type { AthleteStory } from "./log-scenario";

type Trial = typeof testTrials.$inferInsert;
type Side = "both" | "left" | "right";

/** Two days of tests: the first of the camp, and two weeks later. Invented numbers. */
const DAYS_IN = [1, 15] as const;
const TRIALS = 3;

interface Tested {
  readonly kind: string;
  readonly side: Side;
  /** At the first day, for strength 1; what two weeks of camp add, and the swing from trial to trial. */
  readonly start: number;
  readonly gain: number;
  readonly swing: number;
  readonly second: number | null;
}

const TESTED: readonly Tested[] = [
  { kind: "jump-height", side: "both", start: 38, gain: 2.5, swing: 1.6, second: null },
  { kind: "jump-height", side: "left", start: 21, gain: 1, swing: 1.2, second: null },
  { kind: "jump-height", side: "right", start: 23, gain: 0.5, swing: 1.2, second: null },
  { kind: "medicine-ball-throw", side: "both", start: 8.5, gain: 0.4, swing: 0.4, second: 4 },
];

/** What an athlete's tests of a camp gave; those still ahead are left out. */
export function trialRows(
  name: string,
  story: AthleteStory,
  scope: { readonly teamId: string; readonly athleteId: string },
  camp: Pick<typeof camps.$inferSelect, "boutDate" | "weeks">,
  today: Day,
): Trial[] {
  const { from } = campSpan({ bout: { date: camp.boutDate }, weeks: camp.weeks });
  const scale = 0.7 + 0.3 * story.strength;
  return DAYS_IN.flatMap((into, round) => {
    const day = (from + into) as Day;
    if (day >= today) return [];
    return TESTED.flatMap(({ kind, side, start, gain, swing, second }) =>
      Array.from({ length: TRIALS }, (_, trial): Trial => {
        const off = (chance(name, day - from, `${kind} ${side} ${trial}`) - 0.5) * swing;
        return {
          ...scope,
          day: isoFromDay(day),
          kind,
          side,
          value: Math.round((start * scale + gain * round + off) * 10) / 10,
          second,
          massKg: story.mass,
          createdAt: new Date(day * 86_400_000 + 18 * 3_600_000),
        };
      }),
    );
  });
}
