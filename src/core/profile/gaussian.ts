/** The windowed Gaussian, and its exact diffusion behind a sealed surface. */

import erfc from '@stdlib/math-base-special-erfc';
import erfcx from '@stdlib/math-base-special-erfcx';
import { type Anatomy, edgesWithin, ladder, marksAt, shoulders } from './anatomy';
import type { ConcentrationAt, GaussianShape } from './kinds';

/**
 * @param peak of the Gaussian before any window or heat treatment.
 * @param from only the part below this depth is there.
 */
export function gaussian(peak: number, mean: number, sigma: number, from = 0, Dt = 0): GaussianShape {
  const spread = Math.sqrt(2 * Dt);
  const window = from > 0 ? (Dt > 0 ? shoulders(from, spread) : [from]) : [];
  return {
    kind: 'gaussian',
    peak,
    mean,
    sigma,
    from,
    Dt,
    marks: marksAt(...shoulders(mean, Math.hypot(sigma, spread)), ...window),
    jumps: from > 0 && Dt === 0 ? [from] : [],
  };
}

/**
 * Product of the windowed Gaussian with the reflecting kernel G(x-u) + G(x+u), G normal with variance 2Dt, integrated
 * over u >= from. With s^2 = sigma^2 + 2Dt, nu = sigma sqrt(2Dt)/s, z(y) = (from - (2Dt mean + sigma^2 y)/s^2)/(sqrt2 nu):
 *
 *   C(x) = peak sigma/(2 s) sum over y = x, -x of exp(-(y - mean)^2/2s^2) erfc(z(y)).
 *
 * Own algebra; for from = 0 it is the closed form of an implant cut off at the surface and driven in. Where z > 0 the
 * equal form exp(-(from-mean)^2/2sigma^2 - (from-y)^2/4Dt) erfcx(z) keeps the tails.
 */
export function gaussianEvaluator(shape: GaussianShape): ConcentrationAt {
  const { peak, mean, sigma, from, Dt } = shape;
  if (Dt === 0) {
    const inverse = 1 / (2 * sigma * sigma);
    return (x) => (x < from ? 0 : peak * Math.exp(-(x - mean) * (x - mean) * inverse));
  }
  const variance = 2 * Dt;
  const total = sigma * sigma + variance;
  const amplitude = (peak * sigma) / (2 * Math.sqrt(total));
  const nuRoot2 = sigma * Math.sqrt((2 * variance) / total);
  const zAtZero = (from - (variance * mean) / total) / nuRoot2;
  const zSlope = (sigma * sigma) / total / nuRoot2;
  const windowExponent = ((from - mean) * (from - mean)) / (2 * sigma * sigma);
  const term = (y: number): number => {
    const z = zAtZero - zSlope * y;
    if (z > 0) return Math.exp(-windowExponent - ((from - y) * (from - y)) / (2 * variance)) * erfcx(z);
    return Math.exp(-((y - mean) * (y - mean)) / (2 * total)) * erfc(z);
  };
  return (x) => amplitude * (term(x) + term(-x));
}

export function gaussianAnatomy(shape: GaussianShape): Anatomy {
  const { mean, sigma, from, Dt } = shape;
  const spread = Math.sqrt(2 * Dt);
  const total = Math.hypot(sigma, spread);
  const window = Dt > 0 ? ladder(from, spread) : [];
  return {
    edges: edgesWithin(
      [...ladder(mean, total), ...window],
      Dt > 0 ? 0 : from,
      Math.max(mean, from) + 12 * total,
    ),
    kinks: Dt > 0 ? [] : [from],
    beyond: 0,
  };
}
