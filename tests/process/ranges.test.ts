import { describe, expect, test } from 'vitest';
import { IMPLANT_SPECIES, type ImplantSpecies } from '../../src/core/material/dopants';
import type { RangeTarget } from '../../src/core/material/ranges/universal';
import { rangeStatistics } from '../../src/core/process/ranges';
import { pearsonDensity } from '../../src/core/profile/pearsonDensity';
import type { RangeSet } from '../../src/core/study/names';

const um = (cm: number): number => cm * 1e4;
const ask = (species: ImplantSpecies, energy_keV: number, set: RangeSet, target: RangeTarget = 'silicon') =>
  rangeStatistics({ species, energy_keV, target, set });

describe('rangeStatistics', () => {
  test('interpolates the 1975 tables between their rows without leaving them', () => {
    const [low, middle, high] = [40, 45, 50].map(
      (energy) => ask('phosphorus', energy, 'lss1975').projectedRange,
    );
    expect(middle).toBeGreaterThan(low);
    expect(middle).toBeLessThan(high);
    // a power law between neighbours: the geometric mean sits at the geometric mean energy
    expect(
      ask('phosphorus', Math.sqrt(40 * 50), 'lss1975').projectedRange / Math.sqrt(low * high),
    ).toBeCloseTo(1, 12);
  });

  test('counts BF2 as boron at 11/49 of the energy in both sets', () => {
    for (const set of ['universal', 'lss1975'] as const) {
      const { warnings: _, ...molecule } = ask('BF2', 49 * 4, set);
      const { warnings: __, ...atom } = ask('boron', 44, set);
      expect(molecule).toEqual(atom);
    }
  });

  test('gives the 1975 oxide ranges for thermal oxide, 2.65/2.20 deeper than printed for quartz', () => {
    // printed: boron 100 keV 0.3104/0.0710 um in SiO2 of 2.65 g/cm3
    const { projectedRange, straggle } = ask('boron', 100, 'lss1975', 'oxide');
    expect(um(projectedRange)).toBeCloseTo(0.3104 * 1.2045, 4);
    expect(um(straggle)).toBeCloseTo(0.071 * 1.2045, 4);
  });

  test('warns beyond the energies of the data and still rises with energy', () => {
    expect(ask('boron', 60, 'universal').warnings).toEqual([]);
    for (const [energy, set] of [
      [2, 'universal'],
      [800, 'universal'],
      [5, 'lss1975'],
      [400, 'lss1975'],
    ] as const) {
      const { warnings, projectedRange } = ask('boron', energy, set);
      expect(warnings.map((warning) => warning.code)).toEqual(['range-energy']);
      expect(warnings[0].message).toContain(`${energy} keV`);
      expect(ask('boron', energy * 1.01, set).projectedRange).toBeGreaterThan(projectedRange);
    }
  });

  test('extrapolates without a step at the ends of the data', () => {
    for (const [species, edge, set] of [
      ['boron', 5, 'universal'],
      ['arsenic', 500, 'universal'],
      ['antimony', 200, 'lss1975'],
      ['phosphorus', 10, 'lss1975'],
    ] as const) {
      const [below, above] = [0.9999, 1.0001].map((part) => ask(species, edge * part, set));
      expect(Math.abs(above.projectedRange / below.projectedRange - 1)).toBeLessThan(3e-4);
      expect(Math.abs(above.straggle / below.straggle - 1)).toBeLessThan(3e-4);
    }
  });

  test('says what stands in for ions and targets that the 1975 tables lack', () => {
    const substitutes = (species: ImplantSpecies, target: RangeTarget) =>
      ask(species, 100, 'lss1975', target).warnings.map((warning) => warning.code);
    expect(substitutes('indium', 'silicon')).toEqual(['range-substitute']);
    expect(substitutes('boron', 'nitride')).toEqual(['range-substitute']);
    expect(substitutes('antimony', 'oxide')).toEqual(['range-substitute']);
    expect(substitutes('arsenic', 'oxide')).toEqual([]);
    const ratio = (set: RangeSet) =>
      ask('antimony', 100, set, 'nitride').projectedRange / ask('antimony', 100, set).projectedRange;
    expect(ratio('lss1975')).toBeCloseTo(ratio('universal'), 12);
  });

  test('gives moments of which a single-peaked Pearson distribution exists, whatever is asked', () => {
    for (const species of IMPLANT_SPECIES)
      for (const set of ['universal', 'lss1975'] as const)
        for (const target of ['silicon', 'oxide', 'nitride'] as const)
          for (let energy = 0.1; energy <= 10_000; energy *= 1.25) {
            const { straggle, skewness, kurtosis, projectedRange } = ask(species, energy, set, target);
            expect(straggle > 0 && projectedRange > 0).toBe(true);
            expect(() => pearsonDensity(straggle, skewness, kurtosis)).not.toThrow();
          }
  });
});
