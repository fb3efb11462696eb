/** The complementary error function of a predeposition, and its drive-in by Smith's integral. */

import erfc from '@stdlib/math-base-special-erfc';
import { gaussLegendre } from '../numeric/gaussLegendre';
import { type Anatomy, edgesWithin, marksAt } from './anatomy';
import type { ConcentrationAt, ErfcShape } from './kinds';

const MULTIPLES = [0.125, 0.25, 0.5, 0.75, 1, 1.25, 1.5, 2, 2.5, 3, 4, 5, 6, 7, 8.5];
const RULE = gaussLegendre(24);
/** exp(-6.5^2) = 4e-19: what lies further out in the integral is below rounding. */
const REACH = 6.5;

/** @param length 2 sqrt(D t) of the predeposition. */
export function erfcShape(surface: number, length: number, Dt = 0): ErfcShape {
  const scale = Math.sqrt(length * length + 4 * Dt);
  return {
    kind: 'erfc',
    surface,
    length,
    Dt,
    marks: marksAt(0, ...[0.25, 0.5, 1, 1.5, 2, 3, 4].map((k) => k * scale)),
    jumps: [],
  };
}

/**
 * C = (2 surface/pi) Int_0^U exp(-V(1+z^2))/(1+z^2) dz, U = sqrt(D1t1/D2t2), V = x^2/(4(D1t1 + D2t2)), D1t1 = length^2/4.
 *
 * Source: F. M. Smith 1958, the two-step diffusion (from memory; compared with direct convolution in the tests).
 * The integral is 2 pi times Owen's T function of (sqrt(2V), U). For U > 1 the reflection
 * T(h, a) = (q(h) + q(ah))/2 - q(h) q(ah) - T(ah, 1/a), q(h) = erfc(h/sqrt2)/2, brings it back below 1
 * (D. B. Owen, Ann. Math. Stat. 27 (1956) 1075-1090, from memory).
 */
export function erfcEvaluator(shape: ErfcShape): ConcentrationAt {
  const { surface, length, Dt } = shape;
  if (Dt === 0) return (x) => surface * erfc(x / length);
  const U = length / 2 / Math.sqrt(Dt);
  const scale = Math.sqrt(length * length + 4 * Dt);
  if (U <= 1) return (x) => surface * smith((x / scale) * (x / scale), U);
  return (x) => {
    const root = x / scale;
    const near = erfc(root);
    const far = erfc(U * root);
    return Math.max(0, surface * (near + far - near * far - smith(U * U * root * root, 1 / U)));
  };
}

/** (2/pi) Int_0^a exp(-V(1+z^2))/(1+z^2) dz for 0 < a <= 1. */
function smith(V: number, a: number): number {
  const front = Math.exp(-V);
  if (front === 0) return 0;
  const half = (V * a * a > REACH * REACH ? REACH / Math.sqrt(V) : a) / 2;
  let sum = 0;
  for (let k = 0; k < RULE.nodes.length; k++) {
    const z = half * (1 + RULE.nodes[k]);
    sum += (RULE.weights[k] * Math.exp(-V * z * z)) / (1 + z * z);
  }
  return (2 / Math.PI) * front * half * sum;
}

export function erfcAnatomy(shape: ErfcShape): Anatomy {
  const scale = Math.sqrt(shape.length * shape.length + 4 * shape.Dt);
  const drive = 2 * Math.sqrt(shape.Dt);
  const depths = [...MULTIPLES.map((k) => k * scale), ...MULTIPLES.map((k) => k * drive)];
  return { edges: edgesWithin(depths, 0, 8.5 * scale), kinks: [0], beyond: 0 };
}
