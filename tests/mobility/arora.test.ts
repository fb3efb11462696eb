import { describe, expect, test } from 'vitest';
import { arora } from '../../src/core/mobility/arora';
import { deviation, majority } from './oneDepth';

describe("Arora's model", () => {
  test('reproduces the values of an independent implementation', () => {
    // Given to ten digits.
    const values = [
      ['phosphorus', 1e14, 250, 2007.556734],
      ['phosphorus', 1e14, 300, 1337.476628],
      ['phosphorus', 1e14, 400, 714.1978851],
      ['phosphorus', 1e16, 300, 1218.237435],
      ['phosphorus', 1e18, 300, 262.1103978],
      ['phosphorus', 1e18, 400, 226.9079428],
      ['phosphorus', 1e20, 250, 100.7211085],
      ['phosphorus', 1e20, 300, 91.50467447],
      ['phosphorus', 1e20, 400, 78.76429698],
      ['boron', 1e14, 300, 460.8272723],
      ['boron', 1e14, 400, 260.1786312],
      ['boron', 1e16, 300, 437.4523878],
      ['boron', 1e16, 400, 252.3248039],
      ['boron', 1e18, 250, 154.3086189],
      ['boron', 1e18, 300, 143.2249112],
      ['boron', 1e20, 250, 61.97368346],
      ['boron', 1e20, 300, 56.26785519],
    ] as const;
    for (const [dopant, concentration, temperature, expected] of values)
      expect(deviation(majority(arora, dopant, concentration, temperature), expected)).toBeLessThan(1e-8);
  });

  test('uses 0.88 as an exponent: 777 and 114, not the 825 and 106 of copies that multiply by it', () => {
    // Electrons at 1e17 and 1e19, given to three digits.
    expect(Math.abs(majority(arora, 'phosphorus', 1e17) - 777)).toBeLessThan(0.5);
    expect(Math.abs(majority(arora, 'phosphorus', 1e19) - 114)).toBeLessThan(0.5);
  });
});
