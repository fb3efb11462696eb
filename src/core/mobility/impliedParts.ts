/** Splits a fitted mobility into a lattice part and an impurity part by Matthiessen's rule. */

import type { MobilityParts } from './model';

/**
 * Writes the parts at one depth: `lattice` is the model's own limit without impurities, and the impurity part is what
 * Matthiessen's rule then implies, 1/impurity = 1/total - 1/lattice; infinite where the total has reached the limit.
 */
export function setImpliedParts(
  parts: MobilityParts | undefined,
  index: number,
  total: number,
  lattice: number,
): void {
  if (!parts) return;
  parts.lattice[index] = lattice;
  parts.impurity[index] = total < lattice ? (total * lattice) / (lattice - total) : Number.POSITIVE_INFINITY;
}
