/** Shape-preserving interpolation: a smooth curve through given points that never leaves the range of its neighbours. */

/**
 * Cubic Hermite curve through (x, y), continuous with its first derivative, monotone between any two neighbours and
 * therefore free of overshoot; extrema lie at nodes only. Third order where the data are smooth and monotone, exact
 * for straight lines. Outside [x[0], x[n-1]] the end values are held.
 *
 * Source: M. Steffen, A simple method for monotonic interpolation in one dimension, Astronomy and Astrophysics 239
 * (1990) 443-450, equations 2-5, 8, 11 and, for the ends, 24-27 (from memory).
 * @param x ascending without repetition, at least two values.
 * @param y finite, one value for each x.
 * @returns a function that remembers the interval of its last call, so sweeping in depth costs no search.
 * @throws RangeError when the lengths differ, are below two, or x does not ascend.
 */
export function monotoneCubic(x: Float64Array, y: Float64Array): (x: number) => number {
  const n = x.length;
  if (n < 2 || y.length !== n)
    throw new RangeError(`invalid nodes: ${n} depths and ${y.length} values; two or more of each are needed`);
  for (let i = 1; i < n; i++)
    if (!(x[i] > x[i - 1])) throw new RangeError(`invalid nodes: ${x[i]} after ${x[i - 1]}; x must ascend`);
  const slope = steffenSlopes(x, y);
  let last = 0;
  return (at) => {
    if (at <= x[0]) return y[0];
    if (at >= x[n - 1]) return y[n - 1];
    if (at < x[last] || at >= x[last + 1])
      last = last + 2 < n && at >= x[last + 1] && at < x[last + 2] ? last + 1 : intervalOf(x, at);
    const width = x[last + 1] - x[last];
    const rise = (y[last + 1] - y[last]) / width;
    const d = at - x[last];
    const a = (slope[last] + slope[last + 1] - 2 * rise) / (width * width);
    const b = (3 * rise - 2 * slope[last] - slope[last + 1]) / width;
    return ((a * d + b) * d + slope[last]) * d + y[last];
  };
}

/** Index i with x[i] <= at < x[i+1], for `at` inside the nodes; NaN ends in the first interval. */
function intervalOf(x: Float64Array, at: number): number {
  let low = 0;
  let high = x.length - 1;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (x[middle] <= at) low = middle;
    else high = middle;
  }
  return low;
}

/** Slope of the parabola through three neighbours, limited so that both adjoining intervals stay monotone. */
function steffenSlopes(x: Float64Array, y: Float64Array): Float64Array {
  const n = x.length;
  const width = (i: number): number => x[i + 1] - x[i];
  const rise = (i: number): number => (y[i + 1] - y[i]) / width(i);
  const slopes = new Float64Array(n);
  if (n === 2) return slopes.fill(rise(0));
  for (let i = 1; i < n - 1; i++) {
    const [before, after] = [rise(i - 1), rise(i)];
    if (before * after <= 0) continue;
    const parabola = (before * width(i) + after * width(i - 1)) / (width(i - 1) + width(i));
    const limit = 2 * Math.min(Math.abs(before), Math.abs(after));
    slopes[i] = Math.sign(before) * Math.min(limit, Math.abs(parabola));
  }
  slopes[0] = endSlope(rise(0), rise(1), width(0), width(1));
  slopes[n - 1] = endSlope(rise(n - 2), rise(n - 3), width(n - 2), width(n - 3));
  return slopes;
}

function endSlope(rise: number, nextRise: number, width: number, nextWidth: number): number {
  const share = width / (width + nextWidth);
  const parabola = rise * (1 + share) - nextRise * share;
  if (parabola * rise <= 0) return 0;
  return Math.abs(parabola) > 2 * Math.abs(rise) ? 2 * rise : parabola;
}
