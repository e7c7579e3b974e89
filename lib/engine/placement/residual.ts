import type { Span } from "./spans";

/** Load that is still there at an instant, AU. */
export type ResidualLoad = (startsAt: number) => number;

/**
 * Residual load of sport: the sum of load x exp(-age / tau) over sessions that have ended. Kept as a running sum, so that
 * one look-up serves any instant. `tau` in minutes.
 */
export function residualLoad(
  sport: readonly (Span & { readonly load: number })[],
  tau: number,
): ResidualLoad {
  const ended = [...sport].sort((a, b) => a.endsAt - b.endsAt);
  let sum = 0;
  let last = 0;
  const sums = ended.map(({ endsAt, load }) => {
    sum = sum * Math.exp((last - endsAt) / tau) + load;
    last = endsAt;
    return sum;
  });
  return (startsAt) => {
    let [low, high] = [0, ended.length];
    while (low < high) {
      const middle = (low + high) >> 1;
      if ((ended[middle]?.endsAt ?? 0) <= startsAt) low = middle + 1;
      else high = middle;
    }
    const session = ended[low - 1];
    return session ? (sums[low - 1] ?? 0) * Math.exp((session.endsAt - startsAt) / tau) : 0;
  };
}
