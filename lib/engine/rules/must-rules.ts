import { hhmm } from "../geometry";
import type { Span } from "../placement/spans";
import type { Lifting } from "../placement/surroundings";
import type { MustRule, PlacementRuleId, Shut } from "./placement-rule";
import { daysText, hoursText } from "./wording";

const NONE: readonly Shut[] = [];

const wholeDay = (rule: PlacementRuleId, ids: readonly string[], text: () => string): Shut => ({
  rule,
  from: Number.NEGATIVE_INFINITY,
  to: Number.POSITIVE_INFINITY,
  onClock: false,
  ids,
  text,
});

/** Starts that leave less than `gap` minutes to another session, on either side. */
function beside(rule: PlacementRuleId, lift: Lifting, other: Span, gap: number, text: Shut["text"]): Shut {
  const from = other.startsAt - lift.minutes - gap + 1;
  return { rule, from, to: other.endsAt + gap, onClock: false, ids: [other.id], text };
}

const clash: MustRule = {
  id: "clash",
  title: "Sessions never overlap, with time between",
  kind: "must",
  keys: ["clash.gap"],
  shuts: ({ input, sport, fixed }, lift, { first, last }) => {
    const gap = input.rules["clash.gap"];
    const shuts: Shut[] = [];
    const keepClear = (other: Span): void => {
      if (other.id === lift.id) return;
      const text: Shut["text"] = (startsAt) => {
        const [before, after] = [other.startsAt - startsAt - lift.minutes, startsAt - other.endsAt];
        if (before < 0 && after < 0) return `${lift.title} overlaps ${other.title}.`;
        const place = before >= 0 ? `ends ${before} min before` : `starts ${after} min after`;
        return `${lift.title} ${place} ${other.title}; house rule asks ${gap} min.`;
      };
      shuts.push(beside("clash", lift, other, gap, text));
    };
    sport.within(first - gap, last + lift.minutes + gap).forEach(keepClear);
    fixed.within(first - gap, last + lift.minutes + gap).forEach(keepClear);
    return shuts;
  },
  keepsFrom: (rules) => `Less than ${rules["clash.gap"]} min to another session`,
};

const freeHours: MustRule = {
  id: "free-hours",
  title: "Inside the athlete's free hours, not on rest, travel, weigh-in, bout or held days",
  kind: "must",
  keys: [],
  shuts: ({ shutDays, free }, lift, { day, weekday }) => {
    const shut = shutDays.get(day);
    if (shut)
      return [
        wholeDay("free-hours", shut.ids, () => `${lift.title} falls on ${shut.why}; nothing is lifted then.`),
      ];
    const text: Shut["text"] = (_, start) => `${lift.title} at ${hhmm(start)} is outside the free hours.`;
    const shuts: Shut[] = [];
    let open = 0;
    for (const { from, to } of free.fitting(weekday, lift.minutes)) {
      if (from > open) shuts.push({ rule: "free-hours", from: open, to: from, onClock: true, ids: [], text });
      open = to + 1;
    }
    shuts.push({
      rule: "free-hours",
      from: open,
      to: Number.POSITIVE_INFINITY,
      onClock: true,
      ids: [],
      text,
    });
    return shuts;
  },
  keepsFrom: () => "Outside the free hours, or a day without lifting",
};

const heavyBeforeHard: MustRule = {
  id: "heavy-before-hard",
  title: "Heavy legs end well before hard sparring",
  kind: "must",
  keys: ["heavy-before-hard.hours"],
  shuts: ({ input, hard }, lift, { first, last }) => {
    if (!lift.heavyLower) return NONE;
    const asked = input.rules["heavy-before-hard.hours"];
    return hard.within(first, last + lift.minutes + asked * 60).map((sparring) => ({
      rule: "heavy-before-hard",
      from: sparring.startsAt - lift.minutes - asked * 60 + 1,
      // Up to its very start: what starts during or after it is the business of the rule on lifts after hard sparring.
      to: sparring.startsAt + 1,
      onClock: false,
      ids: [sparring.id],
      text: (startsAt) => {
        const gap = sparring.startsAt - startsAt - lift.minutes;
        const place = gap < 0 ? "is not over before" : `ends ${hoursText(gap)} before`;
        return `${lift.title} ${place} ${sparring.title}; house rule asks ${asked} h.`;
      },
    }));
  },
  keepsFrom: (rules) => `Less than ${rules["heavy-before-hard.hours"]} h before hard sparring`,
};

const askedAfterHard = (rules: Parameters<MustRule["keepsFrom"]>[0], { heavyLower }: Lifting): number =>
  Math.max(rules["lift-after-hard.hours"], heavyLower ? rules["heavy-after-hard.hours"] : 0);

const liftAfterHard: MustRule = {
  id: "lift-after-hard",
  title: "A lift waits after hard sparring",
  kind: "must",
  keys: ["lift-after-hard.hours", "heavy-after-hard.hours"],
  shuts: ({ input, hard }, lift, { first, last }) => {
    const asked = askedAfterHard(input.rules, lift);
    return hard.within(first - asked * 60, last).map((sparring) => ({
      rule: "lift-after-hard",
      from: sparring.startsAt + 1,
      to: sparring.endsAt + asked * 60,
      onClock: false,
      ids: [sparring.id],
      text: (startsAt) => {
        const gap = startsAt - sparring.endsAt;
        const place = gap < 0 ? "starts before the end of" : `starts ${hoursText(gap)} after`;
        return `${lift.title} ${place} ${sparring.title}; house rule asks ${asked} h.`;
      },
    }));
  },
  keepsFrom: (rules, lift) => `Less than ${askedAfterHard(rules, lift)} h after hard sparring`,
};

const heavyApart: MustRule = {
  id: "heavy-apart",
  title: "Heavy legs lie apart",
  kind: "must",
  keys: ["heavy-apart.hours"],
  shuts: ({ input, fixedHeavy }, lift, { first, last }) => {
    if (!lift.heavyLower) return NONE;
    const asked = input.rules["heavy-apart.hours"];
    return fixedHeavy
      .within(first - asked * 60, last + lift.minutes + asked * 60)
      .filter(({ id }) => id !== lift.id)
      .map((other) =>
        beside("heavy-apart", lift, other, asked * 60, (startsAt) => {
          const gap = Math.max(other.startsAt - startsAt - lift.minutes, startsAt - other.endsAt);
          return `${lift.title} and ${other.title} lie ${hoursText(gap)} apart; house rule asks ${asked} h.`;
        }),
      );
  },
  keepsFrom: (rules) => `Less than ${rules["heavy-apart.hours"]} h from another heavy lift`,
};

const oneLift: MustRule = {
  id: "one-lift",
  title: "One lift a day, and not one session too many",
  kind: "must",
  keys: ["sessions-a-day"],
  shuts: ({ input, sport, fixed }, lift, { day }) => {
    const others = fixed.on(day).filter(({ id }) => id !== lift.id);
    const shuts = others.map((other) =>
      wholeDay(
        "one-lift",
        [other.id],
        () => `${lift.title} and ${other.title} are on one day; there is one lift a day.`,
      ),
    );
    const sessions = sport.on(day);
    const most = input.rules["sessions-a-day"];
    if (sessions.length + 1 <= most) return shuts;
    const text = (): string =>
      `${lift.title} is session ${sessions.length + 1} of its day; house rule allows ${most}.`;
    return [
      ...shuts,
      wholeDay(
        "one-lift",
        sessions.map(({ id }) => id),
        text,
      ),
    ];
  },
  keepsFrom: (rules) => `Another lift that day, or ${rules["sessions-a-day"]} sessions already`,
};

const lastHeavy: MustRule = {
  id: "last-heavy",
  title: "No heavy legs in the last days",
  kind: "must",
  keys: ["last-heavy.days"],
  shuts: ({ input }, lift, { day }) => {
    const [out, asked] = [input.bout.day - day, input.rules["last-heavy.days"]];
    if (!lift.heavyLower || out >= asked) return NONE;
    const text = `${lift.title} is heavy for the legs ${daysText(out)} out; house rule asks ${asked} or more.`;
    return [wholeDay("last-heavy", [], () => text)];
  },
  keepsFrom: (rules) => `Heavy legs at fewer than ${daysText(rules["last-heavy.days"])} out`,
};

const lastLift: MustRule = {
  id: "last-lift",
  title: "Only the primer, then nothing, before the bout",
  kind: "must",
  keys: ["only-primer.days", "last-lift.days"],
  shuts: ({ input }, lift, { day }) => {
    const out = input.bout.day - day;
    const [none, primer] = [input.rules["last-lift.days"], input.rules["only-primer.days"]];
    const says =
      out <= none
        ? `ends lifting at ${daysText(none)} out`
        : `allows only the primer from ${daysText(primer)} out`;
    if (out > none && (lift.primer || out > primer)) return NONE;
    return [
      wholeDay("last-lift", [], () => `${lift.title} stands ${daysText(out)} out; house rule ${says}.`),
    ];
  },
  keepsFrom: (rules, { primer }) =>
    primer
      ? `Lifting at ${daysText(rules["last-lift.days"])} out or fewer`
      : `Other than the primer at ${daysText(Math.max(rules["last-lift.days"], rules["only-primer.days"]))} out or fewer`,
};

/** In the order in which they are told. */
export const MUST_RULES: readonly MustRule[] = [
  clash,
  freeHours,
  heavyBeforeHard,
  liftAfterHard,
  heavyApart,
  oneLift,
  lastHeavy,
  lastLift,
];
