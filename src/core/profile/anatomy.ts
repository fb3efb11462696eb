/** How finely a shape must be looked at: what quadrature needs to know about it, and nothing else. */

/** Points of one Gauss-Legendre panel; a panel spans about one standard deviation or less. */
export const PANEL_POINTS = 10;

export interface Anatomy {
  /**
   * Ascending depths >= 0. Between neighbours a ten-point Gauss-Legendre panel is accurate; outside the first and the
   * last there is nothing, or less than 1e-30 of the peak.
   */
  readonly edges: Float64Array;
  /** Where the shape is not smooth: jumps, kinks, ends. Ascending. */
  readonly kinks: readonly number[];
  /** Points a panel needs where the edges are this dense, if fewer than the usual. */
  readonly points?: number;
  /** Constant concentration below the last edge to any depth; 0 except for a wafer. */
  readonly beyond: number;
}

const STEPS = Array.from({ length: 25 }, (_, i) => i - 12);

/** Depths one `scale` apart up to twelve on either side of `centre`: resolves anything Gaussian down to 1e-31. */
export function ladder(centre: number, scale: number): number[] {
  return STEPS.map((k) => centre + k * scale);
}

/** Sorted, between `low` and `high` (both kept as edges), and no two nearer than `gap`. */
export function edgesWithin(depths: readonly number[], low: number, high: number, gap = 0): Float64Array {
  if (!(high > low)) return new Float64Array(0);
  const inside = depths.filter((x) => x > low && x < high).sort((a, b) => a - b);
  const kept = [low];
  for (const x of inside) if (x - kept[kept.length - 1] > gap) kept.push(x);
  if (kept.length > 1 && high - kept[kept.length - 1] <= gap) kept.pop();
  kept.push(high);
  return Float64Array.from(kept);
}

/** Marks as every shape carries them: finite, in the silicon, ascending, without repetition. */
export function marksAt(...depths: number[]): number[] {
  const inside = depths.filter((x) => x >= 0 && x < Number.POSITIVE_INFINITY).sort((a, b) => a - b);
  return inside.filter((x, i) => i === 0 || x > inside[i - 1]);
}

/** Centre and shoulders of anything peaked. */
export function shoulders(mean: number, sigma: number): number[] {
  return [-4, -2, -1, 0, 1, 2, 4].map((k) => mean + k * sigma);
}
