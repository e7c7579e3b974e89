import { tauFor } from "../dose/taper";
import { weeksOutOf } from "../geometry";
import { HOUSE_RULES } from "../rules/house-rules";
import type { Day, PhaseSpan, PlanInput } from "../types";
import { campWeeks, type CampWeek } from "./camp-weeks";
import { phaseSpans, taperDays } from "./phase-spans";

/** An input with the camp it spans: what every later step needs to know about its weeks and its taper. */
export interface CampFrame {
  readonly input: PlanInput;
  readonly spans: readonly PhaseSpan[];
  /** First to last. */
  readonly weeks: readonly CampWeek[];
  readonly taperDays: number;
  /** Time constant of the taper, days. */
  readonly tau: number;
  /**
   * The same under the smallest cut a team may choose: minutes reserved for placement come from this one, so that they do not
   * change with the cut. Otherwise a deeper cut could move a session to a day where it gets more sets.
   */
  readonly reserveTau: number;
  /** Day of the taper: 1 on its first, the bout day is its last; below 1 before it. */
  taperDay(day: Day): number;
  /** The camp week `weeksOut`; where the camp has none, the one that holds `day`, else its first. */
  weekOf(weeksOut: number, day: Day): CampWeek;
}

export function frameOf(input: PlanInput): CampFrame {
  const { bout, rules } = input;
  const shape = { boutDay: bout.day, weeks: input.weeks, trainingAge: input.athlete.trainingAge, rules };
  const spans = phaseSpans(shape);
  const weeks = campWeeks(shape, spans);
  const days = taperDays(shape);
  const at = (weeksOut: number): CampWeek | undefined => weeks[weeks.length - 1 - weeksOut];
  return {
    input,
    spans,
    weeks,
    taperDays: days,
    tau: tauFor(rules["taper.cut"], days),
    reserveTau: tauFor(HOUSE_RULES["taper.cut"].min, days),
    taperDay: (day) => days - (bout.day - day),
    weekOf(weeksOut, day) {
      const week = at(weeksOut) ?? at(weeksOutOf(bout.day, day)) ?? weeks[0];
      if (!week) throw new RangeError("A camp has at least one week");
      return week;
    },
  };
}
