import { campSpan } from "../../lib/book";
import { estimateBest, isoFromDay } from "../../lib/engine";
import type { Day } from "../../lib/engine/types";
import type { camps } from "../schema";
import { between, chance } from "./chance";
import { BEST_LIFTS, type AthleteStory } from "./log-scenario";

type CampRow = typeof camps.$inferSelect;
interface Scope {
  readonly teamId: string;
  readonly athleteId: string;
}

const CHECK_IN_DAYS = 28;
const at = (day: Day, hour: number): Date => new Date(day * 86_400_000 + hour * 3_600_000);

/** Rep records of the week before the camp, and the bests that they give. */
export function bestRows(story: AthleteStory, scope: Scope, day: Day) {
  return Object.entries(BEST_LIFTS).flatMap(([exerciseId, { share, reps }]) => {
    const liftedKg = 2.5 * Math.round((story.mass * story.strength * share) / 2.5);
    const best = estimateBest("epley", liftedKg, reps);
    if ("problem" in best) return [];
    const formula = "epley" as const;
    return [
      {
        ...scope,
        exerciseId,
        day: isoFromDay(day),
        liftedKg,
        reps,
        formula,
        kg: best.kg,
        createdAt: at(day, 18),
      },
    ];
  });
}

/** Two days in three, on the way down from the start to the limit, with the swing of a usual day. */
export function weightRows(name: string, story: AthleteStory, scope: Scope, camp: CampRow, today: Day) {
  const { from, to } = campSpan({ bout: { date: camp.boutDate }, weeks: camp.weeks });
  const limit = camp.limitKg ?? story.mass;
  return Array.from({ length: Math.max(0, today - from) }, (_, index) => (from + index) as Day)
    .filter((day) => day === from || chance(name, day - from, "weighed") < 0.67)
    .map((day) => {
      const way = ((day - from) / Math.max(1, to - 1 - from)) * story.descent;
      const swing = (chance(name, day - from, "swing") - 0.5) * 0.5;
      const kg = Math.round((story.mass * (limit / story.mass) ** way + swing) * 10) / 10;
      return { ...scope, day: isoFromDay(day), kg, changedAt: at(day, 7) };
    });
}

/** Four weeks of check-ins, a day left out here and there; none of today yet. */
export function checkInRows(name: string, story: AthleteStory, scope: Scope, today: Day) {
  return Array.from({ length: CHECK_IN_DAYS }, (_, index) => CHECK_IN_DAYS - index)
    .filter((ago) => ago <= 2 || chance(name, ago, "checked in") < 0.88)
    .map((ago) => {
      const day = (today - ago) as Day;
      const answer = (of: keyof AthleteStory["usual"]) =>
        Math.min(
          7,
          Math.max(1, story.usual[of] + between(-1, 1, 1, name, ago, of) + (ago <= 2 ? story.lately : 0)),
        );
      return {
        ...scope,
        day: isoFromDay(day),
        sleep: answer("sleep"),
        fatigue: answer("fatigue"),
        soreness: answer("soreness"),
        stress: answer("stress"),
        changedAt: at(day, 7),
      };
    });
}
