import { describe, expect, test } from 'vitest';
import { BOLTZMANN_EV } from '../../src/core/material/constants';
import { INTRINSIC_RANGE, intrinsicDensity } from '../../src/core/material/intrinsic';

describe('the intrinsic density', () => {
  test('reproduces the values of an independent implementation', () => {
    // Given to ten digits.
    const values = [
      [250, 68877371.62],
      [296.15, 7010420991],
      [300, 9695570927],
    ];
    for (const [temperature, expected] of values)
      expect(Math.abs(intrinsicDensity(temperature) / expected - 1)).toBeLessThan(1e-8);
  });

  test('agrees with the formula of Sproul and Green (1991) within 5 % from 250 to 400 K', () => {
    // J. Appl. Phys. 70, 846: 9.15e19 t^2 exp(-0.5928 eV/kT), measured 275 to 375 K; the reference finds 5 % among modern forms.
    for (let temperature = 250; temperature <= 400; temperature += 10) {
      const other = 9.15e19 * (temperature / 300) ** 2 * Math.exp(-0.5928 / (BOLTZMANN_EV * temperature));
      expect(Math.abs(intrinsicDensity(temperature) / other - 1)).toBeLessThan(0.05);
    }
  });

  test('states the range of its measurements', () => {
    expect(INTRINSIC_RANGE).toEqual([78, 340]);
  });
});
