/** An implanted profile of four moments: a Pearson distribution, of which the part inside the silicon is there. */

import { type Anatomy, edgesWithin, marksAt, shoulders } from './anatomy';
import type { ConcentrationAt, PearsonShape } from './kinds';
import { pearsonDensity } from './pearsonDensity';

export interface Moments {
  readonly mean: number;
  readonly straggle: number;
  readonly skewness: number;
  readonly kurtosis: number;
}

/**
 * @param dose integral over all x, above the surface included.
 * @throws RangeError when no single-peaked Pearson distribution has these moments.
 */
export function pearson(dose: number, moments: Moments, from = 0): PearsonShape {
  const { mean, straggle, skewness, kurtosis } = moments;
  const { mode, low, high } = pearsonDensity(straggle, skewness, kurtosis);
  return {
    kind: 'pearson',
    dose,
    mean,
    straggle,
    skewness,
    kurtosis,
    from,
    marks: marksAt(
      ...[mean + low, ...shoulders(mean, straggle), mean + mode, from, mean + high].filter((x) => x >= from),
    ),
    jumps: from > 0 ? [from] : [],
  };
}

export function pearsonEvaluator(shape: PearsonShape): ConcentrationAt {
  const { dose, mean, straggle, skewness, kurtosis, from } = shape;
  const { logAt } = pearsonDensity(straggle, skewness, kurtosis);
  return (x) => (x < from ? 0 : dose * Math.exp(logAt(x - mean)));
}

export function pearsonAnatomy(shape: PearsonShape): Anatomy {
  const { mean, straggle, skewness, kurtosis, from } = shape;
  const { edges, low, high } = pearsonDensity(straggle, skewness, kurtosis);
  const depths = Array.from(edges, (u) => u + mean);
  const first = Math.max(from, depths[0]);
  return {
    edges: edgesWithin(depths, first, depths[depths.length - 1]),
    kinks: marksAt(...[from, mean + low, mean + high].filter((x) => x >= from)),
    beyond: 0,
  };
}
