import { afterFactor, beforeFactor } from "../dose/sparring";
import { instantAt } from "../geometry";
import type { Lifting, Surroundings } from "../placement/surroundings";
import type { Day } from "../types";
import type { ShouldRule } from "./placement-rule";
import { hoursText } from "./wording";

const nothing = (): null => null;

const restDay: ShouldRule = {
  id: "rest-day",
  title: "A free day a week",
  kind: "should",
  keys: ["rest-day.price"],
  // A matter of the whole week: the problem carries it in `weekly`.
  pricing: nothing,
};

const sportGap: ShouldRule = {
  id: "sport-gap",
  title: "Hours between a lift and other training of the day",
  kind: "should",
  keys: ["sport-gap.hours", "sport-gap.price"],
  pricing: ({ input, sport }, lift, { day }) => {
    const sessions = sport.on(day);
    const [asked, price] = [input.rules["sport-gap.hours"], input.rules["sport-gap.price"]];
    if (sessions.length === 0 || price === 0) return null;
    const gapTo = (session: (typeof sessions)[number], startsAt: number): number =>
      Math.max(0, session.startsAt - startsAt - lift.minutes, startsAt - session.endsAt);
    return {
      points: (startsAt) => {
        let points = 0;
        for (const session of sessions) {
          const short = asked - gapTo(session, startsAt) / 60;
          if (short > 0) points += Math.round(short * price);
        }
        return points;
      },
      text: (startsAt) => {
        const [nearest] = [...sessions].sort((a, b) => gapTo(a, startsAt) - gapTo(b, startsAt));
        if (!nearest) return "";
        const place = nearest.startsAt > startsAt ? "before" : "after";
        return `${hoursText(gapTo(nearest, startsAt))} ${place} ${nearest.title}; house rule would like ${asked} h.`;
      },
    };
  },
};

const heavyBeforeHard48: ShouldRule = {
  id: "heavy-before-hard-48",
  title: "Heavy legs two days before hard sparring",
  kind: "should",
  keys: ["heavy-before-hard-48.hours", "heavy-before-hard-48.price"],
  pricing: ({ input, hard }, lift, { first, last }) => {
    const [asked, price] = [
      input.rules["heavy-before-hard-48.hours"],
      input.rules["heavy-before-hard-48.price"],
    ];
    if (!lift.heavyLower || price === 0) return null;
    if (hard.within(first, last + lift.minutes + asked * 60).length === 0) return null;
    const gapAfter = (startsAt: number): number => {
      const next = hard.nextFrom(startsAt + lift.minutes);
      return next ? next.startsAt - startsAt - lift.minutes : Number.POSITIVE_INFINITY;
    };
    return {
      points: (startsAt) => (gapAfter(startsAt) < asked * 60 ? price : 0),
      text: (startsAt) => {
        const next = hard.nextFrom(startsAt + lift.minutes);
        return `Ends ${hoursText(gapAfter(startsAt))} before ${next?.title ?? "hard sparring"}; house rule would like ${asked} h.`;
      },
    };
  },
};

const fullDose: ShouldRule = {
  id: "full-dose",
  title: "Lifts where hard sparring takes least of them",
  kind: "should",
  keys: ["full-dose.price"],
  pricing: ({ input, hard }, lift, { first, last }) => {
    const { rules } = input;
    const price = rules["full-dose.price"];
    if (price === 0) return null;
    const reach = { before: 60 * rules["before.far"], after: 60 * rules["after.far"] };
    if (hard.within(first - reach.after, last + lift.minutes + reach.before).length === 0) return null;
    // The dose's own factors, so that a place costs by the sets that it will take.
    const share = (startsAt: number): number => {
      const next = hard.nextFrom(startsAt);
      const before = next ? Math.max(0, next.startsAt - startsAt - lift.minutes) / 60 : Infinity;
      const previous = hard.lastBefore(startsAt);
      const after = previous ? Math.max(0, startsAt - previous.endsAt) / 60 : Infinity;
      return beforeFactor(before, rules) * afterFactor(after, rules);
    };
    return {
      points: (startsAt) => Math.round(10 * price * (1 - share(startsAt))),
      text: (startsAt) =>
        `Hard sparring near it takes ${Math.round(100 * (1 - share(startsAt)))} % of its sets.`,
    };
  },
};

const freshFirst: ShouldRule = {
  id: "fresh-first",
  title: "The main lift on the freshest day",
  kind: "should",
  keys: ["fresh-first.price", "fresh-first.hours"],
  pricing: ({ input, residual }, lift) => {
    const price = input.rules["fresh-first.price"];
    if (!lift.fresh || price === 0) return null;
    return {
      points: (startsAt) => Math.round((residual(startsAt) / 100) * price),
      text: (startsAt) =>
        `${Math.round(residual(startsAt))} AU of the sport before it are still in the legs.`,
    };
  },
};

/** Lifts that stand `apart` days from a day, and what each of them costs. */
function standingNear(
  { input, fixed }: Surroundings,
  lift: Lifting,
  day: Day,
): { points: number; titles: string[] } {
  const titles: string[] = [];
  let points = 0;
  [input.rules["spread.next-day"], input.rules["spread.second-day"]].forEach((price, index) => {
    if (price === 0) return;
    for (const near of [day - index - 1, day + index + 1]) {
      for (const other of fixed.on(near as Day)) {
        if (other.id === lift.id) continue;
        points += price;
        titles.push(other.title);
      }
    }
  });
  return { points, titles };
}

const spread: ShouldRule = {
  id: "spread",
  title: "Lifts spread over the week",
  kind: "should",
  keys: ["spread.next-day", "spread.second-day"],
  // Against lifts that stand; between lifts that are being placed the problem carries it in `spread`.
  pricing: (around, lift, { day }) => {
    if (around.fixed.list.length === 0) return null;
    const { points, titles } = standingNear(around, lift, day);
    if (points === 0) return null;
    const names = titles.join(" and ");
    return {
      points: () => points,
      text: () => `Within two days of ${names}; house rule would like them spread.`,
    };
  },
};

const hardDaysHard: ShouldRule = {
  id: "hard-days-hard",
  title: "Lift on hard days, after the sparring",
  kind: "should",
  keys: ["hard-days-hard.on", "hard-days-hard.price"],
  pricing: ({ input, hard }, _lift, { day }) => {
    const price = input.rules["hard-days-hard.price"];
    if (input.rules["hard-days-hard.on"] < 1 || price === 0) return null;
    const ends = hard.on(day).map(({ endsAt }) => endsAt);
    const first = Math.min(...ends);
    return {
      points: (startsAt) => (startsAt >= first ? 0 : price),
      text: () => "Not after hard sparring of the same day; the team likes easy days easy.",
    };
  },
};

/** Above all that should rules and unplaced lifts of a week can add up to (see `problem`), so only a must rule moves it. */
const LOCKED = 2_000_000;
/** Hours ahead from which a move costs least: two weeks, before anybody has packed. Common practice, no published source. */
const FAR_HOURS = 336;

/**
 * Price of taking a published lift from where it stands, by moving it or by leaving it out alike. It falls in a line from
 * the locked hours on, and depends on the old place alone: then planning a plan again changes nothing.
 */
export function stayPutPrice({ input }: Pick<Surroundings, "input">, base: Lifting["base"]): number {
  if (!base) return 0;
  const { rules, now, zone } = input;
  const ahead = (instantAt(zone, base.day, base.start) - now) / 60;
  const locked = rules["stay-put.locked.hours"];
  const [near, far] = [rules["stay-put.near"], rules["stay-put.far"]];
  if (ahead < locked) return LOCKED;
  if (ahead >= FAR_HOURS) return far;
  return Math.round(near + ((far - near) * (ahead - locked)) / (FAR_HOURS - locked));
}

const stayPut: ShouldRule = {
  id: "stay-put",
  title: "Published sessions stay",
  kind: "should",
  keys: ["stay-put.far", "stay-put.near", "stay-put.locked.hours"],
  pricing: (around, { base }, { day }) => {
    const price = stayPutPrice(around, base);
    if (!base || price === 0) return null;
    return {
      points: (_, start) => (day === base.day && start === base.start ? 0 : price),
      text: () => "Not where it was published.",
    };
  },
};

/** In the order in which they are told. */
export const SHOULD_RULES: readonly ShouldRule[] = [
  restDay,
  sportGap,
  heavyBeforeHard48,
  fullDose,
  freshFirst,
  spread,
  hardDaysHard,
  stayPut,
];
