import {
  STRIKING_BASES,
  TRAINING_AGES,
  type StrikingBase,
  type TrainingAge,
  type Weekday,
} from "@/lib/engine/types";

/**
 * The start page's inputs as its address holds them. Read by hand instead of with zod: the page plans in the browser on
 * its first load, and a validator of any input would weigh more than the planner itself.
 */

export const WEIGH_IN_DAYS = ["unknown", "day-before", "same-day"] as const;
export type WeighInDay = (typeof WEIGH_IN_DAYS)[number];

/** Days out that the last hard sparring may be set to. */
export const HARD_UNTIL_DAYS = [0, 3, 5, 7, 10, 14, 21, 28] as const;

export interface StartParams {
  /** `YYYY-MM-DD`; empty or impossible while it is being typed. */
  readonly date: string;
  /** `HH:MM`, first bell. */
  readonly time: string;
  /** IANA name; null until the browser has said where it is. */
  readonly zone: string | null;
  /** 1 to 20. */
  readonly weeks: number;
  readonly hard: readonly Weekday[];
  readonly hardTime: string;
  /** Days out of the last hard sparring, one of `HARD_UNTIL_DAYS`. */
  readonly hardUntil: number;
  /** 1 to 4. */
  readonly lifts: number;
  readonly base: StrikingBase;
  readonly age: TrainingAge;
  readonly weighIn: WeighInDay;
  readonly weighInTime: string;
  /** Hours of every day in which the athlete can lift. */
  readonly from: string;
  readonly to: string;
  /** Further sport sessions a week, 0 to 7. */
  readonly other: number;
}

export const START_DEFAULTS: Omit<StartParams, "date"> = {
  time: "20:00",
  zone: null,
  weeks: 8,
  hard: [2, 6],
  hardTime: "18:00",
  hardUntil: 10,
  lifts: 3,
  base: "whipping-round-kicks",
  age: "intermediate",
  weighIn: "unknown",
  weighInTime: "11:00",
  from: "07:00",
  to: "21:00",
  other: 2,
};

const DATE = /^\d{4}-\d{2}-\d{2}$/;

/** True for `YYYY-MM-DD` of a day that exists. */
export function isDate(text: string): boolean {
  const midnight = DATE.test(text) ? Date.parse(`${text}T00:00:00Z`) : Number.NaN;
  return !Number.isNaN(midnight) && new Date(midnight).toISOString().startsWith(text);
}

const TIME = /^([01]\d|2[0-3]):[0-5]\d$/;
const END_TIME = /^(([01]\d|2[0-3]):[0-5]\d|24:00)$/;

const knowsZone = (name: string): boolean => {
  try {
    new Intl.DateTimeFormat("en", { timeZone: name });
    return true;
  } catch {
    return false;
  }
};

const WEEKDAYS: readonly Weekday[] = [1, 2, 3, 4, 5, 6, 7];

/**
 * Reads an address; whatever is missing, foreign or out of range falls back to `fallback`, value by value.
 * `hard` may be repeated (`hard=2&hard=6`, as a form sends it) or one word (`hard=26`); `hard=0` means none.
 */
export function readStartParams(search: URLSearchParams, fallback: StartParams): StartParams {
  const text = (key: string, shape: RegExp, otherwise: string): string => {
    const given = search.get(key);
    return given !== null && shape.test(given) ? given : otherwise;
  };
  const whole = (key: string, min: number, max: number, otherwise: number): number => {
    const given = search.get(key);
    const value = given !== null && /^\d{1,3}$/.test(given) ? Number(given) : otherwise;
    return value >= min && value <= max ? value : otherwise;
  };
  const word = <T extends string>(key: string, words: readonly T[], otherwise: T): T =>
    words.find((known) => known === search.get(key)) ?? otherwise;
  const bout = search.get("bout") ?? "";
  const zone = search.get("zone");
  const hard = search.getAll("hard").join("");
  return {
    date: isDate(bout) ? bout : fallback.date,
    time: text("at", TIME, fallback.time),
    zone: zone !== null && zone.length <= 64 && knowsZone(zone) ? zone : fallback.zone,
    weeks: whole("weeks", 1, 20, fallback.weeks),
    hard: hard === "" ? fallback.hard : WEEKDAYS.filter((day) => hard.includes(String(day))),
    hardTime: text("hard-at", TIME, fallback.hardTime),
    hardUntil:
      HARD_UNTIL_DAYS.find((days) => String(days) === search.get("hard-until")) ?? fallback.hardUntil,
    lifts: whole("lifts", 1, 4, fallback.lifts),
    base: word("base", STRIKING_BASES, fallback.base),
    age: word("age", TRAINING_AGES, fallback.age),
    weighIn: word("weigh-in", WEIGH_IN_DAYS, fallback.weighIn),
    weighInTime: text("weigh-in-at", TIME, fallback.weighInTime),
    from: text("from", TIME, fallback.from),
    to: text("to", END_TIME, fallback.to),
    other: whole("other", 0, 7, fallback.other),
  };
}

/** Writes the address that `readStartParams` reads back to the same value. */
export function writeStartParams(params: StartParams): string {
  const search = new URLSearchParams();
  const put = (key: string, value: string | number): void => search.set(key, String(value));
  if (isDate(params.date)) put("bout", params.date);
  if (TIME.test(params.time)) put("at", params.time);
  if (params.zone) put("zone", params.zone);
  put("weeks", params.weeks);
  put("hard", params.hard.join("") || 0);
  put("lifts", params.lifts);
  put("base", params.base);
  put("age", params.age);
  put("hard-at", params.hardTime);
  put("hard-until", params.hardUntil);
  put("weigh-in", params.weighIn);
  if (params.weighIn !== "unknown") put("weigh-in-at", params.weighInTime);
  put("from", params.from);
  put("to", params.to);
  put("other", params.other);
  return search.toString();
}
