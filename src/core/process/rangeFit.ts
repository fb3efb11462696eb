/** Evaluating the fitted moments of ion ranges, and going beyond their energies with care. */

import { FIT_ENERGIES, type RangeFit } from '../material/ranges/universal';

/** Lengths in um. */
export interface FittedMoments {
  readonly projectedRange: number;
  readonly straggle: number;
  readonly lateralStraggle: number;
  readonly skewness: number;
  readonly kurtosis: number;
}

/**
 * Within the fitted energies (5 to 500 keV) the quartics themselves. Beyond, lengths follow the power of the energy that
 * they have at the end, skewness and kurtosis keep their end values: a quartic alone would run away.
 */
export function evaluateFit(fit: RangeFit, energy: number): FittedMoments {
  const inside = Math.log(Math.min(FIT_ENERGIES[1], Math.max(FIT_ENERGIES[0], energy)));
  const excess = Math.log(energy) - inside;
  const length = (c: readonly number[]): number => Math.exp(value(c, inside) + excess * slope(c, inside));
  return {
    projectedRange: length(fit.projectedRange),
    straggle: length(fit.straggle),
    lateralStraggle: length(fit.lateralStraggle),
    skewness: value(fit.skewness, inside),
    kurtosis: value(fit.kurtosis, inside),
  };
}

const value = (c: readonly number[], t: number): number => c.reduceRight((sum, term) => sum * t + term, 0);

const slope = (c: readonly number[], t: number): number =>
  c.reduceRight((sum, term, k) => (k === 0 ? sum : sum * t + k * term), 0);
