/** How far every mobility model's resistivity is from the standard MF723, dopant by dopant. */

import type { Dopant } from '../../src/core/material/dopants';
import { MF723_TEMPERATURE, resistivityOf } from '../../src/core/material/mf723';
import { MOBILITY_MODELS } from '../../src/core/mobility/list';
import { uniformSilicon } from '../../src/core/mobility/uniform';
import type { MobilityName } from '../../src/core/study/names';

export interface ModelDeviation {
  model: MobilityName;
  dopant: Dopant;
  /** Largest |rho_model/rho_standard - 1| with its sign, in per cent, and where it occurs. */
  worst_percent: number;
  worstAt_cm3: number;
  /** Median of |rho_model/rho_standard - 1|, in per cent. */
  median_percent: number;
}

/** Three points a decade; arsenic only where the standard has a relation of its own for it. */
const SPANS: [Dopant, number, number][] = [
  ['boron', 14, 20],
  ['phosphorus', 14, 20],
  ['arsenic', 19, 20],
];

/**
 * One row for each model and dopant: complete ionisation, at the standard's 23 C (models of one temperature at their own).
 */
export function modelTable(): ModelDeviation[] {
  return MOBILITY_MODELS.flatMap(({ name }) =>
    SPANS.map(([dopant, from, to]) => {
      const points = Array.from({ length: 3 * (to - from) + 1 }, (_, k) => 10 ** (from + k / 3)).map(
        (concentration) => {
          const { resistivity } = uniformSilicon(dopant, concentration, MF723_TEMPERATURE, name);
          const percent = 100 * (resistivity / resistivityOf(dopant, concentration).value - 1);
          return { concentration, percent };
        },
      );
      const sorted = [...points].sort((a, b) => Math.abs(a.percent) - Math.abs(b.percent));
      const worst = sorted[sorted.length - 1];
      const middle = (sorted.length - 1) / 2;
      const [low, high] = [sorted[Math.floor(middle)], sorted[Math.ceil(middle)]];
      return {
        model: name,
        dopant,
        worst_percent: worst.percent,
        worstAt_cm3: worst.concentration,
        median_percent: (Math.abs(low.percent) + Math.abs(high.percent)) / 2,
      };
    }),
  );
}
