/**
 * Mean of exp(-t / tau) over t = 1 .. days, in closed form.
 * Shape: Banister, Carter & Zarkadas 1999, Eur J Appl Physiol 79:182-191.
 */
export function meanOfDecay(tau: number, days: number): number {
  const step = Math.exp(-1 / tau);
  return (step * (1 - Math.exp(-days / tau))) / (days * (1 - step));
}

/**
 * The time constant, days, whose decay cuts the mean over `days` days by `cut` (0 to 1, exclusive).
 * 41 to 60 % is the published range: Bosquet et al. 2007, Med Sci Sports Exerc 39(8):1358-1365.
 */
export function tauFor(cut: number, days: number): number {
  let [low, high] = [1e-3, 1e6];
  // The mean grows with tau. 100 halvings are far below what a double can tell apart.
  for (let round = 0; round < 100; round++) {
    const middle = (low + high) / 2;
    if (meanOfDecay(middle, days) < 1 - cut) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Share of the sets that is left on day `t` of the taper, 1 on its first day; 1 before it. */
export function taperFactor(t: number, tau: number): number {
  return t < 1 ? 1 : Math.exp(-t / tau);
}
