import { hhmm } from "../geometry";
import type { PlacementRuleId } from "../rules/placement-rules";
import type { Minute, Reason } from "../types";
import { lastBefore, nextFrom, type LiftSpan, type Span, type Surroundings } from "./surroundings";

/** A must rule that a lift breaks, and with what. */
export interface Break {
  readonly rule: PlacementRuleId;
  readonly with: string | null;
  readonly text: string;
}

const hours = (minutes: number): string => {
  const whole = Math.round(minutes / 6) / 10;
  return `${whole} h`;
};

const brk = (rule: PlacementRuleId, other: Span | null, text: string): Break => ({
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
  const out = bout.day - lift.day;
  const shut = around.shutDays.get(lift.day);
  if (shut) return brk("free-hours", null, `${lift.title} falls on ${shut}; nothing is lifted then.`);
  if (lift.heavyLower && out < rules["last-heavy.days"]) {
    return brk(
      "last-heavy",
      null,
      `${lift.title} is heavy for the legs ${out} days out; house rule asks ${rules["last-heavy.days"]} days or more.`,
    );
  }
  if (out <= rules["last-lift.days"]) {
    return brk(
      "last-lift",
      null,
      `${lift.title} stands ${out} ${out === 1 ? "day" : "days"} out; house rule ends lifting before that.`,
    );
  }
  if (!lift.primer && out <= rules["only-primer.days"]) {
    return brk(
      "last-lift",
      null,
      `${lift.title} stands ${out} days out; house rule keeps those days for the primer.`,
    );
  }
  const other = around.fixedByDay.get(lift.day)?.find(({ id }) => id !== lift.id);
  if (other)
    return brk("one-lift", other, `${lift.title} would be the day's second lift beside ${other.title}.`);
  const sport = around.sportByDay.get(lift.day)?.length ?? 0;
  if (sport >= rules["sessions-a-day"]) {
    return brk(
      "one-lift",
      null,
      `${lift.title} would be session ${sport + 1} of the day; house rule allows ${rules["sessions-a-day"]}.`,
    );
  }
  return null;
}

function clashBreak(around: Surroundings, lift: LiftSpan): Break | null {
  const gap = around.input.rules["clash.gap"];
  for (let day = lift.day - 1; day <= lift.day + 1; day++) {
    const others = [
      ...(around.sportByDay.get(day as LiftSpan["day"]) ?? []),
      ...(around.fixedByDay.get(day as LiftSpan["day"]) ?? []),
    ];
    for (const other of others) {
      if (other.id === lift.id || other.startsAt - lift.endsAt >= gap || lift.startsAt - other.endsAt >= gap)
        continue;
      return brk("clash", other, `${lift.title} leaves less than ${gap} min to ${other.title}.`);
    }
  }
  return null;
}

function sparringBreak(around: Surroundings, lift: LiftSpan): Break | null {
  const { rules } = around.input;
  if (lift.heavyLower) {
    const next = nextFrom(around.hard, lift.endsAt);
    const before = next ? next.startsAt - lift.endsAt : Number.POSITIVE_INFINITY;
    if (before < rules["heavy-before-hard.hours"] * 60) {
      return brk(
        "heavy-before-hard",
        next,
        `${lift.title} ends ${hours(before)} before ${next?.title ?? "hard sparring"}; house rule asks ${rules["heavy-before-hard.hours"]} h.`,
      );
    }
  }
  const last = lastBefore(around.hard, lift.startsAt);
  const asked = Math.max(
    rules["lift-after-hard.hours"],
    lift.heavyLower ? rules["heavy-after-hard.hours"] : 0,
  );
  const after = last ? lift.startsAt - last.endsAt : Number.POSITIVE_INFINITY;
  if (after < asked * 60) {
    return brk(
      "lift-after-hard",
      last,
      `${lift.title} starts ${hours(Math.max(0, after))} after ${last?.title ?? "hard sparring"}; house rule asks ${asked} h.`,
    );
  }
  return null;
}

function apartBreak(around: Surroundings, lift: LiftSpan): Break | null {
  if (!lift.heavyLower) return null;
  const asked = around.input.rules["heavy-apart.hours"];
  for (const other of around.fixed) {
    if (!other.heavyLower || other.id === lift.id) continue;
    const gap = Math.max(other.startsAt - lift.endsAt, lift.startsAt - other.endsAt);
    if (gap < asked * 60)
      return brk(
        "heavy-apart",
        other,
        `${lift.title} lies ${hours(Math.max(0, gap))} from ${other.title}; house rule asks ${asked} h.`,
      );
  }
  return null;
}

/** What a lift breaks by its time, against sport and the lifts that stand. First found; null where it breaks nothing. */
export const timeBreak = (around: Surroundings, lift: LiftSpan): Break | null =>
  clashBreak(around, lift) ?? sparringBreak(around, lift) ?? apartBreak(around, lift);

/** Everything a standing lift breaks. */
export function allBreaks(around: Surroundings, lift: LiftSpan, minutes: number): Break[] {
  const found = [
    dayBreak(around, lift),
    clashBreak(around, lift),
    sparringBreak(around, lift),
    apartBreak(around, lift),
    hoursBreak(around, lift, minutes),
  ];
  return found.filter((value) => value !== null);
}

function hoursBreak(around: Surroundings, lift: LiftSpan, minutes: number): Break | null {
  if (around.shutDays.has(lift.day)) return null;
  const weekday = ((((lift.day + 3) % 7) + 7) % 7) + 1;
  const local = lift.startMinute;
  const inside = around.input.athlete.freeHours.some(
    (free) => free.weekday === weekday && free.from <= local && local + minutes <= free.to,
  );
  return inside
    ? null
    : brk(
        "free-hours",
        null,
        `${lift.title} at ${hhmm(local as Minute)} is outside the athlete's free hours.`,
      );
}

export const reasonOf = ({ rule, text }: Break): Reason => ({ rule, text });
