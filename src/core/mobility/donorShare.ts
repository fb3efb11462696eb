/**
 * Which published set of coefficients the donors at a depth take: phosphorus's, arsenic's, or a mixture by concentration.
 *
 * Antimony borrows phosphorus's set, as in the resistivity relation: its level (39 meV below the conduction band) is
 * nearer to phosphorus's (45) than to arsenic's (54). Common practice, no source. All acceptors take boron's set.
 */

import type { DopantColumn } from './model';

/** Share of the donors with arsenic's set when it is the same at every depth: 0 or 1; NaN when it changes with depth. */
export function uniformArsenicShare(donorParts: readonly DopantColumn[]): number {
  const arsenic = donorParts.filter((part) => part.dopant === 'arsenic').length;
  if (arsenic === 0) return 0;
  return arsenic === donorParts.length ? 1 : Number.NaN;
}

/** Share of the donors at depth `index` that take arsenic's set, 0 to 1; phosphorus's where there are no donors. */
export function arsenicShareAt(donorParts: readonly DopantColumn[], index: number): number {
  let arsenic = 0;
  let all = 0;
  for (const part of donorParts) {
    const ionised = part.ionised[index];
    all += ionised;
    if (part.dopant === 'arsenic') arsenic += ionised;
  }
  return all > 0 ? arsenic / all : 0;
}

/** Value of a coefficient that is `phosphorus` without arsenic and `arsenic` without phosphorus. */
export function mixed(phosphorus: number, arsenic: number, share: number): number {
  return phosphorus + share * (arsenic - phosphorus);
}
