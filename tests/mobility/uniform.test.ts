import { describe, expect, test } from 'vitest';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { resistivityOf } from '../../src/core/material/mf723';
import { klaassen } from '../../src/core/mobility/klaassen';
import { mobilityAt, uniformSilicon } from '../../src/core/mobility/uniform';
import { deviation, majority } from './oneDepth';

describe('uniformly doped silicon', () => {
  test('has the resistivity of the standard with the mobility taken from the standard', () => {
    // Minority carriers add less than 1e-8 above 1e15.
    for (const dopant of ['boron', 'phosphorus'] as const)
      expect(
        deviation(
          uniformSilicon(dopant, 1e16, 296.15, 'mf723').resistivity,
          resistivityOf(dopant, 1e16).value,
        ),
      ).toBeLessThan(1e-8);
  });

  test('carries current by both carriers when it is hardly doped', () => {
    const ni = intrinsicDensity(300);
    const { resistivity, electrons, holes } = uniformSilicon('boron', 1, 300, 'klaassen');
    expect(deviation(electrons, ni)).toBeLessThan(1e-9);
    expect(deviation(holes, ni)).toBeLessThan(1e-9);
    // Lattice mobilities 1414 and 470.5; carriers at 1e10 cm^-3 scatter each other by less than 0.1 %.
    expect(deviation(resistivity, 1 / (ELEMENTARY_CHARGE * ni * (1414 + 470.5)))).toBeLessThan(1e-3);
  });

  test('gives both mobilities and says which carriers are the majority', () => {
    const at = mobilityAt(klaassen, { dopant: 'boron', concentration: 1e17, temperature: 300 });
    expect(at.majority).toBe('holes');
    expect(deviation(at.holes, 1e17)).toBeLessThan(1e-9);
    // Minority electrons at 1e3 cm^-3 change the hole mobility by less than 1e-12.
    expect(deviation(at.holeMobility, majority(klaassen, 'boron', 1e17))).toBeLessThan(1e-12);
    // Minority electrons outrun majority electrons at high doping: 330 against 277 by an independent implementation.
    const heavy = mobilityAt(klaassen, { dopant: 'boron', concentration: 1e18, temperature: 300 });
    expect(heavy.electronMobility / majority(klaassen, 'phosphorus', 1e18)).toBeCloseTo(330 / 277, 2);
    expect(uniformSilicon('boron', 1e17, 300, 'klaassen').mobility).toBe(at.holeMobility);
  });
});
