/**
 * The house rules: every threshold of the engine, with unit, range, reason and source. A team may change the value
 * within the range; the engine reads values only from here, through `HouseRules`.
 *
 * `source` names the publication where there is one; "common practice, no published source" where there is none; a
 * published value that nobody on the team has read in its source is marked "from memory".
 */

const COMMON = "common practice, no published source";

export type RuleGroup = "must" | "should" | "camp" | "dose" | "load" | "form";

interface Setting {
  readonly title: string;
  readonly group: RuleGroup;
  readonly unit: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  /** Smallest useful step, for forms. */
  readonly step: number;
  readonly reason: string;
  readonly source: string;
}

const setting = (
  group: RuleGroup,
  title: string,
  value: number,
  unit: string,
  [min, max, step]: readonly [number, number, number],
  reason: string,
  source: string = COMMON,
): Setting => ({ group, title, value, unit, min, max, step, reason, source });

export const HOUSE_RULES = {
  // Must rules of placement
  "clash.gap": setting(
    "must",
    "Least gap between two sessions",
    45,
    "min",
    [0, 240, 5],
    "Time to change, eat a little and move between rooms.",
  ),
  "heavy-before-hard.hours": setting(
    "must",
    "Heavy lower body ends before hard sparring",
    24,
    "h",
    [12, 72, 1],
    "Legs still slow from squats take more shots; volume load is down a day after lower-body work to failure.",
    "Eur J Sport Sci, time-course of changes after resistance training (volume load -0.90 ES at 24 h); engine floor of 24 h derived",
  ),
  "lift-after-hard.hours": setting(
    "must",
    "Lift starts after hard sparring",
    6,
    "h",
    [0, 24, 1],
    "Two contradictory qualities closer than 6 h cost strength.",
    "Robineau et al. 2016, J Strength Cond Res 30(3):672-683",
  ),
  "heavy-after-hard.hours": setting(
    "must",
    "Heavy lower body starts after hard sparring",
    12,
    "h",
    [0, 48, 1],
    "Jump height is down after rounds and damage markers are still up a day later; a night's sleep is the least.",
    "Ghoul et al. 2019, J Strength Cond Res 33(6):1570-1579; the 12 h floor is common practice",
  ),
  "heavy-apart.hours": setting(
    "must",
    "Between two heavy lower-body sessions",
    48,
    "h",
    [24, 96, 1],
    "First-set volume is still down at 48 h and restored after it.",
    "Eur J Sport Sci, time-course of changes after resistance training (first-set volume -0.63 ES at 48 h)",
  ),
  "sessions-a-day": setting(
    "must",
    "Most sessions a day",
    2,
    "sessions",
    [1, 3, 1],
    "A third session is where form and attention go first; the sport's own timetable may still hold more.",
  ),
  "last-heavy.days": setting(
    "must",
    "No heavy lower body at fewer days out than",
    7,
    "days",
    [3, 14, 1],
    "Strength tapers end 3 to 5 days out; a fighter who cuts weight and travels stops earlier.",
    "Pritchard et al. 2016, J Strength Cond Res 30(7):1796-1804 (3.7 ± 1.6 d); the longer default is common practice",
  ),
  "only-primer.days": setting(
    "must",
    "Only the primer from this many days out",
    2,
    "days",
    [1, 5, 1],
    "Priming works 1 to 48 h ahead; anything longer costs more than it gives.",
    "Harrison et al. 2019, Sports Med 49:1487-1514",
  ),
  "last-lift.days": setting(
    "must",
    "No lifting from this many days out",
    1,
    "days",
    [0, 4, 1],
    "The day before belongs to the scale and to travel.",
  ),

  // Should rules of placement: prices
  "rest-day.price": setting(
    "should",
    "A week without a free day",
    60,
    "points",
    [0, 500, 5],
    "One day a week without training keeps monotony down.",
    "Foster 1998, Med Sci Sports Exerc 30:1164-1168 (monotony)",
  ),
  "sport-gap.hours": setting(
    "should",
    "Gap to other training of the same day",
    6,
    "h",
    [0, 12, 1],
    "Strength gains were lower with no gap than with 6 h.",
    "Robineau et al. 2016, J Strength Cond Res 30(3):672-683",
  ),
  "sport-gap.price": setting(
    "should",
    "Each hour short of that gap",
    6,
    "points",
    [0, 100, 1],
    "The nearer, the worse; a short gap still beats a lost session.",
  ),
  "heavy-before-hard-48.hours": setting(
    "should",
    "Heavy lower body ideally ends before hard sparring",
    48,
    "h",
    [24, 96, 1],
    "Performance was restored from 48 h after a lower-body session.",
    "Eur J Sport Sci, time-course of changes after resistance training",
  ),
  "heavy-before-hard-48.price": setting(
    "should",
    "Heavy lower body nearer than that",
    30,
    "points",
    [0, 500, 5],
    "Wanted, but not at the price of losing the heavy day.",
  ),
  "fresh-first.price": setting(
    "should",
    "Each 100 AU of residual load before strength A or power A",
    4,
    "points",
    [0, 50, 1],
    "The quality that matters most gets the freshest day.",
    "Robineau et al. 2016 (priority quality first); price common practice",
  ),
  "fresh-first.hours": setting(
    "should",
    "Time constant of residual load",
    24,
    "h",
    [6, 96, 1],
    "Most of a session's fatigue is gone within two to three days.",
  ),
  "spread.next-day": setting(
    "should",
    "Lifts on consecutive days",
    14,
    "points",
    [0, 200, 1],
    "A day between lifts lets each be done well.",
  ),
  "spread.second-day": setting(
    "should",
    "Lifts two days apart",
    2,
    "points",
    [0, 200, 1],
    "Three days apart is a little better still when the week allows it.",
  ),
  "hard-days-hard.on": setting(
    "should",
    "Prefer lifting on hard-sparring days",
    0,
    "0 or 1",
    [0, 1, 1],
    "Keeps easy days easy; off by default, since many gyms want the sparring day for itself.",
  ),
  "hard-days-hard.price": setting(
    "should",
    "A lift on a day without hard sparring, when preferred",
    12,
    "points",
    [0, 200, 1],
    "Strong enough to gather the work, too weak to break the gaps.",
  ),
  "stay-put.far": setting(
    "should",
    "Moving a published session, two weeks or more ahead",
    8,
    "points",
    [0, 200, 1],
    "People have arranged their days around it.",
  ),
  "stay-put.near": setting(
    "should",
    "Moving a published session, within a few days",
    80,
    "points",
    [0, 1000, 5],
    "The nearer it is, the more a move costs the athlete.",
  ),
  "stay-put.locked.hours": setting(
    "should",
    "Only a must rule moves a session nearer than",
    36,
    "h",
    [0, 96, 1],
    "Tomorrow's session is already packed for.",
  ),
  "start-step.minutes": setting(
    "camp",
    "Start times are tried every",
    30,
    "min",
    [5, 120, 5],
    "A finer grid finds nothing a coach would call better.",
  ),

  // Camp structure
  "taper.days.long": setting(
    "camp",
    "Taper of a camp of 6 weeks or more",
    14,
    "days",
    [7, 21, 1],
    "Two weeks gave the largest pooled effect.",
    "Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365",
  ),
  "taper.days.medium": setting(
    "camp",
    "Taper of a camp of 4 or 5 weeks",
    10,
    "days",
    [7, 21, 1],
    "8 to 14 days, shortened so that building is not squeezed out.",
    "Bosquet et al. 2007; the choice of 10 is common practice",
  ),
  "taper.days.short": setting(
    "camp",
    "Taper of a camp of 3 weeks or less",
    7,
    "days",
    [7, 21, 1],
    "On short notice there is little fatigue to take out.",
  ),
  "foundation.weeks.long": setting(
    "camp",
    "Foundation in a camp of 12 weeks or more",
    3,
    "weeks",
    [0, 6, 1],
    "General strength and tissue tolerance before heavy work.",
  ),
  "foundation.weeks.medium": setting(
    "camp",
    "Foundation in a camp of 10 or 11 weeks",
    2,
    "weeks",
    [0, 6, 1],
    "As above, in less time.",
  ),
  "power.share.novice": setting(
    "camp",
    "Share of building given to power, novice",
    0.3,
    "share",
    [0.1, 0.8, 0.05],
    "The less trained gain more power from getting strong.",
    "Cormie, McGuigan & Newton 2011, Sports Med 41(2):125-146 (from memory)",
  ),
  "power.share.intermediate": setting(
    "camp",
    "Share of building given to power, intermediate",
    0.4,
    "share",
    [0.1, 0.8, 0.05],
    "Between the two.",
    "Cormie, McGuigan & Newton 2011, Sports Med 41(2):125-146 (from memory)",
  ),
  "power.share.advanced": setting(
    "camp",
    "Share of building given to power, advanced",
    0.5,
    "share",
    [0.1, 0.8, 0.05],
    "The strong gain most from fast work.",
    "Cormie, McGuigan & Newton 2011, Sports Med 41(2):125-146 (from memory)",
  ),
  "power.weeks.max": setting(
    "camp",
    "Longest power phase",
    4,
    "weeks",
    [1, 8, 1],
    "Strength fades when it is not trained; four weeks keep most of it.",
  ),
  "deload.every": setting(
    "camp",
    "Deload every so many weeks of building",
    4,
    "weeks",
    [3, 8, 1],
    "A lighter week lets the work of three settle.",
  ),
  "hard-days.off": setting(
    "camp",
    "Hard sparring days a week that take one lift off",
    3,
    "days",
    [2, 7, 1],
    "The sport has taken that recovery already.",
  ),

  // Dose
  "wave.first": setting(
    "dose",
    "Wave, first week of a block",
    0.9,
    "×",
    [0.5, 1.5, 0.05],
    "Start below, build on it.",
  ),
  "wave.second": setting("dose", "Wave, second week", 1, "×", [0.5, 1.5, 0.05], "The planned dose."),
  "wave.third": setting(
    "dose",
    "Wave, third week",
    1.1,
    "×",
    [0.5, 1.5, 0.05],
    "A small overreach before the lighter week.",
  ),
  "wave.deload": setting(
    "dose",
    "Deload week",
    0.6,
    "×",
    [0.3, 1, 0.05],
    "Enough to keep the lifts, little enough to recover.",
  ),
  "taper.cut": setting(
    "dose",
    "Mean cut of sets over the taper",
    0.5,
    "share",
    [0.41, 0.6, 0.01],
    "41 to 60 % less volume gave the largest pooled effect, with intensity and frequency kept.",
    "Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365",
  ),
  "before.floor": setting(
    "dose",
    "Sets a day before hard sparring",
    0.7,
    "×",
    [0.3, 1, 0.05],
    "Less to carry into the rounds.",
  ),
  "before.near": setting(
    "dose",
    "Full reduction at or under",
    24,
    "h",
    [6, 48, 1],
    "Jumps and volume are down a day after.",
    "Eur J Sport Sci, time-course of changes after resistance training",
  ),
  "before.far": setting(
    "dose",
    "No reduction from",
    48,
    "h",
    [24, 96, 1],
    "Performance is restored from 48 h.",
    "Eur J Sport Sci, time-course of changes after resistance training",
  ),
  "after.floor": setting(
    "dose",
    "Sets soon after hard sparring",
    0.75,
    "×",
    [0.3, 1, 0.05],
    "Damage markers are up for a day after rounds.",
    "Ghoul et al. 2019, J Strength Cond Res 33(6):1570-1579; the factor is common practice",
  ),
  "after.near": setting(
    "dose",
    "Full reduction at or under",
    6,
    "h",
    [0, 24, 1],
    "The must rule's own floor.",
  ),
  "after.far": setting(
    "dose",
    "No reduction from",
    36,
    "h",
    [12, 96, 1],
    "A day and a half, with a night on either side.",
  ),
  "cap.ramp": setting(
    "dose",
    "A week's load may exceed the weeks before by",
    0.15,
    "share",
    [0.05, 0.5, 0.01],
    "Load that jumps is load nobody prepared for.",
  ),
  "cap.floor": setting(
    "dose",
    "The cap never cuts lifting below",
    0.5,
    "×",
    [0.2, 1, 0.05],
    "Sport does not give way, and lifting must not vanish.",
  ),
  "cap.weeks": setting(
    "dose",
    "Span of the weekly average",
    4,
    "weeks",
    [2, 8, 1],
    "Exponentially weighted, λ = 2 / (N + 1).",
    "Williams et al. 2017, Br J Sports Med 51(3):209-210 (method)",
  ),
  "minutes.base": setting(
    "dose",
    "Minutes of a lift before the first set",
    12,
    "min",
    [0, 40, 1],
    "Warm-up and mobility.",
  ),
  "minutes.per-set": setting(
    "dose",
    "Minutes a working set",
    3.2,
    "min",
    [1, 6, 0.1],
    "The set and its rest, accessories paired.",
  ),

  // Load
  "monotony.high": setting(
    "load",
    "Monotony called high above",
    2,
    "ratio",
    [1, 4, 0.1],
    "Same load, every day alike, goes with illness.",
    "Foster 1998, Med Sci Sports Exerc 30:1164-1168",
  ),

  // Form illustration
  "form.tau1": setting(
    "form",
    "Time constant of fitness",
    45,
    "days",
    [30, 60, 1],
    "An illustration of training theory, not a forecast.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
  "form.tau2": setting(
    "form",
    "Time constant of fatigue",
    15,
    "days",
    [3, 25, 1],
    "As above.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
  "form.k1": setting(
    "form",
    "Gain of fitness",
    1,
    "ratio",
    [0.5, 3, 0.1],
    "As above.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
  "form.k2": setting(
    "form",
    "Gain of fatigue",
    2,
    "ratio",
    [0.5, 5, 0.1],
    "As above; more than the gain of fitness.",
    "Morton, Fitz-Clarke & Banister 1990, J Appl Physiol 69:1171-1177 (from memory)",
  ),
} as const satisfies Record<string, Setting>;

export type RuleKey = keyof typeof HOUSE_RULES;
export type HouseRules = Readonly<Record<RuleKey, number>>;

export const RULE_KEYS = Object.keys(HOUSE_RULES) as RuleKey[];

/** Default values of all rules. */
export const DEFAULT_RULES: HouseRules = Object.fromEntries(
  RULE_KEYS.map((key) => [key, HOUSE_RULES[key].value]),
) as HouseRules;

/** A team's own values over the defaults; keys that are not house rules are ignored. Does not check ranges. */
export function withOverrides(overrides: Readonly<Partial<Record<string, number>>>): HouseRules {
  const values: Record<RuleKey, number> = { ...DEFAULT_RULES };
  for (const key of RULE_KEYS) values[key] = overrides[key] ?? values[key];
  return values;
}
