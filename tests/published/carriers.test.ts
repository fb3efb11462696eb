/** Carrier densities against published values and worked examples. */

import { describe, expect, test } from 'vitest';
import { neutralCarriers } from '../../src/core/carriers/neutral';
import { intrinsicDensity } from '../../src/core/material/intrinsic';
import { deviation } from '../mobility/oneDepth';

describe('the intrinsic density of silicon', () => {
  test('is 9.65e9 at 300 K: P. P. Altermatt et al., J. Appl. Phys. 93, 1598 (2003)', () => {
    // Three printed digits.
    expect(deviation(intrinsicDensity(300), 9.65e9)).toBeLessThan(0.005);
  });

  test('is 1.00e10 at 300 K within 5 %: A. B. Sproul and M. A. Green, J. Appl. Phys. 70, 846 (1991, from memory)', () => {
    // Modern determinations spread by 5 %.
    expect(deviation(intrinsicDensity(300), 1e10)).toBeLessThan(0.05);
  });

  test('is 8.6e9 at 25 C within 4 % on a teaching page on the properties of silicon', () => {
    expect(deviation(intrinsicDensity(298.15), 8.6e9)).toBeLessThan(0.04);
  });
});

describe('D. A. Neamen, Semiconductor Physics and Devices, chapter 4', () => {
  const carriers = (net: number, ni: number) => {
    const [electrons, holes] = [new Float64Array(1), new Float64Array(1)];
    neutralCarriers(Float64Array.of(net), ni, electrons, holes);
    return { n: electrons[0], p: holes[0] };
  };

  test('example 4.9: N_d = 5e15, N_a = 2e15, ni = 1.5e10 give n = 3e15 and p = 7.5e4', () => {
    // Printed digits: 0.1 %.
    const { n, p } = carriers(3e15, 1.5e10);
    expect(deviation(n, 3e15)).toBeLessThan(1e-3);
    expect(deviation(p, 7.5e4)).toBeLessThan(1e-3);
  });

  test('example 4.10: N_d = 2e14, ni = 2.4e13 (germanium) give n = 2.028e14 and p = 2.84e12', () => {
    // Printed digits: 0.1 %.
    const { n, p } = carriers(2e14, 2.4e13);
    expect(deviation(n, 2.028e14)).toBeLessThan(1e-3);
    expect(deviation(p, 2.84e12)).toBeLessThan(1e-3);
  });
});
