import { campSpan } from "@/lib/book";
import { RecurrenceError, expandEntries } from "@/lib/calendar/recurrence";
import { instantOf, offsetSteps } from "@/lib/calendar/zones";
import {
  PlanInputError,
  dayFromIso,
  hhmm,
  instantAt,
  isoFromDay,
  minuteFromHhmm,
  plan,
  withOverrides,
} from "@/lib/engine";
import type { Day, Instant, Minute, Plan, PlanInput, SportSession, Weekday } from "@/lib/engine/types";
import { AppError } from "@/lib/errors";
import type { SportEntry } from "@/lib/schemas/camp-book";
import { DEFAULT_EFFORT, type PlanAnswer, type PlanRequest } from "@/lib/schemas/plan";

const FORM_NOTE = "An illustration of training theory, not a forecast.";

const entriesOf = (request: PlanRequest): SportEntry[] =>
  request.sport.map((session, index) => ({
    id: `sport-${index + 1}`,
    series: `sport-${index + 1}`,
    idShift: 0,
    kind: session.kind,
    title: session.title,
    start: session.start,
    minutes: session.minutes,
    effort: session.effort ?? DEFAULT_EFFORT[session.kind],
    place: "",
    rrule: session.rrule ?? null,
    exdate: session.exdate ?? [],
  }));

function inputOf(request: PlanRequest, now: Date): PlanInput {
  const { from, to } = campSpan(request);
  const sport = expandEntries(entriesOf(request), from, to);
  const zone = offsetSteps({
    homeZone: request.bout.timeZone,
    venueZone: request.bout.timeZone,
    from: (from - 7) as Day,
    to: (to + 2) as Day,
    venueFrom: to,
  });
  // One minute before midnight: a session at 00:00 of `today` is still ahead.
  const asOf = request.today
    ? ((instantAt(zone, dayFromIso(request.today), 0 as Minute) - 1) as Instant)
    : instantOf(now);
  return {
    now: asOf,
    zone,
    bout: { day: to, start: minuteFromHhmm(request.bout.time) },
    weeks: request.weeks,
    weighIn: request.weighIn
      ? { day: dayFromIso(request.weighIn.date), start: minuteFromHhmm(request.weighIn.time) }
      : null,
    athlete: {
      ...request.athlete,
      freeHours: request.athlete.freeHours.map((hours) => ({
        weekday: hours.weekday as Weekday,
        from: minuteFromHhmm(hours.from),
        to: minuteFromHhmm(hours.to),
      })),
    },
    sport,
    pins: (request.pins ?? []).map((pin) => ({
      id: `${pin.item}.${pin.week}`,
      slot: { item: pin.item, week: pin.week },
      day: dayFromIso(pin.date),
      start: minuteFromHhmm(pin.start),
    })),
    holds: [],
    rules: withOverrides(request.houseRules ?? {}),
    coachFactors: {},
    responses: [],
  };
}

function answerOf(result: Plan, sport: readonly SportSession[]): PlanAnswer {
  return {
    phases: result.phases.map(({ phase, from, to }) => ({
      phase,
      from: isoFromDay(from),
      to: isoFromDay(to),
    })),
    lifting: result.lifts.map((lift) => ({
      id: lift.id,
      week: lift.week,
      item: lift.item,
      date: isoFromDay(lift.day),
      start: hhmm(lift.start),
      minutes: lift.minutes,
      sets: lift.sets,
      intensity: { ...lift.intensity },
      effort: lift.effort,
      heavyLower: lift.heavyLower,
      pinned: lift.pinned,
      factors: lift.factors.map((factor) => ({ ...factor })),
      reasons: lift.reasons.map((reason) => ({ ...reason })),
    })),
    sport: sport.map((session) => ({
      id: session.id,
      kind: session.kind,
      title: session.title,
      date: isoFromDay(session.day),
      start: hhmm(session.start),
      minutes: session.minutes,
      effort: session.effort,
    })),
    unplaced: result.unplaced.map(({ item, week, rules }) => ({
      item,
      week,
      rules: rules.map((rule) => ({ ...rule })),
    })),
    violations: result.violations.map(({ rule, ids, day, text }) => ({
      rule,
      ids: [...ids],
      date: isoFromDay(day),
      text,
    })),
    weeks: result.weeks.map((week) => ({
      weeksOut: week.weeksOut,
      phase: week.phase,
      from: isoFromDay(week.from),
      to: isoFromDay(week.to),
      sets: week.sets,
      sportLoad: week.sportLoad,
      liftingLoad: week.liftingLoad,
      monotony: week.monotony,
      strain: week.strain,
    })),
    form: {
      from: isoFromDay(result.form.from),
      values: [...result.form.values],
      stopsHelping: result.form.stopsHelping,
      helpsMost: result.form.helpsMost,
      note: FORM_NOTE,
    },
  };
}

/**
 * Lays out a camp that nobody keeps: no account, no database.
 * Throws `AppError("invalid")` with a pointer per field for input that cannot be planned.
 */
export async function layOut(request: PlanRequest, now: Date): Promise<PlanAnswer> {
  try {
    const input = inputOf(request, now);
    return answerOf(plan(input), input.sport);
  } catch (error) {
    if (error instanceof PlanInputError) {
      throw new AppError("invalid", "This camp cannot be laid out.", {
        errors: error.problems.map(({ pointer, message }) => ({ pointer, message })),
      });
    }
    if (error instanceof RecurrenceError) {
      throw new AppError("invalid", "This recurrence cannot be expanded.", {
        errors: [{ pointer: `/sport/${error.entryIndex}/${error.pointerField}`, message: error.message }],
      });
    }
    throw error;
  }
}
