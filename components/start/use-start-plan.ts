"use client";

import { useMemo, useState } from "react";
import { startInput } from "@/lib/book/start-camp";
import { civilNow, dateOf } from "@/lib/calendar/zones";
import { inputProblems, plan } from "@/lib/engine";
import type { Day, Instant, Plan, PlanInput } from "@/lib/engine/types";
import { isDate, type StartParams } from "@/lib/schemas/start-params";

export interface StartCamp {
  readonly input: PlanInput;
  readonly plan: Plan;
  /** Today in the camp's zone. */
  readonly today: Day;
}

/** What is wrong, by field, in words that say what to do. */
export type StartProblems = Partial<Record<keyof StartParams, string>>;

const FIELD_OF_POINTER: readonly (readonly [string, keyof StartParams])[] = [
  ["/bout/time", "time"],
  ["/bout", "date"],
  ["/weeks", "weeks"],
  ["/weighIn", "weighIn"],
  ["/athlete/liftsPerWeek", "lifts"],
  ["/athlete/freeHours", "to"],
];

function shapeProblems(params: StartParams): StartProblems {
  return {
    ...(isDate(params.date) ? {} : { date: "Give the date of the bout." }),
    ...(params.time ? {} : { time: "Give the time of the first bell." }),
    ...(params.hardTime ? {} : { hardTime: "Give a time." }),
    ...(params.weighIn === "unknown" || params.weighInTime ? {} : { weighInTime: "Give a time." }),
    ...(params.from && params.to && params.from < params.to ? {} : { to: "Must be later than the start." }),
  };
}

interface LaidOut {
  readonly camp: StartCamp | null;
  readonly problems: StartProblems;
}

/** Lays a camp out from the start page's inputs, or says what keeps it from being laid out. */
export function layOut(params: StartParams, zone: string, now: Instant): LaidOut {
  const shape = shapeProblems(params);
  if (Object.keys(shape).length > 0) return { camp: null, problems: shape };
  const input = startInput(params, zone, now);
  const found = inputProblems(input);
  if (found.length === 0)
    return { camp: { input, plan: plan(input), today: civilNow(zone, dateOf(now)).day }, problems: {} };
  const problems: StartProblems = {};
  for (const problem of found) {
    const field = FIELD_OF_POINTER.find(([pointer]) => problem.pointer.startsWith(pointer))?.[1] ?? "date";
    problems[field] ??= problem.message;
  }
  return { camp: null, problems };
}

/**
 * The camp for the inputs as they stand; while they cannot be planned, the last camp that could, so that the page does
 * not jump while a date is being typed. `camp` is null only if there never was one.
 */
export function useStartPlan(
  params: StartParams,
  zone: string,
  now: Instant,
): LaidOut & { readonly stale: boolean } {
  const laidOut = useMemo(() => layOut(params, zone, now), [params, zone, now]);
  const [last, setLast] = useState(laidOut.camp);
  if (laidOut.camp && laidOut.camp !== last) setLast(laidOut.camp);
  return { camp: laidOut.camp ?? last, problems: laidOut.problems, stale: laidOut.camp === null };
}
