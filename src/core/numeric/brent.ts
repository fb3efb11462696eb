/** Brent's root finder: bracketed, derivative-free, never leaves its bracket. */

/**
 * Root of `f` between `a` and `b`, where the signs of f(a) and f(b) differ.
 *
 * Source: R. P. Brent, Algorithms for Minimization without Derivatives (Prentice-Hall, 1973), chapter 4 (from memory).
 * @param tolerance absolute accuracy of the root, in the unit of `a`.
 * @returns the root; NaN when the signs do not differ.
 */
export function brent(f: (x: number) => number, a: number, b: number, tolerance: number): number {
  let [previous, fPrevious] = [a, f(a)];
  let [best, fBest] = [b, f(b)];
  if (fPrevious === 0) return previous;
  if (fBest === 0) return best;
  if (fPrevious > 0 === fBest > 0 || Number.isNaN(fPrevious + fBest)) return Number.NaN;
  let [opposite, fOpposite] = [previous, fPrevious];
  let step = best - previous;
  let stepBefore = step;
  for (;;) {
    if (Math.abs(fOpposite) < Math.abs(fBest)) {
      [previous, best, opposite] = [best, opposite, best];
      [fPrevious, fBest, fOpposite] = [fBest, fOpposite, fBest];
    }
    const reach = 2 * Number.EPSILON * Math.abs(best) + tolerance / 2;
    const half = (opposite - best) / 2;
    if (Math.abs(half) <= reach || fBest === 0) return best;
    const trial =
      Math.abs(stepBefore) >= reach && Math.abs(fPrevious) > Math.abs(fBest)
        ? interpolated(previous, fPrevious, best, fBest, opposite, fOpposite, half)
        : half;
    const accepted =
      Math.abs(2 * trial) < Math.min(3 * Math.abs(half) - Math.abs(reach), Math.abs(stepBefore)) &&
      trial * half > 0;
    stepBefore = accepted ? step : half;
    step = accepted ? trial : half;
    [previous, fPrevious] = [best, fBest];
    best += Math.abs(step) > reach ? step : Math.sign(half) * reach;
    fBest = f(best);
    if (fBest > 0 === fOpposite > 0) {
      [opposite, fOpposite] = [previous, fPrevious];
      step = best - previous;
      stepBefore = step;
    }
  }
}

/** Step from the best point by the secant, or by inverse quadratic interpolation when three points differ. */
function interpolated(
  a: number,
  fa: number,
  b: number,
  fb: number,
  c: number,
  fc: number,
  half: number,
): number {
  const s = fb / fa;
  if (a === c) return (2 * half * s) / (s - 1);
  const q = fa / fc;
  const r = fb / fc;
  const p = s * (2 * half * q * (q - r) - (b - a) * (r - 1));
  return -p / ((q - 1) * (r - 1) * (s - 1));
}
