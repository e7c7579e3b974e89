import fc from "fast-check";
import {
  DEFAULT_RULES,
  descentLine,
  type Au,
  type CheckIn,
  type Day,
  type Kg,
  type LiftAhead,
  type LoggedSession,
  type Minute,
  type ResponseInput,
  type WeekAnswer,
} from "@/lib/engine";
import { arbRules } from "./plan-input";

export const TODAY = 20_800 as Day;
const at = (offset: number): Day => (TODAY + offset) as Day;

/** A check-in so many days from today, its four answers adding up to `sum`. */
export const checkIn = (offset: number, sum: number): CheckIn => {
  const [sleep = 1, fatigue = 1, soreness = 1, stress = 1] = [0, 1, 2, 3].map(
    (index) => Math.floor(sum / 4) + (index < sum % 4 ? 1 : 0),
  );
  return { day: at(offset), sleep, fatigue, soreness, stress };
};

export const logged = (id: string, offset: number, over: Partial<LoggedSession> = {}): LoggedSession => ({
  id,
  of: "lift",
  title: id,
  day: at(offset),
  start: 600 as Minute,
  expectedEffort: 7,
  effort: 7,
  missed: false,
  pain: null,
  ...over,
});

export const ahead = (id: string, offset: number, over: Partial<LiftAhead> = {}): LiftAhead => ({
  id,
  title: id,
  day: at(offset),
  load: 400 as Au,
  coachFactor: 1,
  ...over,
});

/** The camp week that holds today: it began so many days ago. */
export const weekAnswer = (began: number, cap: number | null, done: number, left: number): WeekAnswer => ({
  from: at(-began),
  to: at(6 - began),
  cap: cap as Au | null,
  done: done as Au,
  ahead: left as Au,
});

/** 30 days before a bout, nothing logged; an invented athlete. */
export const responseInput = (over: Partial<ResponseInput> = {}): ResponseInput => ({
  today: TODAY,
  camp: { from: at(-25), to: at(30) },
  checkIns: [],
  logs: [],
  weight: null,
  weeks: [],
  liftsAhead: [],
  rules: DEFAULT_RULES,
  ...over,
});

const arbDay = fc.integer({ min: -40, max: 5 });
const score = fc.integer({ min: 1, max: 7 });
const effort = fc.option(fc.integer({ min: 0, max: 10 }));
const byDay = { selector: ({ day }: { readonly day: number }) => day };

/** Answers of every kind, also of days to come and with gaps. */
export const arbResponseInput: fc.Arbitrary<ResponseInput> = fc
  .record({
    checkIns: fc.oneof(
      fc.uniqueArray(
        fc.record({ day: arbDay.map(at), sleep: score, fatigue: score, soreness: score, stress: score }),
        { ...byDay, maxLength: 40 },
      ),
      // Somebody who answers daily: ordinary weeks, and then today.
      fc
        .tuple(
          fc.array(fc.integer({ min: 8, max: 14 }), { minLength: 8, maxLength: 30 }),
          fc.integer({ min: 4, max: 28 }),
        )
        .map(([usual, now]) => [checkIn(0, now), ...usual.map((sum, index) => checkIn(-1 - index, sum))]),
    ),
    logs: fc.uniqueArray(
      fc.record({
        id: fc.integer({ min: 0, max: 99 }).map((number) => `s${number}`),
        of: fc.constantFrom("lift" as const, "sport" as const),
        title: fc.constant("A session"),
        day: arbDay.map(at),
        start: fc.constantFrom(600, 1080).map((minute) => minute as Minute),
        expectedEffort: effort,
        effort,
        missed: fc.boolean(),
        pain: fc.option(fc.integer({ min: 0, max: 10 })),
      }),
      { selector: (log) => log.id, maxLength: 30 },
    ),
    weights: fc.uniqueArray(
      fc.record({ day: arbDay.map(at), kg: fc.integer({ min: 58, max: 72 }).map((kg) => kg as Kg) }),
      { ...byDay, maxLength: 20 },
    ),
    minor: fc.boolean(),
    weighIn: fc.integer({ min: -2, max: 40 }).map(at),
    weeks: fc
      .array(
        fc.tuple(
          fc.option(fc.integer({ min: 500, max: 3000 })),
          fc.integer({ min: 0, max: 3000 }),
          fc.integer({ min: 0, max: 2000 }),
        ),
        { minLength: 3, maxLength: 3 },
      )
      .map((rows) => rows.map(([cap, done, left], index) => weekAnswer(10 - 7 * index, cap, done, left))),
    liftsAhead: fc.uniqueArray(
      fc.record({
        id: fc.integer({ min: 0, max: 20 }).map((number) => `lift${number}`),
        title: fc.constant("A lift"),
        day: fc.integer({ min: 0, max: 20 }).map(at),
        load: fc.integer({ min: 0, max: 600 }).map((load) => load as Au),
        coachFactor: fc.constantFrom(0.5, 0.6, 1, 1.5),
      }),
      { selector: (lift) => lift.id, maxLength: 8 },
    ),
    rules: arbRules,
  })
  .map(({ weights, minor, weighIn, ...rest }) =>
    responseInput({
      ...rest,
      weight: {
        minor,
        limitKg: 61 as Kg,
        weighIn,
        line: descentLine({ day: at(-25), kg: 65 as Kg }, 61 as Kg, weighIn, rest.rules),
        weights,
      },
    }),
  );
