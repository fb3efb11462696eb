/** The Pearson family of distributions from four moments: every type, normalised numerically. */

import { gaussLegendre, integratePanels } from '../numeric/gaussLegendre';

export type PearsonType = 'I' | 'III' | 'IV' | 'V' | 'VI' | 'normal';

export interface PearsonDensity {
  /** Types II and VII are the symmetric cases of I and IV and go by those names. */
  readonly type: PearsonType;
  /** Where the density peaks, measured from the mean. */
  readonly mode: number;
  /** Ends of the support, measured from the mean; infinite where it has none. */
  readonly low: number;
  readonly high: number;
  /** Ascending panel edges that resolve everything above 1e-30 of the peak, measured from the mean. */
  readonly edges: Float64Array;
  /** Logarithm of the normalised density at distance u from the mean; -Infinity outside the support. */
  readonly logAt: (u: number) => number;
}

/** Moments of these sizes are as good as those of a simpler type: rounding would cost more than the difference. */
const NEGLIGIBLE = 1e-12;
const NEGLIGIBLE_DISCRIMINANT = 1e-11;
const NEGLIGIBLE_LOG = -70;
const RULE = gaussLegendre(16);

/** f'/f = (u - a)/(b0 + b1 u + b2 u^2), u in units of the straggle. */
interface Coefficients {
  readonly a: number;
  readonly b0: number;
  readonly b2: number;
}

/**
 * Density with mean 0 and the given standard deviation, skewness and kurtosis.
 *
 * df/du = (u - a) f/(b0 + b1 u + b2 u^2), A = 10 kurtosis - 12 skewness^2 - 18, a = b1 = -skewness (kurtosis + 3)/A,
 * b0 = -(4 kurtosis - 3 skewness^2)/A, b2 = -(2 kurtosis - 3 skewness^2 - 6)/A, u in standard deviations.
 * Source: W. K. Hofker, Philips Res. Rep. Suppl. 8 (1975), after K. Pearson 1895 (from memory; the four moments of the
 * result are verified by quadrature in the tests). Types: D = 4 b0 b2 - b1^2 > 0 is IV; D < 0 is I between its roots
 * when they enclose the mean, else VI; D = 0 is V; b2 = 0 is III; b1 = b2 = 0 is the normal distribution.
 * @throws RangeError when no distribution with one peak has these moments.
 */
export function pearsonDensity(straggle: number, skewness: number, kurtosis: number): PearsonDensity {
  const squared = skewness * skewness;
  const A = 10 * kurtosis - 12 * squared - 18;
  const coefficients: Coefficients = {
    a: (-skewness * (kurtosis + 3)) / A,
    b0: -(4 * kurtosis - 3 * squared) / A,
    b2: -(2 * kurtosis - 3 * squared - 6) / A,
  };
  const form = A > 0 && kurtosis > 1 + squared ? unnormalised(coefficients) : undefined;
  const { a, b0, b2 } = coefficients;
  if (!form || !(a > form.low && a < form.high))
    throw new RangeError(
      `invalid moments: no Pearson distribution with one peak has skewness ${skewness} and kurtosis ${kurtosis}`,
    );
  const atMode = form.log(a);
  const logAt = (u: number): number =>
    u > form.low && u < form.high ? form.log(u) - atMode : Number.NEGATIVE_INFINITY;
  const width = Math.min(0.5, 0.7 * Math.sqrt(-(b0 + a * a + b2 * a * a)));
  const edges = [...outward(a, form.low, width, logAt).reverse(), a, ...outward(a, form.high, width, logAt)];
  const logNorm = Math.log(integratePanels((u) => Math.exp(logAt(u)), edges, RULE) * straggle);
  return {
    type: form.type,
    mode: a * straggle,
    low: form.low * straggle,
    high: form.high * straggle,
    edges: Float64Array.from(edges, (u) => u * straggle),
    logAt: (u) => logAt(u / straggle) - logNorm,
  };
}

interface Form {
  readonly type: PearsonType;
  readonly low: number;
  readonly high: number;
  readonly log: (u: number) => number;
}

/** The solution of the differential equation for each type, apart from its norm; b1 = a. */
function unnormalised({ a, b0, b2 }: Coefficients): Form {
  const [low, high] = [Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY];
  if (Math.abs(b2) < NEGLIGIBLE) {
    if (Math.abs(a) < NEGLIGIBLE) return { type: 'normal', low, high, log: (u) => (u * u) / (2 * b0) };
    const end = -b0 / a;
    const power = -(1 + b0 / (a * a));
    return {
      type: 'III',
      low: end < 0 ? end : low,
      high: end < 0 ? high : end,
      log: (u) => u / a + power * Math.log1p(-u / end),
    };
  }
  const D = 4 * b0 * b2 - a * a;
  if (Math.abs(D) < NEGLIGIBLE_DISCRIMINANT * a * a) {
    const root = -a / (2 * b2);
    return {
      type: 'V',
      low: root < 0 ? root : low,
      high: root < 0 ? high : root,
      log: (u) => (Math.log1p(-u / root) - (root - a) / (u - root)) / b2,
    };
  }
  if (D > 0) {
    const rootD = Math.sqrt(D);
    const twist = (a / b2 + 2 * a) / rootD;
    return {
      type: 'IV',
      low,
      high,
      log: (u) =>
        Math.log1p((u * (a + b2 * u)) / b0) / (2 * b2) - twist * Math.atan((2 * b2 * u + a) / rootD),
    };
  }
  return withRealRoots(a, b0, b2, Math.sqrt(-D));
}

/** Types I and VI. Each root is taken in the form that does not cancel, each logarithm as log(1 - u/root). */
function withRealRoots(a: number, b0: number, b2: number, rootD: number): Form {
  const q = -(a + (a < 0 ? -rootD : rootD)) / 2;
  const roots = [q / b2, b0 / q].sort((x, y) => x - y);
  const [r1, r2] = roots;
  const power1 = (r1 - a) / (b2 * (r1 - r2));
  const power2 = (r2 - a) / (b2 * (r2 - r1));
  const enclosed = r1 < 0 && r2 > 0;
  return {
    type: enclosed ? 'I' : 'VI',
    low: enclosed ? r1 : r2 < 0 ? r2 : Number.NEGATIVE_INFINITY,
    high: enclosed ? r2 : r2 < 0 ? Number.POSITIVE_INFINITY : r1,
    log: (u) => power1 * Math.log1p(-u / r1) + power2 * Math.log1p(-u / r2),
  };
}

/** Panel edges from the mode towards one end: even near the peak, growing in a tail, halving towards a finite end. */
function outward(mode: number, end: number, width: number, logAt: (u: number) => number): number[] {
  const sign = Math.sign(end - mode);
  const edges: number[] = [];
  let distance = 0;
  const whole = Math.abs(end - mode);
  for (;;) {
    const left = whole - distance;
    if (left < 1e-8 || (left === Number.POSITIVE_INFINITY && distance > 1e8)) break;
    distance += Math.min(Math.max(width, 0.3 * (distance - 8 * width)), left / 2);
    edges.push(mode + sign * distance);
    if (logAt(mode + sign * distance) < NEGLIGIBLE_LOG) return edges;
  }
  if (Number.isFinite(end)) edges.push(end);
  return edges;
}
