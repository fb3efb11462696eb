/** Etching: the uppermost silicon is taken away, with the dopant in it. */

import type { Contribution } from '../profile/doping';
import { doseOf, strip } from '../profile/shape';
import type { EtchStep } from '../study/recipe';

export interface Etched {
  readonly contributions: Contribution[];
  /** cm^-2 of all that recipe steps had put there. */
  readonly removedDose: number;
}

export function etch(
  contributions: readonly Contribution[],
  { thickness }: Pick<EtchStep, 'thickness'>,
): Etched {
  const fromSteps = contributions.filter(({ stepIndex }) => stepIndex > 0);
  return {
    contributions: contributions.map((part) => ({ ...part, shape: strip(part.shape, thickness) })),
    removedDose: fromSteps.reduce((sum, { shape }) => sum + doseOf(shape, thickness), 0),
  };
}
