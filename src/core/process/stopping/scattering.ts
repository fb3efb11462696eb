/**
 * How much an ion loses and turns in one collision with an atom, for the two theories. Everything is in reduced units: energy
 * epsilon, impact parameters in screening lengths, and s = sin^2(theta/2) of the centre-of-mass angle.
 */

import { gaussLegendre } from '../../numeric/gaussLegendre';

/** Collisions that stand for all of them at one energy: s and the cross-section each stands for, in screening lengths squared. */
export interface Collisions {
  readonly s: Float64Array;
  readonly weight: Float64Array;
}

const IMPACTS = gaussLegendre(128);
const LARGEST_IMPACT = 24;
const ANGLE_POINTS = 64;

/** phi(x) of the universal potential: J. F. Ziegler, J. P. Biersack, U. Littmark (Pergamon 1985); coefficients read and from memory. */
const SCREENING: readonly (readonly [share: number, rate: number])[] = [
  [0.18175, 3.1998],
  [0.50986, 0.94229],
  [0.28022, 0.4029],
  [0.02817, 0.20162],
];

function screening(x: number): number {
  let sum = 0;
  for (const [share, rate] of SCREENING) sum += share * Math.exp(-rate * x);
  return sum;
}

/** Impact parameters b = 24 t^3, so that they crowd where ions turn most; the weight of each is 2 pi b db. */
const IMPACT_PARAMETERS = Array.from(IMPACTS.nodes, (node, k) => {
  const t = (1 + node) / 2;
  const b = LARGEST_IMPACT * t ** 3;
  return { b, weight: 2 * Math.PI * b * LARGEST_IMPACT * 3 * t * t * (IMPACTS.weights[k] / 2) };
});

/** Collisions in the universal potential at a reduced energy. */
export function universalCollisions(epsilon: number): Collisions {
  return {
    s: Float64Array.from(IMPACT_PARAMETERS, ({ b }) => Math.sin(scatteringAngle(epsilon, b) / 2) ** 2),
    weight: Float64Array.from(IMPACT_PARAMETERS, ({ weight }) => weight),
  };
}

/**
 * Centre-of-mass angle: theta = pi - (2 b/R0)(pi/2n) sum sqrt((1 - u^2)/F(u)), u = cos((2j - 1) pi/4n), F(u) = 1 - (b u/R0)^2 - phi(R0/u)
 * u/(R0 eps): Gauss-Chebyshev quadrature of the classical integral (F. T. Smith and others, from memory), checked by Rutherford's limit.
 */
export function scatteringAngle(epsilon: number, b: number): number {
  const closest = closestApproach(epsilon, b);
  let sum = 0;
  for (let j = 1; j <= ANGLE_POINTS; j++) {
    const u = Math.cos(((2 * j - 1) * Math.PI) / (4 * ANGLE_POINTS));
    const F = 1 - ((b * u) / closest) ** 2 - (screening(closest / u) * u) / (closest * epsilon);
    sum += Math.sqrt(Math.max(0, (1 - u * u) / F));
  }
  return Math.PI - ((2 * b) / closest) * (Math.PI / (2 * ANGLE_POINTS)) * sum;
}

/** Largest root of 1 - phi(R)/(R eps) - (b/R)^2, by Newton's method from outside. */
function closestApproach(epsilon: number, b: number): number {
  let R = Math.max(b, 1e-12) + 1 / epsilon;
  // From outside the function is positive and bends so that Newton's method descends to the root.
  for (let round = 0; round < 100; round++) {
    let V = 0;
    let slope = 0;
    for (const [share, rate] of SCREENING) {
      const term = share * Math.exp(-rate * R);
      V += term;
      slope -= rate * term;
    }
    const f = R * R - (V * R) / epsilon - b * b;
    const step = f / (2 * R - (V + slope * R) / epsilon);
    R -= step;
    if (Math.abs(step) < 1e-12 * R) break;
  }
  return R;
}

const LSS_POINTS = gaussLegendre(128);
const [LSS_LAMBDA, LSS_LEAST] = [1.309, 1e-14];

/**
 * Collisions by the differential cross-section d sigma = pi a^2 f(sqrt t) dt/(2 t^(3/2)), t = eps^2 s, f(z) = lambda z^(1/3) [1 + (2 lambda
 * z^(4/3))^(2/3)]^(-3/2), lambda = 1.309: K. B. Winterbon, P. Sigmund, J. B. Sanders 1970, of the Thomas-Fermi function of J. Lindhard,
 * V. Nielsen, M. Scharff 1968 (from memory).
 */
export function lssCollisions(epsilon: number): Collisions {
  const s = new Float64Array(LSS_POINTS.nodes.length);
  const weight = new Float64Array(LSS_POINTS.nodes.length);
  // Uniform in s^(1/6): losses and angles count by s, and f(sqrt t)/t^(3/2) by its smallest values most.
  const power = 6;
  LSS_POINTS.nodes.forEach((node, k) => {
    const v = (1 + node) / 2;
    s[k] = Math.max(v ** power, LSS_LEAST);
    const t = epsilon * epsilon * s[k];
    const z = Math.sqrt(t);
    const f = LSS_LAMBDA * Math.cbrt(z) * (1 + (2 * LSS_LAMBDA * z ** (4 / 3)) ** (2 / 3)) ** -1.5;
    const dt = epsilon * epsilon * power * v ** (power - 1) * (LSS_POINTS.weights[k] / 2);
    weight[k] = (Math.PI * f * dt) / (2 * t ** 1.5);
  });
  return { s, weight };
}
