/** Values between the nodes of a column: logarithmic where both neighbours are positive and steep, linear otherwise. */

/** Index of the last node at or above a depth; -1 above the first. Nodes ascend. */
export function nodeAt(depth: Float64Array, at: number): number {
  let low = 0;
  let high = depth.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (depth[middle] <= at) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}

/** The column's value at a depth; NaN outside the column. `log` interpolates concentrations as they are drawn. */
export function valueAtDepth(depth: Float64Array, values: Float64Array, at: number, log: boolean): number {
  const i = nodeAt(depth, at);
  if (i < 0) return Number.NaN;
  if (i === depth.length - 1) return depth[i] === at ? values[i] : Number.NaN;
  const fraction = (at - depth[i]) / (depth[i + 1] - depth[i]);
  const [a, b] = [values[i], values[i + 1]];
  if (fraction === 0) return a;
  return log && a > 0 && b > 0 ? a * (b / a) ** fraction : a + fraction * (b - a);
}
