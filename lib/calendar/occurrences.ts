import * as rruleModule from "rrule";
import { isoFromDay } from "@/lib/engine";
import type { Day } from "@/lib/engine/types";
import { frequencyOf, ruleText, type Frequency, type RuleParts } from "./rrule-text";

// Plain Node sees a CommonJS module without named exports; bundlers and the tests see named ones.
type RRuleClass = (typeof rruleModule)["RRule"];
const RRule: RRuleClass =
  "RRule" in rruleModule
    ? rruleModule.RRule
    : (rruleModule as unknown as { default: { RRule: RRuleClass } }).default.RRule;

const DAY_MS = 86_400_000;

export interface Rule {
  readonly parts: RuleParts;
  /** Local, YYYY-MM-DDTHH:MM. */
  readonly start: string;
  readonly startDay: Day;
  /** Wall clock as if it were UTC, milliseconds; null without UNTIL. */
  readonly until: number | null;
}

/** Periods (days, weeks, months or years) that may still be looked at, over all entries of a call. */
export interface Allowance {
  periods: number;
}

/** About half a second of work: an ordinary camp uses a few hundred periods. */
export const allowance = (): Allowance => ({ periods: 60_000 });

/** Fewest days of a period, and what looking at one costs in days looked at (measured). */
const PERIOD: Record<Frequency, { readonly days: number; readonly price: number }> = {
  DAILY: { days: 1, price: 1 },
  WEEKLY: { days: 7, price: 1 },
  MONTHLY: { days: 28, price: 2 },
  YEARLY: { days: 365, price: 10 },
};

const fakeUtc = (local: string): Date => new Date(`${local}:00Z`);

/**
 * A later start with the same occurrences from `from` on, for rules whose periods are a fixed number of days: a weekly
 * session of ten years' standing costs no more than a new one. COUNT counts from the true start and cannot be skipped.
 */
function nearStart(rule: Rule, frequency: Frequency, interval: number, from: Day): Day {
  const stride = (frequency === "DAILY" ? 1 : 7) * interval;
  const fixed = (frequency === "DAILY" || frequency === "WEEKLY") && !rule.parts.has("COUNT");
  // One stride short of the window, since a week of the rule may begin on another weekday than the series.
  const skip = Math.floor((from - rule.startDay) / stride) - 1;
  return fixed && skip > 0 ? ((rule.startDay + skip * stride) as Day) : rule.startDay;
}

/**
 * Days from `from` to `to` on which a rule falls, at most `most`, in order. The wall clock is given to the library as if it
 * were UTC: no zone takes part. No period that lies behind the window is looked at, so that a rule without occurrences
 * (30 February) ends as well; the library alone would search until the year 9999.
 */
export function occurrences(rule: Rule, from: Day, to: Day, left: Allowance, most = Infinity): Day[] {
  const frequency = frequencyOf(rule.parts) ?? "DAILY";
  const interval = Number(rule.parts.get("INTERVAL") ?? 1);
  const start = nearStart(rule, frequency, interval, from);
  if (start > to) return [];
  const { days, price } = PERIOD[frequency];
  const periods = Math.ceil((to - start) / (days * interval)) + 2;

  const options = RRule.parseString(ruleText(rule.parts));
  const dtstart = fakeUtc(`${isoFromDay(start)}${rule.start.slice(10)}`);
  const search = new RRule(
    { ...options, dtstart, until: rule.until === null ? null : new Date(rule.until) },
    true,
  );
  let looked = 0;
  // Once at first and then twice a period the library reads `interval`; it stops where the former of the two is 0.
  Object.defineProperty(search.options, "interval", {
    get: () => (++looked > 2 * periods + 1 || looked * price > 2 * left.periods ? 0 : interval),
  });
  const found: Day[] = [];
  search.all((date) => {
    const day = Math.floor(date.getTime() / DAY_MS) as Day;
    if (day > to) return false;
    if (day >= from) found.push(day);
    return found.length < most;
  });
  left.periods -= Math.ceil((looked * price) / 2);
  return found;
}
