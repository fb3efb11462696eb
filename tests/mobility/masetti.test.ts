import { describe, expect, test } from 'vitest';
import { masetti } from '../../src/core/mobility/masetti';
import { deviation, majority, oneDepth } from './oneDepth';

describe("Masetti's model", () => {
  test('reproduces the values of an independent implementation', () => {
    // Given to ten digits.
    const values = [
      ['phosphorus', 1e16, 1183.785396],
      ['phosphorus', 1e18, 276.9619545],
      ['phosphorus', 1e19, 114.784128],
      ['arsenic', 1e14, 1404.392089],
      ['arsenic', 1e16, 1176.786403],
      ['arsenic', 1e18, 283.7833609],
      ['arsenic', 1e19, 108.0495528],
      ['arsenic', 1e20, 60.86727244],
      ['boron', 1e14, 468.6658615],
      ['boron', 1e16, 424.9147663],
      ['boron', 1e17, 319.0980929],
      ['boron', 5e20, 35.06465052],
    ] as const;
    for (const [dopant, concentration, expected] of values)
      expect(deviation(majority(masetti, dopant, concentration), expected)).toBeLessThan(1e-8);
  });

  test('reaches its published maximum in undoped silicon', () => {
    const at = oneDepth(masetti, { dopants: {}, electrons: 1e10, holes: 1e10 });
    expect(at.electrons).toBe(1414);
    expect(at.holes).toBe(470.5);
    expect(at.electronImpurity).toBe(Number.POSITIVE_INFINITY);
  });

  test('sees all impurities of a compensated depth: holes at 276 for N_A = 1e17, N_D = 9e16', () => {
    // By an independent implementation, given to three digits; the net doping alone would give 425.
    const at = oneDepth(masetti, { dopants: { boron: 1e17, phosphorus: 9e16 }, electrons: 0, holes: 1e16 });
    expect(at.holes).toBeCloseTo(276, -0.3);
    expect(Math.abs(at.holes - 276)).toBeLessThan(0.5);
  });

  test('lets arsenic fall below phosphorus above 1e19, as the paper says, and not at 1e18', () => {
    for (const concentration of [1e19, 1e20, 1e21])
      expect(majority(masetti, 'arsenic', concentration)).toBeLessThan(
        majority(masetti, 'phosphorus', concentration),
      );
    expect(majority(masetti, 'arsenic', 1e18)).toBeGreaterThan(majority(masetti, 'phosphorus', 1e18));
  });
});
