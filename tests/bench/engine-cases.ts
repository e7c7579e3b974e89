import type { PlanInput, SportSession } from "@/lib/engine";
import { planInput, weeklySport } from "../factories/plan-input";

/** A gym's week in the order in which sessions are added: hard sparring first, then what fills the days. Invented. */
const WEEK = [
  { kind: "hard-sparring", weekday: 2, start: "18:00", minutes: 60, effort: 8 },
  { kind: "skill", weekday: 1, start: "18:00", minutes: 75, effort: 4 },
  { kind: "hard-sparring", weekday: 6, start: "11:00", minutes: 60, effort: 8 },
  { kind: "skill", weekday: 3, start: "18:00", minutes: 75, effort: 4 },
  { kind: "technical-sparring", weekday: 4, start: "18:30", minutes: 60, effort: 5 },
  { kind: "conditioning", weekday: 1, start: "07:30", minutes: 40, effort: 7 },
  { kind: "skill", weekday: 5, start: "12:00", minutes: 60, effort: 4 },
  { kind: "conditioning", weekday: 3, start: "07:30", minutes: 40, effort: 7 },
  { kind: "other", weekday: 7, start: "10:00", minutes: 60, effort: 2 },
  { kind: "skill", weekday: 6, start: "16:00", minutes: 60, effort: 4 },
] as const;

/** A camp of `weeks` weeks with `sessionsPerWeek` (0 to 10) sport sessions in each, to be planned from scratch. */
export function benchCamp(weeks: number, sessionsPerWeek: number): PlanInput {
  const camp = planInput({ weeks });
  const sport = WEEK.slice(0, sessionsPerWeek).flatMap(
    ({ kind, weekday, start, minutes, effort }): SportSession[] =>
      weeklySport(kind, weekday, start, {
        minutes,
        effort,
        boutDay: camp.bout.day,
        weeks,
        lastDaysOut: kind === "hard-sparring" ? 11 : 2,
      }),
  );
  return { ...camp, sport };
}
