import { hhmm } from "../geometry";
import type { PlacementRuleId } from "../rules/placement-rules";
import { nextFrom, type LiftSpan, type Surroundings } from "./surroundings";

/** What a place costs by one should rule, and why. Whole points. */
export interface Cost {
  readonly rule: PlacementRuleId;
  readonly points: number;
  readonly text: string;
}

const hours = (minutes: number): string => `${Math.round(minutes / 6) / 10} h`;

function sportGapCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const { rules } = around.input;
  let [shortest, name] = [Number.POSITIVE_INFINITY, ""];
  let points = 0;
  for (const other of around.sportByDay.get(lift.day) ?? []) {
    const gap = Math.max(other.startsAt - lift.endsAt, lift.startsAt - other.endsAt);
    const short = rules["sport-gap.hours"] - gap / 60;
    if (short <= 0) continue;
    points += Math.round(short * rules["sport-gap.price"]);
    if (gap < shortest) [shortest, name] = [gap, other.title];
  }
  return points === 0
    ? null
    : {
        rule: "sport-gap",
        points,
        text: `${hours(shortest)} from ${name}; house rule would like ${rules["sport-gap.hours"]} h.`,
      };
}

function nearHardCost(around: Surroundings, lift: LiftSpan): Cost | null {
  if (!lift.heavyLower) return null;
  const { rules } = around.input;
  const next = nextFrom(around.hard, lift.endsAt);
  const gap = next ? next.startsAt - lift.endsAt : Number.POSITIVE_INFINITY;
  if (gap >= rules["heavy-before-hard-48.hours"] * 60) return null;
  return {
    rule: "heavy-before-hard-48",
    points: rules["heavy-before-hard-48.price"],
    text: `Ends ${hours(gap)} before ${next?.title ?? "hard sparring"}; house rule would like ${rules["heavy-before-hard-48.hours"]} h.`,
  };
}

/** Load of the days before that is still there, AU; sessions more than ten time constants back no longer count. */
function residualLoad(around: Surroundings, startsAt: number): number {
  const tau = around.input.rules["fresh-first.hours"] * 60;
  let sum = 0;
  for (const session of around.sport) {
    if (session.endsAt > startsAt) break;
    const age = startsAt - session.endsAt;
    if (age < 10 * tau) sum += session.load * Math.exp(-age / tau);
  }
  return sum;
}

function freshCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const residual = residualLoad(around, lift.startsAt);
  const points = Math.round((residual / 100) * around.input.rules["fresh-first.price"]);
  return points === 0
    ? null
    : {
        rule: "fresh-first",
        points,
        text: `${Math.round(residual)} AU of the days before are still in the legs.`,
      };
}

function hardDayCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const { rules } = around.input;
  if (rules["hard-days-hard.on"] < 1) return null;
  if (around.sportByDay.get(lift.day)?.some(({ kind }) => kind === "hard-sparring")) return null;
  return {
    rule: "hard-days-hard",
    points: rules["hard-days-hard.price"],
    text: "The team likes lifts on hard-sparring days.",
  };
}

function besideFixedCost(around: Surroundings, lift: LiftSpan): Cost | null {
  const { rules } = around.input;
  const prices = [rules["spread.next-day"], rules["spread.second-day"]];
  let points = 0;
  let name = "";
  prices.forEach((price, index) => {
    for (const day of [lift.day - index - 1, lift.day + index + 1]) {
      for (const other of around.fixedByDay.get(day as LiftSpan["day"]) ?? []) {
        points += price;
        name ||= other.title;
      }
    }
  });
  return points === 0 ? null : { rule: "spread", points, text: `Close to ${name}.` };
}

/** What a place costs by itself. `fresh`: the lift wants the freshest day. */
export function shouldCosts(around: Surroundings, lift: LiftSpan, fresh: boolean): Cost[] {
  return [
    sportGapCost(around, lift),
    nearHardCost(around, lift),
    fresh ? freshCost(around, lift) : null,
    hardDayCost(around, lift),
    besideFixedCost(around, lift),
  ].filter((cost) => cost !== null);
}

/**
 * Price of moving a published lift from where it stands, by how near that is. Depends on the old place alone, so that
 * planning a plan again changes nothing. Within the locked hours it is above everything that should rules can add up to.
 */
export function stayPutPrice(around: Surroundings, startsAt: number): number {
  const { rules, now } = around.input;
  const ahead = (startsAt - now) / 60;
  const locked = rules["stay-put.locked.hours"];
  const [near, far] = [rules["stay-put.near"], rules["stay-put.far"]];
  if (ahead <= locked) return LOCKED;
  // Two weeks ahead: the people concerned have not packed yet.
  const farHours = 336;
  if (ahead >= farHours) return far;
  return Math.round(near + ((far - near) * (ahead - locked)) / (farHours - locked));
}

/** More than any week's should costs and unplaced prices together. */
const LOCKED = 200_000;

/** Why a published lift stays where another place would cost less. */
export const stayText = (start: LiftSpan["startMinute"]): string =>
  `Stays at ${hhmm(start as Parameters<typeof hhmm>[0])}, where it was published.`;
