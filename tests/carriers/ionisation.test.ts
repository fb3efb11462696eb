import { describe, expect, test } from 'vitest';
import { boundColumns, hasLevel } from '../../src/core/carriers/ionisation';
import { densitiesOfStates } from '../../src/core/material/silicon';
import { mobilityModel } from '../../src/core/mobility/list';
import { uniformInput } from '../../src/core/mobility/uniform';
import { brent } from '../../src/core/numeric/brent';

const ionisedPart = (
  dopant: 'phosphorus' | 'arsenic' | 'boron',
  concentration: number,
  temperature = 300,
) => {
  const { donors, acceptors } = uniformInput({ dopant, concentration, temperature, ionisation: 'levels' });
  return Math.max(donors[0], acceptors[0]) / concentration;
};

describe('dopant levels of Altermatt 2006', () => {
  // reference: minima of the closed form, computed independently from the recalled parameters.
  test.each([
    ['phosphorus', 1.7e18, 0.79],
    ['arsenic', 5.5e18, 0.66],
    ['boron', 2.1e18, 0.77],
  ] as const)('%s is least ionised at %f cm^-3, with a part of %f', (dopant, at, part) => {
    expect(ionisedPart(dopant, at)).toBeCloseTo(part, 2);
    expect(ionisedPart(dopant, at * 0.7)).toBeGreaterThan(ionisedPart(dopant, at));
    expect(ionisedPart(dopant, at / 0.7)).toBeGreaterThan(ionisedPart(dopant, at));
  });

  test('all is ionised when dilute, and again beyond the metal-insulator transition', () => {
    for (const dopant of ['phosphorus', 'arsenic', 'boron'] as const) {
      expect(ionisedPart(dopant, 1e14)).toBeGreaterThan(0.999);
      expect(ionisedPart(dopant, 3e20)).toBeGreaterThan(0.999);
    }
  });

  test('the neutral solver gives the root of n = N (1 - b n/(n + g n1)) found by bisection', () => {
    for (const concentration of [1e16, 1e18, 8e18]) {
      const columns = boundColumns('boron', Float64Array.of(concentration), 300);
      if (!columns) throw new Error('boron has a level');
      const [bound, threshold] = [columns.bound[0], columns.threshold[0]];
      const root = brent(
        (p) => p - concentration + (bound * p) / (p + threshold),
        1,
        concentration,
        concentration * 1e-14,
      );
      expect(ionisedPart('boron', concentration) / (root / concentration)).toBeCloseTo(1, 9);
    }
  });

  test('less is ionised when it is colder', () => {
    const parts = [500, 400, 300, 250, 200].map((temperature) => ionisedPart('boron', 1e18, temperature));
    for (let k = 1; k < parts.length; k++) expect(parts[k]).toBeLessThan(parts[k - 1]);
  });

  test('a dopant without published levels has none', () => {
    expect(hasLevel('antimony')).toBe(false);
    expect(boundColumns('antimony', Float64Array.of(1e18), 300)).toBeNull();
  });

  test('a model of dopants is given complete ionisation, one of carriers what is ionised', () => {
    expect(mobilityModel('mf723').argument).toBe('dopants');
    expect(mobilityModel('klaassen').argument).toBe('carriers');
  });
});

test('densities of states are those of Green 1990 at 300 K, and their ratio to ni gives a gap of 1.12 to 1.13 eV', () => {
  const { conduction, valence } = densitiesOfStates(300);
  expect([conduction, valence]).toEqual([2.86e19, 3.1e19]);
  const gap = 8.617333e-5 * 300 * Math.log((conduction * valence) / 9.7e9 ** 2);
  expect(gap).toBeGreaterThan(1.12);
  expect(gap).toBeLessThan(1.135);
});
