import { describe, expect, test } from 'vitest';
import { caugheyThomas } from '../../src/core/mobility/caugheyThomas';
import { masetti } from '../../src/core/mobility/masetti';
import { majority } from './oneDepth';

describe('the model of Caughey and Thomas', () => {
  test('stands halfway between its limits at the reference concentration', () => {
    // Exact by the form; 1e-10 is rounding.
    expect(majority(caugheyThomas, 'phosphorus', 8.5e16)).toBeCloseTo((1330 + 65) / 2, 10);
    expect(majority(caugheyThomas, 'boron', 6.3e16)).toBeCloseTo((495 + 47.7) / 2, 10);
  });

  test('gives 232 and 96 for holes at 1e17 and 1e18, as an independent implementation does', () => {
    // Given to whole numbers.
    expect(Math.abs(majority(caugheyThomas, 'boron', 1e17) - 232)).toBeLessThan(0.5);
    expect(Math.abs(majority(caugheyThomas, 'boron', 1e18) - 96)).toBeLessThan(0.5);
  });

  test('deserves its caution: holes 22 to 40 % below Masetti from 1e17 to 1e19', () => {
    const low = [17, 17.5, 18, 18.5, 19].map(
      (power) => 1 - majority(caugheyThomas, 'boron', 10 ** power) / majority(masetti, 'boron', 10 ** power),
    );
    expect(Math.min(...low)).toBeGreaterThan(0.21);
    expect(Math.max(...low)).toBeLessThan(0.41);
    expect(caugheyThomas.caution).toContain('22 to 40 %');
  });
});
