import { describe, expect, test } from 'vitest';
import { type FermiValue, fermiHalf } from '../../src/core/numeric/fermiDirac';
import { integrate } from '../support/quadrature';

const at = (eta: number): FermiValue => {
  const out = { value: 0, slope: 0 };
  fermiHalf(eta, out);
  return out;
};

describe('the Fermi-Dirac integral of order one half', () => {
  test.each([
    [0, 0.7651470246],
    [2, 2.8237212774],
    [10, 24.0846569646],
  ])('at %f is %f, as computed by quadrature elsewhere', (eta, value) => {
    expect(at(eta).value / value).toBeCloseTo(1, 7);
  });

  test('agrees with adaptive quadrature between the points of its table', () => {
    for (const eta of [-11.93, -3.07, 0.06, 1.19, 7.31, 33.33, 59.9]) {
      const exact =
        (4 / Math.sqrt(Math.PI)) *
        integrate((t) => (t * t) / (1 + Math.exp(t * t - eta)), 0, Math.sqrt(Math.max(0, eta) + 40), 1e-10);
      expect(at(eta).value / exact).toBeCloseTo(1, 6);
    }
  });

  test('approaches the exponential far below the band and does not step at the ends of the table', () => {
    expect(at(-25).value / Math.exp(-25)).toBeCloseTo(1, 10);
    for (const end of [-12, 60]) {
      expect(at(end + 1e-9).value / at(end - 1e-9).value).toBeCloseTo(1, 5);
      expect(at(end + 1e-9).slope / at(end - 1e-9).slope).toBeCloseTo(1, 4);
    }
  });

  test('has the slope of its values', () => {
    for (const eta of [-20, -5.03, 0.4, 12.7, 80]) {
      const step = 1e-4;
      const slope = (at(eta + step).value - at(eta - step).value) / (2 * step);
      expect(at(eta).slope / slope).toBeCloseTo(1, 5);
    }
  });
});
