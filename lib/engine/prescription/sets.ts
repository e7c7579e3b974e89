/** One slot's claim on a session's sets. */
export interface Claim {
  readonly share: number;
  /** Fewest and most sets that make sense for what fills it. */
  readonly low: number;
  readonly high: number;
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

/** Claims that are opened: the kept ones, then in order each whose fewest sets still fit. */
function opened(total: number, claims: readonly Claim[]): number[] {
  const lows = claims.map(() => 0);
  let free = total;
  const open = (claim: Claim, index: number, low: number) => {
    lows[index] = low;
    free -= low;
  };
  const kept = claims.filter((claim) => claim.kept).length;
  let keptLeft = kept;
  claims.forEach((claim, index) => {
    if (!claim.kept) return;
    keptLeft -= 1;
    const low = Math.max(Math.min(claim.low, free - keptLeft), Math.min(1, free));
    if (low > 0) open(claim, index, low);
  });
  claims.forEach((claim, index) => {
    if (!claim.kept && claim.low <= free) open(claim, index, claim.low);
  });
  // Fewer sets than any claim wants: the first takes them all.
  if (total > 0 && free === total && claims[0]) open(claims[0], 0, Math.min(total, claims[0].most));
  return lows;
}

/**
 * Parts `total` sets over claims in order of importance: as many claims open as their fewest sets allow, then each next set
 * goes where the share is furthest from met (largest remainder), within the ranges while any range has room.
 */
export function splitSets(total: number, claims: readonly Claim[]): Split {
  const sets = opened(total, claims);
  const shares = claims.reduce((sum, claim, index) => ((sets[index] ?? 0) > 0 ? sum + claim.share : sum), 0);
  let left = total - sets.reduce((sum, value) => sum + value, 0);
  let above = 0;
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
