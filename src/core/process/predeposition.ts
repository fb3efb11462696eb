/** A predeposition: a surface held at a constant concentration lets dopant in. */

import { solidSolubility } from '../material/solubility';
import { erfcShape, type Shape } from '../profile/shape';
import type { PredepositionStep } from '../study/recipe';

export interface Predeposited {
  /** cm^-3 held at the surface: the given value, else the solid solubility at the temperature. */
  readonly surface: number;
  /** Null when nothing measurable went in. */
  readonly shape: Shape | null;
}

/** A diffusion length below a tenth of an angstrom (cm) carries no atom in. */
const SHORTEST_LENGTH = 1e-9;

/** surface erfc(x/2 sqrt(Dt)), added to whatever of the same dopant is there; `Dt` in cm^2 is the dopant's own. */
export function predeposition(step: PredepositionStep, Dt: number): Predeposited {
  const surface = step.surface ?? solidSolubility(step.dopant, step.temperature);
  const length = 2 * Math.sqrt(Dt);
  return { surface, shape: length < SHORTEST_LENGTH ? null : erfcShape(surface, length) };
}
