import { describe, expect, test } from 'vitest';
import { implant } from '../../src/core/process/implant';
import { rangeStatistics } from '../../src/core/process/ranges';
import { evaluator } from '../../src/core/profile/shape';
import type { ImplantStep } from '../../src/core/study/recipe';
import { integrate } from '../support/quadrature';

const UM = 1e-4;
const NM = 1e-7;
const step = (parts: Partial<ImplantStep> = {}): ImplantStep => ({
  kind: 'implant',
  index: 1,
  species: 'boron',
  dose: 1e14,
  energy_keV: 80,
  shape: 'pearson',
  hasTail: false,
  ranges: 'universal',
  ...parts,
});
const moments = (parts: Partial<ImplantStep> = {}) => {
  const at = evaluator(implant(step(parts)).shape);
  const of = (weight: (x: number) => number) => integrate((x) => at(x) * weight(x), 0, 2 * UM, 1e-9);
  const dose = of(() => 1);
  const mean = of((x) => x) / dose;
  return { dose, mean, straggle: Math.sqrt(of((x) => (x - mean) ** 2) / dose) };
};

describe('an implant into bare silicon', () => {
  test.each(['pearson', 'gaussian'] as const)(
    'as a %s has the range, the straggle and the dose of its ion',
    (shape) => {
      const { projectedRange, straggle } = rangeStatistics({
        species: 'boron',
        energy_keV: 80,
        target: 'silicon',
        set: 'universal',
      });
      const found = moments({ shape });
      // A thousandth of the ions ends beyond the surface.
      expect(found.dose / 1e14).toBeCloseTo(1, 2);
      expect(found.mean / projectedRange).toBeCloseTo(1, 2);
      expect(found.straggle / straggle).toBeCloseTo(1, 1);
    },
  );

  test('keeps less of its dose the shallower it is', () => {
    const kept = [5, 10, 40, 160].map((energy_keV) => implant(step({ energy_keV })).retainedDose / 1e14);
    for (let k = 1; k < kept.length; k++) expect(kept[k]).toBeGreaterThan(kept[k - 1]);
    expect(kept[3]).toBeLessThanOrEqual(1);
  });

  test('reports the dose that its profile holds', () => {
    const { shape, retainedDose } = implant(step({ energy_keV: 10 }));
    expect(integrate(evaluator(shape), 0, 0.5 * UM, 1e-10) / retainedDose).toBeCloseTo(1, 6);
  });

  test('of BF2 is boron at 11/49 of the energy', () => {
    const molecule = implant(step({ species: 'BF2', energy_keV: 49 }));
    const atom = implant(step({ species: 'boron', energy_keV: 11 }));
    expect(molecule.dopant).toBe('boron');
    expect(molecule.statistics).toEqual(atom.statistics);
  });

  test('takes the set of ranges it is told', () => {
    const [universal, lss] = (['universal', 'lss1975'] as const).map(
      (ranges) => implant(step({ species: 'arsenic', ranges })).statistics.projectedRange,
    );
    // The tables of 1975 are shallower for arsenic by 15 to 25 %.
    expect(lss / universal).toBeGreaterThan(0.7);
    expect(lss / universal).toBeLessThan(0.9);
  });

  test('outside the energies of its ranges comes with a warning', () => {
    expect(implant(step({ energy_keV: 5000 })).warnings.map(({ code }) => code)).toEqual(['range-energy']);
    expect(implant(step()).warnings).toEqual([]);
  });
});

describe('an implant through a screen', () => {
  const screen = (material: 'oxide' | 'nitride', nm: number) => ({
    screen: { material, thickness: nm * NM },
  });

  test('lies shallower by the thickness, in proportion to the ranges in both materials', () => {
    const range = (target: 'silicon' | 'oxide' | 'nitride') =>
      rangeStatistics({ species: 'boron', energy_keV: 80, target, set: 'universal' }).projectedRange;
    for (const material of ['oxide', 'nitride'] as const) {
      const shift = moments().mean - moments(screen(material, 30)).mean;
      // What stays in the screen takes a little of the near side with it.
      expect(Math.abs(shift / (30 * NM * (range('silicon') / range(material))) - 1)).toBeLessThan(0.03);
    }
  });

  test('leaves in the silicon what passes the screen', () => {
    const bare = implant(step());
    const screened = implant(step(screen('oxide', 200)));
    expect(screened.screened).toBeGreaterThan(0.2);
    expect(screened.retainedDose / (1e14 * (1 - (screened.screened ?? 0)))).toBeCloseTo(1, 6);
    expect(bare.screened).toBeNull();
  });

  test('that stops a third of it is warned about', () => {
    expect(implant(step(screen('oxide', 320))).warnings.map(({ code }) => code)).toEqual(['screen-loss']);
  });

  test('of no thickness is none', () => {
    expect(implant(step(screen('oxide', 0)))).toEqual(implant(step()));
  });
});
