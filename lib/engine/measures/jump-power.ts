/**
 * Power from the height of a jump and body mass. A regression belongs to the jump and the people it was made from, so the
 * method is carried with the number and two methods are never compared.
 *
 * The formula after Lewis is left out: an average power that takes no account of gravity, not recommended by those who
 * tested it.
 */
export const POWER_METHODS = [
  "sayers-squat-jump",
  "sayers-countermovement",
  "harman-peak",
  "harman-average",
  "canavan-vescovi",
] as const;
export type PowerMethod = (typeof POWER_METHODS)[number];

/** watts = height x cm + mass x kg + constant. */
export interface PowerRegression {
  readonly title: string;
  readonly of: "peak" | "average";
  readonly jump: "squat jump" | "countermovement jump";
  /** W per cm of jump height. */
  readonly height: number;
  /** W per kg of body mass. */
  readonly mass: number;
  /** W. */
  readonly constant: number;
  /** Standard error of the estimate, W, where it was read; else null. */
  readonly standardError: number | null;
  readonly source: string;
}

export const POWER_REGRESSIONS: Readonly<Record<PowerMethod, PowerRegression>> = {
  "sayers-squat-jump": {
    title: "Sayers, squat jump",
    of: "peak",
    jump: "squat jump",
    height: 60.7,
    mass: 45.3,
    constant: -2055,
    standardError: null,
    source: "Sayers et al. 1999, Med Sci Sports Exerc 31(4):572-577",
  },
  "sayers-countermovement": {
    title: "Sayers, countermovement jump",
    of: "peak",
    jump: "countermovement jump",
    height: 51.9,
    mass: 48.9,
    constant: -2007,
    standardError: null,
    source: "Sayers et al. 1999, Med Sci Sports Exerc 31(4):572-577 (from memory)",
  },
  "harman-peak": {
    title: "Harman, peak power",
    of: "peak",
    jump: "squat jump",
    height: 61.9,
    mass: 36,
    // Often printed as +1822. Held against the group means of Canavan & Vescovi 2004, minus gives 2580 W where 2585 W is
    // reported, plus gives 6224 W.
    constant: -1822,
    standardError: null,
    source: "Harman et al. 1991, J Appl Sport Sci Res 5:116-120",
  },
  "harman-average": {
    title: "Harman, average power",
    of: "average",
    jump: "squat jump",
    height: 21.2,
    mass: 23,
    constant: -1393,
    standardError: null,
    source: "Harman et al. 1991, J Appl Sport Sci Res 5:116-120",
  },
  "canavan-vescovi": {
    title: "Canavan & Vescovi, women",
    of: "peak",
    jump: "countermovement jump",
    height: 65.1,
    mass: 25.8,
    constant: -1413.1,
    standardError: 120.8,
    source: "Canavan & Vescovi 2004, Med Sci Sports Exerc 36(9):1589-1593",
  },
};

/**
 * Power, W, of a jump of `heightCm` by an athlete of `massKg`. Null where the line runs below 0 W: a jump so low lies
 * outside what the regression was made from.
 */
export function regressionPower(method: PowerMethod, heightCm: number, massKg: number): number | null {
  const { height, mass, constant } = POWER_REGRESSIONS[method];
  const watts = height * heightCm + mass * massKg + constant;
  return watts > 0 ? watts : null;
}
