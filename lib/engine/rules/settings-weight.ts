import { setting, type Setting } from "./setting";

const CEILING_REASON =
  "Share of body mass that may still be to go, so many hours before the weigh-in; a ceiling that comes down, not a daily allowance. A team may set less, not more.";
const CEILING_SOURCE = "Ricci et al. 2025, J Int Soc Sports Nutr 22(1):2467909";

/** The way down to the weight limit. Published limits are the upper end of their range. See `house-rules.ts`. */
export const WEIGHT_SETTINGS = {
  "weight.rate": setting(
    "weight",
    "Weight comes down at, in a week",
    0.7,
    "%",
    [0.2, 1, 0.1],
    "Lifters who lost 0.7 % a week gained lean mass; those who went faster did not.",
    "Garthe et al. 2011, Int J Sport Nutr Exerc Metab 21:97-104",
  ),
  "weight.fastest": setting(
    "weight",
    "Weight never comes down faster than, in a week",
    1.5,
    "%",
    [0.5, 1.5, 0.1],
    "The descent rule of college and school wrestling, held here against current mass, which is the stricter reading.",
    "NCAA and NFHS weight management rules; Turocy et al. 2011, J Athl Train 46:322-336 (figure from memory)",
  ),
  "weight.window": setting(
    "weight",
    "Rate of weight is measured over at least",
    7,
    "days",
    [5, 14, 1],
    "Water moves body mass from day to day; a week evens it out.",
  ),
  "weight.behind": setting(
    "weight",
    "Weight is called behind when above the line by more than",
    1,
    "%",
    [0.3, 3, 0.1],
    "Less than that comes and goes with a meal and a drink.",
  ),
  "weight.ceiling-72": setting(
    "weight",
    "Still to lose 72 h before the weigh-in, at most",
    6.7,
    "%",
    [0, 6.7, 0.1],
    CEILING_REASON,
    CEILING_SOURCE,
  ),
  "weight.ceiling-48": setting(
    "weight",
    "Still to lose 48 h before the weigh-in, at most",
    5.7,
    "%",
    [0, 5.7, 0.1],
    CEILING_REASON,
    CEILING_SOURCE,
  ),
  "weight.ceiling-24": setting(
    "weight",
    "Still to lose 24 h before the weigh-in, at most",
    4.4,
    "%",
    [0, 4.4, 0.1],
    CEILING_REASON,
    CEILING_SOURCE,
  ),
} as const satisfies Record<string, Setting>;
