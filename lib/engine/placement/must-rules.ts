import { hhmm, weekdayOf } from "../geometry";
import type { PlacementRuleId } from "../rules/placement-rules";
import type { Day, Minute, Reason } from "../types";
import { lastBefore, nextFrom, type LiftSpan, type Span, type Surroundings } from "./surroundings";

/** A must rule that a lift breaks, and with what. */
export interface Break {
  readonly rule: PlacementRuleId;
  readonly with: string | null;
  /** Worded only where it is shown: thousands of candidates are shut, a few are told of. */
  readonly text: () => string;
}

const hours = (minutes: number): string => `${Math.round(minutes / 6) / 10} h`;
const days = (count: number): string => `${count} ${count === 1 ? "day" : "days"}`;

const broken = (rule: PlacementRuleId, other: Span | null, text: () => string): Break => ({
  rule,
  with: other?.id ?? null,
  text,
});

/** What a lift breaks by its day alone: the same for every start of the day. */
export function dayBreak(
  around: Surroundings,
  lift: Pick<LiftSpan, "id" | "title" | "day" | "heavyLower" | "primer">,
): Break | null {
  const { rules, bout } = around.input;
  const { title } = lift;
  const out = bout.day - lift.day;
  const shut = around.shutDays.get(lift.day);
  if (shut) return broken("free-hours", null, () => `${title} falls on ${shut}; nothing is lifted then.`);
  if (lift.heavyLower && out < rules["last-heavy.days"]) {
    return broken(
      "last-heavy",
      null,
      () =>
        `${title} is heavy for the legs ${days(out)} out; house rule asks ${rules["last-heavy.days"]} or more.`,
    );
  }
  if (out <= rules["last-lift.days"]) {
    return broken(
      "last-lift",
      null,
      () => `${title} stands ${days(out)} out; house rule ends lifting before that.`,
    );
  }
  if (!lift.primer && out <= rules["only-primer.days"]) {
    return broken(
      "last-lift",
      null,
      () => `${title} stands ${days(out)} out; house rule keeps those days for the primer.`,
    );
  }
  const other = around.fixedByDay.get(lift.day)?.find(({ id }) => id !== lift.id);
  if (other)
    return broken("one-lift", other, () => `${title} would be the day's second lift beside ${other.title}.`);
  const sport = around.sportByDay.get(lift.day)?.length ?? 0;
  if (sport >= rules["sessions-a-day"]) {
    return broken(
      "one-lift",
      null,
      () =>
        `${title} would be session ${sport + 1} of the day; house rule allows ${rules["sessions-a-day"]}.`,
    );
  }
  return null;
}

function tooClose(list: readonly Span[] | undefined, lift: LiftSpan, gap: number): Span | null {
  if (!list) return null;
  for (const other of list) {
    if (other.startsAt - lift.endsAt < gap && lift.startsAt - other.endsAt < gap && other.id !== lift.id)
      return other;
  }
  return null;
}

function clashBreak(around: Surroundings, lift: LiftSpan): Break | null {
  const gap = around.input.rules["clash.gap"];
  for (let day = lift.day - 1; day <= lift.day + 1; day++) {
    const other =
      tooClose(around.sportByDay.get(day as Day), lift, gap) ??
      tooClose(around.fixedByDay.get(day as Day), lift, gap);
    if (other)
      return broken("clash", other, () => `${lift.title} leaves less than ${gap} min to ${other.title}.`);
  }
  return null;
}

function beforeHardBreak(around: Surroundings, lift: LiftSpan): Break | null {
  if (!lift.heavyLower) return null;
  const next = nextFrom(around.hard, lift.endsAt);
  const asked = around.input.rules["heavy-before-hard.hours"];
  if (!next || next.startsAt - lift.endsAt >= asked * 60) return null;
  return broken(
    "heavy-before-hard",
    next,
    () =>
      `${lift.title} ends ${hours(next.startsAt - lift.endsAt)} before ${next.title}; house rule asks ${asked} h.`,
  );
}

function afterHardBreak(around: Surroundings, lift: LiftSpan): Break | null {
  const last = lastBefore(around.hard, lift.startsAt);
  if (!last) return null;
  const { rules } = around.input;
  const asked = Math.max(
    rules["lift-after-hard.hours"],
    lift.heavyLower ? rules["heavy-after-hard.hours"] : 0,
  );
  const gap = lift.startsAt - last.endsAt;
  if (gap >= asked * 60) return null;
  return broken(
    "lift-after-hard",
    last,
    () => `${lift.title} starts ${hours(Math.max(0, gap))} after ${last.title}; house rule asks ${asked} h.`,
  );
}

function apartBreak(around: Surroundings, lift: LiftSpan): Break | null {
  if (!lift.heavyLower) return null;
  const asked = around.input.rules["heavy-apart.hours"];
  for (const other of around.fixedHeavy) {
    const gap = Math.max(other.startsAt - lift.endsAt, lift.startsAt - other.endsAt);
    if (gap >= asked * 60 || other.id === lift.id) continue;
    return broken(
      "heavy-apart",
      other,
      () => `${lift.title} lies ${hours(Math.max(0, gap))} from ${other.title}; house rule asks ${asked} h.`,
    );
  }
  return null;
}

function hoursBreak(around: Surroundings, lift: LiftSpan): Break | null {
  if (around.shutDays.has(lift.day)) return null;
  const weekday = weekdayOf(lift.day);
  const end = lift.startMinute + (lift.endsAt - lift.startsAt);
  const inside = around.input.athlete.freeHours.some(
    (free) => free.weekday === weekday && free.from <= lift.startMinute && end <= free.to,
  );
  if (inside) return null;
  return broken(
    "free-hours",
    null,
    () => `${lift.title} at ${hhmm(lift.startMinute as Minute)} is outside the athlete's free hours.`,
  );
}

/** What a lift breaks by its time, against sport and the lifts that stand. First found; null where it breaks nothing. */
export const timeBreak = (around: Surroundings, lift: LiftSpan): Break | null =>
  clashBreak(around, lift) ??
  beforeHardBreak(around, lift) ??
  afterHardBreak(around, lift) ??
  apartBreak(around, lift);

/** Everything that a lift breaks where it stands. */
export const allBreaks = (around: Surroundings, lift: LiftSpan): Break[] =>
  [dayBreak, clashBreak, beforeHardBreak, afterHardBreak, apartBreak, hoursBreak]
    .map((rule) => rule(around, lift))
    .filter((found) => found !== null);

export const reasonOf = ({ rule, text }: Break): Reason => ({ rule, text: text() });
