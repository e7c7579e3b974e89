/** One slot's claim on a session's sets. */
export interface Claim {
  readonly share: number;
  /** Fewest and most sets by the range of what fills it. */
  readonly low: number;
  readonly high: number;
  /** Fewest sets that are still worth doing where `low` would keep it closed. */
  readonly least: number;
  /** Never more, whatever is left over: the lift-count table's end. `Infinity` where there is none. */
  readonly most: number;
  /** A coach wrote on it: it is opened before the others. */
  readonly kept: boolean;
}

export interface Split {
  /** Sets by claim; 0 where it stays closed. */
  readonly sets: readonly number[];
  /** Sets above what the open claims would take by their own ranges. */
  readonly above: number;
  /** Sets that no open claim may take. */
  readonly left: number;
}

/** Sets that open claims begin with: the kept ones, then in order each whose fewest sets still fit. */
function opened(total: number, claims: readonly Claim[]): number[] {
  const sets = claims.map(() => 0);
  let free = total;
  let kept = claims.filter((claim) => claim.kept).length;
  claims.forEach((claim, index) => {
    if (!claim.kept) return;
    kept -= 1;
    // One set at least for each of those that follow.
    const low = Math.max(Math.min(claim.low, free - kept), Math.min(1, free));
    sets[index] = low;
    free -= low;
  });
  claims.forEach((claim, index) => {
    if (claim.kept) return;
    // What matters most is not closed for the sake of its usual range.
    const low = index === 0 ? Math.min(claim.low, Math.max(claim.least, free)) : claim.low;
    if (low > free) return;
    sets[index] = low;
    free -= low;
  });
  // A few sets over are worth another exercise more than a fourth and fifth set of the ones before.
  claims.forEach((claim, index) => {
    if ((sets[index] ?? 0) > 0 || claim.least > free) return;
    sets[index] = claim.least;
    free -= claim.least;
  });
  const first = claims[0];
  // Fewer sets than any claim wants: the first takes them.
  if (first && free === total) sets[0] = Math.min(total, first.most);
  return sets;
}

function parted(total: number, claims: readonly Claim[]): Split {
  const sets = opened(total, claims);
  const shares = claims.reduce((sum, claim, index) => ((sets[index] ?? 0) > 0 ? sum + claim.share : sum), 0);
  let left = total - sets.reduce((sum, value) => sum + value, 0);
  let above = claims.reduce(
    (sum, claim, index) => sum + Math.max(0, (sets[index] ?? 0) - Math.min(claim.high, claim.most)),
    0,
  );
  const give = (end: (claim: Claim) => number): boolean => {
    let next = -1;
    let most = -Infinity;
    claims.forEach((claim, index) => {
      const has = sets[index] ?? 0;
      if (has === 0 || has >= end(claim)) return;
      const missing = (total * claim.share) / shares - has;
      if (missing > most + 1e-9) [next, most] = [index, missing];
    });
    if (next < 0) return false;
    sets[next] = (sets[next] ?? 0) + 1;
    left -= 1;
    return true;
  };
  while (left > 0 && give((claim) => Math.min(claim.high, claim.most)));
  while (left > 0 && give((claim) => claim.most)) above += 1;
  return { sets, above: above + left, left };
}

/**
 * Parts `total` sets over claims in order of importance: as many claims open as their fewest sets allow, then each next set goes
 * where the share is furthest from met (largest remainder), within the ranges while any range has room. Where open claims would
 * go above their ranges, a closed one opens with less than its own range instead. The sets and `left` add up to `total`.
 */
export function splitSets(total: number, claims: readonly Claim[]): Split {
  let split = parted(total, claims);
  let now = claims;
  for (const index of claims.keys()) {
    if (split.above === 0) break;
    if ((split.sets[index] ?? 0) > 0) continue;
    const eased = now.map((claim, at) => (at === index ? { ...claim, low: claim.least } : claim));
    const next = parted(total, eased);
    if (next.above < split.above && (next.sets[index] ?? 0) > 0) [split, now] = [next, eased];
  }
  return split;
}
