/** Epitaxy: silicon is added on top. */

import type { Contribution } from '../profile/doping';
import { bury, uniform } from '../profile/shape';
import type { EpitaxyStep } from '../study/recipe';

/** Everything lies deeper; the new layer is doped evenly. Diffusion during growth is left to an anneal step. */
export function epitaxy(contributions: readonly Contribution[], step: EpitaxyStep): Contribution[] {
  const { thickness, dopant, concentration, index } = step;
  const buried = contributions.map((part) => ({ ...part, shape: bury(part.shape, thickness) }));
  if (!dopant || concentration === 0) return buried;
  return [...buried, { dopant, shape: uniform(concentration, 0, thickness), stepIndex: index }];
}
