/**
 * Simpson's rule over cells of three nodes (left, exact middle, right): exact for cubics, fourth order.
 * Columns hold an odd number of nodes; even positions are cell ends.
 */

/** Integral of `values` over `depth` between the cell ends `from` and `to` (positions, both even). */
export function integrate(depth: Float64Array, values: Float64Array, from: number, to: number): number {
  let sum = 0;
  for (let i = from; i < to; i += 2)
    sum += (depth[i + 2] - depth[i]) * (values[i] + 4 * values[i + 1] + values[i + 2]);
  return sum / 6;
}

/** Integral from the cell end `from` to every node up to `to`, written into `out`; the parabola's part at a middle. */
export function accumulate(
  depth: Float64Array,
  values: Float64Array,
  from: number,
  to: number,
  out: Float64Array,
): void {
  let sum = 0;
  for (let i = from; i < to; i += 2) {
    const width = depth[i + 2] - depth[i];
    out[i] = sum;
    out[i + 1] = sum + (width * (5 * values[i] + 8 * values[i + 1] - values[i + 2])) / 24;
    sum += (width * (values[i] + 4 * values[i + 1] + values[i + 2])) / 6;
  }
  out[to] = sum;
}
