import type { PlacementRuleId } from "../rules/placement-rules";
import type { Day } from "../types";
import { nextFrom, type LiftSpan, type Surroundings } from "./surroundings";

/** What a place costs by one should rule, in whole points, and why. */
export interface Cost {
  readonly rule: PlacementRuleId;
  readonly points: number;
  readonly text: () => string;
}

const hours = (minutes: number): string => `${Math.round(minutes / 6) / 10} h`;

function sportGapCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const others = around.sportByDay.get(lift.day);
  if (!others) return null;
  const { rules } = around.input;
  const asked = rules["sport-gap.hours"];
  let [shortest, nearest] = [asked * 60, ""];
  let points = 0;
  for (const other of others) {
    const gap = Math.max(other.startsAt - lift.endsAt, lift.startsAt - other.endsAt);
    if (gap >= asked * 60) continue;
    points += Math.round((asked - gap / 60) * rules["sport-gap.price"]);
    if (gap < shortest) [shortest, nearest] = [gap, other.title];
  }
  if (points === 0) return null;
  return {
    rule: "sport-gap",
    points,
    text: () => `${hours(shortest)} from ${nearest}; house rule would like ${asked} h.`,
  };
}

function nearHardCost(around: Surroundings, lift: LiftSpan): Cost | null {
  if (!lift.heavyLower) return null;
  const next = nextFrom(around.hard, lift.endsAt);
  const { rules } = around.input;
  const wanted = rules["heavy-before-hard-48.hours"];
  if (!next || next.startsAt - lift.endsAt >= wanted * 60) return null;
  return {
    rule: "heavy-before-hard-48",
    points: rules["heavy-before-hard-48.price"],
    text: () =>
      `Ends ${hours(next.startsAt - lift.endsAt)} before ${next.title}; house rule would like ${wanted} h.`,
  };
}

function freshCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const residual = around.residual(lift.startsAt);
  const points = Math.round((residual / 100) * around.input.rules["fresh-first.price"]);
  if (points === 0) return null;
  return {
    rule: "fresh-first",
    points,
    text: () => `${Math.round(residual)} AU of the days before are still in the legs.`,
  };
}

function hardDayCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const { rules } = around.input;
  if (rules["hard-days-hard.on"] < 1) return null;
  if (around.sportByDay.get(lift.day)?.some(({ kind }) => kind === "hard-sparring")) return null;
  return {
    rule: "hard-days-hard",
    points: rules["hard-days-hard.price"],
    text: () => "The team likes lifts on hard-sparring days.",
  };
}

function besideFixedCost(around: Surroundings, lift: LiftSpan): Cost | null {
  if (around.fixed.length === 0) return null;
  const { rules } = around.input;
  const prices = [rules["spread.next-day"], rules["spread.second-day"]];
  let points = 0;
  let name = "";
  for (const [index, price] of prices.entries()) {
    for (const day of [lift.day - index - 1, lift.day + index + 1]) {
      for (const other of around.fixedByDay.get(day as Day) ?? []) {
        points += price;
        name ||= other.title;
      }
    }
  }
  return points === 0 ? null : { rule: "spread", points, text: () => `Close to ${name}.` };
}

/** What a place costs by itself, rule by rule. `fresh`: the lift wants the freshest day. */
export const shouldCosts = (around: Surroundings, lift: LiftSpan, fresh: boolean): Cost[] =>
  [
    sportGapCost(around, lift),
    nearHardCost(around, lift),
    fresh ? freshCost(around, lift) : null,
    hardDayCost(around, lift),
    besideFixedCost(around, lift),
  ].filter((cost) => cost !== null);

/** Sum of `shouldCosts`, without the list. */
export const shouldPoints = (around: Surroundings, lift: LiftSpan, fresh: boolean): number =>
  (sportGapCost(around, lift)?.points ?? 0) +
  (nearHardCost(around, lift)?.points ?? 0) +
  (fresh ? (freshCost(around, lift)?.points ?? 0) : 0) +
  (hardDayCost(around, lift)?.points ?? 0) +
  (besideFixedCost(around, lift)?.points ?? 0);

/** More than any week's should costs and unplaced prices together. */
const LOCKED = 200_000;
/** Hours ahead from which a move costs least: two weeks, before anybody has packed or booked. Common practice, no published source. */
const FAR_HOURS = 336;

/**
 * Price of moving a published lift from where it stands, by how near that is. It depends on the old place alone, so that
 * planning a plan again changes nothing. Within the locked hours it is above everything that should rules can add up to.
 */
export function stayPutPrice(around: Surroundings, startsAt: number): number {
  const { rules, now } = around.input;
  const ahead = (startsAt - now) / 60;
  const locked = rules["stay-put.locked.hours"];
  const [near, far] = [rules["stay-put.near"], rules["stay-put.far"]];
  if (ahead <= locked) return LOCKED;
  if (ahead >= FAR_HOURS) return far;
  return Math.round(near + ((far - near) * (ahead - locked)) / (FAR_HOURS - locked));
}
