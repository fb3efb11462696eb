/** Ion ranges against the tables and computations they come from. */

import { describe, expect, test } from 'vitest';
import type { Dopant } from '../../src/core/material/dopants';
import { LSS_MOMENTS } from '../../src/core/material/ranges/lss1975';
import type { RangeTarget } from '../../src/core/material/ranges/universal';
import { evaluateFit } from '../../src/core/process/rangeFit';
import { rangeStatistics } from '../../src/core/process/ranges';
import { publishedTable } from './table';

interface Row {
  set: 'lss1975' | 'universal' | 'thomas-fermi';
  ion: Dopant;
  target: RangeTarget | 'quartz';
  energy_keV: number;
  projectedRange_um: number;
  straggle_um: number;
  lateral_um: number;
  skewness: number;
  kurtosis: number;
}

const rows = publishedTable<Row>('ion-ranges');
const CM_PER_UM = 1e-4;
/** The fits state errors up to 0.4 % of a length; the rows are rounded to 0.0001 um and 0.01. */
const lengthAllowance = (um: number) => 0.004 * um + 0.00006;
const SHAPE_ALLOWANCE = { skewness: 0.012, kurtosis: 0.03 };

describe('Gibbons, Johnson, Mylroie, Projected Range Statistics, 1975 (from memory)', () => {
  const printed = rows.filter((row) => row.set === 'lss1975' && row.target === 'silicon');

  test.each(printed)('$ion at $energy_keV keV in silicon is the printed row', (row) => {
    const { ion, energy_keV } = row;
    const got = rangeStatistics({ species: ion, energy_keV, target: 'silicon', set: 'lss1975' });
    expect(got.projectedRange / CM_PER_UM).toBeCloseTo(row.projectedRange_um, 10);
    expect(got.straggle / CM_PER_UM).toBeCloseTo(row.straggle_um, 10);
    expect(got.warnings).toEqual([]);
  });

  test('oxide rows are those printed for quartz times 2.65/2.20', () => {
    const quartz = rows.filter((row) => row.target === 'quartz');
    expect(quartz).toHaveLength(60);
    for (const { ion, energy_keV, projectedRange_um, straggle_um } of quartz) {
      const got = rangeStatistics({ species: ion, energy_keV, target: 'oxide', set: 'lss1975' });
      expect(got.projectedRange / CM_PER_UM).toBeCloseTo((projectedRange_um * 2.65) / 2.2, 10);
      expect(got.straggle / CM_PER_UM).toBeCloseTo((straggle_um * 2.65) / 2.2, 10);
    }
  });

  test('moments computed from the same theory come within 2.5 % of the range and 7 % of the straggle', () => {
    // The largest deviations of that computation are those of arsenic and antimony at 10 keV.
    for (const { ion, energy_keV, projectedRange_um, straggle_um } of printed) {
      const computed = evaluateFit(LSS_MOMENTS[ion], energy_keV);
      expect(Math.abs(computed.projectedRange / projectedRange_um - 1)).toBeLessThan(0.025);
      expect(Math.abs(computed.straggle / straggle_um - 1)).toBeLessThan(0.07);
    }
  });
});

describe('Transport moments computed for this project', () => {
  test.each(['silicon', 'oxide', 'nitride'] as const)(
    'the universal fits reproduce every row in %s',
    (target) => {
      const wanted = rows.filter(
        (row) => row.set === 'universal' && row.target === target && row.energy_keV >= 5,
      );
      expect(wanted.length).toBeGreaterThan(70);
      for (const row of wanted) {
        const got = rangeStatistics({
          species: row.ion,
          energy_keV: row.energy_keV,
          target,
          set: 'universal',
        });
        const differences = [
          [got.projectedRange / CM_PER_UM, row.projectedRange_um],
          [got.straggle / CM_PER_UM, row.straggle_um],
          [got.lateralStraggle / CM_PER_UM, row.lateral_um],
        ].map(([a, b]) => Math.abs(a - b) / lengthAllowance(b));
        expect(Math.max(...differences), `${row.ion} ${row.energy_keV} keV`).toBeLessThan(1);
        expect(Math.abs(got.skewness - row.skewness)).toBeLessThan(SHAPE_ALLOWANCE.skewness);
        expect(Math.abs(got.kurtosis - row.kurtosis)).toBeLessThan(SHAPE_ALLOWANCE.kurtosis);
      }
    },
  );

  test('the Thomas-Fermi fits reproduce every row', () => {
    for (const row of rows.filter(({ set, energy_keV }) => set === 'thomas-fermi' && energy_keV >= 5)) {
      const got = evaluateFit(LSS_MOMENTS[row.ion], row.energy_keV);
      expect(Math.abs(got.projectedRange - row.projectedRange_um)).toBeLessThan(
        lengthAllowance(row.projectedRange_um),
      );
      expect(Math.abs(got.straggle - row.straggle_um)).toBeLessThan(lengthAllowance(row.straggle_um));
      expect(Math.abs(got.lateralStraggle - row.lateral_um)).toBeLessThan(lengthAllowance(row.lateral_um));
      expect(Math.abs(got.skewness - row.skewness)).toBeLessThan(SHAPE_ALLOWANCE.skewness);
      expect(Math.abs(got.kurtosis - row.kurtosis)).toBeLessThan(SHAPE_ALLOWANCE.kurtosis);
    }
  });
});
