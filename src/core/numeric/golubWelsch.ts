/** Gauss rules from their recurrence, and Gauss rules of any measure given as many small masses. */

/** Points and weights of a quadrature rule. */
export interface Rule {
  readonly nodes: Float64Array;
  readonly weights: Float64Array;
}

const MAX_SWEEPS = 60;

/**
 * Gauss rule of the measure whose monic orthogonal polynomials obey p[k+1] = (x - alpha[k]) p[k] - beta[k] p[k-1]:
 * the eigenvalues of the symmetric tridiagonal matrix of the recurrence and the first components of its eigenvectors,
 * by the implicit QL method.
 *
 * Source: G. H. Golub and J. H. Welsch, Calculation of Gauss quadrature rules, Math. Comp. 23 (1969) 221-230 (from memory).
 * @param beta beta[0] is not read; the others are >= 0.
 * @param mass total mass of the measure.
 * @returns nodes in ascending order; weights sum to `mass` and are never negative.
 */
export function golubWelsch(alpha: Float64Array, beta: Float64Array, mass: number): Rule {
  const n = alpha.length;
  const d = alpha.slice();
  const e = new Float64Array(n);
  for (let i = 1; i < n; i++) e[i - 1] = Math.sqrt(beta[i]);
  const z = new Float64Array(n);
  z[0] = 1;
  for (let l = 0; l < n; l++)
    for (let sweep = 0; sweep < MAX_SWEEPS; sweep++) {
      let m = l;
      while (m < n - 1 && Math.abs(e[m]) > Number.EPSILON * (Math.abs(d[m]) + Math.abs(d[m + 1]))) m++;
      if (m === l) break;
      implicitStep(d, e, z, l, m);
    }
  const order = Array.from(d.keys()).sort((i, j) => d[i] - d[j]);
  return {
    nodes: Float64Array.from(order, (i) => d[i]),
    weights: Float64Array.from(order, (i) => mass * z[i] * z[i]),
  };
}

/** One shifted QL sweep over rows l to m, rotating z along. */
function implicitStep(d: Float64Array, e: Float64Array, z: Float64Array, l: number, m: number): void {
  const lead = (d[l + 1] - d[l]) / (2 * e[l]);
  const root = Math.hypot(lead, 1);
  let g = d[m] - d[l] + e[l] / (lead + (lead >= 0 ? root : -root));
  let [sine, cosine, shift] = [1, 1, 0];
  for (let i = m - 1; i >= l; i--) {
    const f = sine * e[i];
    const b = cosine * e[i];
    let r = Math.hypot(f, g);
    e[i + 1] = r;
    if (r === 0) {
      d[i + 1] -= shift;
      e[m] = 0;
      return;
    }
    sine = f / r;
    cosine = g / r;
    g = d[i + 1] - shift;
    r = (d[i] - g) * sine + 2 * cosine * b;
    shift = sine * r;
    d[i + 1] = g + shift;
    g = cosine * r - b;
    const above = z[i + 1];
    z[i + 1] = sine * z[i] + cosine * above;
    z[i] = cosine * z[i] - sine * above;
  }
  d[l] -= shift;
  e[l] = g;
  e[m] = 0;
}

/**
 * The n-point Gauss rule of many point masses: same moments up to order 2n - 1, positive weights, nodes inside.
 * However rough the masses are, an integral of them with a smooth function becomes a sum of n terms.
 *
 * Source: discrete Stieltjes procedure, W. Gautschi, On generating orthogonal polynomials, SIAM J. Sci. Stat. Comput. 3
 * (1982) 289-317 (from memory); stable for n well below the number of masses.
 * @param points all inside [low, high].
 * @param masses >= 0.
 */
export function gaussRuleOfMasses(
  points: ArrayLike<number>,
  masses: ArrayLike<number>,
  low: number,
  high: number,
  n: number,
): Rule {
  const count = points.length;
  let total = 0;
  for (let j = 0; j < count; j++) total += masses[j];
  if (!(total > 0)) return { nodes: new Float64Array(0), weights: new Float64Array(0) };
  const centre = (low + high) / 2;
  const scale = (high - low) / 2;
  const t = Float64Array.from({ length: count }, (_, j) => (points[j] - centre) / scale);
  const alpha = new Float64Array(n);
  const beta = new Float64Array(n);
  let previous = new Float64Array(count);
  let current = new Float64Array(count).fill(1);
  let normBefore = 1;
  let terms = 0;
  for (let k = 0; k < n; k++, terms++) {
    let [norm, first] = [0, 0];
    for (let j = 0; j < count; j++) {
      const share = (masses[j] / total) * current[j] * current[j];
      norm += share;
      first += share * t[j];
    }
    // A measure on fewer than n points is spent here: what is left is rounding.
    if (!(norm > 1e-28 * normBefore)) break;
    alpha[k] = first / norm;
    beta[k] = norm / normBefore;
    normBefore = norm;
    for (let j = 0; j < count; j++) {
      const next = (t[j] - alpha[k]) * current[j] - (k > 0 ? beta[k] * previous[j] : 0);
      previous[j] = next;
    }
    [previous, current] = [current, previous];
  }
  const rule = golubWelsch(alpha.subarray(0, terms), beta.subarray(0, terms), total);
  for (let i = 0; i < terms; i++) rule.nodes[i] = centre + scale * Math.min(1, Math.max(-1, rule.nodes[i]));
  return rule;
}
