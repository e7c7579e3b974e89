import { instantAt } from "./geometry";
import { HOUSE_RULES, RULE_KEYS } from "./rules/house-rules";
import type { InputProblem, PlanInput } from "./types";

/** Input that cannot be planned; `problems` says what to mend, field by field. */
export class PlanInputError extends Error {
  override readonly name = "PlanInputError";
  constructor(readonly problems: readonly InputProblem[]) {
    super(problems.map(({ pointer, message }) => `${pointer}: ${message}`).join(" "));
  }
}

type Code = InputProblem["code"];

const within = (value: number, low: number, high: number): boolean => value >= low && value <= high;
const whole = (value: number, low: number, high: number): boolean =>
  Number.isInteger(value) && within(value, low, high);
const isDay = (value: number): boolean => Number.isSafeInteger(value);
const isMinute = (value: number): boolean => whole(value, 0, 1439);

/** Collects one problem for each check that fails. */
class Problems {
  readonly found: InputProblem[] = [];
  check(holds: boolean, code: Code, pointer: string, message: string): void {
    if (!holds) this.found.push({ code, pointer, message });
  }
}

function checkBout(input: PlanInput, problems: Problems): void {
  const { bout, weighIn, now, zone } = input;
  const numbers =
    Number.isFinite(now) && zone.every((step) => Number.isFinite(step.from) && Number.isFinite(step.offset));
  problems.check(numbers, "number", "/bout/timeZone", "The time zone has no usable offsets.");
  problems.check(isDay(bout.day), "number", "/bout/date", "Give a date.");
  problems.check(isMinute(bout.start), "number", "/bout/time", "Give a time of day, 00:00 to 23:59.");
  if (problems.found.length > 0) return;
  const boutAt = instantAt(zone, bout.day, bout.start);
  problems.check(
    boutAt > now,
    "bout-past",
    "/bout/date",
    "The bout is over: give a date that is today or later.",
  );
  if (!weighIn) return;
  const weighInIsTime = isDay(weighIn.day) && isMinute(weighIn.start);
  problems.check(weighInIsTime, "number", "/weighIn/date", "Give a date and a time of day.");
  if (!weighInIsTime) return;
  const order = instantAt(zone, weighIn.day, weighIn.start) <= boutAt;
  problems.check(order, "weigh-in-order", "/weighIn/date", "The weigh-in cannot be after the bout.");
}

function checkAthlete({ athlete }: PlanInput, problems: Problems): void {
  const lifts = whole(athlete.liftsPerWeek, 1, 4);
  problems.check(lifts, "lifts-range", "/athlete/liftsPerWeek", "Lifts a week: a whole number from 1 to 4.");
  athlete.freeHours.forEach(({ weekday, from, to }, index) => {
    const holds = whole(weekday, 1, 7) && whole(from, 0, 1440) && whole(to, 0, 1440) && from < to;
    const message = "Free hours must end after they start, between 00:00 and 24:00 of one day.";
    problems.check(holds, "free-hours", `/athlete/freeHours/${index}`, message);
  });
}

function checkSport({ sport }: PlanInput, problems: Problems): void {
  sport.forEach(({ day, start, minutes, effort, doneLoad }, index) => {
    const at = (field: string): string => `/sport/${index}/${field}`;
    problems.check(isDay(day) && isMinute(start), "number", at("start"), "Give a date and a time of day.");
    problems.check(
      whole(minutes, 1, 1440),
      "sport-range",
      at("minutes"),
      "Minutes: a whole number from 1 to 1440.",
    );
    problems.check(within(effort, 0, 10), "sport-range", at("effort"), "Effort: 0 to 10.");
    const done = doneLoad === undefined || (Number.isFinite(doneLoad) && doneLoad >= 0);
    problems.check(done, "sport-range", at("doneLoad"), "A load that was done is 0 or more.");
  });
}

function checkDecisions({ pins, holds, coachFactors, responses }: PlanInput, problems: Problems): void {
  pins.forEach(({ slot, day, start }, index) => {
    const holdsUp = isDay(day) && isMinute(start) && Number.isInteger(slot.week);
    problems.check(holdsUp, "number", `/pins/${index}`, "Give a date, a time of day and a week.");
  });
  holds.forEach(({ from, to }, index) => {
    problems.check(isDay(from) && (to === null || isDay(to)), "number", `/holds/${index}`, "Give dates.");
  });
  for (const [id, factor] of Object.entries(coachFactors)) {
    problems.check(
      within(factor, 0.5, 1.5),
      "number",
      `/coachFactors/${id}`,
      "The coach's factor: 0.5 to 1.5.",
    );
  }
  responses.forEach(({ from, to, factor }, index) => {
    const at = `/responses/${index}`;
    problems.check(isDay(from) && isDay(to) && from <= to, "number", at, "Give dates, the first one first.");
    problems.check(within(factor, 0.5, 1), "number", `${at}/factor`, "The factor of a suggestion: 0.5 to 1.");
  });
}

function checkRules({ rules }: PlanInput, problems: Problems): void {
  for (const key of RULE_KEYS) {
    const { title, min, max, step, unit } = HOUSE_RULES[key];
    const value = rules[key];
    // Days, weeks, hours and points are counted in whole ones: half a taper day has no place in a calendar.
    const fits = Number.isInteger(step) ? Number.isInteger(value) : Number.isFinite(value);
    const message = `${title}: ${Number.isInteger(step) ? "a whole number from " : ""}${min} to ${max} ${unit}.`;
    problems.check(fits && within(value, min, max), "rule-range", `/houseRules/${key}`, message);
  }
}

/** What keeps an input from being planned, by JSON pointer into a plan request; empty for input that can be planned. */
export function inputProblems(input: PlanInput): readonly InputProblem[] {
  const problems = new Problems();
  const weeks = whole(input.weeks, 1, 20);
  problems.check(weeks, "weeks-range", "/weeks", "Camp length: a whole number of weeks from 1 to 20.");
  checkAthlete(input, problems);
  checkSport(input, problems);
  checkDecisions(input, problems);
  checkRules(input, problems);
  const ofBout = new Problems();
  checkBout(input, ofBout);
  return [...ofBout.found, ...problems.found];
}
