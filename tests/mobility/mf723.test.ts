import { describe, expect, test } from 'vitest';
import { ELEMENTARY_CHARGE } from '../../src/core/material/constants';
import { resistivityOf } from '../../src/core/material/mf723';
import { mf723 } from '../../src/core/mobility/mf723';
import { deviation, majority, oneDepth } from './oneDepth';

describe('the mobility implied by the resistivity standard', () => {
  test('gives the resistivity of the standard back', () => {
    // Rounding only.
    for (const dopant of ['phosphorus', 'arsenic', 'boron', 'antimony', 'gallium'] as const)
      for (const concentration of [1e14, 1e17, 3e19, 1e20]) {
        const resistivity = 1 / (ELEMENTARY_CHARGE * concentration * majority(mf723, dopant, concentration));
        expect(deviation(resistivity, resistivityOf(dopant, concentration).value)).toBeLessThan(1e-13);
      }
  });

  test('has no parts and stays finite without dopants', () => {
    const at = oneDepth(mf723, { dopants: {}, electrons: 1e10, holes: 1e10 });
    expect(at.electronLattice).toBeNaN();
    expect(at.holeImpurity).toBeNaN();
    // rho N tends to 6.242e18 10^(0.057501/-0.018376) and to 1.305e16 + 1.133e17: mobilities near 1460 and 480.
    expect(at.electrons).toBeGreaterThan(1300);
    expect(at.electrons).toBeLessThan(1500);
    expect(deviation(at.holes, 1 / (ELEMENTARY_CHARGE * 1.305e16))).toBeLessThan(1e-6);
  });
});
