/** The tests' own diffusion: direct quadrature of the convolution with the reflecting kernel, panel by panel. */

import { integrate } from './quadrature';

/**
 * Int source(u) [G(x-u) + G(x+u)] du over the stretches between `breaks`, each by adaptive quadrature within twelve kernel
 * widths of x (and of its mirror image).
 */
export function convolvedDirectly(
  source: (u: number) => number,
  Dt: number,
  x: number,
  breaks: readonly number[],
): number {
  const spread = Math.sqrt(2 * Dt);
  const norm = 1 / (Math.sqrt(2 * Math.PI) * spread);
  const kernel = (z: number): number => norm * Math.exp((-z * z) / (2 * spread * spread));
  const f = (u: number): number => source(u) * (kernel(x - u) + kernel(x + u));
  const low = Math.max(breaks[0], x - 12 * spread);
  const high = Math.min(breaks[breaks.length - 1], x + 12 * spread);
  const inside = breaks.filter((u) => u > low && u < high);
  const edges = [low, ...inside, high];
  let sum = 0;
  for (let i = 0; i + 1 < edges.length; i++)
    if (edges[i + 1] > edges[i]) sum += integrate(f, edges[i], edges[i + 1], 1e-9);
  return sum;
}
