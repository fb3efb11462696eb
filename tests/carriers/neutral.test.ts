import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { neutralCarriers } from '../../src/core/carriers/neutral';

function carriers(net: number, ni: number): { n: number; p: number } {
  const electrons = new Float64Array(1);
  const holes = new Float64Array(1);
  neutralCarriers(Float64Array.of(net), ni, electrons, holes);
  return { n: electrons[0], p: holes[0] };
}

describe('neutral carriers', () => {
  test('keep n p = ni^2 to the last digits for any doping of either sign', () => {
    const net = fc
      .tuple(fc.boolean(), fc.double({ min: -2, max: 23, noNaN: true }))
      .map(([isN, power]) => (isN ? 1 : -1) * 10 ** power);
    fc.assert(
      fc.property(net, fc.double({ min: -10, max: 17, noNaN: true }), (doping, power) => {
        const ni = 10 ** power;
        const { n, p } = carriers(doping, ni);
        // Four rounded operations.
        expect(Math.abs((n * p) / (ni * ni) - 1)).toBeLessThan(1e-15);
        expect(Math.abs(n - p - doping)).toBeLessThanOrEqual(1e-15 * (n + p));
        expect(Math.min(n, p)).toBeGreaterThan(0);
      }),
    );
  });

  test('are ni each in intrinsic silicon', () => {
    expect(carriers(0, 1e10)).toEqual({ n: 1e10, p: 1e10 });
  });

  test('swap when the doping changes sign', () => {
    const donors = carriers(3e15, 1e10);
    expect(carriers(-3e15, 1e10)).toEqual({ n: donors.p, p: donors.n });
  });

  test('fill every depth', () => {
    const electrons = new Float64Array(3);
    const holes = new Float64Array(3);
    // n - p = 3 and n p = 4 has the exact answer 4 and 1.
    neutralCarriers(Float64Array.of(3, 0, -3), 2, electrons, holes);
    expect([...electrons]).toEqual([4, 2, 1]);
    expect([...holes]).toEqual([1, 2, 4]);
  });
});
