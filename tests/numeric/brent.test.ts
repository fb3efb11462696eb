import { describe, expect, test } from 'vitest';
import { brent } from '../../src/core/numeric/brent';

function counted(f: (x: number) => number): { f: (x: number) => number; calls: () => number } {
  let calls = 0;
  return {
    f: (x) => {
      calls++;
      return f(x);
    },
    calls: () => calls,
  };
}

describe('brent', () => {
  test('finds the root of cos x = x to the last digits in few steps', () => {
    const { f, calls } = counted((x) => Math.cos(x) - x);
    expect(brent(f, 0, 1, 1e-15)).toBeCloseTo(0.7390851332151607, 14);
    expect(calls()).toBeLessThan(12);
  });

  test('finds a root where the function is flat by bisection, still bracketed', () => {
    const { f, calls } = counted((x) => (x - 1) ** 9);
    expect(Math.abs(brent(f, 0, 3, 1e-10) - 1)).toBeLessThan(1e-3);
    expect(calls()).toBeLessThan(150);
  });

  test('handles a step, and ends may be given in either order', () => {
    const step = (x: number) => (x < 0.3 ? -1 : 1);
    expect(brent(step, 0, 1, 1e-12)).toBeCloseTo(0.3, 11);
    expect(brent(step, 1, 0, 1e-12)).toBeCloseTo(0.3, 11);
  });

  test('spans twenty decades of function values', () => {
    const net = (x: number) => 1e20 * Math.exp(-x * x) - 1e15;
    expect(brent(net, 0, 10, 1e-12)).toBeCloseTo(Math.sqrt(Math.log(1e5)), 11);
  });

  test('returns an end that is a root, and NaN without a sign change', () => {
    expect(brent((x) => x, 0, 1, 1e-9)).toBe(0);
    expect(brent((x) => x - 1, 0, 1, 1e-9)).toBe(1);
    expect(brent(() => 1, 0, 1, 1e-9)).toBeNaN();
    expect(brent(() => Number.NaN, 0, 1, 1e-9)).toBeNaN();
  });
});
