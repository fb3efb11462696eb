/** Gauss-Hermite quadrature: averages over a normal distribution. */

import { golubWelsch, type Rule } from './golubWelsch';

/**
 * The n-point rule of the unit normal distribution: sum of weights[k] f(nodes[k]) is the mean of f(z), exact for
 * polynomials up to degree 2n - 1. Recurrence of the monic Hermite polynomials He: alpha = 0, beta[k] = k
 * (Abramowitz and Stegun 1964, 22.7, from memory).
 */
export function gaussHermite(n: number): Rule {
  return golubWelsch(
    new Float64Array(n),
    Float64Array.from({ length: n }, (_, k) => k),
    1,
  );
}
