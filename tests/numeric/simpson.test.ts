import { describe, expect, test } from 'vitest';
import { accumulate, integrate } from '../../src/core/numeric/simpson';

function cells(ends: number[]): Float64Array {
  const nodes = ends.flatMap((x, i) => (i === 0 ? [x] : [(ends[i - 1] + x) / 2, x]));
  return Float64Array.from(nodes);
}

describe('Simpson cells', () => {
  test('integrate cubics exactly on uneven cells', () => {
    const x = cells([0, 0.1, 0.7, 1, 2.5]);
    const f = x.map((t) => 4 * t ** 3 - 3 * t ** 2 + 1);
    expect(integrate(x, f, 0, 8)).toBeCloseTo(2.5 ** 4 - 2.5 ** 3 + 2.5, 12);
    expect(integrate(x, f, 2, 6)).toBeCloseTo(1 - 1 + 1 - (0.1 ** 4 - 0.1 ** 3 + 0.1), 12);
  });

  test('gain a factor of sixteen when the cells are halved', () => {
    const error = (n: number) => {
      const x = cells(Array.from({ length: n + 1 }, (_, i) => i / n));
      return Math.abs(integrate(x, x.map(Math.exp), 0, 2 * n) - (Math.E - 1));
    };
    expect(error(8) / error(16)).toBeGreaterThan(15);
    expect(error(8) / error(16)).toBeLessThan(17);
  });

  test('accumulate to the same total, exactly for parabolas at every node', () => {
    const x = cells([0, 0.5, 2]);
    const out = new Float64Array(x.length);
    accumulate(
      x,
      x.map((t) => 3 * t * t),
      0,
      4,
      out,
    );
    for (let i = 0; i < x.length; i++) expect(out[i]).toBeCloseTo(x[i] ** 3, 12);
  });
});
