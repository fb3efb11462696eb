/** Symmetric positive tridiagonal systems, solved in place. */

/**
 * Solves the system with diagonal `diagonal` and off-diagonals -`coupling` (coupling[i] joins i and i + 1) for the right-hand
 * side `values`, which the solution replaces. `diagonal` is used up. L. H. Thomas (1949), from memory; stable without pivoting
 * for diagonally dominant systems.
 */
export function solveTridiagonal(
  diagonal: Float64Array,
  coupling: Float64Array,
  values: Float64Array,
  count: number,
): void {
  for (let i = 1; i < count; i++) {
    const factor = coupling[i - 1] / diagonal[i - 1];
    diagonal[i] -= factor * coupling[i - 1];
    values[i] += factor * values[i - 1];
  }
  values[count - 1] /= diagonal[count - 1];
  for (let i = count - 2; i >= 0; i--) values[i] = (values[i] + coupling[i] * values[i + 1]) / diagonal[i];
}

/**
 * Solves a general system: `lower[i]` multiplies the unknown i - 1, `upper[i]` the unknown i + 1 of row i. `diagonal` is used up, the
 * solution replaces `values`. The same elimination; stable without pivoting for diagonally dominant columns, as implicit
 * diffusion has them.
 */
export function solveGeneralTridiagonal(
  lower: Float64Array,
  diagonal: Float64Array,
  upper: Float64Array,
  values: Float64Array,
): void {
  const last = values.length - 1;
  for (let i = 1; i <= last; i++) {
    const factor = lower[i] / diagonal[i - 1];
    diagonal[i] -= factor * upper[i - 1];
    values[i] -= factor * values[i - 1];
  }
  values[last] /= diagonal[last];
  for (let i = last - 1; i >= 0; i--) values[i] = (values[i] - upper[i] * values[i + 1]) / diagonal[i];
}
