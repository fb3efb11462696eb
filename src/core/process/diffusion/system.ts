/**
 * One implicit step of diffusion by finite volumes: every dopant in the field and with the point defects that all of them make.
 *
 * J = -D (dC/dx + s C d ln(n/ni)/dx), s = 1 for donors and -1 for acceptors; D = D0 + D+ (p/ni) + D- (n/ni) + D= (n/ni)^2;
 * n from local neutrality of what is active. Only what is dissolved moves: up to a limit for each dopant, the rest lies still as
 * clusters until what is around it falls below the limit. Drift by exponential fitting (D. L. Scharfetter and H. K. Gummel, IEEE
 * Trans. Electron Devices 16, 64, 1969, from memory), so that no concentration can become negative; diffusivity of a face from the mean
 * of its two nodes. Charged-defect form after R. B. Fair 1981.
 */

import type { ChargedDiffusivity } from '../../material/chargedDiffusivity';
import { solveGeneralTridiagonal } from '../../numeric/tridiagonal';

export interface Species {
  readonly sign: 1 | -1;
  /** cm^-3 at the nodes. */
  concentration: Float64Array;
  /** What the surface does with this dopant; absent: it lets nothing through. */
  readonly surface?: { readonly held: number } | { readonly evaporation: number };
}

/** What a temperature means for the step; cm^2/s and cm^-3, one entry for each species. */
export interface StepConditions {
  readonly diffusivity: readonly ChargedDiffusivity[];
  /** Most that is dissolved. */
  readonly limit: readonly number[];
  readonly ni: number;
}

/** What a difference of two solutions is measured against. */
export interface Tolerance {
  /** Part of a concentration. */
  readonly tolerance: number;
  /** Depth, cm. */
  readonly shift: number;
  /** Concentrations far below this matter to nobody, cm^-3. */
  readonly floor: number;
}

/** The inner iteration ends when it changes by this part of the tolerance; doses are kept exactly at every sweep. */
const CLOSE_ENOUGH = 0.05;
const MOST_SWEEPS = 40;
/** Of the way to the next iterate. */
const SMALLEST_PART = 1 / 16;
/** In units of the limit; below, all is dissolved to 1e-7. */
const NEGLIGIBLE = 0.08;

export class DiffusionSystem {
  readonly depth: Float64Array;
  /** Box around each node, cm. */
  readonly volume: Float64Array;
  readonly #ratio: Float64Array;
  readonly #drop: Float64Array;
  readonly #bernoulli: Float64Array;
  readonly #lower: Float64Array;
  readonly #diagonal: Float64Array;
  readonly #upper: Float64Array;
  readonly #slope: Float64Array;
  readonly #start: Float64Array;

  constructor(depth: Float64Array) {
    const count = depth.length;
    this.depth = depth;
    this.volume = new Float64Array(count);
    for (let i = 0; i + 1 < count; i++) {
      const half = (depth[i + 1] - depth[i]) / 2;
      this.volume[i] += half;
      this.volume[i + 1] += half;
    }
    this.#ratio = new Float64Array(count);
    this.#drop = new Float64Array(count);
    this.#bernoulli = new Float64Array(count);
    this.#lower = new Float64Array(count);
    this.#diagonal = new Float64Array(count);
    this.#upper = new Float64Array(count);
    this.#slope = new Float64Array(count);
    this.#start = new Float64Array(count);
  }

  /**
   * Backward Euler over `time` (s) from `before`, starting the inner iteration from `guess`.
   * @returns the concentrations after it, or null when the iteration did not settle: the step was too long.
   */
  advance(
    species: readonly Species[],
    before: readonly Float64Array[],
    guess: readonly Float64Array[],
    time: number,
    conditions: StepConditions,
    tolerance: Tolerance,
  ): Float64Array[] | null {
    let now: readonly Float64Array[] = guess;
    let changeBefore = Number.POSITIVE_INFINITY;
    let part = 1;
    for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
      this.#findCarriers(species, now, conditions);
      const next = species.map((each, k) => this.#solve(each, before[k], now[k], time, conditions, k));
      const change = differenceOf(this.depth, now, next, tolerance);
      if (change < CLOSE_ENOUGH) return next;
      // The field of a dopant's own carriers answers a change with the opposite one, that of dense dopants that cancel with a larger one:
      // a part of the way, smaller where that does not help, settles at once.
      if (change > changeBefore * (part === 1 ? 0.5 : 0.9)) part = Math.max(SMALLEST_PART, part / 2);
      changeBefore = change;
      now =
        part === 1
          ? next
          : now.map((column, k) => column.map((value, i) => value + part * (next[k][i] - value)));
    }
    return null;
  }

  /** What the carriers make of every face: n/ni there, and the part of the drift, from what is active at the nodes. */
  #findCarriers(
    species: readonly Species[],
    now: readonly Float64Array[],
    { limit, ni }: StepConditions,
  ): void {
    const [ratios, drops, weights] = [this.#ratio, this.#drop, this.#bernoulli];
    let logBefore = 0;
    let ratioBefore = 0;
    for (let i = 0; i < this.depth.length; i++) {
      let net = 0;
      for (let k = 0; k < species.length; k++)
        net += species[k].sign * now[k][i] * dissolvedPart(now[k][i] / limit[k]);
      const logRatio = Math.asinh(net / (2 * ni));
      const ratio = Math.exp(logRatio);
      if (i > 0) {
        const drop = logRatio - logBefore;
        ratios[i - 1] = (ratioBefore + ratio) / 2;
        drops[i - 1] = drop;
        weights[i - 1] = bernoulli(drop);
      }
      logBefore = logRatio;
      ratioBefore = ratio;
    }
  }

  #solve(
    { sign, surface }: Species,
    before: Float64Array,
    now: Float64Array,
    time: number,
    { diffusivity, limit }: StepConditions,
    k: number,
  ): Float64Array {
    const { depth, volume } = this;
    const [lower, diagonal, upper] = [this.#lower, this.#diagonal, this.#upper];
    const { neutral, positive, negative, doubleNegative } = diffusivity[k];
    const next = new Float64Array(depth.length);
    for (let i = 0; i < depth.length; i++) {
      diagonal[i] = volume[i];
      next[i] = volume[i] * before[i];
      lower[i] = 0;
      upper[i] = 0;
    }
    // What is dissolved, as a straight line around the last concentration.
    const [slope, start] = [this.#slope, this.#start];
    const [ratios, drop, weight] = [this.#ratio, this.#drop, this.#bernoulli];
    for (let i = 0; i < depth.length; i++) {
      const relative = now[i] / limit[k];
      const part = dissolvedPart(relative);
      slope[i] = part === 1 ? 1 : part / (1 + sixthPower(relative));
      start[i] = now[i] * (part - slope[i]);
    }
    for (let i = 0; i + 1 < depth.length; i++) {
      const ratio = ratios[i];
      const D = neutral + positive / ratio + ratio * (negative + ratio * doubleNegative);
      const factor = (time * D) / (depth[i + 1] - depth[i]);
      // B(-z) = B(z) + z: one exponential serves both directions and both signs.
      const rising = factor * weight[i];
      const falling = rising + factor * drop[i];
      const out = sign > 0 ? rising : falling;
      const back = sign > 0 ? falling : rising;
      diagonal[i] += out * slope[i];
      lower[i + 1] -= out * slope[i];
      diagonal[i + 1] += back * slope[i + 1];
      upper[i] -= back * slope[i + 1];
      const still = back * start[i + 1] - out * start[i];
      next[i] += still;
      next[i + 1] -= still;
    }
    if (surface && 'held' in surface) {
      diagonal[0] = 1;
      upper[0] = 0;
      next[0] = surface.held;
    } else if (surface) diagonal[0] += time * surface.evaporation;
    solveGeneralTridiagonal(lower, diagonal, upper, next);
    return next;
  }

  dose(concentration: Float64Array): number {
    let sum = 0;
    for (let i = 0; i < concentration.length; i++) sum += this.volume[i] * concentration[i];
    return sum;
  }
}

/**
 * Part of a concentration, given in units of its limit, that is dissolved: (1 + r^6)^(-1/6), all of little, the limit itself of much,
 * 11 % less than the limit where the concentration reaches it.
 */
function dissolvedPart(relative: number): number {
  return relative < NEGLIGIBLE ? 1 : 1 / Math.sqrt(Math.cbrt(1 + sixthPower(relative)));
}

const sixthPower = (x: number): number => x * x * x * (x * x * x);

/** z/(exp z - 1). */
function bernoulli(z: number): number {
  if (Math.abs(z) < 1e-4) return 1 - z / 2 + (z * z) / 12;
  return z / Math.expm1(z);
}

/**
 * Largest difference of two solutions, in units of what is tolerable: a part of the concentration, or what a shift of the profile by
 * the smallest depth of interest would make, whichever is more. Steep fronts are judged by where they are.
 */
export function differenceOf(
  depth: Float64Array,
  one: readonly Float64Array[],
  two: readonly Float64Array[],
  { tolerance, shift, floor }: Tolerance,
): number {
  let largest = 0;
  for (let k = 0; k < one.length; k++) {
    const [a, b] = [one[k], two[k]];
    for (let i = 0; i < b.length; i++) {
      const [before, after] = [Math.max(0, i - 1), Math.min(b.length - 1, i + 1)];
      const slope = Math.abs(b[after] - b[before]) / (depth[after] - depth[before]);
      const difference = Math.abs(b[i] - a[i]) / (tolerance * (b[i] + floor) + slope * shift);
      if (difference > largest) largest = difference;
    }
  }
  return largest;
}
