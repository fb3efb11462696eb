/**
 * Which part of the dopants is ionised, with levels that move into the band as doping grows.
 *
 * E = E0/[1 + (N/N_ref)^c],  b = 1/[1 + (N/N_b)^d],  N+/N = 1 - b n/(n + g n1),  n1 = Nc exp(-E/kT);  for acceptors p and Nv.
 *
 * Source: P. P. Altermatt, A. Schenk, B. Schmithuesen, G. Heiser, J. Appl. Phys. 100, 113714 and 113715 (2006), parameters from
 * memory. A later paper (H. Steinkemper, P. P. Altermatt, M. Hermle, AIP Advances 6, 125202, 2016) reports a mistake in the
 * formalism; what it is was not found. Made for 300 K and up to the metal-insulator transition, above which all are ionised.
 */

import { BOLTZMANN_EV } from '../material/constants';
import { DOPANT_FACTS, type Dopant } from '../material/dopants';
import { densitiesOfStates } from '../material/silicon';

interface Level {
  /** eV */
  readonly energy: number;
  /** cm^-3 */
  readonly nRef: number;
  readonly c: number;
  readonly nBound: number;
  readonly d: number;
  readonly degeneracy: number;
}

const LEVELS: Partial<Record<Dopant, Level>> = {
  phosphorus: { energy: 0.0455, nRef: 2.2e18, c: 2, nBound: 6e18, d: 2.3, degeneracy: 1 / 2 },
  arsenic: { energy: 0.0537, nRef: 4e18, c: 1.5, nBound: 1.4e19, d: 3, degeneracy: 1 / 2 },
  boron: { energy: 0.04439, nRef: 1.3e18, c: 1.4, nBound: 4.5e18, d: 2.4, degeneracy: 1 / 4 },
};

export const IONISATION_SOURCE = 'Altermatt et al., J. Appl. Phys. 100, 113714 and 113715 (2006)';

export const hasLevel = (dopant: Dopant): boolean => LEVELS[dopant] !== undefined;

/**
 * A dopant's level at every depth: of `bound` atoms (cm^-3) the part c/(c + threshold) holds its carrier, c being the density of
 * the carriers it gives. Null for a dopant without published levels.
 */
export function boundColumns(
  dopant: Dopant,
  active: Float64Array,
  temperature: number,
): { bound: Float64Array; threshold: Float64Array } | null {
  const level = LEVELS[dopant];
  if (!level) return null;
  const { conduction, valence } = densitiesOfStates(temperature);
  const states = level.degeneracy * (DOPANT_FACTS[dopant].role === 'donor' ? conduction : valence);
  const perKelvin = -level.energy / (BOLTZMANN_EV * temperature);
  const [logRef, logBound] = [Math.log(level.nRef), Math.log(level.nBound)];
  const bound = new Float64Array(active.length);
  const threshold = new Float64Array(active.length);
  for (let i = 0; i < active.length; i++) {
    const log = Math.log(active[i]);
    const energy = perKelvin / (1 + Math.exp(level.c * (log - logRef)));
    bound[i] = active[i] / (1 + Math.exp(level.d * (log - logBound)));
    threshold[i] = states * Math.exp(energy);
  }
  return { bound, threshold };
}
