/** Gauss-Legendre quadrature: the rule, and its sum over panels. */

import { golubWelsch, type Rule } from './golubWelsch';

/**
 * The n-point rule on [-1, 1], exact for polynomials up to degree 2n - 1. Recurrence of the monic Legendre polynomials:
 * alpha = 0, beta[k] = k^2/(4k^2 - 1) (Abramowitz and Stegun 1964, 22.7, from memory).
 */
export function gaussLegendre(n: number): Rule {
  const beta = Float64Array.from({ length: n }, (_, k) => (k * k) / (4 * k * k - 1));
  return golubWelsch(new Float64Array(n), beta, 2);
}

/** Integral of f over each panel between neighbouring edges, summed. */
export function integratePanels(f: (x: number) => number, edges: ArrayLike<number>, rule: Rule): number {
  const { nodes, weights } = rule;
  let total = 0;
  for (let i = 0; i + 1 < edges.length; i++) {
    const half = (edges[i + 1] - edges[i]) / 2;
    const centre = (edges[i + 1] + edges[i]) / 2;
    let panel = 0;
    for (let k = 0; k < nodes.length; k++) panel += weights[k] * f(centre + half * nodes[k]);
    total += half * panel;
  }
  return total;
}
