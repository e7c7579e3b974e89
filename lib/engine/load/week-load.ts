/** Load, spread and strain of seven days. */
export interface WeekLoad {
  /** AU. */
  readonly total: number;
  /** Mean / sample SD (n - 1); null where the SD is 0. */
  readonly monotony: number | null;
  /** Total x monotony; null where monotony is. */
  readonly strain: number | null;
}

/**
 * Monotony and strain of daily loads, several sessions of a day summed first, rest days 0.
 * Foster 1998, Med Sci Sports Exerc 30:1164-1168. The paper does not say which SD: the sample SD (n - 1) is our choice.
 * Equal days have no SD, and then no monotony: a stand-in for the SD would give monotony the unit of load.
 */
export function weekLoad(daily: readonly number[]): WeekLoad {
  const total = daily.reduce((sum, load) => sum + load, 0);
  const mean = total / daily.length;
  const squares = daily.reduce((sum, load) => sum + (load - mean) ** 2, 0);
  const equal = daily.every((load) => load === daily[0]);
  if (equal || daily.length < 2) return { total, monotony: null, strain: null };
  const monotony = mean / Math.sqrt(squares / (daily.length - 1));
  return { total, monotony, strain: total * monotony };
}
