import { offsetSteps } from "@/lib/calendar/zones";
import { DEFAULT_RULES, dayFromIso, isoFromDay, minuteFromHhmm, weekSpan, weekdayOf } from "@/lib/engine";
import type { Day, Instant, PlanInput, SportKind, SportSession, Weekday } from "@/lib/engine/types";
import type { CampForm } from "@/lib/schemas/camp";
import { isDate, type StartParams } from "@/lib/schemas/start-params";

/** What the start page takes a session to be, since it asks for no more than the days: common practice, no published source. */
const HARD_MINUTES = 75;
const OTHER_MINUTES = 60;
const OTHER_TIME = "18:00";
/** Days out of the last other session: the last days are for travel and the scale. */
const OTHER_UNTIL = 3;

/** Days that other sessions take first, as far as hard sparring leaves them. */
const OTHER_DAYS: readonly Weekday[] = [1, 3, 5, 4, 2, 6, 7];
const BY_DAY: Record<Weekday, string> = { 1: "MO", 2: "TU", 3: "WE", 4: "TH", 5: "FR", 6: "SA", 7: "SU" };

interface WeeklySport {
  readonly kind: SportKind;
  readonly title: string;
  readonly days: readonly Weekday[];
  /** `HH:MM` */
  readonly start: string;
  readonly minutes: number;
  /** CR-10, as in `lib/schemas/plan.ts`: sparring hard, drills and pads at most 4 (Kirk et al. 2021). */
  readonly effort: number;
  readonly until: number;
}

function weeklySport(params: StartParams): WeeklySport[] {
  return [
    {
      kind: "hard-sparring",
      title: "Hard sparring",
      days: params.hard,
      start: params.hardTime,
      minutes: HARD_MINUTES,
      effort: 8,
      // Never on the day itself.
      until: Math.max(1, params.hardUntil),
    },
    {
      kind: "skill",
      title: "Skill",
      days: OTHER_DAYS.filter((day) => !params.hard.includes(day)).slice(0, params.other),
      start: OTHER_TIME,
      minutes: OTHER_MINUTES,
      effort: 4,
      until: OTHER_UNTIL,
    },
  ];
}

const campDays = (params: StartParams): Day[] => {
  const boutDay = dayFromIso(params.date);
  const { from } = weekSpan(boutDay, params.weeks - 1);
  return Array.from({ length: boutDay - from + 1 }, (_, index) => (from + index) as Day);
};

const daysOf = (sport: WeeklySport, params: StartParams): Day[] => {
  const last = dayFromIso(params.date) - sport.until;
  return campDays(params).filter((day) => day <= last && sport.days.includes(weekdayOf(day)));
};

/** The sport sessions of the camp's days, in order. */
export function startSport(params: StartParams): SportSession[] {
  return weeklySport(params)
    .flatMap((sport) =>
      daysOf(sport, params).map((day) => ({
        id: `${sport.kind}@${isoFromDay(day)}`,
        kind: sport.kind,
        title: sport.title,
        day,
        start: minuteFromHhmm(sport.start),
        minutes: sport.minutes,
        effort: sport.effort,
      })),
    )
    .sort((a, b) => a.day - b.day || a.start - b.start);
}

/** Date and time of the weigh-in, or null where it is not known yet. */
export function startWeighIn(params: StartParams): { date: string; time: string } | null {
  if (params.weighIn === "unknown") return null;
  const day = dayFromIso(params.date) - (params.weighIn === "day-before" ? 1 : 0);
  return { date: isoFromDay(day as Day), time: params.weighInTime };
}

const WEEK: readonly Weekday[] = [1, 2, 3, 4, 5, 6, 7];

/** The engine's input for the start page: dates and times must be real ones. */
export function startInput(params: StartParams, zone: string, now: Instant): PlanInput {
  const boutDay = dayFromIso(params.date);
  const weighIn = startWeighIn(params);
  const { from } = weekSpan(boutDay, params.weeks - 1);
  return {
    now,
    zone: offsetSteps({
      homeZone: zone,
      venueZone: zone,
      from: (from - 7) as Day,
      to: (boutDay + 2) as Day,
      venueFrom: boutDay,
    }),
    bout: { day: boutDay, start: minuteFromHhmm(params.time) },
    weeks: params.weeks,
    weighIn: weighIn && { day: dayFromIso(weighIn.date), start: minuteFromHhmm(weighIn.time) },
    athlete: {
      trainingAge: params.age,
      liftsPerWeek: params.lifts,
      strikingBase: params.base,
      freeHours: WEEK.map((weekday) => ({
        weekday,
        from: minuteFromHhmm(params.from),
        to: minuteFromHhmm(params.to),
      })),
    },
    sport: startSport(params),
    pins: [],
    holds: [],
    rules: DEFAULT_RULES,
    coachFactors: {},
    responses: [],
  };
}

/** The same camp as the form that a team keeps: recurring sessions stay recurring. Null without a date of the bout. */
export function startCampForm(params: StartParams, zone: string, athleteName: string): CampForm | null {
  if (!isDate(params.date)) return null;
  return {
    athlete: { name: athleteName },
    homeZone: zone,
    bout: {
      date: params.date,
      time: params.time,
      timeZone: zone,
      place: "",
      opponent: "",
      ruleset: "",
      rounds: null,
      roundMinutes: null,
      limitKg: null,
    },
    weeks: params.weeks,
    weighIn: startWeighIn(params),
    facts: {
      trainingAge: params.age,
      liftsPerWeek: params.lifts,
      strikingBase: params.base,
      freeHours: WEEK.map((weekday) => ({ weekday, from: params.from, to: params.to })),
    },
    sport: weeklySport(params).flatMap((sport) => {
      const days = daysOf(sport, params);
      const first = days[0];
      if (first === undefined) return [];
      return {
        kind: sport.kind,
        title: sport.title,
        start: `${isoFromDay(first)}T${sport.start}`,
        minutes: sport.minutes,
        effort: sport.effort,
        place: "",
        // A count instead of an end date: it means the same in every zone.
        rrule: `FREQ=WEEKLY;BYDAY=${sport.days.map((day) => BY_DAY[day]).join(",")};COUNT=${days.length}`,
        exdate: [],
      };
    }),
  };
}
