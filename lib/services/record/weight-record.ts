import {
  MINOR_WORDS,
  ceilings,
  dayFromIso,
  descentLine,
  isoFromDay,
  linePoints,
  weightRemark,
  withOverrides,
  type DescentPace,
} from "@/lib/engine";
import type { Day, Kg } from "@/lib/engine/types";
import type { WeightRecord } from "@/lib/schemas/athlete-record";
import { spanOf, type AthleteNow } from "@/lib/services/today/athlete-day";

/** A weight of so many days before a camp still says where its line starts. */
const START_BACK_DAYS = 7;
/** Half a year, where no camp asks for more. */
const SHOWN_DAYS = 182;

const nearestOf = ({ camps, today }: AthleteNow) =>
  camps.find(({ camp }) => camp.weighInDate !== null && dayFromIso(camp.weighInDate) >= today);

/** From which day weights are shown. */
export function weightsShownFrom(now: AthleteNow): Day {
  const nearest = nearestOf(now);
  const back = (now.today - SHOWN_DAYS) as Day;
  return nearest ? (Math.min(back, spanOf(nearest).from - START_BACK_DAYS) as Day) : back;
}

const PACE_WORDS: Readonly<Record<DescentPace, string | null>> = {
  none: null,
  recommended: "The line falls no faster than recommended (0.7 % a week by default, Garthe et al. 2011).",
  "faster-than-recommended":
    "The line falls faster than recommended (0.7 % a week by default, Garthe et al. 2011).",
  "beyond-fastest":
    "The limit asks for more than the fastest rate (1.5 % a week by default, NCAA and NFHS): the line keeps that rate and ends above the limit.",
};

/** Weights with the line and the ceilings of the camp that runs; nothing but the reason for a minor. */
export function weightRecordOf(
  now: AthleteNow,
  rows: readonly { readonly day: string; readonly kg: number }[],
): WeightRecord {
  if (now.minor) return { off: "minor", reason: MINOR_WORDS };
  const weights = rows.map(({ day, kg }) => ({ date: day, kg }));
  const nearest = nearestOf(now);
  const { limitKg = null, weighInDate = null } = nearest?.camp ?? {};
  if (!nearest || limitKg === null || weighInDate === null) return { off: null, weights, to: null };
  const weighIn = dayFromIso(weighInDate);
  const rules = withOverrides(now.rules);
  const points = rows.map(({ day, kg }) => ({ day: dayFromIso(day), kg: kg as Kg }));
  const start = points.find(({ day }) => day >= spanOf(nearest).from - START_BACK_DAYS && day < weighIn);
  const limit = limitKg as Kg;
  const line = start ? descentLine(start, limit, weighIn, rules) : null;
  const facts = { minor: false, limitKg: limit, weighIn, line, weights: points, today: now.today, rules };
  const state = weightRemark(facts);
  return {
    off: null,
    weights,
    to: {
      campId: nearest.camp.id,
      limitKg,
      weighIn: weighInDate,
      line: line ? linePoints(line).map(({ day, kg }) => ({ date: isoFromDay(day), kg })) : [],
      pace: line ? PACE_WORDS[line.pace] : null,
      ceilings: ceilings(limit, weighIn, rules).map(({ day, hours, kg }) => ({
        date: isoFromDay(day),
        hours,
        kg,
      })),
      remarks: state.off === null ? state.remarks.map(({ text, source }) => ({ text, source })) : [],
    },
  };
}
