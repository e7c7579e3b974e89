import fc from "fast-check";
import {
  DEFAULT_RULES,
  HOUSE_RULES,
  RULE_KEYS,
  SPORT_KINDS,
  STRIKING_BASES,
  TRAINING_AGES,
  ITEMS,
  campStart,
  dayFromIso,
  instantAt,
  minuteFromHhmm,
  weekdayOf,
  withOverrides,
  type AcceptedResponse,
  type Day,
  type FreeHours,
  type HouseRules,
  type Instant,
  type Minute,
  type OffsetStep,
  type Pin,
  type PlanInput,
  type SportKind,
  type SportSession,
  type Weekday,
} from "@/lib/engine";

export const day = dayFromIso;
export const minute = minuteFromHhmm;
export const UTC: readonly OffsetStep[] = [{ from: 0, offset: 0 }];

/** Free on the given weekdays (all of them by default) between two times. */
export const freeHours = (
  from: string,
  to: string,
  weekdays: readonly number[] = [1, 2, 3, 4, 5, 6, 7],
): FreeHours[] =>
  weekdays.map((weekday) => ({ weekday: weekday as Weekday, from: minute(from), to: minute(to) }));

/** A session every week on one weekday, over a camp and the week before it. */
export function weeklySport(
  kind: SportKind,
  weekday: number,
  start: string,
  over: {
    minutes?: number;
    effort?: number;
    title?: string;
    boutDay?: Day;
    weeks?: number;
    lastDaysOut?: number;
  } = {},
): SportSession[] {
  const { minutes = 60, effort = 4, title = kind, boutDay = BOUT_DAY, weeks = 8, lastDaysOut = 0 } = over;
  const first = campStart(boutDay, weeks);
  return Array.from({ length: 7 * weeks }, (_, index) => (first + index) as Day)
    .filter((at) => weekdayOf(at) === weekday && boutDay - at >= lastDaysOut)
    .map((at) => ({
      id: `${kind}-${weekday}-${start}@${at}`,
      kind,
      title,
      day: at,
      start: minute(start),
      minutes,
      effort,
    }));
}

/** Saturday. */
const BOUT_DAY = day("2027-01-09");

/** Hard sparring on Tuesday evening and Saturday noon, skill on Monday and Wednesday; hard sparring stops 11 days out. */
export const gymWeek = (boutDay: Day = BOUT_DAY, weeks = 8): SportSession[] => [
  ...weeklySport("hard-sparring", 2, "18:00", { effort: 8, boutDay, weeks, lastDaysOut: 11 }),
  ...weeklySport("hard-sparring", 6, "11:00", { effort: 8, boutDay, weeks, lastDaysOut: 11 }),
  ...weeklySport("skill", 1, "18:00", { boutDay, weeks, lastDaysOut: 2 }),
  ...weeklySport("skill", 3, "18:00", { boutDay, weeks, lastDaysOut: 2 }),
];

/** An 8-week camp to Saturday 9 January 2027, made before it starts; an invented gym. */
export const planInput = (over: Partial<PlanInput> = {}): PlanInput => {
  const bout = over.bout ?? { day: BOUT_DAY, start: minute("20:30") };
  const weeks = over.weeks ?? 8;
  return {
    now: ((campStart(bout.day, weeks) - 7) * 1440) as Instant,
    zone: UTC,
    bout,
    weeks,
    weighIn: { day: (bout.day - 1) as Day, start: minute("11:00") },
    athlete: {
      trainingAge: "intermediate",
      liftsPerWeek: 3,
      strikingBase: "whipping-round-kicks",
      freeHours: freeHours("10:00", "20:00"),
    },
    sport: gymWeek(bout.day, weeks),
    pins: [],
    holds: [],
    rules: DEFAULT_RULES,
    coachFactors: {},
    responses: [],
    ...over,
  };
};

/** Frozen to the bottom: writing to it throws. */
export function deepFreeze<T>(value: T): T {
  if (typeof value === "object" && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    for (const inner of Object.values(value)) deepFreeze(inner);
  }
  return value;
}

/* Generated input */

/** A clock change on `day`: from 02:00 to 03:00 or from 03:00 to 02:00; both readings' later one begins the step. */
const clocks = (at: Day, before: number, after: number): OffsetStep[] => [
  { from: 0, offset: before },
  { from: at * 1440 + 180, offset: after },
];

/** Days that calendars get wrong: leap days, ends of years, and plain ones. */
const arbBoutDay: fc.Arbitrary<Day> = fc.oneof(
  fc
    .constantFrom(
      "2028-02-29",
      "2028-03-01",
      "2026-12-31",
      "2027-01-01",
      "2027-03-28",
      "2026-10-25",
      "2026-04-05",
    )
    .map(day),
  fc.integer({ min: day("2026-01-01"), max: day("2031-12-31") }).map((value) => value as Day),
);

const arbZone = (boutDay: Day): fc.Arbitrary<readonly OffsetStep[]> =>
  fc.oneof(
    fc.constantFrom<readonly OffsetStep[]>(
      UTC,
      [{ from: 0, offset: 330 }],
      [{ from: 0, offset: -180 }],
      [{ from: 0, offset: 780 }],
    ),
    fc
      .tuple(fc.integer({ min: 0, max: 60 }), fc.boolean())
      .map(([back, forward]) => clocks((boutDay - back) as Day, forward ? 60 : 120, forward ? 120 : 60)),
    // Travel: a zone many hours away from a few days before the bout.
    fc.tuple(fc.integer({ min: 1, max: 8 }), fc.constantFrom(-600, 540)).map(([back, away]) => [
      { from: 0, offset: 0 },
      { from: (boutDay - back) * 1440, offset: away },
    ]),
  );

const arbMinute = (from: number, to: number): fc.Arbitrary<Minute> =>
  fc.integer({ min: from / 15, max: to / 15 }).map((quarter) => (quarter * 15) as Minute);

const arbFreeHours: fc.Arbitrary<readonly FreeHours[]> = fc.oneof(
  { weight: 4, arbitrary: fc.constant(freeHours("10:00", "20:00")) },
  { weight: 1, arbitrary: fc.constant(freeHours("00:00", "24:00")) },
  { weight: 1, arbitrary: fc.constant([]) },
  {
    weight: 1,
    arbitrary: fc.constant([...freeHours("06:30", "09:00"), ...freeHours("17:00", "22:00", [1, 3, 5])]),
  },
  {
    weight: 4,
    arbitrary: fc.array(
      fc
        .tuple(fc.integer({ min: 1, max: 7 }), arbMinute(0, 1260), fc.integer({ min: 2, max: 40 }))
        .map(([weekday, from, quarters]) => ({
          weekday: weekday as Weekday,
          from,
          to: Math.min(1440, from + 15 * quarters) as Minute,
        })),
      { minLength: 1, maxLength: 10 },
    ),
  },
);

interface Weekly {
  readonly kind: SportKind;
  readonly weekday: number;
  readonly start: Minute;
  readonly minutes: number;
  readonly effort: number;
}

const arbWeekly = (kinds: readonly SportKind[]): fc.Arbitrary<Weekly> =>
  fc.record({
    kind: fc.constantFrom(...kinds),
    weekday: fc.integer({ min: 1, max: 7 }),
    start: arbMinute(360, 1320),
    minutes: fc.constantFrom(30, 60, 75, 90, 120),
    effort: fc.integer({ min: 0, max: 10 }),
  });

const arbTimetable: fc.Arbitrary<readonly Weekly[]> = fc.oneof(
  {
    weight: 5,
    arbitrary: fc.array(
      arbWeekly(["hard-sparring", "technical-sparring", "skill", "skill", "conditioning"]),
      { maxLength: 8 },
    ),
  },
  { weight: 1, arbitrary: fc.array(arbWeekly(SPORT_KINDS), { maxLength: 10 }) },
  // Sparring every day.
  {
    weight: 1,
    arbitrary: arbMinute(600, 1200).map((start) =>
      [1, 2, 3, 4, 5, 6, 7].map((weekday): Weekly => ({
        kind: "hard-sparring",
        weekday,
        start,
        minutes: 60,
        effort: 8,
      })),
    ),
  },
);

function expand(timetable: readonly Weekly[], boutDay: Day, weeks: number): SportSession[] {
  const first = campStart(boutDay, weeks);
  return Array.from({ length: 7 * weeks - 1 }, (_, index) => (first + index) as Day).flatMap((at) =>
    timetable.flatMap((row, index): SportSession[] =>
      row.weekday === weekdayOf(at)
        ? [
            {
              id: `s${index}@${at}`,
              kind: row.kind,
              title: row.kind,
              day: at,
              start: row.start,
              minutes: row.minutes,
              effort: row.effort,
            },
          ]
        : [],
    ),
  );
}

/** House rules with up to six values of a team's own, each within its range. */
export const arbRules: fc.Arbitrary<HouseRules> = fc.oneof(
  { weight: 3, arbitrary: fc.constant(DEFAULT_RULES) },
  {
    weight: 1,
    arbitrary: fc
      .array(
        fc.constantFrom(...RULE_KEYS).chain((key) => {
          const { min, max, step } = HOUSE_RULES[key];
          return fc
            .integer({ min: 0, max: Math.round((max - min) / step) })
            .map((steps) => [key, Math.min(max, Number((min + steps * step).toFixed(4)))] as const);
        }),
        { maxLength: 6 },
      )
      .map((pairs) => withOverrides(Object.fromEntries(pairs))),
  },
);

const arbPin = (boutDay: Day, weeks: number): fc.Arbitrary<Pin> =>
  fc
    .record({
      item: fc.constantFrom(...ITEMS),
      week: fc.integer({ min: 0, max: weeks - 1 }),
      back: fc.integer({ min: 0, max: 7 * weeks - 1 }),
      start: arbMinute(0, 1425),
    })
    .map(({ item, week, back, start }) => ({
      id: `${item}.${week}`,
      slot: { item, week },
      day: (boutDay - back) as Day,
      start,
    }));

/** An accepted suggestion on any days of the camp, from one day to all of it. */
export const arbResponse = (boutDay: Day, weeks: number): fc.Arbitrary<AcceptedResponse> =>
  fc
    .record({
      back: fc.integer({ min: 0, max: 7 * weeks - 1 }),
      length: fc.integer({ min: 0, max: 7 * weeks }),
      factor: fc.constantFrom(0.5, 0.7, 0.8, 0.95, 1),
    })
    .map(({ back, length, factor }) => ({
      from: (boutDay - back) as Day,
      to: (boutDay - back + length) as Day,
      factor,
    }));

export interface ArbOptions {
  readonly minWeeks?: number;
  readonly maxWeeks?: number;
  readonly pins?: boolean;
  readonly holds?: boolean;
  /** Default house rules only. */
  readonly defaultRules?: boolean;
  /** The camp lies wholly ahead. */
  readonly ahead?: boolean;
}

/** Valid input of every kind: awkward days, zones, free hours, timetables, pins, holds and house rules. */
export const arbPlanInput = (options: ArbOptions = {}): fc.Arbitrary<PlanInput> =>
  fc
    .record({
      boutDay: arbBoutDay,
      weeks: fc.integer({ min: options.minWeeks ?? 1, max: options.maxWeeks ?? 20 }),
    })
    .chain(({ boutDay, weeks }) =>
      fc
        .record({
          zone: arbZone(boutDay),
          boutStart: arbMinute(600, 1425),
          // Days from now to the camp's first day; negative is a camp that is under way, up to the bout's own morning.
          ahead: options.ahead
            ? fc.integer({ min: 1, max: 20 })
            : fc.oneof(fc.integer({ min: 0, max: 20 }), fc.integer({ min: 1 - 7 * weeks, max: 0 })),
          nowMinute: arbMinute(0, 585),
          weighIn: fc.oneof(
            fc.constant(null),
            fc.record({ back: fc.integer({ min: 0, max: 2 }), start: arbMinute(360, 585) }),
          ),
          trainingAge: fc.constantFrom(...TRAINING_AGES),
          liftsPerWeek: fc.integer({ min: 1, max: 4 }),
          strikingBase: fc.constantFrom(...STRIKING_BASES),
          free: arbFreeHours,
          timetable: arbTimetable,
          pins:
            options.pins === false
              ? fc.constant([])
              : fc.oneof(fc.constant([]), fc.array(arbPin(boutDay, weeks), { maxLength: 4 })),
          holds:
            options.holds === false
              ? fc.constant([])
              : fc.oneof(
                  { weight: 4, arbitrary: fc.constant([]) },
                  {
                    weight: 1,
                    arbitrary: fc
                      .tuple(
                        fc.integer({ min: 0, max: 7 * weeks }),
                        fc.option(fc.integer({ min: 0, max: 10 })),
                      )
                      .map(([back, length]) => [
                        {
                          from: (boutDay - back) as Day,
                          to: length === null ? null : ((boutDay - back + length) as Day),
                        },
                      ]),
                  },
                ),
          rules: options.defaultRules ? fc.constant(DEFAULT_RULES) : arbRules,
          coach: fc.oneof(
            fc.constant({}),
            fc
              .constantFrom(0.5, 0.8, 1.25, 1.5)
              .map((factor) => ({ "strength-a.2": factor, "power-a.1": factor })),
          ),
          responses: fc.oneof(
            { weight: 3, arbitrary: fc.constant([]) },
            { weight: 2, arbitrary: fc.array(arbResponse(boutDay, weeks), { minLength: 1, maxLength: 3 }) },
          ),
        })
        .map((made): PlanInput => ({
          now: instantAt(made.zone, (campStart(boutDay, weeks) - made.ahead) as Day, made.nowMinute),
          zone: made.zone,
          bout: { day: boutDay, start: made.boutStart },
          weeks,
          weighIn: made.weighIn && { day: (boutDay - made.weighIn.back) as Day, start: made.weighIn.start },
          athlete: {
            trainingAge: made.trainingAge,
            liftsPerWeek: made.liftsPerWeek,
            strikingBase: made.strikingBase,
            freeHours: made.free,
          },
          sport: expand(made.timetable, boutDay, weeks),
          pins: made.pins,
          holds: made.holds,
          rules: made.rules,
          coachFactors: made.coach,
          responses: made.responses,
        })),
    );
