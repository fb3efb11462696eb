/** Reverse bias: each layer has one Fermi level, and at a junction each kind of carrier keeps that of its own side. */

import type { SampledDoping } from '../profile/doping';
import type { ChargeModel } from './charge';

/**
 * Sets the quasi-Fermi potentials for reverse voltages (V, >= 0) of the metallurgical junctions from the surface down; the last
 * layer is at zero. The n side of a reverse-biased junction is the more positive one. Electrons of a p layer take the level of the
 * nearer n layer and the other way about: flat on each side, as without current.
 */
export function setBias(
  charges: ChargeModel,
  doping: SampledDoping,
  reverse: readonly number[],
  volt: number,
): void {
  const { depth, junctions, net } = doping;
  if (junctions.every((_, k) => !reverse[k])) return;
  const bounds = [0, ...junctions, depth.length - 1];
  const isN = bounds.slice(1).map((to, k) => net[(bounds[k] + to) >> 1] > 0);
  const levels = new Array<number>(isN.length).fill(0);
  for (let k = isN.length - 2; k >= 0; k--)
    levels[k] = levels[k + 1] + ((isN[k] ? 1 : -1) * (reverse[k] ?? 0)) / volt;
  for (let k = 0; k < isN.length; k++) {
    const [from, to] = [bounds[k], bounds[k + 1]];
    const [above, below] = [k > 0 ? levels[k - 1] : null, k + 1 < levels.length ? levels[k + 1] : null];
    const middle = (depth[from] + depth[to]) / 2;
    for (let i = from; i <= to; i++) {
      const nearer = depth[i] < middle ? (above ?? below) : (below ?? above);
      const [own, other] = [levels[k], nearer ?? levels[k]];
      charges.electronLevel[i] = isN[k] ? own : other;
      charges.holeLevel[i] = isN[k] ? other : own;
    }
  }
  charges.noteBias();
}
