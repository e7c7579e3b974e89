import { dayFromIso, descentLine, isoFromDay, lineKg, weightRemark, withOverrides } from "@/lib/engine";
import type { Day, Kg } from "@/lib/engine/types";
import type { WeightView } from "@/lib/schemas/today";
import { spanOf, type AthleteNow } from "./athlete-day";

/** A weight of so many days before a camp still says where its line starts. */
const START_BACK_DAYS = 7;
/** With a day to spare over the 28 that the engine looks back for a rate. */
const LOOK_BACK_DAYS = 35;

/** From which day weights are needed, for the line and for the rate. */
export function weightsFrom({ camps, today }: AthleteNow): Day {
  const [nearest] = camps;
  const back = (today - LOOK_BACK_DAYS) as Day;
  return nearest ? (Math.min(back, spanOf(nearest).from - START_BACK_DAYS) as Day) : back;
}

/**
 * Weights against the line to the limit of the nearest bout. Nothing but the reason for a minor, without a limit or a weigh-in to
 * come, and without a weight to start from.
 */
export function weightViewOf(
  now: AthleteNow,
  rows: readonly { readonly day: string; readonly kg: number }[],
  window: readonly Day[],
): WeightView {
  if (now.minor) return { off: "minor" };
  const nearest = now.camps.find(
    ({ camp }) => camp.weighInDate !== null && dayFromIso(camp.weighInDate) >= now.today,
  );
  const { limitKg = null, weighInDate = null } = nearest?.camp ?? {};
  if (!nearest || limitKg === null || weighInDate === null) return { off: "no-limit" };
  const weighIn = dayFromIso(weighInDate);
  const rules = withOverrides(now.rules);
  const weights = rows.map(({ day, kg }) => ({ day: dayFromIso(day), kg: kg as Kg }));
  const start = weights.find(({ day }) => day >= spanOf(nearest).from - START_BACK_DAYS && day < weighIn);
  const line = start ? descentLine(start, limitKg as Kg, weighIn, rules) : null;
  const state = weightRemark({
    minor: false,
    limitKg: limitKg as Kg,
    weighIn,
    line,
    weights,
    today: now.today,
    rules,
  });
  if (state.off !== null) return { off: state.off === "no-weight" ? "no-weight" : "no-limit" };
  return {
    off: null,
    limitKg,
    weighIn: weighInDate,
    line: line
      ? window
          .filter((day) => day >= line.from && day <= weighIn)
          .map((day) => ({ date: isoFromDay(day), kg: lineKg(line, day) }))
      : [],
    remarks: state.remarks.map(({ kind, text }) => ({ kind, text })),
  };
}
