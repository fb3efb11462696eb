/** An implant: ion, dose, energy and screen layer become a profile in the silicon. */

import { type Dopant, dopantOf } from '../material/dopants';
import { doseOf, gaussian, pearson, type Shape } from '../profile/shape';
import type { Warning } from '../study/problem';
import type { ImplantStep } from '../study/recipe';
import { withTail } from './channelling';
import { type RangeStatistics, rangeStatistics } from './ranges';

export interface Implanted {
  readonly dopant: Dopant;
  readonly shape: Shape;
  /** In silicon. */
  readonly statistics: RangeStatistics;
  /** cm^-2 inside the silicon. */
  readonly retainedDose: number;
  /** Fraction of the ions that the screen stopped or threw back; null without a screen. */
  readonly screened: number | null;
  readonly warnings: readonly Warning[];
}

/** Range scaling errs by a few per cent in depth while no more than this stays in the screen. */
const LARGE_SCREEN_LOSS = 0.3;

/**
 * Profile of an implant into amorphous silicon: a Pearson distribution of four moments, or a Gaussian of two.
 *
 * What lies at x < 0 is lost, and the dose left in the silicon reported: the moments are those of an unbounded medium, in
 * which these ions have gone back through the surface, while the dose of a step is what the implanter counted on its way
 * in. (Boron at 10 keV loses 2 %, heavier ions less than 0.5 %.)
 *
 * With a tail, that is put on last, see `withTail`.
 *
 * Through a screen: the ions that pass are those whose range in the screen's own material exceeds its thickness t; they lie
 * in the silicon as the silicon profile shifted up by t Rp_silicon/Rp_screen, scaled to the dose that passed.
 * Source: range scaling after H. Ryssel et al. 1983 (from memory); mean depth within 0 to 4 % of a two-layer Monte Carlo.
 */
export function implant(step: ImplantStep): Implanted {
  const { species, energy_keV, dose, screen, ranges: set } = step;
  const statistics = rangeStatistics({ species, energy_keV, target: 'silicon', set });
  const distribution = (amount: number, moments: RangeStatistics, offset: number): Shape =>
    step.shape === 'gaussian'
      ? gaussian(
          amount / (Math.sqrt(2 * Math.PI) * moments.straggle),
          moments.projectedRange - offset,
          moments.straggle,
        )
      : pearson(amount, { ...moments, mean: moments.projectedRange - offset });
  const warnings = [...statistics.warnings];
  let shape = distribution(dose, statistics, 0);
  let screened: number | null = null;
  if (screen && screen.thickness > 0) {
    const inScreen = rangeStatistics({ species, energy_keV, target: screen.material, set });
    warnings.push(...inScreen.warnings);
    const passed = doseOf(distribution(1, inScreen, screen.thickness), Number.POSITIVE_INFINITY);
    const equivalent = screen.thickness * (statistics.projectedRange / inScreen.projectedRange);
    const inside = doseOf(distribution(1, statistics, equivalent), Number.POSITIVE_INFINITY);
    shape = distribution(inside > 0 ? (dose * passed) / inside : 0, statistics, equivalent);
    screened = 1 - passed;
    if (screened > LARGE_SCREEN_LOSS)
      warnings.push({
        code: 'screen-loss',
        message: `${(100 * screened).toFixed(0)} % of the ${species} stays in the screen ${screen.material}: what reaches the silicon is uncertain, because range scaling is checked only while less than 30 % stays`,
      });
  }
  if (step.hasTail) shape = withTail(shape);
  return {
    dopant: dopantOf(species),
    shape,
    statistics,
    retainedDose: doseOf(shape, Number.POSITIVE_INFINITY),
    screened,
    warnings: distinct(warnings),
  };
}

/** The screen repeats what the silicon already said. */
function distinct(warnings: readonly Warning[]): Warning[] {
  return warnings.filter((one, i) => warnings.findIndex((other) => other.message === one.message) === i);
}
