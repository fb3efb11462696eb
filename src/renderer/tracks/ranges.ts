/** What the vertical axes show, from the values inside the depth window alone. */

import type { Curve } from './curves';
import type { DepthWindow } from './depthWindow';
import { nodeAt } from './interpolate';

/** Decades shown below the lowest doping, and the most decades shown at all. */
const DECADES_BELOW = 1.2;
const MOST_DECADES = 9;

/** Largest and smallest positive finite values of curves in a window; null when there are none. */
export function positiveSpan(
  depth: Float64Array,
  curves: readonly Curve[],
  window: DepthWindow,
): { low: number; high: number } | null {
  const first = Math.max(0, nodeAt(depth, window.from_um));
  const last = Math.min(depth.length - 1, nodeAt(depth, window.to_um) + 1);
  let low = Number.POSITIVE_INFINITY;
  let high = 0;
  for (const { values } of curves)
    for (let i = first; i <= last; i++) {
      const value = values[i];
      if (value > 0 && value < low) low = value;
      if (value > high && value < Number.POSITIVE_INFINITY) high = value;
    }
  return high > 0 ? { low, high } : null;
}

/** Limits of a logarithmic axis as powers of ten: down to a decade below `floor`, up to just above the highest value. */
export function logRange(span: { high: number } | null, floor: number): [number, number] {
  if (span === null) return [13, 20];
  const top = Math.log10(span.high) + 0.35;
  const bottom = Math.min(Math.log10(floor) - DECADES_BELOW, top - 2);
  return [Math.max(bottom, top - MOST_DECADES), top];
}

export const linearRange = (span: { high: number } | null): [number, number] => [0, (span?.high ?? 1) * 1.12];
