/** Where a value lies among ascending edges. */

/** Index i with edges[i] <= at < edges[i+1]; -1 below the first edge, edges.length - 1 from the last edge on. */
export function intervalOf(edges: ArrayLike<number>, at: number): number {
  let low = -1;
  let high = edges.length;
  while (high - low > 1) {
    const middle = (low + high) >>> 1;
    if (edges[middle] <= at) low = middle;
    else high = middle;
  }
  return low;
}
