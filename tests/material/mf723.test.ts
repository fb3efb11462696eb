import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { DOPANTS } from '../../src/core/material/dopants';
import { concentrationOf, resistivityOf } from '../../src/core/material/mf723';

const decades = (from: number, to: number, perDecade: number) =>
  Array.from({ length: Math.round((to - from) * perDecade) + 1 }, (_, k) => 10 ** (from + k / perDecade));

/** Worst |rho -> N -> rho| over a range of resistivities. */
function worstReturn(dopant: 'boron' | 'phosphorus', from: number, to: number): number {
  const there = decades(Math.log10(from), Math.log10(to), 200);
  return Math.max(
    ...there.map((rho) =>
      Math.abs(resistivityOf(dopant, concentrationOf(dopant, rho).value).value / rho - 1),
    ),
  );
}

describe('the resistivity relation of the standard', () => {
  test('agrees with itself as the standard claims: within 3 % for boron from 1e-4 to 1e4 Ohm cm', () => {
    // An independent implementation found 2.95 %.
    expect(worstReturn('boron', 1e-4, 1e4)).toBeCloseTo(0.0295, 3);
  });

  test('agrees with itself within 4.74 % for phosphorus from 2e-4 to 4000 Ohm cm', () => {
    // The standard claims 4.5 %; an independent implementation found 4.74 % at the very edge.
    expect(worstReturn('phosphorus', 2e-4, 4000)).toBeCloseTo(0.0474, 3);
  });

  test('reproduces the values of an independent implementation', () => {
    // Given to ten digits; 1e-8 covers the rounding of the last one.
    const resistivities = [
      ['phosphorus', 1e12, 4263.70435],
      ['boron', 1e12, 13051.57975],
      ['phosphorus', 1e14, 42.87130886],
      ['boron', 1e14, 130.9703415],
      ['phosphorus', 1e15, 4.481878397],
      ['boron', 1e15, 13.30621845],
      ['boron', 1e16, 1.44343772],
      ['phosphorus', 1e17, 0.08383082086],
      ['boron', 1e17, 0.2021509509],
      ['phosphorus', 1e18, 0.02355919556],
      ['boron', 1e18, 0.04355483598],
      ['phosphorus', 1e19, 0.005775379183],
      ['phosphorus', 1e20, 0.0007701020157],
      ['boron', 1e20, 0.001168878074],
      ['arsenic', 1e19, 0.005554803603],
      ['arsenic', 1e20, 0.0009635272463],
    ] as const;
    for (const [dopant, concentration, expected] of resistivities)
      expect(Math.abs(resistivityOf(dopant, concentration).value / expected - 1)).toBeLessThan(1e-8);
    const concentrations = [
      ['phosphorus', 0.001, 7.376259932e19],
      ['boron', 0.01, 8.486217403e18],
      ['boron', 0.1, 2.768833884e17],
      ['phosphorus', 1, 4.864338223e15],
      ['boron', 1, 1.458760276e16],
      ['phosphorus', 10, 4.445182783e14],
      ['boron', 10, 1.340222817e15],
      ['boron', 100, 1.330803431e14],
      ['phosphorus', 1000, 4.150954944e12],
    ] as const;
    for (const [dopant, resistivity, expected] of concentrations)
      expect(Math.abs(concentrationOf(dopant, resistivity).value / expected - 1)).toBeLessThan(1e-8);
  });

  test('inverts the arsenic relation exactly, up to both of its ends', () => {
    // Root tolerance 1e-14 in ln N; the terms of the polynomial cancel four digits.
    for (const concentration of [1e19, ...decades(19.01, 20.77, 10), 6e20]) {
      const { value } = resistivityOf('arsenic', concentration);
      expect(Math.abs(concentrationOf('arsenic', value).value / concentration - 1)).toBeLessThan(1e-10);
    }
  });

  test('says from which dopant a value is borrowed, and whether measurements support it', () => {
    expect(resistivityOf('boron', 1e16)).toMatchObject({ range: [1e14, 1e20], inRange: true });
    expect(resistivityOf('boron', 1e16).borrowedFrom).toBeUndefined();
    expect(resistivityOf('antimony', 1e18)).toEqual({
      ...resistivityOf('phosphorus', 1e18),
      borrowedFrom: 'phosphorus',
    });
    for (const acceptor of ['indium', 'gallium', 'aluminium'] as const)
      expect(concentrationOf(acceptor, 2)).toEqual({ ...concentrationOf('boron', 2), borrowedFrom: 'boron' });
    expect(resistivityOf('arsenic', 1e18)).toMatchObject({ inRange: true, borrowedFrom: 'phosphorus' });
    expect(resistivityOf('arsenic', 2e19).borrowedFrom).toBeUndefined();
    expect(resistivityOf('arsenic', 8e20)).toMatchObject({ range: [1e19, 6e20], inRange: false });
    expect(resistivityOf('phosphorus', 2e20).inRange).toBe(false);
    expect(concentrationOf('phosphorus', 1e-5).inRange).toBe(false);
    expect(concentrationOf('phosphorus', 1).inRange).toBe(true);
  });

  test('stays finite, positive and falling far outside its range, where the bare formulas have poles', () => {
    const exponent = fc.double({ min: 5, max: 25, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...DOPANTS), exponent, (dopant, power) => {
        const here = resistivityOf(dopant, 10 ** power).value;
        const denser = resistivityOf(dopant, 10 ** power * 1.05).value;
        expect(here).toBeGreaterThan(denser);
        expect(denser).toBeGreaterThan(0);
      }),
    );
    fc.assert(
      fc.property(
        fc.constantFrom(...DOPANTS),
        fc.double({ min: -9, max: 9, noNaN: true }),
        (dopant, power) => {
          const here = concentrationOf(dopant, 10 ** power).value;
          const moreResistive = concentrationOf(dopant, 10 ** power * 1.1).value;
          expect(here).toBeGreaterThan(moreResistive);
          expect(moreResistive).toBeGreaterThan(0);
        },
      ),
    );
  });
});
