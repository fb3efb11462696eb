import { describe, expect, test } from 'vitest';
import { MOBILITY_MODELS } from '../../src/core/mobility/list';
import { masetti } from '../../src/core/mobility/masetti';
import { deviation, majority, oneDepth } from './oneDepth';

const electronsOf = (model: (typeof MOBILITY_MODELS)[number], dopants: Record<string, number>) =>
  oneDepth(model, { dopants, electrons: 2e19, holes: 5 }).electrons;

describe('donors that share a depth', () => {
  test('give the mobility of one of them as the other fades away', () => {
    // The mixture is linear in the share, 1e-12 here.
    for (const model of MOBILITY_MODELS) {
      const alone = electronsOf(model, { arsenic: 2e19 });
      const almost = electronsOf(model, { arsenic: 2e19, phosphorus: 2e7 });
      expect(deviation(almost, alone)).toBeLessThan(1e-11);
    }
  });

  test('give a mobility between those of the two, where they have sets of their own', () => {
    for (const model of MOBILITY_MODELS.filter(({ name }) =>
      ['klaassen', 'masetti', 'mf723'].includes(name),
    )) {
      const [arsenic, phosphorus] = [
        electronsOf(model, { arsenic: 4e19 }),
        electronsOf(model, { phosphorus: 4e19 }),
      ];
      const both = electronsOf(model, { arsenic: 2e19, phosphorus: 2e19 });
      expect(both).toBeGreaterThan(Math.min(arsenic, phosphorus));
      expect(both).toBeLessThan(Math.max(arsenic, phosphorus));
    }
  });

  test('mix the coefficients, not the mobilities', () => {
    // Masetti's form with every coefficient the mean of the two published rows, N = 4e19.
    const [mu0, muMax, mu1, cr, cs, alpha, beta] = [60.35, 1415.5, 49.75, 9.44e16, 3.42e20, 0.6955, 1.99];
    const expected = mu0 + (muMax - mu0) / (1 + (4e19 / cr) ** alpha) - mu1 / (1 + (cs / 4e19) ** beta);
    expect(deviation(electronsOf(masetti, { arsenic: 2e19, phosphorus: 2e19 }), expected)).toBeLessThan(
      1e-13,
    );
  });

  test('let antimony borrow from phosphorus, and the other acceptors from boron', () => {
    for (const model of MOBILITY_MODELS) {
      expect(majority(model, 'antimony', 1e19)).toBe(majority(model, 'phosphorus', 1e19));
      for (const dopant of ['indium', 'gallium', 'aluminium'] as const)
        expect(majority(model, dopant, 1e17)).toBe(majority(model, 'boron', 1e17));
    }
  });
});
